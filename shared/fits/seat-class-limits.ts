import { FitInputError } from './fit-input-error.ts';
import type { LimitsUm, SeatName } from './fit-types.ts';
import { limitDeviationsUm } from './limit-deviations.ts';
import { parseToleranceClass } from './tolerance-class.ts';

/**
 * Limit deviations of a seat's recorded class; `undefined` where none is recorded.
 *
 * @throws {FitInputError} `unknown_class` also for a hole class on a shaft or the other way round
 */
export function seatClassLimitsUm(
  seat: SeatName,
  nominalMm: number,
  toleranceClass: string | undefined,
): LimitsUm | undefined {
  if (toleranceClass === undefined) return undefined;
  const field = seat === 'shaft' ? 'shaftClass' : 'housingClass';
  if (parseToleranceClass(toleranceClass, field).seat !== seat) {
    throw new FitInputError(
      'unknown_class',
      field,
      `"${toleranceClass}" is a class of ${seat === 'shaft' ? 'holes; shafts are written small, e.g. k5' : 'shafts; housing bores are written in capitals, e.g. H7'}.`,
    );
  }
  return limitDeviationsUm(nominalMm, toleranceClass, {
    size: seat === 'shaft' ? 'd' : 'D',
    class: field,
  });
}
