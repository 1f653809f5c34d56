import type { SitePrincipal } from '#server/auth/principal.ts';
import { recordActivity } from '#server/db/activity.repository.ts';
import type { Database } from '#server/db/database.ts';
import type { WebhookDelivery } from '#server/db/entities/webhook-delivery.entity.ts';
import { AppError, notFound } from '#server/http/app-error.ts';
import {
  webhookBody,
  type SetWebhookRequest,
  type WebhookDeliveryItem,
  type WebhookResponse,
} from '#shared/contracts/webhook.ts';
import { refuseInnerHost, TargetRefused } from './allowed-target.ts';
import { WebhookRepository } from './webhook.repository.ts';

const deliveriesShown = 100;

const presentDelivery = (delivery: WebhookDelivery): WebhookDeliveryItem => ({
  id: delivery.id,
  inspectionId: delivery.inspectionId,
  toState: webhookBody.shape.toState.parse(
    (JSON.parse(delivery.body) as { toState: unknown }).toState,
  ),
  state: delivery.state,
  attempts: delivery.attempts,
  lastError: delivery.lastError,
  createdAt: delivery.createdAt.toISOString(),
  sentAt: delivery.sentAt?.toISOString() ?? null,
  nextAttemptAt: delivery.state === 'waiting' ? delivery.nextAttemptAt.toISOString() : null,
});

/** The lead connects the plant's own maintenance system. */
export class WebhookService {
  private readonly database: Database;
  private readonly allowsInnerTargets: boolean;
  private readonly now: () => Date;

  constructor(database: Database, allowsInnerTargets: boolean, now: () => Date = () => new Date()) {
    this.database = database;
    this.allowsInnerTargets = allowsInnerTargets;
    this.now = now;
  }

  async standing({ siteId }: SitePrincipal): Promise<WebhookResponse> {
    const webhooks = new WebhookRepository(this.database.db);
    const webhook = await webhooks.of(siteId);
    return {
      url: webhook?.url ?? null,
      since: webhook?.since.toISOString() ?? null,
      deliveries: (await webhooks.newest(siteId, deliveriesShown)).map(presentDelivery),
    };
  }

  async set(principal: SitePrincipal, request: SetWebhookRequest): Promise<WebhookResponse> {
    const { siteId, userId } = principal;
    this.checkTarget(request.url);
    const now = this.now();
    await this.database.transaction(async (db) => {
      const webhooks = new WebhookRepository(db);
      const present = await webhooks.of(siteId);
      const secret = request.secret ?? present?.secret;
      if (secret === undefined) refuse('secret', 'Enter a secret that the receiver knows too.');
      // With a corrected address what has not arrived yet still comes, and nothing a second time.
      const since = present?.since ?? now;
      await webhooks.save({ siteId, url: request.url, secret, since });
      const details = { url: request.url };
      const entry = { siteId, userId, action: 'webhook.set', objectType: 'site', details };
      await recordActivity(db, { ...entry, objectId: siteId }, now);
    });
    return this.standing(principal);
  }

  async remove({ siteId, userId }: SitePrincipal): Promise<void> {
    await this.database.transaction(async (db) => {
      await new WebhookRepository(db).remove(siteId);
      const entry = { siteId, userId, action: 'webhook.removed', objectType: 'site' };
      await recordActivity(db, { ...entry, objectId: siteId }, this.now());
    });
  }

  async sendAgain({ siteId }: SitePrincipal, deliveryId: number): Promise<void> {
    const webhooks = new WebhookRepository(this.database.db);
    if (!(await webhooks.sendAgain(siteId, deliveryId, this.now()))) throw notFound('delivery');
  }

  /** What can be told from the address alone; names are checked when they are connected to. */
  private checkTarget(text: string): void {
    const url = new URL(text);
    if (url.username !== '' || url.password !== '') {
      refuse('url', 'Leave name and password out of the address; the signature is the proof.');
    }
    if (this.allowsInnerTargets) return;
    try {
      refuseInnerHost(url);
    } catch (error) {
      if (error instanceof TargetRefused) refuse('url', error.message);
      throw error;
    }
  }
}

function refuse(path: string, message: string): never {
  throw new AppError('validation', message, { fields: [{ path, message }] });
}
