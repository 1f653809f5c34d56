import { noiseFloor } from '#shared/signal/noise-floor.ts';
import { floorHalfWidthLines } from '#shared/signal/spectrum-view.ts';
import type { Spectrum } from './spectrum-data.ts';

/** Without a speed the floor is taken over as many Hz as a motor of four poles turns. */
const usualSpeedHz = 25;

/** The noise floor of a recorded spectrum as the screening draws it, in the spectrum's own unit. */
export function noiseFloorLine({ stepHz, amplitude }: Spectrum, speedHz: number | null): Spectrum {
  const power = Float64Array.from(amplitude, (value) => value * value);
  const halfWidth = floorHalfWidthLines(speedHz ?? usualSpeedHz, stepHz);
  return { stepHz, amplitude: Float32Array.from(noiseFloor(power, halfWidth), Math.sqrt) };
}
