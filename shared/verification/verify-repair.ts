import { formatFixed, formatSignificant } from '../quantities/format-number.ts';
import { changedConditions, type ChangedCondition } from './changed-conditions.ts';
import type { VerificationReading } from './verification-reading.ts';

/** What a comparison proposes to the lead, who decides. */
export const verificationProposals = ['verified', 'reopen', 'measure again'] as const;
export type VerificationProposal = (typeof verificationProposals)[number];

/** One measuring point before and after the repair; null where there is no reading. */
export interface PointVerification {
  pointLabel: string;
  before: VerificationReading | null;
  after: VerificationReading | null;
  /** What became of the signs, in a few words. */
  outcome: string;
  /** The outcome with its numbers. */
  sentence: string;
}

export interface RepairVerification {
  surveyedOn: string;
  proposal: VerificationProposal;
  /** The verdict of the comparison, with its numbers. */
  sentence: string;
  points: PointVerification[];
  /** What was measured otherwise than before, in sentences. */
  conditions: string[];
}

/**
 * A run counts as fallen from this factor on: the same as in the change since earlier surveys, where
 * the repeatability of a route is about a quarter (common practice, no source).
 */
const fallFactor = 1.5;
/** Runs below this are noise of the survey, mm/s rms. */
const traceMmPerS = 0.05;

type Fate = 'gone' | 'flagged' | 'lingers' | 'not judged' | 'missing';

interface JudgedPoint extends PointVerification {
  fate: Fate;
  changes: ChangedCondition[];
}

/**
 * Sets the readings of one survey after a repair against those that raised the finding. Proposes
 * `verified` only where every point that raised it was measured again under like conditions, is no
 * flag any more and lost its run; `reopen` where any point of the position is a flag; else `measure
 * again`. It is a comparison of records, never proof of a tight fit, and says so.
 *
 * @param before - the reading that raised the finding at each point, one a point
 * @param after - the readings of one survey at points of the position, one a point
 * @param surveyedOn - date of that survey, YYYY-MM-DD
 * @throws {RangeError} if one of the lists is empty
 */
export function verifyRepair(
  before: readonly VerificationReading[],
  after: readonly VerificationReading[],
  surveyedOn: string,
): RepairVerification {
  if (before.length === 0 || after.length === 0) {
    throw new RangeError('A verification needs readings from before and after the repair.');
  }
  const labels = [...new Set([...before, ...after].map(({ pointLabel }) => pointLabel))].sort();
  const points = labels.map((label) => {
    const of = (readings: readonly VerificationReading[]) =>
      readings.find(({ pointLabel }) => pointLabel === label) ?? null;
    return judgePoint(label, of(before), of(after));
  });
  const { proposal, reason } = propose(points);
  return {
    surveyedOn,
    proposal,
    sentence: `Survey of ${surveyedOn}: ${reason} This compares records; it is no proof of a tight fit.`,
    points: points.map(({ fate: _fate, changes: _changes, ...point }) => point),
    conditions: points.flatMap(({ pointLabel, changes }) =>
      changes.map(({ text }) => `At ${pointLabel} ${text}.`),
    ),
  };
}

function judgePoint(
  pointLabel: string,
  before: VerificationReading | null,
  after: VerificationReading | null,
): JudgedPoint {
  const fate = fateOf(before, after);
  const changes = before && after && after.score !== null ? changedConditions(before, after) : [];
  return {
    pointLabel,
    before,
    after,
    fate,
    changes,
    outcome: outcomeOf(before, fate),
    sentence: pointSentence(before, after, fate),
  };
}

function fateOf(before: VerificationReading | null, after: VerificationReading | null): Fate {
  if (after === null) return 'missing';
  if (after.score === null) return 'not judged';
  if (after.verdict !== 'none') return 'flagged';
  if (before === null) return 'gone';
  // A limit that was raised since must not make a repair look good.
  if (after.score >= before.suspectedScore) return 'lingers';
  return after.runMmPerSRms <= Math.max(before.runMmPerSRms / fallFactor, traceMmPerS)
    ? 'gone'
    : 'lingers';
}

const score = (value: number | null) => formatFixed(value, 2);
const level = (value: number | null) =>
  value === null ? 'not known' : `${formatSignificant(value, 2)} mm/s rms`;
const orders = (count: number) => (count === 1 ? '1 order' : `${count} orders`);

