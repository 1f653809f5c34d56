import type { Db } from '#server/db/database.ts';
import { RejectedFile } from '#server/db/entities/rejected-file.entity.ts';
import { Route } from '#server/db/entities/route.entity.ts';
import { RoutePoint } from '#server/db/entities/route-point.entity.ts';
import { Survey } from '#server/db/entities/survey.entity.ts';
import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import { likePattern } from '#server/db/like-pattern.ts';
import type { SurveyCounts, SurveyListQuery } from '#shared/contracts/survey.ts';

const noCounts: SurveyCounts = {
  pointCount: 0,
  measuredPointCount: 0,
  waveformCount: 0,
  queuedCount: 0,
  runningCount: 0,
  doneCount: 0,
  failedCount: 0,
  rejectedFileCount: 0,
  noneCount: 0,
  suspectedCount: 0,
  likelyCount: 0,
  retakeCount: 0,
  undecidedFlagCount: 0,
};

/** Surveys of a site and how far they are. */
export class SurveyRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async list(siteId: number, query: SurveyListQuery) {
    const builder = this.db
      .createQueryBuilder(Survey, 'survey')
      .innerJoinAndSelect('survey.route', 'route')
      .innerJoinAndSelect('survey.createdBy', 'createdBy')
      .where('route.siteId = :siteId', { siteId });
    if (query.routeId !== undefined) {
      builder.andWhere('survey.routeId = :routeId', { routeId: query.routeId });
    }
    if (query.search) {
      builder.andWhere('route.name LIKE :pattern', { pattern: likePattern(query.search) });
    }
    const direction = query.direction === 'asc' ? 'ASC' : 'DESC';
    const [surveys, total] = await builder
      .orderBy(query.sort === 'routeName' ? 'route.name' : 'survey.surveyedOn', direction)
      .addOrderBy('survey.id', direction)
      .skip((query.page - 1) * query.pageSize)
      .take(query.pageSize)
      .getManyAndCount();
    return { surveys, total };
  }

  find(siteId: number, id: number): Promise<Survey | null> {
    return this.db.findOne(Survey, {
      where: { id, route: { siteId } },
      relations: { route: true, createdBy: true },
    });
  }

  ofDate(routeId: number, surveyedOn: string): Promise<Survey | null> {
    return this.db.findOneBy(Survey, { routeId, surveyedOn });
  }

  routeExists(siteId: number, id: number): Promise<boolean> {
    return this.db.existsBy(Route, { id, siteId });
  }

  async insert(survey: Omit<Survey, 'id' | 'route' | 'createdBy'>): Promise<number> {
    const result = await this.db.insert(Survey, survey);
    return (result.identifiers[0] as { id: number }).id;
  }

  async pointsOf(routeId: number): Promise<MeasuringPoint[]> {
    const points = await this.db.find(RoutePoint, {
      where: { routeId },
      relations: { measuringPoint: { bearingPosition: { machine: true } } },
      order: { sequence: 'ASC' },
    });
    return points.flatMap(({ measuringPoint }) => measuringPoint ?? []);
  }

  rejectedFiles(surveyId: number): Promise<RejectedFile[]> {
    return this.db.find(RejectedFile, { where: { surveyId }, order: { fileName: 'ASC' } });
  }

  rejectedFile(surveyId: number, id: number): Promise<RejectedFile | null> {
    return this.db.findOneBy(RejectedFile, { id, surveyId });
  }

  async removeRejectedFile(id: number): Promise<void> {
    await this.db.delete(RejectedFile, { id });
  }

  /** The counts of several surveys in a few grouped queries. */
  async counts(surveyIds: number[]): Promise<Map<number, SurveyCounts>> {
    const counts = new Map(surveyIds.map((id) => [id, { ...noCounts }]));
    if (surveyIds.length === 0) return counts;
    const places = surveyIds.map(() => '?').join(', ');
    const rows = await this.db.query<({ id: number } & Record<string, string | number>)[]>(
      `SELECT survey.id,
              (SELECT COUNT(*) FROM route_point rp WHERE rp.route_id = survey.route_id) AS pointCount,
              (SELECT COUNT(DISTINCT w.measuring_point_id) FROM waveform w
                 JOIN route_point rp ON rp.measuring_point_id = w.measuring_point_id
                  AND rp.route_id = survey.route_id
                WHERE w.survey_id = survey.id) AS measuredPointCount,
              (SELECT COUNT(*) FROM rejected_file r WHERE r.survey_id = survey.id) AS rejectedFileCount,
              COUNT(waveform.id) AS waveformCount,
              COALESCE(SUM(waveform.screening_state = 'queued'), 0) AS queuedCount,
              COALESCE(SUM(waveform.screening_state = 'running'), 0) AS runningCount,
              COALESCE(SUM(waveform.screening_state = 'done'), 0) AS doneCount,
              COALESCE(SUM(waveform.screening_state = 'failed'), 0) AS failedCount,
              COALESCE(SUM(screening.verdict = 'none'), 0) AS noneCount,
              COALESCE(SUM(screening.verdict = 'suspected'), 0) AS suspectedCount,
              COALESCE(SUM(screening.verdict = 'likely'), 0) AS likelyCount,
              COALESCE(SUM(screening.verdict = 'retake'), 0) AS retakeCount,
              COALESCE(SUM(screening.verdict <> 'none' AND screening.decision IS NULL), 0)
                AS undecidedFlagCount
         FROM survey
         LEFT JOIN waveform ON waveform.survey_id = survey.id
         LEFT JOIN screening ON screening.waveform_id = waveform.id
          AND screening.run = waveform.screening_run
        WHERE survey.id IN (${places})
        GROUP BY survey.id, survey.route_id`,
      surveyIds,
    );
    for (const { id, ...row } of rows) {
      counts.set(id, {
        ...noCounts,
        ...Object.fromEntries(Object.entries(row).map(([name, value]) => [name, Number(value)])),
      });
    }
    return counts;
  }
}
