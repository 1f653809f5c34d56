import type { FindingState } from '#shared/contracts/finding.ts';
import type { InspectionOutcome } from '#shared/contracts/inspection.ts';
import type { MachineKind } from '#shared/contracts/machine.ts';
import type { FindingOutcome } from '#shared/contracts/outcomes.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { LoosenessKind, SpeedSource, Verdict } from '#shared/signal/screening-types.ts';

/** An accepted flag of a finding. */
export interface OutcomeFlag {
  verdict: Verdict;
  score: number | null;
  kind: LoosenessKind | null;
  speedSource: SpeedSource;
  direction: Direction;
  /** YYYY-MM-DD */
  surveyedOn: string;
  decidedAt: Date;
}

export interface OutcomeReport {
  outcome: InspectionOutcome;
  reportedAt: Date;
}

/** A finding with what its outcome is read from. */
export interface OutcomeCase {
  findingId: number;
  state: FindingState;
  machineKind: MachineKind;
  flags: readonly OutcomeFlag[];
  /** Oldest first. */
  reports: readonly OutcomeReport[];
  /** When it was last closed as verified or dismissed; null while it is open. */
  closedAt: Date | null;
}

/** The report that settled a finding: the first that found it loose, else the newest. */
export function settlingReport({ reports }: OutcomeCase): OutcomeReport | null {
  return reports.find(({ outcome }) => outcome === 'loose') ?? reports.at(-1) ?? null;
}

export function outcomeOf(one: OutcomeCase): FindingOutcome {
  const report = settlingReport(one);
  if (report === null) return one.state === 'dismissed' ? 'dismissed' : 'waiting';
  return ({ loose: 'confirmed', 'not loose': 'not found', 'not clear': 'unsettled' } as const)[
    report.outcome
  ];
}

/** The flags that led to the inspection: what was accepted after its report says nothing of it. */
export function flagsBehind(one: OutcomeCase): readonly OutcomeFlag[] {
  const report = settlingReport(one);
  if (report === null) return one.flags;
  return one.flags.filter(({ decidedAt }) => decidedAt <= report.reportedAt);
}

/** The verdict a finding counts under: that of its highest score; null where no flag was behind it. */
export function verdictBehind(one: OutcomeCase): 'suspected' | 'likely' | null {
  const [clearest] = flagsBehind(one)
    .filter(({ verdict }) => verdict === 'suspected' || verdict === 'likely')
    .sort((a, b) => (b.score ?? 0) - (a.score ?? 0));
  return clearest === undefined ? null : (clearest.verdict as 'suspected' | 'likely');
}
