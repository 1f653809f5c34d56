import type { Db } from '#server/db/database.ts';
import { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { RejectedFile } from '#server/db/entities/rejected-file.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import { Survey } from '#server/db/entities/survey.entity.ts';
import { Waveform } from '#server/db/entities/waveform.entity.ts';
import type { OrderLine } from '#shared/signal/screening-types.ts';

export type NewWaveform = Omit<Waveform, 'id' | 'survey' | 'measuringPoint'>;

/** What lists show of a screening: of its result, some twenty kilobytes, the order table alone. */
export type ScreeningSummary = Pick<
  Screening,
  'id' | 'verdict' | 'score' | 'speedHz' | 'decision'
> & { orders: readonly OrderLine[] };

/** A waveform with its point, machine, survey and the screening of its latest run. */
export interface WaveformRow {
  waveform: Waveform;
  screening: ScreeningSummary | null;
}

/** Waveforms, and the files that could not be read. */
export class WaveformRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  private rows() {
    return this.db
      .createQueryBuilder(Waveform, 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .innerJoinAndSelect('survey.route', 'route')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .innerJoinAndSelect('point.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine');
  }

  /** The screenings of the latest run. */
  private async screeningsOf(waveforms: Waveform[]): Promise<Map<number, ScreeningSummary>> {
    if (waveforms.length === 0) return new Map();
    const places = waveforms.map(() => '?').join(', ');
    const rows = await this.db.query<
      (Omit<ScreeningSummary, 'orders'> & { waveformId: number; orders: string })[]
    >(
      `SELECT screening.id, screening.waveform_id AS waveformId, screening.verdict,
              screening.score, screening.speed_hz AS speedHz, screening.decision,
              CAST(JSON_EXTRACT(screening.result, '$.orders') AS CHAR) AS orders
         FROM screening
         JOIN waveform ON waveform.id = screening.waveform_id
          AND waveform.screening_run = screening.run
        WHERE screening.waveform_id IN (${places})`,
      waveforms.map((waveform) => waveform.id),
    );
    return new Map(
      rows.map(({ waveformId, orders, ...row }) => [
        waveformId,
        { ...row, orders: JSON.parse(orders) as OrderLine[] },
      ]),
    );
  }

  async find(siteId: number, id: number): Promise<WaveformRow | null> {
    const waveform = await this.rows()
      .where('waveform.id = :id', { id })
      .andWhere('route.siteId = :siteId', { siteId })
      .getOne();
    if (waveform === null) return null;
    const screenings = await this.screeningsOf([waveform]);
    return { waveform, screening: screenings.get(id) ?? null };
  }

  async ofSurvey(surveyId: number): Promise<WaveformRow[]> {
    const waveforms = await this.rows()
      .where('waveform.surveyId = :surveyId', { surveyId })
      .orderBy('waveform.id')
      .getMany();
    const screenings = await this.screeningsOf(waveforms);
    return waveforms.map((waveform) => ({
      waveform,
      screening: screenings.get(waveform.id) ?? null,
    }));
  }

  async ofContent(surveyId: number, contentHash: string): Promise<WaveformRow[]> {
    const waveforms = await this.rows()
      .where('waveform.surveyId = :surveyId', { surveyId })
      .andWhere('waveform.contentHash = :contentHash', { contentHash })
      .orderBy('waveform.channelIndex')
      .getMany();
    const screenings = await this.screeningsOf(waveforms);
    return waveforms.map((waveform) => ({
      waveform,
      screening: screenings.get(waveform.id) ?? null,
    }));
  }

  /** The same point in the survey of the route before this one, if it was screened. */
  async previous(waveform: Waveform) {
    const row = await this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .where('waveform.measuringPointId = :point', { point: waveform.measuringPointId })
      .andWhere('screening.run = waveform.screeningRun')
      .andWhere('survey.surveyedOn < :date', { date: waveform.survey?.surveyedOn })
      .orderBy('survey.surveyedOn', 'DESC')
      .addOrderBy('screening.id', 'DESC')
      .getOne();
    if (row === null) return null;
    return {
      waveformId: row.waveformId,
      screeningId: row.id,
      surveyedOn: row.waveform?.survey?.surveyedOn ?? '',
    };
  }

  /** The other directions of the position in the same survey, if they were screened. */
  async alongside(waveform: Waveform) {
    const rows = await this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoin('screening.waveform', 'waveform')
      .innerJoin('waveform.measuringPoint', 'point')
      .select(['screening.id', 'screening.waveformId', 'screening.speedHz'])
      .addSelect(['waveform.id', 'waveform.unit', 'point.id', 'point.direction'])
      .where('waveform.surveyId = :survey', { survey: waveform.surveyId })
      .andWhere('waveform.measuringPointId <> :point', { point: waveform.measuringPointId })
      .andWhere('point.bearingPositionId = :position', {
        position: waveform.measuringPoint?.bearingPositionId,
      })
      .andWhere('screening.run = waveform.screeningRun')
      .orderBy('point.direction')
      .addOrderBy('waveform.id', 'DESC')
      .getMany();
    return rows.flatMap(({ id, waveformId, speedHz, waveform: other }) => {
      const direction = other?.measuringPoint?.direction;
      if (other === undefined || direction === undefined) return [];
      return [{ waveformId, screeningId: id, direction, unit: other.unit, speedHz }];
    });
  }

  async insert(waveforms: NewWaveform[]): Promise<void> {
    await this.db.insert(Waveform, waveforms);
  }

  /** Asks for another screening; the ones before stay with their runs. */
  async requestRun(id: number, changes: Partial<Waveform>): Promise<boolean> {
    const { screeningRun, ...rest } = changes;
    const result = await this.db.update(
      Waveform,
      { id, ...(screeningRun === undefined ? {} : { screeningRun: screeningRun - 1 }) },
      {
        ...rest,
        ...(screeningRun === undefined ? {} : { screeningRun }),
        screeningState: 'queued',
        screeningAttempts: 0,
        screeningFailure: null,
      },
    );
    return result.affected === 1;
  }

  /** A screening with its waveform, if the site has it. */
  async screening(siteId: number, id: number): Promise<Screening | null> {
    return this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoin('waveform.survey', 'survey')
      .innerJoin('survey.route', 'route')
      .leftJoinAndSelect('screening.decidedBy', 'decidedBy')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .innerJoinAndSelect('point.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .where('screening.id = :id', { id })
      .andWhere('route.siteId = :siteId', { siteId })
      .getOne();
  }

  async findingOf(screeningId: number): Promise<number | null> {
    const [row] = await this.db.query<{ findingId: number }[]>(
      'SELECT finding_id AS findingId FROM finding_screening WHERE screening_id = ? ORDER BY finding_id DESC LIMIT 1',
      [screeningId],
    );
    return row?.findingId ?? null;
  }

  survey(siteId: number, id: number): Promise<Survey | null> {
    return this.db.findOne(Survey, {
      where: { id, route: { siteId } },
      relations: { route: true },
    });
  }

  countOfSurvey(surveyId: number): Promise<number> {
    return this.db.countBy(Waveform, { surveyId });
  }

  point(siteId: number, id: number): Promise<MeasuringPoint | null> {
    return this.db.findOne(MeasuringPoint, {
      where: { id, bearingPosition: { machine: { siteId } } },
      relations: { bearingPosition: { machine: true } },
    });
  }

  /** Keeps why a file could not be read; the same file again takes the place of the first. */
  async reject(file: Omit<RejectedFile, 'id' | 'survey'>): Promise<void> {
    await this.db.upsert(RejectedFile, file, ['surveyId', 'contentHash']);
  }

  /** A file that was mended and sent again under its name is no longer a rejected one. */
  async clearRejection(
    surveyId: number,
    { fileName, contentHash }: { fileName: string; contentHash: string },
  ): Promise<void> {
    await this.db.delete(RejectedFile, { surveyId, fileName });
    // Nor is one that only lacked what a person has now said of it.
    await this.db.delete(RejectedFile, { surveyId, contentHash });
  }
}
