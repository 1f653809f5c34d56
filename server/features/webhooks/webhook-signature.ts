import { createHmac } from 'node:crypto';

export const signatureHeader = 'Fretline-Signature';
export const timestampHeader = 'Fretline-Timestamp';

/**
 * HMAC-SHA256, hexadecimal, over the timestamp header (seconds since 1970), a full stop and the body
 * as sent. With the time inside, a receiver can refuse an old message that somebody sends again.
 */
export const webhookSignature = (secret: string, timestampS: number, body: string): string =>
  createHmac('sha256', secret).update(`${timestampS}.${body}`).digest('hex');
