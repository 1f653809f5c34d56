import type { ReviewDecision } from '#shared/contracts/review.ts';
import type { LoosenessKind, SpeedSource } from '#shared/signal/screening-types.ts';

export const decisionWords: Readonly<Record<ReviewDecision, string>> = {
  accepted: 'Accepted',
  rejected: 'Rejected',
  retake: 'Retake asked for',
};

export const kindWords: Readonly<Record<LoosenessKind, string>> = {
  seat: 'A bearing seat',
  pedestal: 'Pedestal, foot or frame',
  undetermined: 'The signs do not tell',
};

export const speedSourceWords: Readonly<Record<SpeedSource, string>> = {
  told: 'as told',
  refined: 'told, refined from the record',
  estimated: 'estimated from the record',
  none: 'not found',
};
