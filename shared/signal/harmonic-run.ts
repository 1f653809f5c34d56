import type { HarmonicRun, OrderLine } from './screening-types.ts';

/** A line counts where noise alone gives as much less than once in a thousand … */
const significantBelowP = 1e-3;
/** … and it is more than a trace of the family's strongest line. */
const traceShare = 0.01;

/** Two ways to be lucky: most of the risk goes to the family, since the chance of a real run is tiny. */
const familyShare = 1.1;
const runShare = 11;

const isWhole = (order: number) => Number.isInteger(order);
const isHalf = (order: number) => Number.isInteger(order * 2) && !isWhole(order);

/** Whether an order stands out, by chance and by level. */
export function standsOut(line: OrderLine, strongestMmPerS: number): boolean {
  return line.pNoise < significantBelowP && line.velocityMmPerSRms >= traceShare * strongestMmPerS;
}

/** The orders that a loose joint could have put there: those that nothing else explains. */
const open = (line: OrderLine) => line.explainedBy === null;

/**
 * The longest run of whole orders that stand out, how many do, and how they fall off. The chance of
 * luck is the smaller of two, each with its share of the risk: that of the first orders lifted together, and that of an
 * unbroken run of independent lines, at most (N − L + 1)·pᴸ, with the largest chance of the run's
 * own lines as p, times the speeds it could have been found at.
 *
 * @param pFamily - chance of the family as a whole
 * @param speedsTried - independent speeds among which the best was chosen
 */
export function harmonicRun(
  orders: readonly OrderLine[],
  pFamily = 1,
  speedsTried = 1,
): HarmonicRun {
  const strongest = Math.max(0, ...orders.map((line) => line.velocityMmPerSRms));
  const whole = orders.filter((line) => isWhole(line.order));
  const out = new Set(whole.filter((line) => standsOut(line, strongest)).map((line) => line.order));
  let best = { length: 0, from: 0, to: 0 };
  let start = 0;
  const last = Math.max(0, ...whole.map((line) => line.order));
  for (let order = 1; order <= last + 1; order += 1) {
    if (out.has(order)) {
      if (start === 0) start = order;
    } else if (start > 0) {
      if (order - start > best.length) best = { length: order - start, from: start, to: order - 1 };
      start = 0;
    }
  }
  const inRun = whole.filter((line) => line.order >= best.from && line.order <= best.to);
  const worstP = Math.max(1e-300, ...inRun.map((line) => line.pNoise));
  const places = Math.max(1, whole.length - best.length + 1);
  // A single line is no run.
  const pRun = best.length < 2 ? 1 : speedsTried * places * worstP ** best.length;
  const fraction = (test: (order: number) => boolean, reach: number) =>
    orders.filter(
      (line) => test(line.order) && line.order < reach && open(line) && standsOut(line, strongest),
    ).length;
  return {
    ...best,
    pChance: Math.min(1, familyShare * pFamily, runShare * pRun),
    significantOfFirst10: [...out].filter((order) => order <= 10).length,
    significantOfFirst20: out.size,
    slopeDbPerOrder: slope(inRun),
    halfOrderCount: fraction(isHalf, 10),
    thirdOrderCount: fraction((order) => !isWhole(order) && !isHalf(order), 6),
  };
}

/** Least-squares slope of the levels of a run, dB per order. */
function slope(lines: readonly OrderLine[]): number | null {
  if (lines.length < 3) return null;
  const meanOrder = lines.reduce((sum, line) => sum + line.order, 0) / lines.length;
  const levels = lines.map((line) => 20 * Math.log10(Math.max(line.velocityMmPerSRms, 1e-9)));
  const meanLevel = levels.reduce((sum, level) => sum + level, 0) / lines.length;
  let [above, below] = [0, 0];
  lines.forEach((line, index) => {
    above += (line.order - meanOrder) * ((levels[index] ?? 0) - meanLevel);
    below += (line.order - meanOrder) ** 2;
  });
  return above / below;
}
