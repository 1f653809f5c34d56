import { realFft, realFromLines } from './fft.ts';
import { pointsPerTurn } from './shaft-angle.ts';

const ordersKept = 20;
const displacementOrders = 10;
const pointsShown = 256;

/** One turn of the shaft, averaged over the record; 256 points a turn. */
export interface AveragedRevolution {
  /** mm/s. */
  velocityMmPerS: Float64Array;
  /** µm, from the first ten orders. */
  displacementUm: Float64Array;
  /** m/s², from the first ten orders. */
  accelerationMPerS2: Float64Array;
  /** Power of the averaged turn, (mm/s)². */
  synchronousPower: number;
  /** Power of what every single turn leaves beside the average, (mm/s)². */
  residualPower: number;
}

/**
 * Averages the record over its turns (synchronous averaging) and integrates and differentiates the
 * average by its orders.
 *
 * @param velocity - mm/s over the shaft angle, `pointsPerTurn` a turn
 * @param highestOrder - orders above it lie outside the usable band
 */
export function averagedRevolution(
  velocity: Float64Array,
  speedHz: number,
  highestOrder: number,
): AveragedRevolution {
  const turns = Math.floor(velocity.length / pointsPerTurn);
  const mean = new Float64Array(pointsPerTurn);
  let total = 0;
  for (let i = 0; i < turns * pointsPerTurn; i += 1) {
    const value = velocity[i] ?? 0;
    const at = i % pointsPerTurn;
    mean[at] = (mean[at] ?? 0) + value / turns;
    total += value * value;
  }
  total /= Math.max(1, turns * pointsPerTurn);
  const spectrum = realFft(mean);
  const most = Math.min(ordersKept, Math.floor(highestOrder));
  const [v, x, a] = [0, 0, 0].map(() => new Float64Array(2 * (most + 1))) as [
    Float64Array,
    Float64Array,
    Float64Array,
  ];
  let synchronousPower = 0;
  for (let order = 1; order <= most; order += 1) {
    const [re, im] = [
      (spectrum[2 * order] ?? 0) / pointsPerTurn,
      (spectrum[2 * order + 1] ?? 0) / pointsPerTurn,
    ];
    const omega = 2 * Math.PI * order * speedHz;
    synchronousPower += 2 * (re * re + im * im);
    v.set([re, im], 2 * order);
    if (order > displacementOrders) continue;
    x.set([(im / omega) * 1000, (-re / omega) * 1000], 2 * order);
    a.set([(-im * omega) / 1000, (re * omega) / 1000], 2 * order);
  }
  return {
    velocityMmPerS: realFromLines(v, pointsShown),
    displacementUm: realFromLines(x, pointsShown),
    accelerationMPerS2: realFromLines(a, pointsShown),
    synchronousPower,
    residualPower: Math.max(0, total - synchronousPower),
  };
}
