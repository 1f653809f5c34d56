import { In } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { StateChange } from '#server/db/entities/state-change.entity.ts';

/** What the files tell beside what the lists show. */
export class SiteExportRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** The inspections of several findings, oldest first. */
  inspectionsOf(findingIds: number[]): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: { findingId: In(findingIds) },
      order: { id: 'ASC' },
    });
  }

  inspections(ids: number[]): Promise<Inspection[]> {
    return this.db.findBy(Inspection, { id: In(ids) });
  }

  /** The changes of state of the findings themselves, oldest first. */
  changesOf(findingIds: number[]): Promise<StateChange[]> {
    return this.db
      .createQueryBuilder(StateChange, 'change')
      .innerJoinAndSelect('change.changedBy', 'changedBy')
      .where('change.finding_id IN (:...findingIds)', { findingIds })
      .andWhere('change.inspection_id IS NULL')
      .orderBy('change.changed_at')
      .addOrderBy('change.id')
      .getMany();
  }

  /** The next screenings of the site after an id, every run, in the order they were made. */
  screenings(
    siteId: number,
    surveyId: number | undefined,
    afterId: number,
    count: number,
  ): Promise<Screening[]> {
    const found = this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .innerJoinAndSelect('survey.route', 'route')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .innerJoinAndSelect('point.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .leftJoinAndSelect('screening.decidedBy', 'decidedBy')
      .where('route.site_id = :siteId', { siteId })
      .andWhere('screening.id > :afterId', { afterId })
      .orderBy('screening.id')
      .limit(count);
    if (surveyId !== undefined) found.andWhere('waveform.survey_id = :surveyId', { surveyId });
    return found.getMany();
  }

  /** The finding each screening belongs to. */
  async findingsOf(screeningIds: number[]): Promise<Map<number, number>> {
    const places = screeningIds.map(() => '?').join(', ');
    const rows = await this.db.query<{ screeningId: number; findingId: number }[]>(
      `SELECT screening_id AS screeningId, MAX(finding_id) AS findingId
         FROM finding_screening WHERE screening_id IN (${places}) GROUP BY screening_id`,
      screeningIds,
    );
    return new Map(rows.map(({ screeningId, findingId }) => [screeningId, Number(findingId)]));
  }
}
