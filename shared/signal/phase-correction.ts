import { medianInPlace } from './noise-floor.ts';
import { orderSegments, type OrderSegments } from './order-spectra.ts';
import { pointsPerTurn } from './shaft-angle.ts';

const highestOrder = 20;
/** Mean power over the lines beside it from which an order has a say. */
const ratioMin = 8;
/** How far the correction is looked for, in lines of the whole record at the highest order used. */
const reachLines = 0.75;
const steps = 16;
/** Short segments lose little at the record's ends; their sum in phase is as narrow as the record. */
const shortTurns = 4;
const shortSegmentsMax = 300;
/** Equivalent noise bandwidth of the Hann window, lines (Harris 1978). */
const hannBandwidth = 1.5;

/**
 * What is left of an error of the speed after the angle was followed: the rate at which the phases
 * of all strong orders together drift through the record. Maximises the power of their sums in
 * phase, each over its noise: the maximum likelihood estimate for orders in white noise (Rife and
 * Boorstyn 1974), up to the taper at both ends.
 *
 * @param velocity - over the shaft angle
 * @param segments - long ones, to tell the strong orders by
 * @returns relative correction of the speed, and its standard error; both 0 where no order is strong
 */
export function phaseCorrection(
  velocity: Float64Array,
  segments: OrderSegments,
): { shift: number; error: number } {
  const none = { shift: 0, error: 0 };
  const turns = Math.floor(velocity.length / pointsPerTurn);
  const used = strongOrders(segments);
  const top = used.at(-1)?.order ?? 0;
  if (top === 0) return none;
  const hopTurns = Math.max(shortTurns / 2, Math.ceil(turns / shortSegmentsMax));
  const short = orderSegments(velocity, shortTurns, hopTurns).segments;
  if (short.length < 3) return none;
  const inPhase = (shift: number) =>
    used.reduce((sum, { order, noise }) => {
      const turn = -2 * Math.PI * order * shift * hopTurns;
      const at = 2 * order * shortTurns;
      const [stepRe, stepIm] = [Math.cos(turn), Math.sin(turn)];
      let [re, im, c, d] = [0, 0, 1, 0];
      for (const lines of short) {
        const [a, b] = [lines[at] ?? 0, lines[at + 1] ?? 0];
        re += a * c - b * d;
        im += a * d + b * c;
        [c, d] = [c * stepRe - d * stepIm, c * stepIm + d * stepRe];
      }
      return sum + (re * re + im * im) / noise;
    }, 0);
  const step = reachLines / (top * turns) / steps;
  const values = Array.from({ length: 2 * steps + 1 }, (_, i) => inPhase((i - steps) * step));
  const best = values.indexOf(Math.max(...values));
  const [before, here, after] = [values[best - 1], values[best] ?? 0, values[best + 1]];
  if (before === undefined || after === undefined) return none;
  const bend = 2 * here - before - after;
  if (!(bend > 0)) return none;
  // Power of the order over noise in a line of the whole record without a window.
  const whole = (hannBandwidth * turns) / segments.linesPerOrder;
  const information = used.reduce(
    (sum, { order, ratio }) => sum + order * order * (ratio - 1) * whole,
    0,
  );
  return {
    shift: (best - steps + (after - before) / (2 * bend)) * step,
    error: Math.sqrt(6 / information) / (2 * Math.PI * turns),
  };
}

/** Orders that stand out of the lines beside them, with the noise of one segment's line. */
function strongOrders({ segments, linesPerOrder }: OrderSegments) {
  const found: { order: number; noise: number; ratio: number }[] = [];
  const beside = new Float64Array(linesPerOrder + 1);
  for (let order = 1; order <= highestOrder; order += 1) {
    const centre = order * linesPerOrder;
    let [power, count] = [0, 0];
    for (let k = centre - linesPerOrder / 2; k <= centre + linesPerOrder / 2; k += 1) {
      let sum = 0;
      for (const lines of segments) sum += (lines[2 * k] ?? 0) ** 2 + (lines[2 * k + 1] ?? 0) ** 2;
      if (k === centre) power = sum;
      else if (Math.abs(k - centre) > 1) beside[count++] = sum;
    }
    const noise = medianInPlace(beside, count);
    const ratio = power / noise;
    if (noise > 0 && ratio >= ratioMin) {
      found.push({ order, noise: noise / segments.length, ratio });
    }
  }
  return found;
}
