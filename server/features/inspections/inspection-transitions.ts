import type { InspectionState } from '#shared/contracts/inspection.ts';
import type { SiteRole } from '#shared/contracts/session.ts';

export const inspectionActions = ['accept', 'report', 'close', 'cancel', 'reassign'] as const;
export type InspectionAction = (typeof inspectionActions)[number];

interface Transition {
  from: readonly InspectionState[];
  to: InspectionState;
  role: SiteRole;
}

const transitions: Readonly<Record<InspectionAction, Transition>> = {
  accept: { from: ['assigned'], to: 'accepted', role: 'owner' },
  report: { from: ['accepted'], to: 'reported', role: 'owner' },
  close: { from: ['reported'], to: 'closed', role: 'lead' },
  // The new owner accepts anew.
  reassign: { from: ['assigned', 'accepted'], to: 'assigned', role: 'lead' },
  cancel: { from: ['assigned', 'accepted'], to: 'cancelled', role: 'lead' },
};

/** The state an action leads to; null where the state or the role doesn't allow it. */
export function nextInspectionState(
  state: InspectionState,
  action: InspectionAction,
  role: SiteRole,
): InspectionState | null {
  const transition = transitions[action];
  return transition.role === role && transition.from.includes(state) ? transition.to : null;
}
