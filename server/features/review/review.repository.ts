import type { SelectQueryBuilder } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { BearingPosition } from '#server/db/entities/bearing-position.entity.ts';
import { Screening } from '#server/db/entities/screening.entity.ts';
import type { ReviewDecision, ReviewQueueQuery } from '#shared/contracts/review.ts';

/** Screenings as the review desk reads and decides them. */
export class ReviewRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  /** One page of the queue: what waits worst first, what is decided newest first. */
  async queue(siteId: number, query: ReviewQueueQuery) {
    const found = this.latest(siteId);
    if (query.surveyId !== undefined) {
      found.andWhere('waveform.surveyId = :surveyId', { surveyId: query.surveyId });
    }
    if (query.verdict !== undefined) {
      found.andWhere('screening.verdict = :verdict', { verdict: query.verdict });
    }
    if (query.show === 'open') {
      found.andWhere('screening.decision IS NULL').andWhere("screening.verdict <> 'none'");
    } else {
      found.andWhere('screening.decision IS NOT NULL');
    }
    const total = await found.clone().getCount();
    if (query.show === 'open') {
      found
        .addSelect("FIELD(screening.verdict, 'likely', 'suspected', 'retake')", 'verdict_rank')
        .orderBy('verdict_rank', 'ASC')
        .addOrderBy('screening.score', 'DESC')
        .addOrderBy('screening.id', 'ASC');
    } else {
      found.orderBy('screening.decidedAt', 'DESC').addOrderBy('screening.id', 'DESC');
    }
    const rows = await found
      .limit(query.pageSize)
      .offset((query.page - 1) * query.pageSize)
      .getMany();
    return { rows, total };
  }

  /** Flags that nobody has decided on. */
  countOpen(siteId: number): Promise<number> {
    return this.latest(siteId)
      .andWhere('screening.decision IS NULL')
      .andWhere("screening.verdict <> 'none'")
      .getCount();
  }

  /** The screening with where it was taken, if it belongs to the site. */
  find(siteId: number, screeningId: number): Promise<Screening | null> {
    return this.joined(siteId).andWhere('screening.id = :screeningId', { screeningId }).getOne();
  }

  /** Holds the position's row: accepting at one position happens one after the other. */
  async lockPosition(positionId: number): Promise<void> {
    await this.db.findOneOrFail(BearingPosition, {
      where: { id: positionId },
      select: { id: true },
      lock: { mode: 'pessimistic_write' },
    });
  }

  /** Reads the screening as it is now and keeps others from deciding on it meanwhile. */
  lockScreening(screeningId: number): Promise<Screening | null> {
    return this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .leftJoinAndSelect('screening.decidedBy', 'decidedBy')
      .where('screening.id = :screeningId', { screeningId })
      .setLock('pessimistic_write')
      .getOne();
  }

  async writeDecision(
    screeningId: number,
    decision: {
      decision: ReviewDecision | null;
      decisionReason: string | null;
      decidedByUserId: number | null;
      decidedAt: Date | null;
    },
  ): Promise<void> {
    await this.db.update(Screening, { id: screeningId }, decision);
  }

  /** Screenings of a waveform's latest run; an earlier run has been superseded. */
  private latest(siteId: number): SelectQueryBuilder<Screening> {
    return this.joined(siteId).andWhere('waveform.screeningRun = screening.run');
  }

  private joined(siteId: number): SelectQueryBuilder<Screening> {
    return this.db
      .createQueryBuilder(Screening, 'screening')
      .innerJoinAndSelect('screening.waveform', 'waveform')
      .innerJoinAndSelect('waveform.survey', 'survey')
      .innerJoinAndSelect('waveform.measuringPoint', 'point')
      .innerJoinAndSelect('point.bearingPosition', 'position')
      .innerJoinAndSelect('position.machine', 'machine')
      .leftJoinAndSelect('screening.decidedBy', 'decidedBy')
      .where('machine.siteId = :siteId', { siteId });
  }
}
