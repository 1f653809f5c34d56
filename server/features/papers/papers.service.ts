import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import type { FindingResponse } from '#shared/contracts/finding.ts';
import { inspectionResponse, type InspectionResponse } from '#shared/contracts/inspection.ts';
import type { SurveyResponse } from '#shared/contracts/survey.ts';
import { drawFinding } from './finding-paper.ts';
import { drawInspection } from './inspection-paper.ts';
import { PapersRepository } from './papers.repository.ts';
import { screeningCaution } from './paper-words.ts';
import { Sheet } from './sheet.ts';
import { readShownScreening, type ScreeningReader } from './shown-screening.ts';
import { drawSurvey } from './survey-paper.ts';

/** What papers show, read as the person who asks may see it; each throws where they may not. */
export interface PaperSources extends ScreeningReader {
  finding: (principal: SitePrincipal, findingId: number) => Promise<FindingResponse>;
  inspection: (principal: SitePrincipal, inspectionId: number) => Promise<InspectionResponse>;
  survey: (principal: SitePrincipal, surveyId: number) => Promise<SurveyResponse>;
  /** By the register or by the designation; null where neither tells it. */
  bearingWidthMm: (position: BearingPosition) => number | null;
}

export interface Paper {
  fileName: string;
  bytes: Buffer;
}

/** Papers to print or to send on. */
export class PapersService {
  private readonly repository: PapersRepository;
  private readonly sources: PaperSources;
  private readonly now: () => Date;

  constructor(database: Database, sources: PaperSources, now: () => Date = () => new Date()) {
    this.repository = new PapersRepository(database.db);
    this.sources = sources;
    this.now = now;
  }

  async finding(principal: SitePrincipal, findingId: number): Promise<Paper> {
    const finding = await this.sources.finding(principal, findingId);
    const shown = await readShownScreening(this.sources, principal, finding);
    const sheet = await this.sheet(principal, `Finding ${finding.id}`);
    drawFinding(sheet, { finding, shown });
    return {
      fileName: `finding-${finding.id}-${nameable(finding.machineTag)}.pdf`,
      bytes: await sheet.finish(),
    };
  }

  async inspection(principal: SitePrincipal, inspectionId: number): Promise<Paper> {
    // By its contract: reports kept from before a field was there get its default.
    const inspection = inspectionResponse.parse(
      await this.sources.inspection(principal, inspectionId),
    );
    const position = await this.repository.positionOf(principal.siteId, inspection.findingId);
    const widthMm = position === null ? null : this.sources.bearingWidthMm(position);
    const sheet = await this.sheet(principal, `Inspection ${inspection.id}`);
    drawInspection(sheet, { inspection, widthMm });
    return {
      fileName: `inspection-${inspection.id}-${nameable(inspection.machineTag)}.pdf`,
      bytes: await sheet.finish(),
    };
  }

  async survey(principal: SitePrincipal, surveyId: number): Promise<Paper> {
    const survey = await this.sources.survey(principal, surveyId);
    const methodVersions = await this.repository.methodVersions(surveyId);
    const sheet = await this.sheet(principal, `Survey ${survey.routeName} ${survey.surveyedOn}`);
    drawSurvey(sheet, { survey, methodVersions });
    return {
      fileName: `survey-${nameable(survey.routeName)}-${survey.surveyedOn}.pdf`,
      bytes: await sheet.finish(),
    };
  }

  private async sheet(principal: SitePrincipal, title: string): Promise<Sheet> {
    return new Sheet({
      title,
      siteName: await this.repository.siteName(principal.siteId),
      printedOn: this.now().toISOString().slice(0, 10),
      caution: screeningCaution,
    });
  }
}

/** Tags have strokes and spaces, names of files better not. */
const nameable = (text: string) => text.replace(/[^\p{L}\p{N}.-]+/gu, '-');
