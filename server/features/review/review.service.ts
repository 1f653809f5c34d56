import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database, Db } from '#server/db/database.ts';
import type { Screening } from '#server/db/entities/screening.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import type {
  DecideRequest,
  DecideResponse,
  ReviewDecision,
  ReviewQueueQuery,
} from '#shared/contracts/review.ts';
import { ReviewRepository } from './review.repository.ts';

/** What the findings make of an accepted screening, in the decision's own transaction. */
export interface FindingEvidence {
  /** Makes the position's finding or extends the active one. The caller holds the position's row. */
  take: (
    db: Db,
    evidence: { principal: SitePrincipal; positionId: number; screeningId: number; reason: string },
    now: Date,
  ) => Promise<{ findingId: number; isNew: boolean }>;
  /** Takes the screening out again; refuses where the finding has moved on since. */
  giveBack: (
    db: Db,
    evidence: { principal: SitePrincipal; screeningId: number; since: Date },
    now: Date,
  ) => Promise<void>;
}

const decisionWords: Readonly<Record<ReviewDecision, string>> = {
  accepted: 'accepted this flag',
  rejected: 'rejected this flag',
  retake: 'asked for a retake of this measurement',
};

/** The review desk: the queue of flags and the analyst's decision on each. */
export class ReviewService {
  private readonly database: Database;
  private readonly evidence: FindingEvidence;
  private readonly now: () => Date;

  constructor(database: Database, evidence: FindingEvidence, now: () => Date = () => new Date()) {
    this.database = database;
    this.evidence = evidence;
    this.now = now;
  }

  queue(principal: SitePrincipal, query: ReviewQueueQuery) {
    return new ReviewRepository(this.database.db).queue(principal.siteId, query);
  }

  async decide(
    principal: SitePrincipal,
    screeningId: number,
    request: DecideRequest,
  ): Promise<DecideResponse> {
    const positionId = await this.positionOf(principal, screeningId);
    const now = this.now();
    return this.database.transaction(async (db) => {
      const repository = new ReviewRepository(db);
      // Always position first, then screening: the same order everywhere keeps two decisions from
      // waiting for each other.
      await repository.lockPosition(positionId);
      const screening = await repository.lockScreening(screeningId);
      if (screening === null) throw notFound('screening');
      refuseDecided(screening);
      refuseSuperseded(screening);
      await repository.writeDecision(screeningId, {
        decision: request.decision,
        decisionReason: request.reason === '' ? null : request.reason,
        decidedByUserId: principal.userId,
        decidedAt: now,
      });
      const finding =
        request.decision === 'accepted'
          ? await this.evidence.take(
              db,
              { principal, positionId, screeningId, reason: request.reason },
              now,
            )
          : null;
      await recordActivity(
        db,
        {
          ...entryOf(principal, screeningId),
          action: `screening.${request.decision}`,
          details: { reason: request.reason, findingId: finding?.findingId ?? null },
        },
        now,
      );
      return {
        screeningId,
        decision: request.decision,
        findingId: finding?.findingId ?? null,
        findingIsNew: finding?.isNew ?? false,
      };
    });
  }

  /** Takes back one's own decision, as long as nobody has built on it. */
  async undo(principal: SitePrincipal, screeningId: number): Promise<void> {
    const positionId = await this.positionOf(principal, screeningId);
    const now = this.now();
    await this.database.transaction(async (db) => {
      const repository = new ReviewRepository(db);
      await repository.lockPosition(positionId);
      const screening = await repository.lockScreening(screeningId);
      if (screening === null) throw notFound('screening');
      if (screening.decision === null || screening.decidedAt === null) {
        throw new AppError('wrong_state', 'There is no decision on this screening to take back.');
      }
      if (screening.decidedByUserId !== principal.userId) {
        throw new AppError(
          'conflict',
          `${screening.decidedBy?.name ?? 'Somebody else'} decided on this screening; only they can take it back.`,
        );
      }
      if (screening.decision === 'accepted') {
        await this.evidence.giveBack(
          db,
          { principal, screeningId, since: screening.decidedAt },
          now,
        );
      }
      await repository.writeDecision(screeningId, {
        decision: null,
        decisionReason: null,
        decidedByUserId: null,
        decidedAt: null,
      });
      await recordActivity(
        db,
        {
          ...entryOf(principal, screeningId),
          action: 'screening.decision-undone',
          details: { decision: screening.decision },
        },
        now,
      );
    });
  }

  private async positionOf(principal: SitePrincipal, screeningId: number): Promise<number> {
    const screening = await new ReviewRepository(this.database.db).find(
      principal.siteId,
      screeningId,
    );
    const positionId = screening?.waveform?.measuringPoint?.bearingPositionId;
    if (positionId === undefined) throw notFound('screening');
    return positionId;
  }
}

const entryOf = (principal: SitePrincipal, screeningId: number) => ({
  siteId: principal.siteId,
  userId: principal.userId,
  objectType: 'screening',
  objectId: screeningId,
});

function refuseDecided(screening: Screening): void {
  if (screening.decision === null) return;
  const who = screening.decidedBy?.name ?? 'Somebody';
  const when = screening.decidedAt?.toISOString().slice(0, 16).replace('T', ' ') ?? '';
  throw new AppError(
    'conflict',
    `${who} ${decisionWords[screening.decision]} on ${when} UTC. Your decision was not saved.`,
  );
}

function refuseSuperseded(screening: Screening): void {
  if (screening.waveform?.screeningRun === screening.run) return;
  throw new AppError(
    'wrong_state',
    'The waveform has been screened again since. Decide on its newest screening.',
  );
}
