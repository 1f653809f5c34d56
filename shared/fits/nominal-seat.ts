import { bearingByDesignation } from './bearing-designation.ts';
import { FitInputError } from './fit-input-error.ts';
import type { SeatName } from './fit-types.ts';

function tableSize(designation: string | null) {
  if (designation === null) return undefined;
  try {
    return bearingByDesignation(designation);
  } catch (error) {
    if (error instanceof FitInputError) return undefined;
    throw error;
  }
}

/**
 * Nominal diameter of a seat: the size on record, else the one the designation gives.
 *
 * @returns d for the shaft seat, D for the housing seat, mm; null where neither is known
 *
 * @example
 * nominalSeatMm({ designation: '6312', boreMm: null, outsideMm: null }, 'housing') // => 130
 */
export function nominalSeatMm(
  position: { designation: string | null; boreMm: number | null; outsideMm: number | null },
  seat: SeatName,
): number | null {
  const bearing = tableSize(position.designation);
  return seat === 'shaft'
    ? (position.boreMm ?? bearing?.d ?? null)
    : (position.outsideMm ?? bearing?.D ?? null);
}
