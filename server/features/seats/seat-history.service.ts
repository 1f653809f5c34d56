import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { AppError } from '#server/http/app-error.ts';
import type { FitRecordResponse, SeatName } from '#shared/contracts/fit-record.ts';
import type { SeatHistoryEntry, SeatHistoryResponse } from '#shared/contracts/seat-history.ts';
import { measuringPlan } from '#shared/fits/measuring-plan.ts';
import { nominalSeatMm } from '#shared/fits/nominal-seat.ts';
import { shaftTaperOf } from '#shared/fits/tapered-position.ts';
import { bearingSizeOf } from './position-fit.ts';
import { isCorrected, partFigures, wearSteps, type RecordWithReadings } from './seat-history.ts';
import { SeatHistoryRepository } from './seat-history.repository.ts';

/** What the history takes from others. */
export interface SeatHistoryNeighbours {
  /** The position with its machine, if the person may see it; throws where not. */
  seenPosition: (principal: SitePrincipal, positionId: number) => Promise<BearingPosition>;
  presentFitRecord: (record: FitRecord) => FitRecordResponse;
}

/** The records of one seat on a line with the findings and inspections of its position. */
export class SeatHistoryService {
  private readonly database: Database;
  private readonly neighbours: SeatHistoryNeighbours;

  constructor(database: Database, neighbours: SeatHistoryNeighbours) {
    this.database = database;
    this.neighbours = neighbours;
  }

  async ofSeat(
    principal: SitePrincipal,
    positionId: number,
    seat: SeatName,
  ): Promise<SeatHistoryResponse> {
    const position = await this.neighbours.seenPosition(principal, positionId);
    if (position.kind === 'plain') {
      throw new AppError('not_found', 'A plain bearing has no seats.');
    }
    const repository = new SeatHistoryRepository(this.database.db);
    const [records, findings, inspections] = await Promise.all([
      repository.records(positionId, seat),
      repository.findings(positionId),
      repository.inspections(positionId),
    ]);
    const nominalMm = nominalSeatMm(position, seat);
    const history = records.map((record) => withReadings(record, inspections));
    const entries: SeatHistoryEntry[] = [
      ...findings.map(({ id, openedAt, state }) => ({
        kind: 'finding' as const,
        on: dayOf(openedAt),
        findingId: id,
        state,
      })),
      ...inspections.map((inspection) => inspectionEntry(inspection, seat)),
      ...history.map((one) => ({
        kind: 'record' as const,
        on: one.record.recordedOn,
        record: this.neighbours.presentFitRecord(one.record),
        corrected: isCorrected(one.record, records),
        figures: partFigures(one, nominalMm),
      })),
    ];
    return {
      machineId: position.machineId,
      machineTag: position.machine?.tag ?? '',
      positionId,
      positionCode: position.code,
      positionName: position.name,
      seat,
      nominalMm,
      taper: seat === 'shaft' ? shaftTaperOf(position) : null,
      // Within a day in the order it goes: found, inspected, recorded; the sort keeps that order.
      entries: entries.sort((a, b) => a.on.localeCompare(b.on, 'en')).reverse(),
      wear: wearSteps(seat, history, nominalMm),
      plan: planOf(position, seat, nominalMm),
    };
  }
}

const dayOf = (moment: Date) => moment.toISOString().slice(0, 10);

/** The readings of the report that this record was made from. */
function withReadings(record: FitRecord, inspections: readonly Inspection[]): RecordWithReadings {
  const report = inspections.find(({ id }) => id === record.inspectionId)?.report;
  const reported = report?.seats.find(
    // Reports of old have no stage: they told of the seat as found.
    ({ seat, stage }) => seat === record.seat && stage === (record.stage ?? 'as found'),
  );
  return { record, readings: reported?.readings ?? [] };
}

const inspectionEntry = (inspection: Inspection, seat: SeatName): SeatHistoryEntry => ({
  kind: 'inspection',
  on: dayOf(inspection.reportedAt ?? inspection.assignedAt),
  inspectionId: inspection.id,
  state: inspection.state,
  outcome: inspection.report?.outcome ?? null,
  workDone: inspection.report?.workDone ?? null,
  checksThisSeat: seat === 'shaft' ? inspection.checkShaftSeat : inspection.checkHousingSeat,
});

function planOf(
  position: BearingPosition,
  seat: SeatName,
  nominalMm: number | null,
): SeatHistoryResponse['plan'] {
  if (nominalMm === null || (seat === 'shaft' && shaftTaperOf(position) !== null)) return null;
  const plan = measuringPlan(seat, nominalMm, bearingSizeOf(position).widthMm ?? undefined);
  return {
    instrument: plan.instrument,
    planesMm: plan.planesMm === undefined ? null : [...plan.planesMm],
    directionsDeg: [...plan.directionsDeg],
    steps: [...plan.steps],
  };
}
