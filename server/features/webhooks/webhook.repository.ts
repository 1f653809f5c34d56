import { In, IsNull, LessThanOrEqual } from 'typeorm';
import type { Db } from '#server/db/database.ts';
import { isDuplicateKey } from '#server/db/duplicate-key.ts';
import { Inspection } from '#server/db/entities/inspection.entity.ts';
import { StateChange } from '#server/db/entities/state-change.entity.ts';
import { WebhookDelivery } from '#server/db/entities/webhook-delivery.entity.ts';
import { Webhook } from '#server/db/entities/webhook.entity.ts';

/** Where sites are told, and what they are told. */
export class WebhookRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  of(siteId: number): Promise<Webhook | null> {
    return this.db.findOneBy(Webhook, { siteId });
  }

  all(): Promise<Webhook[]> {
    return this.db.find(Webhook);
  }

  async save(webhook: Pick<Webhook, 'siteId' | 'url' | 'secret' | 'since'>): Promise<void> {
    await this.db.upsert(Webhook, webhook, ['siteId']);
  }

  /** Takes the address away, and what was still to be told there. */
  async remove(siteId: number): Promise<void> {
    await this.db.delete(Webhook, { siteId });
    await this.db.delete(WebhookDelivery, { siteId, state: In(['waiting', 'failed']) });
  }

  /** Changes of inspections since the webhook was set that have no delivery yet, oldest first. */
  untold({ siteId, since }: Webhook, limit: number): Promise<StateChange[]> {
    return this.db
      .createQueryBuilder(StateChange, 'step')
      .innerJoin('step.finding', 'finding')
      .leftJoin(WebhookDelivery, 'delivery', 'delivery.state_change_id = step.id')
      .where('finding.siteId = :siteId', { siteId })
      .andWhere('step.inspectionId IS NOT NULL')
      .andWhere('step.changedAt >= :since', { since })
      .andWhere('delivery.id IS NULL')
      .orderBy('step.id', 'ASC')
      .limit(limit)
      .getMany();
  }

  inspections(ids: readonly number[]): Promise<Inspection[]> {
    return this.db.find(Inspection, {
      where: { id: In(ids) },
      relations: { finding: { bearingPosition: { machine: true } } },
    });
  }

  /** One delivery for each change, whichever server finds it first. */
  async add(
    delivery: Pick<WebhookDelivery, 'siteId' | 'stateChangeId' | 'inspectionId' | 'body'>,
    now: Date,
  ): Promise<void> {
    try {
      await this.db.insert(WebhookDelivery, {
        ...delivery,
        state: 'waiting',
        attempts: 0,
        nextAttemptAt: now,
        lastError: null,
        createdAt: now,
        sentAt: null,
      });
    } catch (error) {
      if (!isDuplicateKey(error)) throw error;
    }
  }

  due(now: Date, limit: number): Promise<WebhookDelivery[]> {
    return this.db.find(WebhookDelivery, {
      where: { state: 'waiting', nextAttemptAt: LessThanOrEqual(now), sentAt: IsNull() },
      order: { id: 'ASC' },
      take: limit,
    });
  }

  /** Takes a delivery for one attempt; false if another process took it. */
  async claim({ id, attempts }: WebhookDelivery, until: Date): Promise<boolean> {
    const result = await this.db.update(
      WebhookDelivery,
      { id, state: 'waiting', attempts },
      { attempts: attempts + 1, nextAttemptAt: until },
    );
    return result.affected === 1;
  }

  async update(id: number, changes: Partial<WebhookDelivery>): Promise<void> {
    await this.db.update(WebhookDelivery, { id }, changes);
  }

  newest(siteId: number, limit: number): Promise<WebhookDelivery[]> {
    return this.db.find(WebhookDelivery, {
      where: { siteId },
      order: { id: 'DESC' },
      take: limit,
    });
  }

  /** False where there is no such delivery, or it has arrived. */
  async sendAgain(siteId: number, id: number, now: Date): Promise<boolean> {
    const result = await this.db.update(
      WebhookDelivery,
      { id, siteId, state: In(['waiting', 'failed']) },
      { state: 'waiting', attempts: 0, nextAttemptAt: now },
    );
    return result.affected === 1;
  }
}
