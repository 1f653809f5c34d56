import type { FindingState } from '#shared/contracts/finding.ts';
import type { InspectionState } from '#shared/contracts/inspection.ts';
import { StateMark, type MarkShape } from './state-mark.tsx';

export const findingStateWords: Readonly<Record<FindingState, string>> = {
  open: 'Open',
  inspecting: 'Inspecting',
  monitoring: 'Monitoring',
  repaired: 'Repaired',
  verified: 'Verified',
  dismissed: 'Dismissed',
};

const findingShapes: Readonly<Record<FindingState, MarkShape>> = {
  open: 'box-empty',
  inspecting: 'box-half',
  monitoring: 'box-dot',
  repaired: 'box-diagonal',
  verified: 'box-check',
  dismissed: 'box-struck',
};

export const inspectionStateWords: Readonly<Record<InspectionState, string>> = {
  assigned: 'Assigned',
  accepted: 'Accepted',
  reported: 'Reported',
  closed: 'Closed',
  cancelled: 'Cancelled',
};

const inspectionShapes: Readonly<Record<InspectionState, MarkShape>> = {
  assigned: 'box-empty',
  accepted: 'box-quarter',
  reported: 'box-half',
  closed: 'box-check',
  cancelled: 'box-struck',
};

export function FindingStateMark({ state }: { state: FindingState }) {
  return <StateMark shape={findingShapes[state]}>{findingStateWords[state]}</StateMark>;
}

export function InspectionStateMark({ state }: { state: InspectionState }) {
  return <StateMark shape={inspectionShapes[state]}>{inspectionStateWords[state]}</StateMark>;
}
