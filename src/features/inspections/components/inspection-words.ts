import type { InPlaceCheckName } from '#shared/contracts/in-place-check.ts';
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

export const inPlaceFindingWords = {
  sound: 'Sound',
  fault: 'At fault',
  'not checked': 'Not checked',
} as const;

/** Names of the checks, what is read, and how it is done (common practice, no source). */
export const inPlaceWords: Readonly<
  Record<InPlaceCheckName, { name: string; reading: string; hint: string }>
> = {
  'bolt torque': {
    name: 'Bolt torque',
    reading: 'Lowest torque',
    hint: 'Each foot and pedestal bolt, with a torque wrench, against the maker’s figure',
  },
  'movement across the joint': {
    name: 'Movement across the joint',
    reading: 'Below the joint',
    hint: 'Vibration at 1× on both sides of the joint, one hand’s breadth apart, while it runs',
  },
  'soft foot': {
    name: 'Soft foot',
    reading: 'Rise when loosened',
    hint: 'Dial gauge on each foot in turn, bolt loosened, machine locked out',
  },
  shims: { name: 'Shims', reading: '', hint: 'Few, flat, clean and under the whole foot' },
  grout: { name: 'Grout', reading: '', hint: 'Hollow sound, crumbling edges, oil in it' },
  cracks: { name: 'Cracks', reading: '', hint: 'Pedestal, welds, base and frame' },
};
