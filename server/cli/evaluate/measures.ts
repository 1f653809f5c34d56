import {
  recordFaults,
  severities,
  simulatedLoosenessKinds,
} from '#fixtures/signals/signal-types.ts';
import type { CaseOutcome } from './case-outcome.ts';

export interface Share {
  name: string;
  cases: number;
  hits: number;
}

export interface CalibrationBin {
  from: number;
  to: number;
  cases: number;
  meanScore: number;
  looseShare: number;
}

export interface HistogramBin {
  from: number;
  to: number;
  loose: number;
  notLoose: number;
}

const flagged = ({ verdict }: CaseOutcome) => verdict === 'suspected' || verdict === 'likely';
const whole = ({ fault }: CaseOutcome) => fault === null;
const isLoose = ({ looseness }: CaseOutcome) => looseness !== null;

function share(
  name: string,
  cases: readonly CaseOutcome[],
  hit: (one: CaseOutcome) => boolean,
): Share {
  return { name, cases: cases.length, hits: cases.filter(hit).length };
}

/** Loose machines whose looseness reaches the record, in records fit to be judged. */
export const looseCases = (outcomes: readonly CaseOutcome[]) =>
  outcomes.filter((one) => whole(one) && isLoose(one) && one.physicsLeavesSign === true);

/** Sound machines and look-alikes, in records fit to be judged. */
export const tightCases = (outcomes: readonly CaseOutcome[]) =>
  outcomes.filter((one) => whole(one) && !isLoose(one));

export function recall(outcomes: readonly CaseOutcome[]): Share[] {
  const loose = looseCases(outcomes);
  const bySeverity = severities.map((severity) =>
    share(
      severity,
      loose.filter((one) => one.severity === severity),
      flagged,
    ),
  );
  const strong = loose.filter((one) => one.severity !== 'incipient');
  return [
    share('all', loose, flagged),
    share('moderate and severe', strong, flagged),
    ...bySeverity,
  ];
}

export function recallByKind(outcomes: readonly CaseOutcome[]): Share[] {
  const loose = looseCases(outcomes);
  return simulatedLoosenessKinds.flatMap((kind) =>
    severities.map((severity) =>
      share(
        `${kind}, ${severity}`,
        loose.filter((one) => one.looseness === kind && one.severity === severity),
        flagged,
      ),
    ),
  );
}

const signRanges = [
  [0, 2],
  [3, 4],
  [5, 7],
  [8, Infinity],
] as const;

/** Recall by how much the looseness shows at all: orders it raised. */
export function recallBySigns(outcomes: readonly CaseOutcome[]): Share[] {
  const loose = looseCases(outcomes);
  return signRanges.map(([from, to]) =>
    share(
      to === Infinity
        ? `${from} orders and more raised`
        : from === 0
          ? `at most ${to} orders raised`
          : `${from} to ${to} orders raised`,
      loose.filter(
        ({ risenOrders }) => risenOrders !== null && risenOrders >= from && risenOrders <= to,
      ),
      flagged,
    ),
  );
}

export function falseAlarms(outcomes: readonly CaseOutcome[]): Share[] {
  const tight = tightCases(outcomes);
  const names = [...new Set(tight.map(({ lookAlike }) => lookAlike))].sort();
  const each = names.map((name) =>
    share(
      name,
      tight.filter(({ lookAlike }) => lookAlike === name),
      flagged,
    ),
  );
  return [share('all', tight, flagged), ...each];
}

export function retakes(outcomes: readonly CaseOutcome[]) {
  const retaken = ({ verdict }: CaseOutcome) => verdict === 'retake';
  const defective = outcomes.filter((one) => one.expectsRetake);
  return {
    defective: share('defective records', defective, retaken),
    sound: share('sound records', outcomes.filter(whole), retaken),
    byFault: recordFaults.map((fault) =>
      share(
        fault,
        outcomes.filter((one) => one.fault === fault),
        retaken,
      ),
    ),
    /** A wrong told speed is well met by a retake or by the right speed. */
    wrongSpeedMet: share(
      'wrong told speed: retaken, or the right speed found',
      outcomes.filter(({ fault }) => fault === 'wrong told speed'),
      (one) => retaken(one) || Math.abs(one.speedError ?? 1) < 5e-3,
    ),
  };
}

