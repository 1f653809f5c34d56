import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { RejectedFile } from '#server/db/entities/rejected-file.entity.ts';
import type { Survey } from '#server/db/entities/survey.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  CreateSurveyRequest,
  SurveyCounts,
  SurveyListQuery,
} from '#shared/contracts/survey.ts';
import type { WaveformListItem } from '#shared/contracts/waveform.ts';
import { SurveyRepository } from './survey.repository.ts';

export interface SurveyWhole {
  survey: Survey;
  counts: SurveyCounts;
  points: MeasuringPoint[];
  waveforms: WaveformListItem[];
  rejectedFiles: RejectedFile[];
}

interface Waveforms {
  /** The waveforms of a survey, as lists show them. */
  waveformsOf: (surveyId: number) => Promise<WaveformListItem[]>;
}

/** Surveys: one walk of a route on one date. */
export class SurveyService {
  private readonly database: Database;
  private readonly waveforms: Waveforms;
  private readonly now: () => Date;

  constructor(database: Database, waveforms: Waveforms, now: () => Date = () => new Date()) {
    this.database = database;
    this.waveforms = waveforms;
    this.now = now;
  }

  async list(principal: SitePrincipal, query: SurveyListQuery) {
    const repository = new SurveyRepository(this.database.db);
    const { surveys, total } = await repository.list(principal.siteId, query);
    const counts = await repository.counts(surveys.map((survey) => survey.id));
    return { surveys, counts, total };
  }

  /** A day ahead of UTC is today somewhere on earth. */
  private latestDay(): string {
    return new Date(this.now().getTime() + 14 * 3_600_000).toISOString().slice(0, 10);
  }

  async create(principal: SitePrincipal, request: CreateSurveyRequest): Promise<SurveyWhole> {
    const repository = new SurveyRepository(this.database.db);
    if (!(await repository.routeExists(principal.siteId, request.routeId))) {
      const message = 'This route does not exist at this site.';
      throw new AppError('validation', message, { fields: [{ path: 'routeId', message }] });
    }
    if (request.surveyedOn > this.latestDay()) {
      const message = 'The date lies in the future.';
      throw new AppError('validation', message, { fields: [{ path: 'surveyedOn', message }] });
    }
    const id = await this.database.transaction(async (db) => {
      const created = await new SurveyRepository(db)
        .insert({
          ...request,
          createdByUserId: principal.userId,
          createdAt: this.now(),
        })
        .catch((error: unknown) => {
          if (!isDuplicateKey(error)) throw error;
          const message = `This route already has a survey of ${request.surveyedOn}.`;
          throw new AppError('conflict', message, {
            cause: error,
            fields: [{ path: 'surveyedOn', message }],
          });
        });
      await recordActivity(db, {
        siteId: principal.siteId,
        userId: principal.userId,
        action: 'survey.created',
        objectType: 'survey',
        objectId: created,
      });
      return created;
    });
    return this.whole(principal, id);
  }

  async whole(principal: SitePrincipal, id: number): Promise<SurveyWhole> {
    const repository = new SurveyRepository(this.database.db);
    const survey = await repository.find(principal.siteId, id);
    if (survey === null) throw notFound('survey');
    const [counts, points, waveforms, rejectedFiles] = await Promise.all([
      this.countsOf(id),
      repository.pointsOf(survey.routeId),
      this.waveforms.waveformsOf(id),
      repository.rejectedFiles(id),
    ]);
    return { survey, counts, points, waveforms, rejectedFiles };
  }

  async progress(principal: SitePrincipal, id: number): Promise<SurveyCounts> {
    const survey = await new SurveyRepository(this.database.db).find(principal.siteId, id);
    if (survey === null) throw notFound('survey');
    return this.countsOf(id);
  }

  /** Puts away the note of a file that could not be read; the file itself was never kept. */
  async dismissRejectedFile(principal: SitePrincipal, id: number, fileId: number): Promise<void> {
    const survey = await new SurveyRepository(this.database.db).find(principal.siteId, id);
    if (survey === null) throw notFound('survey');
    await this.database.transaction(async (db) => {
      const repository = new SurveyRepository(db);
      const file = await repository.rejectedFile(id, fileId);
      if (file === null) throw notFound('file');
      await repository.removeRejectedFile(fileId);
      await recordActivity(
        db,
        {
          siteId: principal.siteId,
          userId: principal.userId,
          action: 'rejected-file.dismissed',
          objectType: 'survey',
          objectId: id,
          details: { fileName: file.fileName, errorLine: file.errorLine },
        },
        this.now(),
      );
    });
  }

  private async countsOf(id: number): Promise<SurveyCounts> {
    const counts = (await new SurveyRepository(this.database.db).counts([id])).get(id);
    if (counts === undefined) throw notFound('survey');
    return counts;
  }
}
