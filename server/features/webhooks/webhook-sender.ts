import type { Logger } from 'pino';
import type { Database } from '#server/db/database.ts';
import type { Inspection } from '#server/db/entities/inspection.entity.ts';
import type { StateChange } from '#server/db/entities/state-change.entity.ts';
import type { WebhookDelivery } from '#server/db/entities/webhook-delivery.entity.ts';
import type { WebhookBody } from '#shared/contracts/webhook.ts';
import { postWebhook } from './post-webhook.ts';
import { WebhookRepository } from './webhook.repository.ts';

const batchSize = 50;
const claimMs = 60_000;
/** Half a minute, doubled up to an hour, given up after about a day. */
const firstRetryMs = 30_000;
const longestRetryMs = 3_600_000;
const attemptsMax = 30;

export interface WebhookSenderOptions {
  database: Database;
  logger: Logger;
  publicUrl: () => string;
  allowsInnerTargets: boolean;
  now?: () => Date;
}

/**
 * Tells webhooks of changes. A change is known from the record of states, which is written in its
 * own transaction, so nothing is told that did not happen and nothing is missed by a crash.
 */
export class WebhookSender {
  private readonly options: WebhookSenderOptions;

  constructor(options: WebhookSenderOptions) {
    this.options = options;
  }

  /** Writes a delivery for what is new, and tries what is due. */
  async round(): Promise<void> {
    const webhooks = new WebhookRepository(this.options.database.db);
    for (const webhook of await webhooks.all()) {
      const changes = await webhooks.untold(webhook, batchSize);
      const ids = [...new Set(changes.map((change) => change.inspectionId ?? 0))];
      const inspections = new Map(
        (await webhooks.inspections(ids)).map((inspection) => [inspection.id, inspection]),
      );
      for (const change of changes) {
        const inspection = inspections.get(change.inspectionId ?? 0);
        if (inspection === undefined) continue;
        const body = JSON.stringify(this.bodyOf(webhook.siteId, change, inspection));
        const { siteId } = webhook;
        const delivery = { siteId, stateChangeId: change.id, inspectionId: inspection.id, body };
        await webhooks.add(delivery, this.now());
      }
    }
    for (const delivery of await webhooks.due(this.now(), batchSize)) await this.deliver(delivery);
  }

  private async deliver(delivery: WebhookDelivery): Promise<void> {
    const { database, logger, allowsInnerTargets } = this.options;
    const webhooks = new WebhookRepository(database.db);
    const webhook = await webhooks.of(delivery.siteId);
    if (webhook === null) return;
    const isOurs = await webhooks.claim(delivery, new Date(this.now().getTime() + claimMs));
    if (!isOurs) return;
    const { url, secret } = webhook;
    const { id, body } = delivery;
    try {
      await postWebhook({ url, secret, body, at: this.now(), allowsInnerTargets });
      await webhooks.update(id, { state: 'sent', sentAt: this.now(), lastError: null });
    } catch (error) {
      const lastError = error instanceof Error ? error.message : String(error);
      const attempt = delivery.attempts + 1;
      const waitMs = Math.min(firstRetryMs * 2 ** (attempt - 1), longestRetryMs);
      await webhooks.update(
        id,
        attempt >= attemptsMax
          ? { state: 'failed', lastError }
          : { lastError, nextAttemptAt: new Date(this.now().getTime() + waitMs) },
      );
      logger.warn({ deliveryId: id, attempt, error: lastError }, 'a webhook could not be told');
    }
  }

  private bodyOf(siteId: number, change: StateChange, inspection: Inspection): WebhookBody {
    const position = inspection.finding?.bearingPosition;
    return {
      id: change.id,
      event: 'inspection.state-changed',
      changedAt: change.changedAt.toISOString(),
      siteId,
      inspectionId: inspection.id,
      findingId: inspection.findingId,
      fromState: change.fromState,
      toState: change.toState,
      workOrderReference: inspection.workOrderReference,
      machineTag: position?.machine?.tag ?? '',
      positionCode: position?.code ?? '',
      dueOn: inspection.dueOn,
      link: `${this.options.publicUrl()}/sites/${siteId}/inspections/${inspection.id}`,
    };
  }

  private now(): Date {
    return this.options.now?.() ?? new Date();
  }
}
