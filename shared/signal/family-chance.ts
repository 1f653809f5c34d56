import type { OrderSpectrum } from './order-spectra.ts';
import type { OrderLine } from './screening-types.ts';
import { fisherTail } from './tail-chances.ts';

/** Families looked for: the first so many whole orders together. */
const familySizes = [3, 6, 10, 20];
/** Independent tries that the sizes, in power and in phase, are worth: they share their lines (simulated). */
const triesWorth = 3;
/** Standard normal quantile of one in a thousand: the level a single line counts up to. */
const capQuantile = 3.09;
/** Lines beside the orders that a floor is taken from, over all, times what a median of them is worth. */
const floorWorth = 0.2;
/** Orders beyond the family's ends that its floors reach to. */
const floorOverhang = 2;
/** Complex Hann lines of segments that overlap by half correlate by so much. */
const overlapCorrelation = 1 / 6;

/**
 * Chance that noise alone lifts the first whole orders together as far as they are: their mean power
 * over their floors is F-distributed, so that six orders are found where none of them stands out
 * alone. Looked for in the mean power of the segments and in that of their mean in phase, which
 * finds a steady family 5 dB and more deeper in noise. Every order counts up to the level that noise
 * alone reaches once in a thousand only (Wilson and Hilferty 1931): one strong line makes no family.
 *
 * @param orders - the order table, with its floors
 * @returns 0–1, for all that was tried together
 */
export function familyChance(
  { power, coherentPower, averages, segmentCount, linesPerOrder }: OrderSpectrum,
  orders: readonly OrderLine[],
): number {
  const whole = orders.filter((line) => Number.isInteger(line.order));
  if (averages === 0) return 1;
  const inPhase = (1 + 2 * (1 - 1 / segmentCount) * overlapCorrelation) / segmentCount;
  let least = 1;
  for (const [lines, share, worth] of [
    [power, 1, averages],
    [coherentPower, inPhase, 1],
  ] as const) {
    const cap = (1 - 1 / (9 * worth) + capQuantile / (3 * Math.sqrt(worth))) ** 3;
    let sum = 0;
    whole.forEach((line, index) => {
      const floor = share * line.floorMmPerSRms ** 2;
      sum += Math.min(cap, (lines[line.order * linesPerOrder] ?? 0) / floor);
      const size = index + 1;
      if (!familySizes.includes(size)) return;
      const floorAverages = floorWorth * averages * linesPerOrder * (size + floorOverhang);
      least = Math.min(least, fisherTail(sum / size, worth * size, floorAverages));
    });
  }
  return Math.min(1, triesWorth * least);
}