/** Looseness called where the sensor, not the machine, was loose or misread. */
export function falseAlarmsOfFaults(outcomes: readonly CaseOutcome[]): Share {
  const tight = outcomes.filter((one) => one.fault !== null && !isLoose(one));
  return share('tight machines in defective records', tight, flagged);
}

/** @returns the share `p` of sorted absolute values that lies below */
export function percentile(values: readonly number[], p: number): number | null {
  if (values.length === 0) return null;
  const sorted = values.map(Math.abs).sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(p * sorted.length) - 1)] ?? null;
}

/** Orders a record must show for its lines to allow a speed. */
const visibleOrdersMin = 3;

/** Relative error of the speeds found by lines, in records fit to be judged whose lines allow it. */
export function speedErrors(outcomes: readonly CaseOutcome[]) {
  const allows = (one: CaseOutcome) =>
    whole(one) && one.verdict !== 'retake' && (one.visibleOrders ?? 0) >= visibleOrdersMin;
  const found = outcomes.filter(
    (one) => allows(one) && (one.speedSource === 'refined' || one.speedSource === 'estimated'),
  );
  const errors = found.flatMap(({ speedError }) => (speedError === null ? [] : [speedError]));
  const judged = outcomes.filter(allows).length;
  return {
    found: found.length,
    judged,
    median: percentile(errors, 0.5),
    p95: percentile(errors, 0.95),
    p99: percentile(errors, 0.99),
  };
}

const binCount = 10;

/** Loose machines that leave no sign are left out: nothing in the record could tell them. */
const scored = (outcomes: readonly CaseOutcome[]) =>
  [...looseCases(outcomes), ...tightCases(outcomes)].flatMap((one) =>
    one.score === null ? [] : [{ score: one.score, loose: isLoose(one) }],
  );

export function calibration(outcomes: readonly CaseOutcome[]): CalibrationBin[] {
  return scoreBins(outcomes).map(({ from, to, inBin }) => ({
    from,
    to,
    cases: inBin.length,
    meanScore: inBin.reduce((sum, { score }) => sum + score, 0) / Math.max(1, inBin.length),
    looseShare: inBin.filter(({ loose }) => loose).length / Math.max(1, inBin.length),
  }));
}

/** Mean distance of score and share, weighed by the cases of each bin. */
export function calibrationError(bins: readonly CalibrationBin[]): number {
  const cases = bins.reduce((sum, bin) => sum + bin.cases, 0);
  const off = bins.reduce(
    (sum, bin) => sum + bin.cases * Math.abs(bin.meanScore - bin.looseShare),
    0,
  );
  return off / Math.max(1, cases);
}

export function histogram(outcomes: readonly CaseOutcome[]): HistogramBin[] {
  return scoreBins(outcomes).map(({ from, to, inBin }) => {
    const loose = inBin.filter((one) => one.loose).length;
    return { from, to, loose, notLoose: inBin.length - loose };
  });
}

function scoreBins(outcomes: readonly CaseOutcome[]) {
  const all = scored(outcomes);
  return Array.from({ length: binCount }, (_, bin) => {
    const [from, to] = [bin / binCount, (bin + 1) / binCount];
    const last = bin === binCount - 1;
    return { from, to, inBin: all.filter(({ score }) => score >= from && (last || score < to)) };
  });
}

const limitsTried = [0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 0.95, 0.98];

/** What other limits of the score would find and call falsely. */
export function operatingPoints(outcomes: readonly CaseOutcome[]) {
  const loose = looseCases(outcomes);
  const tight = tightCases(outcomes);
  return limitsTried.map((limit) => {
    const reaches = ({ score }: CaseOutcome) => score !== null && score >= limit;
    return {
      limit,
      found: share('found', loose, reaches),
      falseAlarms: share('false alarms', tight, reaches),
    };
  });
}

/** Share of the flags that are right where `prevalence` of the points are loose (Bayes). */
export function predictiveValue(recallShare: number, falseShare: number, prevalence: number) {
  const right = recallShare * prevalence;
  const flags = right + falseShare * (1 - prevalence);
  return flags > 0 ? right / flags : 0;
}
