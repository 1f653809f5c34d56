import { machineKinds } from '#shared/contracts/machine.ts';
import {
  outcomeSteps,
  outcomeTraits,
  type OutcomeGroupResponse,
  type OutcomesResponse,
  type OutcomeStep,
  type OutcomeTrait,
} from '#shared/contracts/outcomes.ts';
import { median } from '#shared/statistics/median.ts';
import { wilsonInterval } from '#shared/statistics/wilson-interval.ts';
import {
  flagsBehind,
  outcomeOf,
  settlingReport,
  verdictBehind,
  type OutcomeCase,
  type OutcomeFlag,
} from './outcome-case.ts';

const msPerDay = 86_400_000;

/**
 * What became of the method's flags. Findings are counted, not flags, where a share is given: the
 * flags of one bearing position stand and fall together, and counting each would make the interval
 * too narrow.
 */
export function summariseOutcomes(cases: readonly OutcomeCase[]): Omit<OutcomesResponse, 'flags'> {
  const flagged = cases.filter((one) => verdictBehind(one) !== null);
  return {
    site: groupOf(flagged),
    byVerdict: (['likely', 'suspected'] as const).map((verdict) => ({
      verdict,
      ...groupOf(flagged.filter((one) => verdictBehind(one) === verdict)),
    })),
    byMachineKind: machineKinds.flatMap((machineKind) => {
      const ofKind = flagged.filter((one) => one.machineKind === machineKind);
      return ofKind.length === 0 ? [] : [{ machineKind, ...groupOf(ofKind) }];
    }),
    times: outcomeSteps.map((step) => {
      const days = flagged.flatMap((one) => daysOf(one, step));
      return { step, medianDays: median(days), findingCount: days.length };
    }),
    traits: outcomeTraits.flatMap((trait) => traitCounts(flagged, trait)),
  };
}

function groupOf(cases: readonly OutcomeCase[]): OutcomeGroupResponse {
  const count = (outcome: ReturnType<typeof outcomeOf>) =>
    cases.filter((one) => outcomeOf(one) === outcome).length;
  const confirmedCount = count('confirmed');
  const notFoundCount = count('not found');
  return {
    confirmedCount,
    notFoundCount,
    unsettledCount: count('unsettled'),
    dismissedCount: count('dismissed'),
    waitingCount: count('waiting'),
    predictiveValue: wilsonInterval(confirmedCount, confirmedCount + notFoundCount),
  };
}

const dayMs = (moment: Date) => Date.parse(moment.toISOString().slice(0, 10));

/** Whole calendar days a step took; none where it isn't done. */
function daysOf(one: OutcomeCase, step: OutcomeStep): number[] {
  const surveyMs = Math.min(...flagsBehind(one).map(({ surveyedOn }) => Date.parse(surveyedOn)));
  const report = settlingReport(one);
  const inspectedMs = report === null ? null : dayMs(report.reportedAt);
  const closedMs = one.closedAt === null ? null : dayMs(one.closedAt);
  const between = (from: number | null, to: number | null) =>
    from === null || to === null || to < from ? [] : [(to - from) / msPerDay];
  if (step === 'survey to inspection') return between(surveyMs, inspectedMs);
  if (step === 'survey to closing') return between(surveyMs, closedMs);
  return between(inspectedMs, closedMs);
}

const valueOf: Readonly<Record<OutcomeTrait, (one: OutcomeCase, flag: OutcomeFlag) => string>> = {
  'machine kind': ({ machineKind }) => machineKind,
  'speed source': (_one, { speedSource }) => speedSource,
  'kind of looseness': (_one, { kind }) => kind ?? 'undetermined',
  direction: (_one, { direction }) => direction,
};

/** Flags by the values of a trait, most frequent first. */
function traitCounts(cases: readonly OutcomeCase[], trait: OutcomeTrait) {
  const counts = new Map<string, { confirmedCount: number; notFoundCount: number }>();
  for (const one of cases) {
    const outcome = outcomeOf(one);
    if (outcome !== 'confirmed' && outcome !== 'not found') continue;
    for (const flag of flagsBehind(one)) {
      const value = valueOf[trait](one, flag);
      const known = counts.get(value) ?? { confirmedCount: 0, notFoundCount: 0 };
      if (outcome === 'confirmed') known.confirmedCount += 1;
      else known.notFoundCount += 1;
      counts.set(value, known);
    }
  }
  return [...counts]
    .map(([value, count]) => ({ trait, value, ...count }))
    .sort(
      (a, b) =>
        b.confirmedCount + b.notFoundCount - a.confirmedCount - a.notFoundCount ||
        a.value.localeCompare(b.value),
    );
}
