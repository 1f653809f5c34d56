import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { SeatBonding, SeatCondition, SeatName } from '#shared/contracts/fit-record.ts';

/** The newest word on each fact of one seat, gathered from all of its records. */
export interface SeatRecord {
  toleranceClass: string | null;
  seatMeasuredMm: number | null;
  ringMeasuredMm: number | null;
  condition: SeatCondition | null;
  /** Of a tapered seat, from the newest mounting. */
  driveUpMm: number | null;
  clearanceReductionUm: number | null;
  bonding: SeatBonding | null;
  /** Day on which the seat was last measured or driven up; null where it never was. */
  measuredOn: string | null;
  /** Day of the newest record of any kind. */
  recordedOn: string | null;
  /** Day from which the seat has been wearing: when it was measured, else when it was made. */
  inServiceSince: string | null;
}

const isSaid = (value: number | null) => value !== null;

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
  const mounted = own.find((record) =>
    [record.driveUpMm, record.clearanceReductionUm].some(isSaid),
  );
  const measuredOn = (measured ?? mounted)?.recordedOn ?? null;
  return {
    toleranceClass: newest('toleranceClass')?.toleranceClass ?? null,
    seatMeasuredMm: measured?.seatMeasuredMm ?? null,
    ringMeasuredMm: newest('ringMeasuredMm')?.ringMeasuredMm ?? null,
    condition: newest('condition')?.condition ?? null,
    // Drive-up and loss of clearance of one mounting belong together.
    driveUpMm: mounted?.driveUpMm ?? null,
    clearanceReductionUm: mounted?.clearanceReductionUm ?? null,
    bonding: newest('bonding')?.bonding ?? null,
    measuredOn,
    recordedOn: own[0]?.recordedOn ?? null,
    inServiceSince: measuredOn ?? own.at(-1)?.recordedOn ?? null,
  };
}
