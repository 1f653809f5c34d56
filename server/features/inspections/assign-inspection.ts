import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { AssignInspectionRequest } from '#shared/contracts/finding.ts';
import { assignedMail, mailFactsOf } from './inspection-mails.ts';
import type { InspectionNeighbours } from './inspection-neighbours.ts';
import { inspectionSummary } from './inspection-summary.ts';
import { InspectionRepository } from './inspection.repository.ts';
import { recordInspectionActivity } from './move-inspection.ts';
import { refuseField } from './refuse-field.ts';
import { todayAnywhere } from './today-anywhere.ts';

/** Assigning: the task, the finding's step and the e-mail are written together or not at all. */
export class AssignInspection {
  private readonly database: Database;
  private readonly neighbours: InspectionNeighbours;
  private readonly now: () => Date;

  constructor(database: Database, neighbours: InspectionNeighbours, now: () => Date) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  /** @returns id of the inspection */
  async assign(
    principal: SitePrincipal,
    findingId: number,
    request: AssignInspectionRequest,
  ): Promise<number> {
    const background = await this.neighbours.findingBackground(principal.siteId, findingId);
    const { finding, screenings, clearest } = background;
    if (request.dueOn < todayAnywhere(this.now()))
      refuseField('dueOn', 'The due date lies in the past.');
    const isPlain = finding.bearingPosition?.kind === 'plain';
    if (isPlain && (request.checkShaftSeat || request.checkHousingSeat)) {
      refuseField('checkShaftSeat', 'A plain bearing has no seats; ask for the check in place.');
    }
    const assignee = await ownerAt(this.neighbours, principal.siteId, request.assigneeUserId);
    const seats = await this.neighbours.assessSeats(finding.bearingPositionId, screenings);
    const summary = inspectionSummary(
      finding.bearingPosition?.name ?? '',
      clearest,
      screenings.length,
    );
    const now = this.now();
    const { version, ...task } = request;
    return this.database.transaction(async (db) => {
      const repository = new InspectionRepository(db);
      await this.neighbours.moveFinding(
        db,
        { principal, findingId, event: 'assign', reason: task.instructions ?? '', version },
        now,
      );
      const row = {
        ...task,
        findingId,
        state: 'assigned' as const,
        assignedByUserId: principal.userId,
        assignedAt: now,
      };
      const id = await repository.insert(row);
      await repository.addStateChange({
        findingId,
        inspectionId: id,
        fromState: null,
        toState: 'assigned',
        reason: null,
        changedByUserId: principal.userId,
        changedAt: now,
      });
      const inspection = { ...row, id, finding } as Inspection;
      const mail = assignedMail(
        mailFactsOf(this.neighbours.publicUrl(), principal.siteId, inspection),
        assignee.name,
        summary,
        seats,
      );
      await this.neighbours.addMail(
        db,
        {
          ...mail,
          kind: 'assigned',
          siteId: principal.siteId,
          to: assignee,
          occasion: `inspection:${id}:assigned`,
        },
        now,
      );
      await recordInspectionActivity(
        db,
        principal,
        id,
        'assigned',
        { findingId, assigneeUserId: assignee.userId, dueOn: task.dueOn },
        now,
      );
      return id;
    });
  }
}

/** Refuses at its field whoever is no asset owner of the site. */
export async function ownerAt(
  neighbours: Pick<InspectionNeighbours, 'membersOf'>,
  siteId: number,
  userId: number,
) {
  const members = await neighbours.membersOf(siteId);
  const member = members.find((one) => one.userId === userId);
  if (member?.role !== 'owner') {
    refuseField('assigneeUserId', 'Choose an asset owner of this site.');
  }
  return member;
}
