import type { FindingAction, FindingState } from '#shared/contracts/finding.ts';
import type { SiteRole } from '#shared/contracts/session.ts';

/**
 * What moves a finding: the lead's decisions, and what comes of its inspection. An inspection that
 * repaired the fit leads to `repaired`; one that found it sound to `monitoring`, so that the next
 * survey has the last word; one that found it loose but left it, or could not tell, back to `open`,
 * where the lead must decide again.
 */
export const findingEvents = [
  'assign',
  'monitor',
  'dismiss',
  'reopen',
  'verify',
  'inspection-repaired',
  'inspection-not-loose',
  'inspection-unsettled',
  'inspection-cancelled',
] as const satisfies readonly (FindingAction | `inspection-${string}`)[];
export type FindingEvent = (typeof findingEvents)[number];

interface Transition {
  from: readonly FindingState[];
  to: FindingState;
  /** Who may make it. Whose inspection it is, is the inspection's own rule. */
  role: SiteRole;
}

const transitions: Readonly<Record<FindingEvent, Transition>> = {
  assign: { from: ['open', 'monitoring'], to: 'inspecting', role: 'lead' },
  monitor: { from: ['open', 'monitoring'], to: 'monitoring', role: 'lead' },
  dismiss: { from: ['open', 'monitoring'], to: 'dismissed', role: 'lead' },
  reopen: { from: ['monitoring', 'repaired', 'verified', 'dismissed'], to: 'open', role: 'lead' },
  verify: { from: ['repaired'], to: 'verified', role: 'lead' },
  'inspection-repaired': { from: ['inspecting'], to: 'repaired', role: 'owner' },
  'inspection-not-loose': { from: ['inspecting'], to: 'monitoring', role: 'owner' },
  'inspection-unsettled': { from: ['inspecting'], to: 'open', role: 'owner' },
  'inspection-cancelled': { from: ['inspecting'], to: 'open', role: 'lead' },
};

/** States in which a finding is done with: new evidence then makes a new one. */
export const finishedFindingStates: readonly FindingState[] = ['verified', 'dismissed'];

/** The state an event leads to; null where the state or the role doesn't allow it. */
export function nextFindingState(
  state: FindingState,
  event: FindingEvent,
  role: SiteRole,
): FindingState | null {
  const transition = transitions[event];
  return transition.role === role && transition.from.includes(state) ? transition.to : null;
}
