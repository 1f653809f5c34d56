import { In, Not } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { FindingScreening } from '#server/db/entities/finding-screening.entity.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { FitRecord } from '#server/db/entities/fit-record.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';

/** What the assessment of a position's seats is made from. */
export class SeatRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  find(positionId: number): Promise<BearingPosition | null> {
    return this.db.findOne(BearingPosition, {
      where: { id: positionId },
      relations: { machine: true },
    });
  }

  /** All positions of a machine along the train. */
  ofMachine(machineId: number): Promise<BearingPosition[]> {
    return this.db.find(BearingPosition, {
      where: { machineId },
      relations: { machine: true },
      order: { sequence: 'ASC', code: 'ASC' },
    });
  }

  /** Newest first. */
  recordsOf(positionIds: number[]): Promise<FitRecord[]> {
    if (positionIds.length === 0) return Promise.resolve([]);
    return this.db.find(FitRecord, {
      where: { bearingPositionId: In(positionIds) },
      order: { recordedOn: 'DESC', id: 'DESC' },
    });
  }

  /** Findings that nobody has repaired or dismissed, without the one these screenings belong to. */
  async unrepairedFindings(
    positionIds: number[],
    exceptScreeningIds: number[],
  ): Promise<Pick<Finding, 'bearingPositionId' | 'openedAt'>[]> {
    const links =
      exceptScreeningIds.length === 0
        ? []
        : await this.db.find(FindingScreening, { where: { screeningId: In(exceptScreeningIds) } });
    return this.db.find(Finding, {
      where: {
        id: Not(In(links.map(({ findingId }) => findingId))),
        bearingPositionId: In(positionIds),
        state: In(['open', 'inspecting', 'monitoring']),
      },
    });
  }

  /** The present screenings of the positions in the surveys, with their points. */
  screeningsOf(positionIds: number[], surveyIds: number[]): Promise<Screening[]> {
    if (positionIds.length === 0 || surveyIds.length === 0) return Promise.resolve([]);
    return this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .where('waveform.surveyId IN (:...surveyIds)', { surveyIds })
      .andWhere('point.bearingPositionId IN (:...positionIds)', { positionIds })
      .andWhere('screening.run = waveform.screeningRun')
      .getMany();
  }
}
