import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { AssignInspectionRequest } from '#shared/contracts/finding.ts';
import type {
  InspectionListItem,
  InspectionListQuery,
  InspectionReport,
} from '#shared/contracts/inspection.ts';
import { AssignInspection } from './assign-inspection.ts';
import { fitRecordsOf } from './inspection-fit-records.ts';
import { cancelledMail, closedMail, mailFactsOf, reportedMail } from './inspection-mails.ts';
import type { InspectionEvent, InspectionNeighbours } from './inspection-neighbours.ts';
import { InspectionPhotoRepository } from './inspection-photo.repository.ts';
import { inspectionSummary } from './inspection-summary.ts';
import { isAssignee, maySeeInspection } from './inspection.policy.ts';
import { presentInspectionItem, type InspectionWhole } from './inspection.presenter.ts';
import { InspectionRepository } from './inspection.repository.ts';
import { moveInspection } from './move-inspection.ts';
import { refuseField } from './refuse-field.ts';
import { reportFaults } from './report-checks.ts';
import { todayAnywhere } from './today-anywhere.ts';

/** What comes of a report: see finding-transitions for what each event does. */
function eventOf(report: InspectionReport): InspectionEvent {
  if (report.repaired) return 'inspection-repaired';
  return report.outcome === 'not loose' ? 'inspection-not-loose' : 'inspection-unsettled';
}

/** Fit inspections: assigned by the lead, done by the asset owner, closed by the lead. */
export class InspectionService {
  private readonly database: Database;
  private readonly neighbours: InspectionNeighbours;
  private readonly now: () => Date;
  private readonly assigning: AssignInspection;

