import { explanations, type Explanation } from './explained-orders.ts';
import { chanceOfLine, medianInPlace } from './noise-floor.ts';
import { noiseTilt } from './noise-tilt.ts';
import type { OrderSpectrum } from './order-spectra.ts';
import type { MachineFacts, OrderLine } from './screening-types.ts';
import { plainVelocityRmsFactor } from './velocity-lines.ts';
import type { Quantity } from '../quantities/quantity.ts';

export const highestOrder = 20;
/** Lines to an order from which half and third orders can be told from the whole ones beside them. */
const linesForHalves = 8;
const linesForThirds = 16;
const floorReachOrders = 1.5;
const floorLinesMin = 4;
/** A median of neighbouring Hann lines is worth this share of as many independent ones (simulated). */
const medianWorth = 0.3;
/** The largest of three neighbouring Hann lines exceeds a level as often as one of so many independent ones (simulated: 2.4 at a chance of 0.2, 2.9 at 0.001). */
const linesLookedAt = 2.7;
/** Three neighbouring Hann lines of a tone together, over its power (Harris 1978). */
const hannLobe = 1.5;

/** Orders looked at: every multiple of a half and of a third up to the twentieth. */
export const tableOrders: readonly number[] = Array.from(
  { length: highestOrder * 6 },
  (_, index) => (index + 1) / 6,
).filter((order) => {
  const sixths = Math.round(order * 6);
  return sixths % 3 === 0 || sixths % 2 === 0;
});

const isNear = (value: number, grid: number, reach: number) =>
  Math.abs(value - Math.round(value / grid) * grid) < reach;

/** Floor of an order: mean noise power of a line, (mm/s rms)², and the averages it is worth. */
export interface OrderFloor {
  power: number;
  averages: number;
}

/** Whether a line belongs to a whole, half or (where it can be told apart) third order. */
function orderLineTest({ linesPerOrder }: OrderSpectrum): (line: number) => boolean {
  const grid = linesPerOrder >= linesForHalves ? 0.5 : 1;
  const reach = 1.6 / linesPerOrder;
  return (line) => {
    const at = line / linesPerOrder;
    return isNear(at, grid, reach) || (linesPerOrder > linesForThirds && isNear(at, 1 / 3, reach));
  };
}

/**
 * Noise beside an order: the median of the averaged power between the whole, half and (where they
 * can be told apart) third orders, as far to one side as to the other, levelled by the tilt. A gamma
 * variable's median is (1 − 1/9a)³ of its mean (Wilson and Hilferty 1931).
 *
 * @param tilt - exponent of the noise's power over order
 */
export function orderFloor(spectrum: OrderSpectrum, order: number, tilt = 0) {
  const { power, averages, linesPerOrder } = spectrum;
  const isOrder = orderLineTest(spectrum);
  const centre = order * linesPerOrder;
  const lowest = Math.ceil(0.3 * linesPerOrder);
  const most = Math.min(
    Math.max(centre - lowest, 0.5 * linesPerOrder),
    Math.max(power.length - 1 - centre, 0.5 * linesPerOrder),
  );
  const beside = new Float64Array(power.length);
  let count = 0;
  for (
    let reachOrders = floorReachOrders;
    count < floorLinesMin && reachOrders < 8;
    reachOrders *= 2
  ) {
    const reach = Math.min(reachOrders * linesPerOrder, Math.max(most, floorLinesMin * 2));
    count = 0;
    const to = Math.min(power.length - 1, Math.floor(centre + reach));
    for (let k = Math.max(lowest, Math.ceil(centre - reach)); k <= to; k += 1) {
      if (isOrder(k)) continue;
      beside[count++] = (power[k] ?? 0) * (tilt === 0 ? 1 : (k / centre) ** -tilt);
    }
  }
  const median = medianInPlace(beside, count);
  return {
    power: Math.max(median / (1 - 1 / (9 * averages)) ** 3, 1e-30),
    averages: Math.max(1, medianWorth * averages * count),
  } satisfies OrderFloor;
}

/**
 * Level, floor, prominence and chance of every order in the usable band.
 *
 * @param speedHz - of the position's shaft
 * @param factor - from the recorded unit to the base unit, to give amplitudes back as recorded
 */
export function orderTable(
  spectrum: OrderSpectrum,
  speedHz: number,
  usableHz: number,
  machine: MachineFacts | undefined,
  quantity: Quantity,
  factor: number,
): OrderLine[] {
  const { power, linesPerOrder, averages } = spectrum;
  const known = explanations(speedHz, machine, usableHz);
  const widthHz = speedHz / linesPerOrder;
  const lines: OrderLine[] = [];
  const tilt = noiseTilt(spectrum, orderLineTest(spectrum));
  for (const order of tableOrders) {
    const frequencyHz = order * speedHz;
    if (frequencyHz > usableHz) break;
    if (linesPerOrder < linesForHalves && !Number.isInteger(order)) continue;
    if (linesPerOrder < linesForThirds && !Number.isInteger(order * 2)) continue;
    const at = Math.round(order * linesPerOrder);
    let [best, sum] = [0, 0];
    for (let k = at - 1; k <= at + 1; k += 1) {
      best = Math.max(best, power[k] ?? 0);
      sum += power[k] ?? 0;
    }
    const floor = orderFloor(spectrum, order, order < 2 * floorReachOrders ? tilt : 0);
    const ratio = best / floor.power;
    const velocityMmPerSRms = Math.sqrt(Math.max(best, sum / hannLobe));
    lines.push({
      order: roundOrder(order),
      frequencyHz,
      velocityMmPerSRms,
      amplitudePeak: velocityMmPerSRms / plainVelocityRmsFactor(quantity, frequencyHz) / factor,
      floorMmPerSRms: Math.sqrt(floor.power),
      prominenceDb: 10 * Math.log10(Math.max(ratio, 1e-12)),
      pNoise: chanceOfLine(ratio, linesLookedAt, averages, floor.averages),
      explainedBy: explanationOf(known, frequencyHz, widthHz)?.words ?? null,
    });
  }
  return lines;
}

/** The known source nearest to an order, if it falls into the same line. */
function explanationOf(
  known: readonly Explanation[],
  frequencyHz: number,
  widthHz: number,
): Explanation | undefined {
  let nearest: Explanation | undefined;
  let least = Math.max(1.5 * widthHz, 0.002 * frequencyHz);
  for (const one of known) {
    const away = Math.abs(one.frequencyHz - frequencyHz);
    if (away < least) [nearest, least] = [one, away];
  }
  return nearest;
}

/** Thirds are written with four decimals; wholes and halves are exact. */
const roundOrder = (order: number) => Math.round(order * 1e4) / 1e4;
