/**
 * Interference the inner ring needs so that a radial load turning relative to it does not make it
 * creep. Light form 0.08·√(d·Fr/B) to Fr = 0.3·C0r (two sources), heavy form 0.02·Fr/B above (one
 * source); both are the trade's empirical formulas for rings on solid steel shafts. What smoothing
 * takes is added, and 0.0015·d·ΔT for a ring warmer than its surroundings (two sources).
 *
 * @param load - d and B in mm (> 0), Fr in N (≥ 0); static rating C0r in N, absent: the light form
 * @returns interference needed, µm
 *
 * @example
 * neededInterferenceUm({ d: 50, B: 20, radialLoadN: 4000 }) // => 8 (0.08·√10000)
 */
export function neededInterferenceUm(load: {
  d: number;
  B: number;
  radialLoadN: number;
  staticRatingN?: number;
  smoothingUm?: number;
  warmerThanSurroundingsK?: number;
}): number {
  const heavy = load.staticRatingN !== undefined && load.radialLoadN > 0.3 * load.staticRatingN;
  const byLoad = heavy
    ? (0.02 * load.radialLoadN) / load.B
    : 0.08 * Math.sqrt((load.d * load.radialLoadN) / load.B);
  return byLoad + (load.smoothingUm ?? 0) + 0.0015 * load.d * (load.warmerThanSurroundingsK ?? 0);
}
