import type { SeatMark } from './condition-words.ts';
import type { RingLoad, SeatHistory } from './fit-types.ts';

/**
 * Mean loss of interference by a year of service, µm: a ring with a rotating or indeterminate load
 * works on its seat, one with a stationary load hardly moves. Project's assumption, no source.
 */
const wearPerYearUm: Readonly<Record<RingLoad, number>> = {
  rotating: 0.4,
  indeterminate: 0.4,
  stationary: 0.2,
};

/** Mean loss that goes with a condition seen at the last inspection, µm. Assumption, no source. */
const wearByConditionUm: Readonly<Record<SeatMark, number>> = {
  sound: 0,
  'moisture corrosion': 5,
  'fretting corrosion': 10,
  'plastic deformation': 15,
  'abrasive wear': 15,
  'creep marks': 20,
  'adhesive wear': 20,
  cracked: 40,
};

/** How much faster a seat wears on that was not found sound. Assumption, no source. */
const markedSeatFactor = 3;

/** Mean loss by each finding of looseness that was not repaired, µm. Assumption, no source. */
const wearByFindingUm = 8;

/**
 * Mean wear of a seat since it was made, restored or last measured. The wear itself is taken as
 * exponentially distributed about this mean: small wear is likely, large wear possible.
 *
 * A condition counts only as far as the diameters do not already tell it: with a seat measured at
 * the inspection that found the condition, the loss is in the measured value, and the condition only
 * says that the seat wears on faster.
 *
 * @param measured - whether the seat's diameter was measured when the condition was seen
 * @returns mean loss of interference, µm; 0 where nothing is known
 */
export function meanWearUm(
  history: SeatHistory | undefined,
  load: RingLoad | undefined,
  measured: boolean,
): number {
  if (!history) return 0;
  const isMarked = history.condition !== undefined && history.condition !== 'sound';
  const perYear = wearPerYearUm[load ?? 'rotating'] * (isMarked ? markedSeatFactor : 1);
  const byTime = (history.yearsInService ?? 0) * perYear;
  const byCondition = history.condition && !measured ? wearByConditionUm[history.condition] : 0;
  return byTime + byCondition + (history.earlierFindings ?? 0) * wearByFindingUm;
}
