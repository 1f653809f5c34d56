/** Density of steel, kg/m³ (common handbook value). */
const steelDensityKgPerM3 = 7850;

/**
 * Loss of interference between a solid steel shaft and an inner ring that turn together, by
 * centrifugal growth. Rotating disc with a hole for the ring and rotating solid cylinder for the
 * shaft, plane stress: Timoshenko and Goodier, Theory of Elasticity, "Rotating disks". The ring is
 * taken as plain between its bore and its raceway; its pressure on the shaft is not followed, so the
 * figure is on the safe side (a little too large).
 *
 * @param d - bore, mm; > 0
 * @param racewayMm - raceway diameter of the inner ring, mm; > d
 * @param speedRpm - speed of the shaft, r/min; ≥ 0
 * @param steel - modulus GPa and Poisson's ratio
 * @returns loss of interference on the diameter, µm; ≥ 0
 *
 * @example
 * ringGrowthUm(60, 78, 0, { modulusGpa: 208, poisson: 0.3 }) // => 0
 */
export function ringGrowthUm(
  d: number,
  racewayMm: number,
  speedRpm: number,
  steel: { modulusGpa: number; poisson: number },
): number {
  const omega = (speedRpm * 2 * Math.PI) / 60;
  const a = d / 2000;
  const b = racewayMm / 2000;
  const nu = steel.poisson;
  const stressPerSquare = (steelDensityKgPerM3 * omega ** 2) / (steel.modulusGpa * 1e9);
  const boreGrowthM = ((stressPerSquare * a) / 4) * ((3 + nu) * b ** 2 + (1 - nu) * a ** 2);
  const shaftGrowthM = ((stressPerSquare * a) / 4) * (1 - nu) * a ** 2;
  return 2 * (boreGrowthM - shaftGrowthM) * 1e6;
}
