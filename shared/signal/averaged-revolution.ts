import type { Quantity } from '../quantities/quantity.ts';

const ordersKept = 20;
const pointsPerTurn = 256;

/** One turn of the shaft, averaged over the record. */
export interface AveragedRevolution {
  /** Velocity, mm/s, at equal steps of the turn. */
  velocityMmPerS: Float64Array;
  /** Displacement, µm, from the first ten orders, at the same steps. */
  displacementUm: Float64Array;
  /** Power of the whole orders, mm²/s². */
  synchronousPower: number;
}

/**
 * Averages the record over its revolutions in the frequency domain: the complex amplitude of every
 * whole order (a Hann-weighted sum at exactly k times the speed), integrated to velocity and
 * displacement, put together again over one turn.
 *
 * @param values - prepared samples, m/s², mm/s or µm
 * @param speedHz - of the shaft, > 0
 * @param topHz - orders above it are left out
 */
export function averagedRevolution(
  values: Float64Array,
  sampleRateHz: number,
  quantity: Quantity,
  speedHz: number,
  topHz: number,
): AveragedRevolution {
  const velocityMmPerS = new Float64Array(pointsPerTurn);
  const displacementUm = new Float64Array(pointsPerTurn);
  let synchronousPower = 0;
  for (let order = 1; order <= ordersKept; order += 1) {
    const frequencyHz = order * speedHz;
    if (frequencyHz > topHz) break;
    const [re, im] = lineAt(values, sampleRateHz, frequencyHz);
    const omega = 2 * Math.PI * frequencyHz;
    // Velocity in mm/s as a complex amplitude: a/(jω), v, or jω·x.
    const [vRe, vIm] =
      quantity === 'acceleration'
        ? [(im / omega) * 1000, (-re / omega) * 1000]
        : quantity === 'velocity'
          ? [re, im]
          : [-im * omega * 1e-3, re * omega * 1e-3];
    synchronousPower += (vRe ** 2 + vIm ** 2) / 2;
    const [xRe, xIm] = [(vIm / omega) * 1000, (-vRe / omega) * 1000];
    for (let point = 0; point < pointsPerTurn; point += 1) {
      const angle = (2 * Math.PI * order * point) / pointsPerTurn;
      const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
      velocityMmPerS[point] = (velocityMmPerS[point] ?? 0) + vRe * cos - vIm * sin;
      if (order <= 10) {
        displacementUm[point] = (displacementUm[point] ?? 0) + xRe * cos - xIm * sin;
      }
    }
  }
  return { velocityMmPerS, displacementUm, synchronousPower };
}

/** Complex amplitude of one frequency by a Hann-weighted sum, with the phasor turned step by step. */
function lineAt(values: Float64Array, sampleRateHz: number, frequencyHz: number): [number, number] {
  const n = values.length;
  const step = (2 * Math.PI * frequencyHz) / sampleRateHz;
  const windowStep = (2 * Math.PI) / n;
  const [stepCos, stepSin] = [Math.cos(step), Math.sin(step)];
  const [winCos, winSin] = [Math.cos(windowStep), Math.sin(windowStep)];
  let [cos, sin, wCos, wSin, re, im] = [1, 0, 1, 0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const weighted = (values[i] ?? 0) * (0.5 - 0.5 * wCos);
    re += weighted * cos;
    im -= weighted * sin;
    [cos, sin] = [cos * stepCos - sin * stepSin, sin * stepCos + cos * stepSin];
    [wCos, wSin] = [wCos * winCos - wSin * winSin, wSin * winCos + wCos * winSin];
  }
  const gain = 4 / n; // 2 for the single side, over a coherent gain of n/2
  return [re * gain, im * gain];
}
