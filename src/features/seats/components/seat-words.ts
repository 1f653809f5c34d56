import type { FitSource } from '#shared/contracts/fit-record.ts';
import type { InspectionOutcome } from '#shared/contracts/inspection.ts';
import type { SeatAssessment } from '#shared/contracts/seat-assessment.ts';

export const seatWords = { shaft: 'Shaft seat', housing: 'Housing seat' } as const;

export const seatPartsWords = {
  shaft: 'shaft and inner ring',
  housing: 'housing bore and outer ring',
} as const;

/** The parts a micrometer is set on, by seat. */
export const partWords = {
  shaft: { seat: 'Shaft diameter', ring: 'Bore of the inner ring' },
  housing: { seat: 'Housing bore', ring: 'Outside diameter of the outer ring' },
} as const;

export const sourceWords: Readonly<Record<FitSource, string>> = {
  drawing: 'From the drawing',
  mounting: 'At mounting',
  inspection: 'At an inspection',
};

export const outcomeWords: Readonly<Record<InspectionOutcome, string>> = {
  loose: 'Looseness was found.',
  'not loose': 'No looseness was found.',
  'not clear': 'The inspection was not clear.',
};

/** "12 %"; the ends are not rounded to certainty. */
export function percentText(share: number): string {
  const percent = Math.round(share * 100);
  if (percent < 1) return 'under 1 %';
  return percent > 99 ? 'over 99 %' : `${percent} %`;
}

export function verdictText(seat: SeatAssessment): string {
  if (seat.verdict === null) return 'Nothing to compare with';
  const by = seat.outsideLimitsUm ? ` by ${seat.outsideLimitsUm.toFixed(1)} µm` : '';
  const words = {
    'as recommended': 'As recommended',
    looser: `Looser than it should be${by}`,
    tighter: `Tighter than it should be${by}`,
    'not recorded': 'Not recorded',
  } as const;
  return words[seat.verdict];
}

/** The limits for the micrometer, as they stand on a drawing. */
export function limitsMmText(seat: SeatAssessment): string | null {
  if (seat.seatLimitsMm === null) return null;
  return `${seat.seatLimitsMm[0].toFixed(3)} to ${seat.seatLimitsMm[1].toFixed(3)}`;
}
