import type { Db } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { Finding } from '#server/db/entities/finding.entity.ts';
import { Site } from '#server/db/entities/site.entity.ts';

/** What papers say beside what the pages show. */
export class PapersRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async siteName(siteId: number): Promise<string> {
    return (await this.db.findOneByOrFail(Site, { id: siteId })).name;
  }

  async positionOf(siteId: number, findingId: number): Promise<BearingPosition | null> {
    const finding = await this.db.findOne(Finding, {
      where: { id: findingId, siteId },
      relations: { bearingPosition: true },
    });
    return finding?.bearingPosition ?? null;
  }

  /** Versions of the method that the survey's screenings were made with. */
  async methodVersions(surveyId: number): Promise<string[]> {
    const rows = await this.db.query<{ version: string }[]>(
      `SELECT DISTINCT screening.method_version AS version
         FROM screening
         JOIN waveform ON waveform.id = screening.waveform_id
          AND waveform.screening_run = screening.run
        WHERE waveform.survey_id = ? ORDER BY version`,
      [surveyId],
    );
    return rows.map(({ version }) => version);
  }
}
