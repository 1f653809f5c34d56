import { bearingByDesignation } from './bearing-designation.ts';
import { FitInputError } from './fit-input-error.ts';
import type { TaperedSeat } from './fit-types.ts';

/** Forms of a shaft seat whose ring is driven up a taper. */
const taperedForms: readonly string[] = ['adapter sleeve', 'withdrawal sleeve', 'tapered shaft'];

function hasTaperedBore(designation: string | null): boolean {
  if (designation === null) return false;
  try {
    return bearingByDesignation(designation).taperedBore;
  } catch (error) {
    if (error instanceof FitInputError) return false;
    throw error;
  }
}

/**
 * Whether the ring of a position's shaft seat is driven up a taper, and which: said by the seat's
 * form or by the bearing's tapered bore (supplement K).
 *
 * @param position.shaftSeatForm - as the register has it
 * @param position.seatTaper - null counts as 1:12, the taper of all but the wide series
 *   (common practice, no source)
 * @returns the taper, or null for a cylindrical seat
 */
export function shaftTaperOf(position: {
  shaftSeatForm: string;
  seatTaper: TaperedSeat['taper'] | null;
  designation: string | null;
}): TaperedSeat['taper'] | null {
  const isTapered =
    taperedForms.includes(position.shaftSeatForm) || hasTaperedBore(position.designation);
  return isTapered ? (position.seatTaper ?? '1:12') : null;
}
