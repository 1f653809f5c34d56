import type { Mounting } from './fit-types.ts';
import { referenceC } from './running-fit.ts';

/** Heating limits, °C: open bearings (two sources), sealed, shielded or greased ones (one source). */
export const heatingLimitC = { open: 120, capped: 80 } as const;

/** How much hotter than needed a ring is heated in practice: 20–30 K (common practice). */
export const defaultHandlingMarginK = 20;

function advise(heat: boolean, allowed: boolean, limitC: number, capped: boolean): string {
  if (!heat) return 'No heating needed: the ring slides on cold.';
  const how =
    'Heat by induction (first choice for a single bearing, demagnetised afterwards); ovens and hot plates suit batches of small bearings; oil baths are slow and risk dirt. Never heat with an open flame.';
  if (allowed) return `${how} Hold the ring below ${limitC} °C.`;
  return `${how} Heating alone would pass the limit of ${limitC} °C${capped ? ' for sealed or greased bearings' : ''}: heat to the limit and cool the shaft as well, press the ring on, or mount with oil pressure.`;
}

/**
 * Mounting temperature of the inner ring: T = T_shaft + (I_max + clearance for sliding on) /
 * (1000·α·d), the shaft at 20 °C; what to heat to is that and the handling margin. Where the limit
 * is passed, the shaft is cooled by what is missing: the same formula solved for T_shaft with the
 * ring at its limit, the shaft taken to shrink as the ring grows.
 *
 * @param ring - bore d mm; α 1/K; greatest interference and clearance wanted, µm; margin K, ≥ 0
 * @returns temperatures, °C; `allowed` where what to heat to stays within the limit
 *
 * @example
 * // d = 60 mm, 30 µm + 30 µm, α = 12.5e-6: needed 100 °C
 */
export function mountingOf(ring: {
  d: number;
  alphaPerK: number;
  greatestInterferenceUm: number;
  slideOnClearanceUm?: number;
  handlingMarginK?: number;
  capped: boolean;
}): Mounting {
  const limitC = ring.capped ? heatingLimitC.capped : heatingLimitC.open;
  const gapUm = ring.greatestInterferenceUm + (ring.slideOnClearanceUm ?? 0);
  const heat = gapUm > 0;
  const neededC = referenceC + (heat ? gapUm / (1000 * ring.alphaPerK * ring.d) : 0);
  const heatToC = heat ? neededC + (ring.handlingMarginK ?? defaultHandlingMarginK) : neededC;
  // The last bits of the division must not turn exactly 120 °C into more.
  const allowed = heatToC <= limitC + 1e-9;
  return {
    neededC,
    heatToC,
    limitC,
    allowed,
    ...(allowed ? {} : { shaftCooledToC: referenceC - (heatToC - limitC) }),
    advice: advise(heat, allowed, limitC, ring.capped),
  };
}
