import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';
import type { MailKind, OutboxState } from '#shared/contracts/mail.ts';

/** An e-mail to be sent, written in the transaction that calls for it and sent once afterwards. */
@Entity('outbox_mail')
@Index('outbox_mail_due', ['state', 'nextAttemptAt'])
@Index('outbox_mail_site', ['siteId', 'state'])
export class OutboxMail {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  /** Names the occasion; the same occasion never makes two mails. */
  @Column({ type: 'varchar', length: 120, unique: true })
  occasion: string;

  /** Null of mails written before kinds were told. */
  @Column({ type: 'varchar', length: 12, nullable: true })
  kind: MailKind | null;

  // No foreign keys: what was sent stays on record when a person or a site is gone.
  @Column({ type: 'int', nullable: true })
  toUserId: number | null;

  @Column({ type: 'int', nullable: true })
  siteId: number | null;

  @Column({ type: 'varchar', length: 254 })
  toAddress: string;

  @Column({ type: 'varchar', length: 200 })
  subject: string;

  @Column({ type: 'text' })
  textBody: string;

  @Column({ type: 'text' })
  htmlBody: string;

  @Column({ type: 'varchar', length: 8 })
  state: OutboxState;

  @Column({ type: 'int', default: 0 })
  attempts: number;

  @Column({ type: 'datetime', precision: 3 })
  nextAttemptAt: Date;

  @Column({ type: 'text', nullable: true })
  lastError: string | null;

  @Column({ type: 'datetime', precision: 3 })
  createdAt: Date;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  sentAt: Date | null;
}
