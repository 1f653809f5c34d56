import type { SitePrincipal } from '#server/auth/principal.ts';
import type { Database, Db } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type { PersonalMail } from '#server/mail/mailer.ts';
import { OutboxRepository } from '#server/mail/outbox.repository.ts';
import type { ChangeDueDateRequest, ReassignInspectionRequest } from '#shared/contracts/desk.ts';
import { ownerAt } from './assign-inspection.ts';
import { assignedMail, mailFactsOf } from './inspection-mails.ts';
import { dueChangedMail, handedOnMail } from './change-mails.ts';
import type { InspectionNeighbours } from './inspection-neighbours.ts';
import { inspectionSummary } from './inspection-summary.ts';
import { InspectionRepository } from './inspection.repository.ts';
import { changedMeanwhile, moveInspection, recordInspectionActivity } from './move-inspection.ts';
import { refuseField } from './refuse-field.ts';
import { reminderMail } from './reminder-mails.ts';
import { todayAnywhere } from './today-anywhere.ts';

const inWork: readonly Inspection['state'][] = ['assigned', 'accepted'];

/** What the lead changes of a task under way: whose it is, by when, and a word to its owner. */
export class ChangeInspection {
  private readonly database: Database;
  private readonly neighbours: InspectionNeighbours;
  private readonly now: () => Date;

  constructor(
    database: Database,
    neighbours: InspectionNeighbours,
    now: () => Date = () => new Date(),
  ) {
    this.database = database;
    this.neighbours = neighbours;
    this.now = now;
  }

  /** The new owner gets the whole task by e-mail, the former one that it is no longer theirs. */
  async reassign(
    principal: SitePrincipal,
    inspectionId: number,
    { version, assigneeUserId, dueOn, reason }: ReassignInspectionRequest,
  ): Promise<void> {
    const inspection = await this.seen(principal, inspectionId);
    const former = inspection.assignee;
    if (assigneeUserId === inspection.assigneeUserId) {
      refuseField('assigneeUserId', `${former?.name ?? 'This person'} has the task already.`);
    }
    // A day that has passed meanwhile may stay as it is; a new one may not lie in the past.
    if (dueOn !== inspection.dueOn) this.refusePast(dueOn);
    const assignee = await ownerAt(this.neighbours, principal.siteId, assigneeUserId);
    const { finding, screenings, clearest } = await this.neighbours.findingBackground(
      principal.siteId,
      inspection.findingId,
    );
    const seats = await this.neighbours.assessSeats(finding.bearingPositionId, screenings);
    const position = finding.bearingPosition?.name ?? '';
    const summary = inspectionSummary(position, clearest, screenings.length);
    const now = this.now();
    await this.database.transaction(async (db) => {
      const changes = { assigneeUserId, dueOn, assignedAt: now };
      const step = { principal, inspection, action: 'reassign', version, reason, changes } as const;
      await moveInspection(db, step, now);
      const changed = { ...inspection, ...changes, state: 'assigned' as const };
      const text = assignedMail(this.factsOf(principal, changed), assignee.name, summary, seats);
      const occasion = `inspection:${inspectionId}:assigned:${version + 1}`;
      await this.tell(db, principal, { ...text, kind: 'assigned', to: assignee, occasion });
      if (!former) return;
      await this.tell(db, principal, {
        ...handedOnMail(this.factsOf(principal, changed), principal.name, assignee.name, reason),
        kind: 'reassigned',
        to: { userId: former.id, email: former.email },
        occasion: `inspection:${inspectionId}:handed-on:${version + 1}`,
      });
    });
  }

  async changeDueDate(
    principal: SitePrincipal,
    inspectionId: number,
    { version, dueOn, reason }: ChangeDueDateRequest,
  ): Promise<void> {
    const inspection = await this.seen(principal, inspectionId);
    this.refuseDone(inspection);
    if (dueOn === inspection.dueOn) refuseField('dueOn', 'This is the due date already.');
    this.refusePast(dueOn);
    const { assignee, findingId } = inspection;
    const now = this.now();
    await this.database.transaction(async (db) => {
      const isWritten =
        inspection.version === version &&
        (await new InspectionRepository(db).update(inspectionId, version, { dueOn }));
      if (!isWritten) throw changedMeanwhile(inspection);
      const details = { findingId, from: inspection.dueOn, to: dueOn, reason };
      await recordInspectionActivity(db, principal, inspectionId, 'due-changed', details, now);
      if (!assignee) return;
      const facts = this.factsOf(principal, { ...inspection, dueOn });
      await this.tell(db, principal, {
        ...dueChangedMail(facts, principal.name, inspection.dueOn, reason),
        kind: 'reassigned',
        to: { userId: assignee.id, email: assignee.email },
        occasion: `inspection:${inspectionId}:due-changed:${version + 1}`,
      });
    });
  }

  /** Once a day for each task: more would be noise. */
  async remind(principal: SitePrincipal, inspectionId: number): Promise<void> {
    const inspection = await this.seen(principal, inspectionId);
    this.refuseDone(inspection);
    const { assignee } = inspection;
    if (!assignee) throw notFound('inspection');
    const now = this.now();
    const day = now.toISOString().slice(0, 10);
    const occasion = `inspection:${inspectionId}:reminder:${day}:${assignee.id}`;
    await this.database.transaction(async (db) => {
      if ((await new OutboxRepository(db).written([occasion])).size > 0) {
        throw new AppError('wrong_state', `${assignee.name} was reminded of this today already.`);
      }
      const isSent = await this.tell(db, principal, {
        ...reminderMail(this.factsOf(principal, inspection), principal.name),
        kind: 'reminder',
        to: { userId: assignee.id, email: assignee.email },
        occasion,
      });
      if (!isSent) {
        const message = `${assignee.name} has switched reminders off. Call, or hand the task on.`;
        throw new AppError('wrong_state', message);
      }
      await recordInspectionActivity(db, principal, inspectionId, 'reminded', {}, now);
    });
  }

  private tell(db: Db, { siteId }: SitePrincipal, mail: Omit<PersonalMail, 'siteId'>) {
    return this.neighbours.addMail(db, { ...mail, siteId }, this.now());
  }

  private factsOf({ siteId }: SitePrincipal, inspection: Inspection) {
    return mailFactsOf(this.neighbours.publicUrl(), siteId, inspection);
  }

  private refusePast(dueOn: string): void {
    if (dueOn < todayAnywhere(this.now())) refuseField('dueOn', 'The due date lies in the past.');
  }

  private refuseDone({ state }: Inspection): void {
    if (inWork.includes(state)) return;
    throw new AppError(
      'wrong_state',
      `This inspection is ${state}; nothing is to be done by a day.`,
    );
  }

  private async seen({ siteId }: SitePrincipal, inspectionId: number): Promise<Inspection> {
    const repository = new InspectionRepository(this.database.db);
    const inspection = await repository.find(siteId, inspectionId);
    if (inspection === null) throw notFound('inspection');
    return inspection;
  }
}
