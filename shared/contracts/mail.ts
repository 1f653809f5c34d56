import { z } from 'zod';

export const outboxStates = ['waiting', 'sent', 'failed'] as const;
export type OutboxState = (typeof outboxStates)[number];

/** A mail in the demo mailbox, as the local fake SMTP server received it. */
export const demoMailResponse = z.object({
  id: z.int(),
  toAddress: z.string(),
  fromAddress: z.string(),
  subject: z.string(),
  textBody: z.string(),
  /** Links found in the text, in order, relative to this product's address. */
  links: z.array(z.string()),
  receivedAt: z.string(),
});
export const demoMailboxResponse = z.object({ mails: z.array(demoMailResponse) });
export type DemoMailboxResponse = z.infer<typeof demoMailboxResponse>;
