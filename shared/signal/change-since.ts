import type { EarlierScreening, EvidenceSentence } from './screening-types.ts';

/** What is set against the earlier surveys. */
export interface PresentLevels {
  score: number;
  runMmPerS: number;
}

/** A run that grew by half, or fell by a third, has changed: repeatability of a route is about a quarter (common practice, no source). */
const riseFactor = 1.5;
const fallFactor = 1 / riseFactor;
/** Runs below this are noise of the survey, mm/s rms. */
const traceMmPerS = 0.05;

const day = (timeMs: number) => new Date(timeMs).toISOString().slice(0, 10);
const level = (mmPerS: number) => `${mmPerS.toPrecision(2)} mm/s rms`;

/**
 * What changed since the point's earlier surveys, in a sentence: a run that grows speaks for a joint
 * that works loose, one that has stood there all along rather for the machine's own nature. The score
 * itself is of this record alone.
 *
 * @param earlier - oldest first
 */
export function changeSince(
  present: PresentLevels,
  earlier: readonly EarlierScreening[] = [],
): EvidenceSentence[] {
  const last = earlier.at(-1);
  if (last === undefined) return [];
  const now = Math.max(present.runMmPerS, 0);
  if (Math.max(now, last.runMmPerS) < traceMmPerS) return [];
  const scores = `score ${last.score.toFixed(2)} then, ${present.score.toFixed(2)} now`;
  const from = `since the survey of ${day(last.takenAtMs)}`;
  const ratio = now / Math.max(last.runMmPerS, 0.2 * traceMmPerS);
  if (ratio >= riseFactor) {
    return [
      {
        for: true,
        text: `Orders 2 to 10 rose ${from} from ${level(last.runMmPerS)} to ${level(now)} (${scores}).`,
      },
    ];
  }
  if (ratio <= fallFactor) {
    return [
      {
        for: false,
        text: `Orders 2 to 10 fell ${from} from ${level(last.runMmPerS)} to ${level(now)} (${scores}).`,
      },
    ];
  }
  const steady = earlier.filter(({ runMmPerS }) => {
    const change = now / Math.max(runMmPerS, 0.2 * traceMmPerS);
    return change < riseFactor && change > fallFactor;
  }).length;
  return [
    {
      for: false,
      text:
        steady > 1
          ? `Orders 2 to 10 stand as in ${steady} earlier surveys (${level(now)}): what lasts without growing is rather the machine’s nature.`
          : `Orders 2 to 10 are as they were ${from} (${level(last.runMmPerS)} then, ${level(now)} now).`,
    },
  ];
}
