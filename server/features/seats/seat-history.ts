import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { SeatReading } from '#shared/contracts/inspection.ts';
import type { PartFigures, SeatWearStep } from '#shared/contracts/seat-history.ts';
import { FitInputError } from '#shared/fits/fit-input-error.ts';
import type { SeatName } from '#shared/fits/fit-types.ts';
import { measuredWear } from '#shared/fits/measured-wear.ts';
import { defaultInstrumentUncertaintyUm, measureSeat } from '#shared/fits/seat-measurement.ts';

/** A record with the readings of the inspection that brought it. */
export interface RecordWithReadings {
  record: FitRecord;
  readings: readonly SeatReading[];
}

/** What the readings of one part say; null without any, or where they can't be of this seat. */
function figuresOf(
  readings: readonly SeatReading[],
  part: SeatReading['part'],
  nominalMm: number,
): PartFigures | null {
  const own = readings
    .filter((reading) => reading.part === part)
    .map(({ plane, directionDeg, diameterMm }) => ({ plane, directionDeg, diameter: diameterMm }));
  if (own.length === 0) return null;
  try {
    const measured = measureSeat(own, nominalMm);
    return {
      part,
      planes: measured.planes.map((plane) => ({
        plane: plane.plane,
        meanMm: plane.meanMm,
        outOfRoundnessUm: plane.outOfRoundnessUm ?? null,
        readingCount: plane.readingCount,
      })),
      taperUm: measured.taperUm ?? null,
      expandedUncertaintyUm: measured.expandedUncertaintyUm,
    };
  } catch (error) {
    // The size on record was changed since: the readings no longer belong to it.
    if (error instanceof FitInputError) return null;
    throw error;
  }
}

/** Figures of the seat, then of the ring, as far as they were read. */
export function partFigures(
  { readings }: RecordWithReadings,
  nominalMm: number | null,
): PartFigures[] {
  if (nominalMm === null) return [];
  return (['seat', 'ring'] as const)
    .map((part) => figuresOf(readings, part, nominalMm))
    .filter((figures) => figures !== null);
}

/** Whether a later record of the same day, not of an inspection, takes this one's place. */
export function isCorrected(record: FitRecord, records: readonly FitRecord[]): boolean {
  return (
    record.inspectionId === null &&
    records.some(
      (other) =>
        other.recordedOn === record.recordedOn &&
        other.inspectionId === null &&
        other.id > record.id,
    )
  );
}

/**
 * Change of size between each measurement of the seat and the next.
 *
 * @param history - records of one seat, oldest first
 * @returns the newest step first
 */
export function wearSteps(
  seat: SeatName,
  history: readonly RecordWithReadings[],
  nominalMm: number | null,
): SeatWearStep[] {
  const records = history.map(({ record }) => record);
  const measured = history.flatMap((one) => {
    const { record } = one;
    if (record.seatMeasuredMm === null || isCorrected(record, records)) return [];
    const seatFigures = partFigures(one, nominalMm).find(({ part }) => part === 'seat');
    return [
      {
        record,
        measured: {
          atMs: Date.parse(record.recordedOn),
          diameterMm: record.seatMeasuredMm,
          standardUncertaintyUm:
            seatFigures === undefined
              ? defaultInstrumentUncertaintyUm
              : seatFigures.expandedUncertaintyUm / 2,
        },
      },
    ];
  });
  const steps = measured.slice(1).flatMap((to, index): SeatWearStep[] => {
    const from = measured[index];
    if (from === undefined) return [];
    const wear = measuredWear(seat, from.measured, to.measured);
    return [
      {
        fromRecordId: from.record.id,
        toRecordId: to.record.id,
        fromOn: from.record.recordedOn,
        toOn: to.record.recordedOn,
        isWork: to.record.stage === 'as left',
        lossUm: wear.lossUm,
        expandedUncertaintyUm: wear.expandedUncertaintyUm,
        perYearUm: wear.perYearUm ?? null,
        perYearUncertaintyUm: wear.perYearUncertaintyUm ?? null,
        isSignificant: wear.isSignificant,
      },
    ];
  });
  return steps.reverse();
}
