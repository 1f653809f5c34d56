import { z } from 'zod';

export const outboxStates = ['waiting', 'sent', 'failed'] as const;
export type OutboxState = (typeof outboxStates)[number];

/** The occasions on which a person gets an e-mail; each can be switched off by its reader. */
export const mailKinds = [
  'assigned',
  'reassigned',
  'reminder',
  'due-soon',
  'overdue',
  'cancelled',
  'reported',
  'closed',
  'weekly',
] as const;
export const mailKind = z.enum(mailKinds);
export type MailKind = z.infer<typeof mailKind>;

/** What a kind is called where a person chooses, and in the foot of the mail itself. */
export const mailKindWords: Readonly<Record<MailKind, string>> = {
  assigned: 'An inspection is assigned to me',
  reassigned: 'An inspection of mine changes hands or gets another due date',
  reminder: 'The reliability lead reminds me of an inspection',
  'due-soon': 'An inspection is due soon',
  overdue: 'An inspection is overdue',
  cancelled: 'An inspection of mine is cancelled',
  reported: 'An inspection I assigned is reported',
  closed: 'An inspection I reported is closed',
  weekly: 'Weekly summary of a site',
};

export const mailChoicesResponse = z.object({
  email: z.string(),
  choices: z.array(z.object({ kind: mailKind, wanted: z.boolean() })),
});
export type MailChoicesResponse = z.infer<typeof mailChoicesResponse>;

export const mailChoiceRequest = z.strictObject({ kind: mailKind, wanted: z.boolean() });
export type MailChoiceRequest = z.infer<typeof mailChoiceRequest>;

/** What the page behind an unsubscribe link may tell who isn't signed in: no name, no address. */
export const unsubscribeResponse = z.object({ kind: mailKind, wanted: z.boolean() });
export type UnsubscribeResponse = z.infer<typeof unsubscribeResponse>;

export const outboxQuery = z.object({
  /** Those with a fault: given up, or tried in vain and waiting for the next attempt. */
  faulty: z.stringbool().default(false),
});
export type OutboxQuery = z.infer<typeof outboxQuery>;

export const outboxItem = z.object({
  id: z.int(),
  kind: mailKind.nullable(),
  toAddress: z.string(),
  subject: z.string(),
  state: z.enum(outboxStates),
  attempts: z.int(),
  lastError: z.string().nullable(),
  createdAt: z.string(),
  sentAt: z.string().nullable(),
  /** Null where no attempt is to come. */
  nextAttemptAt: z.string().nullable(),
});
export type OutboxItem = z.infer<typeof outboxItem>;

/** The newest mails; the counts are of all. */
export const outboxResponse = z.object({
  mails: z.array(outboxItem),
  waitingCount: z.int(),
  failedCount: z.int(),
});
export type OutboxResponse = z.infer<typeof outboxResponse>;

/** A mail in the demo mailbox, as the local fake SMTP server received it. */
export const demoMailResponse = z.object({
  id: z.int(),
  toAddress: z.string(),
  fromAddress: z.string(),
  subject: z.string(),
  textBody: z.string(),
  /** As a mail program shows it; to be shown in a sandboxed frame only. */
  htmlBody: z.string(),
  /** Links found in the text, in order, relative to this product's address. */
  links: z.array(z.string()),
  receivedAt: z.string(),
});
export const demoMailboxResponse = z.object({ mails: z.array(demoMailResponse) });
export type DemoMailboxResponse = z.infer<typeof demoMailboxResponse>;
