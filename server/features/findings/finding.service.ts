import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { FindingScreening } from '#server/db/entities/finding-screening.entity.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import type { Finding } from '#server/db/entities/finding.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { DecideFindingRequest, FindingListQuery } from '#shared/contracts/finding.ts';
import type { InspectionListItem } from '#shared/contracts/inspection.ts';
import type { SeatAssessmentsResponse } from '#shared/contracts/seat-assessment.ts';
import { dayPastEverywhere, monitoringOf } from './finding-monitoring.ts';
import { moveFinding } from './finding-progress.ts';
import { verifiedStates, verifyFinding } from './finding-verification.ts';
import { maySeeFinding } from './finding.policy.ts';
import { clearestScreening, type FindingWhole } from './finding.presenter.ts';
import { FindingRepository } from './finding.repository.ts';
import { VerificationRepository } from './verification.repository.ts';

/** What findings take from the other features. */
export interface FindingNeighbours {
  /** The seats of a position, ranked by what the screenings show. */
  assessSeats: (
    positionId: number,
    screenings: readonly Screening[],
  ) => Promise<SeatAssessmentsResponse>;
  inspectionsOf: (findingId: number) => Promise<InspectionListItem[]>;
}

/** Findings and the lead's decisions on them. */
export class FindingService {
  private readonly database: Database;
  private readonly neighbours: FindingNeighbours;
  private readonly now: () => Date;

  constructor(
    database: Database,
    neighbours: FindingNeighbours,
    now: () => Date = () => new Date(),
  ) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  async list(principal: SitePrincipal, query: FindingListQuery) {
    const repository = new FindingRepository(this.database.db);
    const ownerUserId = principal.role === 'owner' ? principal.userId : null;
    const today = dayPastEverywhere(this.now());
    const { rows, total } = await repository.list(principal.siteId, ownerUserId, query, today);
    const ids = rows.map((finding) => finding.id);
    const [links, surveyCounts] = await Promise.all([
      repository.screeningsOf(ids),
      repository.surveyCounts(ids),
    ]);
    const linksOf = new Map<number, FindingScreening[]>();
    for (const link of links) {
      const known = linksOf.get(link.findingId);
      if (known) known.push(link);
      else linksOf.set(link.findingId, [link]);
    }
    return {
      rows: rows.map((finding) => ({
        finding,
        links: linksOf.get(finding.id) ?? [],
        monitoring: monitoringOf(finding, surveyCounts.get(finding.id) ?? 0, today),
      })),
      total,
    };
  }

  async whole(principal: SitePrincipal, findingId: number): Promise<FindingWhole> {
    const finding = await this.seen(principal, findingId);
    const repository = new FindingRepository(this.database.db);
    const [links, history, inspections, surveyCounts] = await Promise.all([
      repository.screeningsOf([findingId]),
      repository.historyOf(findingId),
      this.neighbours.inspectionsOf(findingId),
      repository.surveyCounts([findingId]),
    ]);
    const seats = await this.neighbours.assessSeats(finding.bearingPositionId, screeningsOf(links));
    const verification = await this.verificationOf(finding, screeningsOf(links));
    const monitoring = monitoringOf(
      finding,
      surveyCounts.get(findingId) ?? 0,
      dayPastEverywhere(this.now()),
    );
    return { finding, links, history, seats, inspections, verification, monitoring };
  }

  private async verificationOf(finding: Finding, linked: readonly Screening[]) {
    if (!verifiedStates.includes(finding.state)) return null;
    const repository = new VerificationRepository(this.database.db);
    const repairedAt = await repository.repairedAt(finding.id);
    if (repairedAt === null) return null;
    const day = repairedAt.toISOString().slice(0, 10);
    const later = await repository.screeningsFrom(finding.bearingPositionId, day);
    return verifyFinding(finding, repairedAt, linked, later);
  }

  async decide(
    principal: SitePrincipal,
    findingId: number,
    request: DecideFindingRequest,
  ): Promise<FindingWhole> {
    await this.seen(principal, findingId);
    const now = this.now();
    const { monitorUntilOn = null, monitorSurveys = null } = request;
    if (monitorUntilOn !== null && monitorUntilOn < dayPastEverywhere(now)) {
      throw new AppError('validation', 'The day lies in the past.', {
        fields: [{ path: 'monitorUntilOn', message: 'The day lies in the past.' }],
      });
    }
    await this.database.transaction((db) =>
      moveFinding(
        db,
        {
          principal,
          findingId,
          event: request.action,
          reason: request.reason,
          version: request.version,
          monitor: { untilOn: monitorUntilOn, surveys: monitorSurveys },
        },
        now,
      ),
    );
    return this.whole(principal, findingId);
  }

  /** The finding behind an inspection: the row, and the screenings that show it. */
  async background(siteId: number, findingId: number) {
    const repository = new FindingRepository(this.database.db);
    const [finding, links] = await Promise.all([
      repository.find(siteId, findingId),
      repository.screeningsOf([findingId]),
    ]);
    if (finding === null) throw notFound('finding');
    return { finding, screenings: screeningsOf(links), clearest: clearestScreening(links) };
  }

  private async seen(principal: SitePrincipal, findingId: number): Promise<Finding> {
    const finding = await new FindingRepository(this.database.db).find(principal.siteId, findingId);
    if (finding === null || !maySeeFinding(principal, finding)) throw notFound('finding');
    return finding;
  }
}

const screeningsOf = (links: readonly FindingScreening[]): Screening[] =>
  links.flatMap(({ screening }) => (screening ? [screening] : []));
