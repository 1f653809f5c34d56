import type { SitePrincipal } from '#server/auth/principal.ts';
import { csvTable } from '#server/csv/csv-table.ts';
import type { Database } from '#server/db/database.ts';
import type { FindingListItem, FindingListQuery } from '#shared/contracts/finding.ts';
import type { InspectionListItem, InspectionListQuery } from '#shared/contracts/inspection.ts';
import { findingColumns, type FindingRow } from './finding-columns.ts';
import { inspectionColumns, type InspectionRow } from './inspection-columns.ts';
import { screeningColumns, type ScreeningRow } from './screening-columns.ts';
import { SiteExportRepository } from './site-export.repository.ts';

/** Pages of the lists themselves: so a file never shows what the list would not. */
export interface ExportedLists {
  findings: (principal: SitePrincipal, query: FindingListQuery) => Promise<FindingListItem[]>;
  inspections: (
    principal: SitePrincipal,
    query: InspectionListQuery,
  ) => Promise<InspectionListItem[]>;
  /** Throws where the site has no such survey. */
  checkSurvey: (principal: SitePrincipal, surveyId: number) => Promise<unknown>;
}

const pageRows = 200;

/** Findings, inspections and screenings of a site as CSV, read a page at a time. */
export class SiteExportService {
  private readonly repository: SiteExportRepository;
  private readonly lists: ExportedLists;

  constructor(database: Database, lists: ExportedLists) {
    this.repository = new SiteExportRepository(database.db);
    this.lists = lists;
  }

  findings(principal: SitePrincipal, query: FindingListQuery): AsyncGenerator<string> {
    return csvTable(findingColumns, this.findingPages(principal, query));
  }

  inspections(principal: SitePrincipal, query: InspectionListQuery): AsyncGenerator<string> {
    return csvTable(inspectionColumns, this.inspectionPages(principal, query));
  }

  /** Of one survey, or of all of them. */
  async screenings(
    principal: SitePrincipal,
    surveyId: number | undefined,
  ): Promise<AsyncGenerator<string>> {
    if (surveyId !== undefined) await this.lists.checkSurvey(principal, surveyId);
    return csvTable(screeningColumns, this.screeningPages(principal.siteId, surveyId));
  }

  private async *findingPages(
    principal: SitePrincipal,
    query: FindingListQuery,
  ): AsyncGenerator<FindingRow[]> {
    // By the day they were opened, which never changes: pages don't shift while the file is written.
    const fixed = { ...query, sort: 'openedAt', direction: 'asc', pageSize: pageRows } as const;
    for (let page = 1; ; page += 1) {
      const items = await this.lists.findings(principal, { ...fixed, page });
      if (items.length === 0) return;
      const ids = items.map(({ id }) => id);
      const [inspections, changes] = await Promise.all([
        this.repository.inspectionsOf(ids),
        this.repository.changesOf(ids),
      ]);
      yield items.map((item) => ({
        item,
        inspections: inspections.filter(({ findingId }) => findingId === item.id),
        lastChange: changes.filter(({ findingId }) => findingId === item.id).at(-1) ?? null,
      }));
      if (items.length < pageRows) return;
    }
  }

  private async *inspectionPages(
    principal: SitePrincipal,
    query: InspectionListQuery,
  ): AsyncGenerator<InspectionRow[]> {
    const fixed = { ...query, pageSize: pageRows };
    for (let page = 1; ; page += 1) {
      const items = await this.lists.inspections(principal, { ...fixed, page });
      if (items.length === 0) return;
      const inspections = await this.repository.inspections(items.map(({ id }) => id));
      yield items.map((item) => ({
        item,
        inspection: inspections.find(({ id }) => id === item.id) ?? null,
      }));
      if (items.length < pageRows) return;
    }
  }

  private async *screeningPages(
    siteId: number,
    surveyId: number | undefined,
  ): AsyncGenerator<ScreeningRow[]> {
    let afterId = 0;
    for (;;) {
      const screenings = await this.repository.screenings(siteId, surveyId, afterId, pageRows);
      const last = screenings.at(-1);
      if (last === undefined) return;
      afterId = last.id;
      const findingOf = await this.repository.findingsOf(screenings.map(({ id }) => id));
      const inspections = await this.repository.inspectionsOf([...new Set(findingOf.values())]);
      yield screenings.map((screening) => {
        const findingId = findingOf.get(screening.id) ?? null;
        return {
          screening,
          findingId,
          inspections: inspections.filter((one) => one.findingId === findingId),
        };
      });
    }
  }
}
