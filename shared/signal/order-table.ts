import { chanceOfLine } from './noise-floor.ts';
import { explanations } from './explained-orders.ts';
import type { MachineFacts, OrderLine } from './screening-types.ts';
import { peakNear, type SpectrumView } from './spectrum-view.ts';
import { velocityRmsFactor } from './velocity-lines.ts';

export const highestOrder = 20;
const reachMinLines = 1;
const reachMaxLines = 4;

/** Orders looked at: every multiple of a half and of a third up to the twentieth. */
export const tableOrders: readonly number[] = Array.from(
  { length: highestOrder * 6 },
  (_, index) => (index + 1) / 6,
).filter((order) => {
  const sixths = Math.round(order * 6);
  return sixths % 3 === 0 || sixths % 2 === 0;
});

/**
 * Level, floor, prominence and chance of every order in the usable band.
 *
 * @param speedHz - of the position's shaft
 * @param speedErrorHz - half the 95 % interval: the higher the order, the wider it is looked for
 * @param factor - from the recorded unit to the base unit, to give amplitudes back as recorded
 */
export function orderTable(
  view: SpectrumView,
  speedHz: number,
  speedErrorHz: number,
  machine: MachineFacts | undefined,
  factor: number,
): OrderLine[] {
  const known = explanations(speedHz, machine, view.usableHz);
  const lines: OrderLine[] = [];
  for (const order of tableOrders) {
    const frequencyHz = order * speedHz;
    if (frequencyHz > view.usableHz || frequencyHz < 2 * view.stepHz) continue;
    const reach = Math.max(
      reachMinLines,
      Math.min(reachMaxLines, (order * speedErrorHz) / view.stepHz),
    );
    const peak = peakNear(view, frequencyHz, reach);
    if (peak === null) continue;
    const ratio = view.ratio[peak.index] ?? 0;
    const explained = known.find(
      (one) =>
        Math.abs(one.frequencyHz - frequencyHz) < Math.max(1.5 * view.stepHz, 0.002 * frequencyHz),
    );
    lines.push({
      order: roundOrder(order),
      frequencyHz: peak.frequencyHz,
      velocityMmPerSRms: peak.amplitudePeak * velocityRmsFactor(view.quantity, peak.frequencyHz),
      amplitudePeak: peak.amplitudePeak / factor,
      floorMmPerSRms: Math.sqrt(1 / Math.max(ratio, 1e-12)) * (view.velocity[peak.index] ?? 0),
      prominenceDb: 10 * Math.log10(Math.max(ratio, 1e-12)),
      pNoise: chanceOfLine(ratio, 2 * Math.round(reach) + 1),
      explainedBy: explained?.words ?? null,
    });
  }
  return lines;
}

/** Thirds are written with four decimals; wholes and halves are exact. */
const roundOrder = (order: number) => Math.round(order * 1e4) / 1e4;