const outcomes: Readonly<Record<Fate, string>> = {
  gone: 'The signs are gone',
  flagged: 'The signs are there',
  lingers: 'Below the limit, but the signs have not clearly gone',
  'not judged': 'The record of this survey could not be judged',
  missing: 'Not measured in this survey',
};

const outcomeOf = (before: VerificationReading | null, fate: Fate) =>
  before === null && fate === 'gone' ? 'No signs' : outcomes[fate];

/** The numbers of one point, before and after. */
function pointSentence(
  before: VerificationReading | null,
  after: VerificationReading | null,
  fate: Fate,
): string {
  const outcome = outcomeOf(before, fate);
  if (after === null || fate === 'not judged') return `${outcome}.`;
  if (before === null) {
    return `${outcome}: score ${score(after.score)}, run of ${orders(after.runLength)}, orders 2 to 10 ${level(after.runMmPerSRms)}, overall velocity ${level(after.overallMmPerSRms)}; this point did not raise the finding.`;
  }
  return `${outcome}: score ${score(before.score)} before, ${score(after.score)} after; run of ${orders(before.runLength)} before, ${orders(after.runLength)} after; orders 2 to 10 ${level(before.runMmPerSRms)} before, ${level(after.runMmPerSRms)} after; overall velocity ${level(before.overallMmPerSRms)} before, ${level(after.overallMmPerSRms)} after.`;
}

const list = (points: readonly JudgedPoint[]) =>
  points.map(({ pointLabel }) => pointLabel).join(', ');

/** The clearest numbers of a group of points in brackets: the highest score after the repair. */
function worst(points: readonly JudgedPoint[]): string {
  const [first] = [...points].sort((a, b) => (b.after?.score ?? 0) - (a.after?.score ?? 0));
  if (first?.after == null) return '';
  const { before, after } = first;
  const from = before === null ? '' : `${score(before.score)} before and `;
  return `score ${from}${score(after.score)} after at ${first.pointLabel}`;
}

function propose(points: readonly JudgedPoint[]): {
  proposal: VerificationProposal;
  reason: string;
} {
  const flagged = points.filter(({ fate }) => fate === 'flagged');
  if (flagged.length > 0) {
    return {
      proposal: 'reopen',
      reason: `looseness signs at ${list(flagged)} after the repair (${worst(flagged)}).`,
    };
  }
  const raised = points.filter(({ before }) => before !== null);
  const reasons: string[] = [];
  const missing = raised.filter(({ fate }) => fate === 'missing');
  if (missing.length > 0) reasons.push(`${list(missing)} was not measured`);
  const unjudged = raised.filter(({ fate }) => fate === 'not judged');
  if (unjudged.length > 0) reasons.push(`the record at ${list(unjudged)} could not be judged`);
  const lingering = raised.filter(({ fate }) => fate === 'lingers');
  if (lingering.length > 0) {
    reasons.push(`the signs at ${list(lingering)} have not clearly gone (${worst(lingering)})`);
  }
  for (const { pointLabel, changes } of raised) {
    const spoiling = changes.filter(({ spoils }) => spoils).map(({ text }) => text);
    if (spoiling.length > 0) reasons.push(`at ${pointLabel} ${spoiling.join(' and ')}`);
  }
  if (reasons.length > 0) {
    return {
      proposal: 'measure again',
      reason: `this can’t tell yet whether the looseness is gone: ${reasons.join('; ')}.`,
    };
  }
  const count =
    raised.length === 1
      ? 'the point'
      : raised.length === 2
        ? 'both points'
        : `all ${raised.length} points`;
  return {
    proposal: 'verified',
    reason: `no looseness signs any more at ${count} that raised the finding (${worst(raised)}; orders 2 to 10 ${leastFall(raised)}).`,
  };
}

/** The smallest fall among the points, as levels. */
function leastFall(points: readonly JudgedPoint[]): string {
  const share = ({ before, after }: JudgedPoint) =>
    (after?.runMmPerSRms ?? 0) / Math.max(before?.runMmPerSRms ?? 0, traceMmPerS);
  const [least] = [...points].sort((a, b) => share(b) - share(a));
  return `from ${level(least?.before?.runMmPerSRms ?? null)} to ${level(least?.after?.runMmPerSRms ?? null)} at ${least?.pointLabel ?? ''}`;
}
