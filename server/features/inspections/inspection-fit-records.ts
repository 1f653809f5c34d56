import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { InspectionReport } from '#shared/contracts/inspection.ts';
import { meanDiameterMm } from './report-checks.ts';

/** The fit records that a report adds: one for each seat and stage, as found before as left. */
export function fitRecordsOf(
  report: InspectionReport,
  made: { inspectionId: number; bearingPositionId: number; recordedByUserId: number; now: Date },
): Omit<FitRecord, 'id' | 'bearingPosition' | 'recordedBy'>[] {
  return [...report.seats]
    .sort((a, b) => a.stage.localeCompare(b.stage, 'en'))
    .map((seat) => ({
      bearingPositionId: made.bearingPositionId,
      seat: seat.seat,
      recordedOn: made.now.toISOString().slice(0, 10),
      source: 'inspection' as const,
      toleranceClass: null,
      seatMeasuredMm: meanDiameterMm(seat, 'seat'),
      ringMeasuredMm: meanDiameterMm(seat, 'ring'),
      diameterUnit: 'mm' as const,
      driveUpMm: null,
      clearanceReductionUm: null,
      bonding: null,
      condition: seat.condition,
      stage: seat.stage,
      note: `${seat.stage === 'as left' ? 'As left' : 'As found'}; ${seat.readings.length} readings.`,
      inspectionId: made.inspectionId,
      recordedByUserId: made.recordedByUserId,
      createdAt: made.now,
    }));
}
