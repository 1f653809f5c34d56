import type { Db } from '#server/db/database.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { StateChange } from '#server/db/entities/state-change.entity.ts';

/** What is read to set a survey against the screenings that raised a finding. */
export class VerificationRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** When the finding was last marked as repaired; null if never. */
  async repairedAt(findingId: number): Promise<Date | null> {
    const change = await this.db.findOne(StateChange, {
      where: { findingId, toState: 'repaired' },
      order: { changedAt: 'DESC', id: 'DESC' },
    });
    return change?.changedAt ?? null;
  }

  /**
   * The newest screenings of the position's waveforms from surveys of that day on, oldest survey
   * first; of a point measured twice in a survey the later record comes last.
   */
  screeningsFrom(bearingPositionId: number, day: string): Promise<Screening[]> {
    return this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .where('point.bearingPositionId = :bearingPositionId', { bearingPositionId })
      .andWhere('screening.run = waveform.screeningRun')
      .andWhere('survey.surveyedOn >= :day', { day })
      .orderBy('survey.surveyedOn', 'ASC')
      .addOrderBy('survey.id', 'ASC')
      .addOrderBy('waveform.id', 'ASC')
      .getMany();
  }
}