  constructor(
    database: Database,
    neighbours: InspectionNeighbours,
    now: () => Date = () => new Date(),
  ) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
    this.assigning = new AssignInspection(database, neighbours, now);
  }

  async list(principal: SitePrincipal, query: InspectionListQuery) {
    const ownerUserId = principal.role === 'owner' ? principal.userId : null;
    const { rows, total } = await new InspectionRepository(this.database.db).list(
      principal.siteId,
      ownerUserId,
      query,
    );
    return { items: rows.map((row) => presentInspectionItem(row, this.today())), total };
  }

  async ofFinding(findingId: number): Promise<InspectionListItem[]> {
    const rows = await new InspectionRepository(this.database.db).ofFinding(findingId);
    return rows.map((row) => presentInspectionItem(row, this.today()));
  }

  async whole(principal: SitePrincipal, inspectionId: number): Promise<InspectionWhole> {
    const inspection = await this.seen(principal, inspectionId);
    const { finding, screenings, clearest } = await this.neighbours.findingBackground(
      principal.siteId,
      inspection.findingId,
    );
    return {
      inspection,
      summary: inspectionSummary(finding.bearingPosition?.name ?? '', clearest, screenings.length),
      seats: await this.neighbours.assessSeats(finding.bearingPositionId, screenings),
      photos: await new InspectionPhotoRepository(this.database.db).ofInspection(inspectionId),
      today: this.today(),
    };
  }

  async assign(principal: SitePrincipal, findingId: number, request: AssignInspectionRequest) {
    return this.whole(principal, await this.assigning.assign(principal, findingId, request));
  }

  async accept(principal: SitePrincipal, inspectionId: number, version: number) {
    const inspection = await this.seen(principal, inspectionId);
    this.refuseOthers(principal, inspection);
    await this.database.transaction((db) =>
      moveInspection(
        db,
        { principal, inspection, action: 'accept', version, reason: '' },
        this.now(),
      ),
    );
    return this.whole(principal, inspectionId);
  }

  async report(
    principal: SitePrincipal,
    inspectionId: number,
    version: number,
    report: InspectionReport,
  ) {
    const inspection = await this.seen(principal, inspectionId);
    this.refuseOthers(principal, inspection);
    const { finding } = inspection;
    if (!finding) throw notFound('inspection');
    await this.checkReport(finding.bearingPositionId, report);
    const now = this.now();
    await this.database.transaction(async (db) => {
      await moveInspection(
        db,
        {
          principal,
          inspection,
          action: 'report',
          version,
          reason: '',
          changes: { report, reportedAt: now },
        },
        now,
      );
      await new InspectionRepository(db).addFitRecords(
        fitRecordsOf(report, {
          inspectionId,
          bearingPositionId: finding.bearingPositionId,
          recordedByUserId: principal.userId,
          now,
        }),
      );
      await this.neighbours.moveFinding(
        db,
        {
          principal,
          findingId: inspection.findingId,
          event: eventOf(report),
          reason: report.workDone,
        },
        now,
      );
      const { assignedBy } = inspection;
      if (!assignedBy) return;
      await this.neighbours.addMail(
        db,
        {
          ...reportedMail(
            mailFactsOf(this.neighbours.publicUrl(), principal.siteId, inspection),
            principal.name,
            report,
          ),
          kind: 'reported',
          siteId: principal.siteId,
          to: { userId: assignedBy.id, email: assignedBy.email },
          occasion: `inspection:${inspectionId}:reported`,
        },
        now,
      );
    });
    return this.whole(principal, inspectionId);
  }

  async close(principal: SitePrincipal, inspectionId: number, version: number, reason: string) {
    const inspection = await this.seen(principal, inspectionId);
    const now = this.now();
    await this.database.transaction(async (db) => {
      await moveInspection(db, { principal, inspection, action: 'close', version, reason }, now);
      const { assignee } = inspection;
      if (!assignee) return;
      const facts = mailFactsOf(this.neighbours.publicUrl(), principal.siteId, inspection);
      await this.neighbours.addMail(
        db,
        {
          ...closedMail(facts, principal.name, reason),
          kind: 'closed',
          siteId: principal.siteId,
          to: { userId: assignee.id, email: assignee.email },
          occasion: `inspection:${inspectionId}:closed`,
        },
        now,
      );
    });
    return this.whole(principal, inspectionId);
  }

  async cancel(principal: SitePrincipal, inspectionId: number, version: number, reason: string) {
    if (reason === '') refuseField('reason', 'Give a reason.');
    const inspection = await this.seen(principal, inspectionId);
    const now = this.now();
    await this.database.transaction(async (db) => {
      await moveInspection(
        db,
        { principal, inspection, action: 'cancel', version, reason },
        this.now(),
      );
      await this.neighbours.moveFinding(
        db,
        { principal, findingId: inspection.findingId, event: 'inspection-cancelled', reason },
        now,
      );
      const { assignee } = inspection;
      if (!assignee) return;
      await this.neighbours.addMail(
        db,
        {
          ...cancelledMail(
            mailFactsOf(this.neighbours.publicUrl(), principal.siteId, inspection),
            principal.name,
            reason,
          ),
          kind: 'cancelled',
          siteId: principal.siteId,
          to: { userId: assignee.id, email: assignee.email },
          occasion: `inspection:${inspectionId}:cancelled`,
        },
        now,
      );
    });
    return this.whole(principal, inspectionId);
  }

  private async checkReport(positionId: number, report: InspectionReport): Promise<void> {
    const { seats } = await this.neighbours.assessSeats(positionId, []);
    if (seats.length === 0 && report.seats.length > 0) {
      refuseField('report.seats', 'A plain bearing has no seats to report on.');
    }
    const nominal = (name: 'shaft' | 'housing') =>
      seats.find(({ seat }) => seat === name)?.nominalMm ?? null;
    const faults = reportFaults(report, { shaft: nominal('shaft'), housing: nominal('housing') });
    const first = faults[0];
    if (first !== undefined) throw new AppError('validation', first.message, { fields: faults });
  }

  private refuseOthers(principal: SitePrincipal, inspection: Inspection): void {
    if (isAssignee(principal, inspection)) return;
    throw new AppError(
      'forbidden',
      `This inspection is assigned to ${inspection.assignee?.name ?? 'somebody else'}.`,
    );
  }

  private async seen(principal: SitePrincipal, inspectionId: number): Promise<Inspection> {
    const inspection = await new InspectionRepository(this.database.db).find(
      principal.siteId,
      inspectionId,
    );
    if (inspection === null || !maySeeInspection(principal, inspection)) {
      throw notFound('inspection');
    }
    return inspection;
  }

  private today(): string {
    return todayAnywhere(this.now());
  }
}
