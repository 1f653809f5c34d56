import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { SeatCondition, SeatName } from '#shared/contracts/fit-record.ts';

/** The newest word on each fact of one seat, gathered from all of its records. */
export interface SeatRecord {
  toleranceClass: string | null;
  seatMeasuredMm: number | null;
  ringMeasuredMm: number | null;
  condition: SeatCondition | null;
  /** Day of the newest record of any kind. */
  recordedOn: string | null;
  /** Day from which the seat has been wearing: when it was measured, else when it was made. */
  inServiceSince: string | null;
}

/**
 * Combines a seat's records: the drawing gives the class, a later measurement the diameters, an
 * inspection the condition. None of them wipes out what another one said of a different fact.
 *
 * @param records - of the position, newest first
 */
export function seatRecordOf(records: readonly FitRecord[], seat: SeatName): SeatRecord {
  const own = records.filter((record) => record.seat === seat);
  const newest = <Key extends keyof FitRecord>(key: Key) =>
    own.find((record) => record[key] !== null);
  const measured = newest('seatMeasuredMm');
  return {
    toleranceClass: newest('toleranceClass')?.toleranceClass ?? null,
    seatMeasuredMm: measured?.seatMeasuredMm ?? null,
    ringMeasuredMm: newest('ringMeasuredMm')?.ringMeasuredMm ?? null,
    condition: newest('condition')?.condition ?? null,
    recordedOn: own[0]?.recordedOn ?? null,
    inServiceSince: measured?.recordedOn ?? own.at(-1)?.recordedOn ?? null,
  };
}
