import { createHmac, timingSafeEqual } from 'node:crypto';
import { mailKind, type MailKind } from '#shared/contracts/mail.ts';

const purpose = 'unsubscribe';

const signatureOf = (payload: string, secret: string) =>
  createHmac('sha256', secret).update(`${purpose}:${payload}`).digest('base64url');

/** Names one person and one kind of mail; good for switching that kind off and nothing else. */
export function signUnsubscribeToken(userId: number, kind: MailKind, secret: string): string {
  const payload = `${userId}.${kind}`;
  return `${payload}.${signatureOf(payload, secret)}`;
}

/** Null where the token isn't one of ours. */
export function readUnsubscribeToken(
  token: string,
  secret: string,
): { userId: number; kind: MailKind } | null {
  const [userId = '', kindName = '', signature = '', ...rest] = token.split('.');
  const kind = mailKind.safeParse(kindName);
  if (!/^[1-9]\d{0,9}$/.test(userId) || !kind.success || rest.length > 0) return null;
  const right = Buffer.from(signatureOf(`${userId}.${kindName}`, secret));
  const given = Buffer.from(signature);
  if (given.length !== right.length || !timingSafeEqual(given, right)) return null;
  return { userId: Number(userId), kind: kind.data };
}
