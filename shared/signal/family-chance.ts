import type { OrderSpectrum } from './order-spectra.ts';
import type { OrderLine } from './screening-types.ts';
import { fisherTail } from './tail-chances.ts';

/** Families looked for: the first so many whole orders together. */
const familySizes = [2, 3, 4, 6, 8, 10, 14, 20];
/** Standard normal quantile of one in a thousand: the level a single line counts up to. */
const capQuantile = 3.09;
/** Lines beside the orders that a floor is taken from, over all, times what a median of them is worth. */
const floorWorth = 0.2;
/** Orders beyond the family's ends that its floors reach to. */
const floorOverhang = 2;

/**
 * Chance that noise alone lifts the first whole orders together as far as they are: their mean power
 * over their floors is F-distributed, so that six orders are found at 2.4 dB of four averages, where
 * none of them stands out alone. Every order counts up to the level that noise alone reaches once in
 * a thousand only (Wilson and Hilferty 1931): one strong line makes no family. The smallest chance
 * of the sizes tried, times how many were tried (Bonferroni).
 *
 * @param orders - the order table, with its floors
 * @returns 0–1
 */
export function familyChance(
  { power, averages, linesPerOrder }: OrderSpectrum,
  orders: readonly OrderLine[],
): number {
  const whole = orders.filter((line) => Number.isInteger(line.order));
  const cap = (1 - 1 / (9 * averages) + capQuantile / (3 * Math.sqrt(averages))) ** 3;
  const sizes = familySizes.filter((size) => size <= whole.length);
  let least = 1;
  let sum = 0;
  whole.forEach((line, index) => {
    const ratio = (power[line.order * linesPerOrder] ?? 0) / line.floorMmPerSRms ** 2;
    sum += Math.min(cap, ratio);
    const size = index + 1;
    if (!sizes.includes(size)) return;
    const floorAverages = floorWorth * averages * linesPerOrder * (size + floorOverhang);
    least = Math.min(least, fisherTail(sum / size, averages * size, floorAverages));
  });
  return Math.min(1, sizes.length * least);
}
