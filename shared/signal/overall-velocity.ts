import type { ScreeningResult } from './screening-types.ts';
import type { SpectrumView } from './spectrum-view.ts';

const topHz = 1000;
const bottomHz = 10;
const slowBottomHz = 2;
const slowBelowHz = 10; // 600 r/min
/** Equivalent noise bandwidth of the Hann window, lines (Harris 1978). */
const hannNoiseBandwidth = 1.5;

/**
 * Overall velocity as ISO 20816-1 measures it: rms over 10–1000 Hz, from 2 Hz for shafts below
 * 600 r/min. Where the record does not reach 1000 Hz the band ends with it and says so.
 *
 * @returns null where the record covers less than a decade of the band
 */
export function overallVelocity(
  view: SpectrumView,
  speedHz: number | null,
): ScreeningResult['overallVelocity'] {
  const fromHz = speedHz !== null && speedHz < slowBelowHz ? slowBottomHz : bottomHz;
  const toHz = Math.min(topHz, view.usableHz);
  if (toHz < 10 * fromHz) return null;
  let power = 0;
  const from = Math.ceil(fromHz / view.stepHz);
  const to = Math.min(view.velocity.length - 1, Math.floor(toHz / view.stepHz));
  for (let i = from; i <= to; i += 1) power += (view.velocity[i] ?? 0) ** 2;
  return { mmPerSRms: Math.sqrt(power / hannNoiseBandwidth), fromHz, toHz };
}
