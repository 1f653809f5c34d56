import type { SeatStage } from '#shared/contracts/fit-record.ts';
import type { InspectionListItem, InspectionOutcome } from '#shared/contracts/inspection.ts';

export const seatWords = { shaft: 'Shaft seat', housing: 'Housing seat' } as const;

/** The parts a micrometer is set on, by seat. */
export const partWords = {
  shaft: { seat: 'Shaft diameter', ring: 'Bore of the inner ring' },
  housing: { seat: 'Housing bore', ring: 'Outside diameter of the outer ring' },
} as const;

export const stageWords: Readonly<Record<SeatStage, string>> = {
  'as found': 'As found',
  'as left': 'As left',
};

export const outcomeWords: Readonly<Record<InspectionOutcome, string>> = {
  loose: 'Loose',
  'not loose': 'Not loose',
  'not clear': 'Not clear',
};

/** "Shaft seat, in place": what is to be checked, in a few words. */
export function checksText(
  checks: Pick<InspectionListItem, 'checkShaftSeat' | 'checkHousingSeat' | 'checkInPlace'>,
): string {
  const words = [
    ...(checks.checkInPlace ? ['in place'] : []),
    ...(checks.checkShaftSeat ? ['shaft seat'] : []),
    ...(checks.checkHousingSeat ? ['housing seat'] : []),
  ].join(', ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
