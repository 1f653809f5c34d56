import { request as requestHttp } from 'node:http';
import { request as requestHttps } from 'node:https';
import { publicLookup, refuseInnerHost } from './allowed-target.ts';
import { signatureHeader, timestampHeader, webhookSignature } from './webhook-signature.ts';

const timeoutMs = 10_000;

export interface WebhookPost {
  url: string;
  secret: string;
  body: string;
  at: Date;
  allowsInnerTargets: boolean;
}

/**
 * Posts once, follows no redirect (it could lead inside) and reads nothing but the status.
 *
 * @throws {Error} refused, not reached, too slow, or answered by anything but 2xx
 */
export async function postWebhook(post: WebhookPost): Promise<void> {
  const url = new URL(post.url);
  if (!post.allowsInnerTargets) refuseInnerHost(url);
  const timestampS = Math.floor(post.at.getTime() / 1000);
  const request = url.protocol === 'https:' ? requestHttps : requestHttp;
  const status = await new Promise<number>((resolve, reject) => {
    const sent = request(
      url,
      {
        method: 'POST',
        // A connection of its own: a kept one would pass the look-up by.
        agent: false,
        timeout: timeoutMs,
        ...(post.allowsInnerTargets ? {} : { lookup: publicLookup }),
        headers: {
          'content-type': 'application/json; charset=utf-8',
          'content-length': Buffer.byteLength(post.body),
          'user-agent': 'Fretline',
          [timestampHeader]: String(timestampS),
          [signatureHeader]: webhookSignature(post.secret, timestampS, post.body),
        },
      },
      (answer) => {
        answer.resume();
        resolve(answer.statusCode ?? 0);
        sent.destroy();
      },
    );
    sent.on('timeout', () => sent.destroy(new Error(`no answer within ${timeoutMs / 1000} s`)));
    sent.on('error', reject);
    sent.end(post.body);
  });
  if (status < 200 || status > 299) throw new Error(`The receiver answered ${status}.`);
}
