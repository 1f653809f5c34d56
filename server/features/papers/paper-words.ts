import type { FindingState } from '#shared/contracts/finding.ts';
import type { InspectionState } from '#shared/contracts/inspection.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';
import { formatFixed } from '#shared/quantities/format-number.ts';
import type { Verdict } from '#shared/signal/screening-types.ts';

export const screeningCaution =
  'A screening is a hint for a qualified analyst, not a diagnosis and not a release to run. Fits and repairs follow the machine maker’s drawing, the bearing supplier’s guidance, local codes and the judgement of licensed or certified people.';

export const verdictWords: Readonly<Record<Verdict, string>> = {
  none: 'No looseness signs',
  suspected: 'Looseness suspected',
  likely: 'Looseness likely',
  retake: 'Retake the measurement',
};

export const findingStateWords: Readonly<Record<FindingState, string>> = {
  open: 'Open',
  inspecting: 'Inspecting',
  monitoring: 'Monitoring',
  repaired: 'Repaired',
  verified: 'Verified',
  dismissed: 'Dismissed',
};

export const inspectionStateWords: Readonly<Record<InspectionState, string>> = {
  assigned: 'Assigned',
  accepted: 'Accepted',
  reported: 'Reported',
  closed: 'Closed',
  cancelled: 'Cancelled',
};

/** A state of either, as a change of state keeps it. */
export const stateWord = (state: string): string =>
  state === '' ? state : state.charAt(0).toUpperCase() + state.slice(1);

export const seatWords = { shaft: 'Shaft seat', housing: 'Housing seat' } as const;

/** The parts an instrument is set on, by seat. */
export const partWords = {
  shaft: { seat: 'Shaft diameter', ring: 'Bore of the inner ring' },
  housing: { seat: 'Housing bore', ring: 'Outside diameter of the outer ring' },
} as const;

/** "60.002 to 60.015 mm at 20 °C"; null where no limits are on record. */
export const limitsText = ({ seatLimitsMm }: SeatAssessment): string | null =>
  seatLimitsMm === null
    ? null
    : `${formatFixed(seatLimitsMm[0], 3)} to ${formatFixed(seatLimitsMm[1], 3)}\u00a0mm at 20\u00a0°C`;

/** "12 µm interference": the word instead of a sign that may be misread. */
export function fitWord(valueUm: number): string {
  if (Math.abs(valueUm) < 0.05) return '0 µm';
  const size = formatFixed(Math.abs(valueUm), Number.isInteger(valueUm) ? 0 : 1);
  return `${size}\u00a0µm ${valueUm > 0 ? 'interference' : 'clearance'}`;
}

export const scoreText = (score: number | null): string =>
  score === null ? 'no score' : `score ${formatFixed(score, 2)}`;

/** "12 %"; the ends are not rounded to certainty. */
export function percentText(share: number): string {
  const percent = Math.round(share * 100);
  if (percent < 1) return 'under 1\u00a0%';
  return percent > 99 ? 'over 99\u00a0%' : `${percent}\u00a0%`;
}

export const dayOf = (moment: string): string => moment.slice(0, 10);
