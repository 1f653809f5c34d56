import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { OutboxState } from '#shared/contracts/mail.ts';
import { Site } from './site.entity.ts';

/** One change of state of an inspection, to be told to the site's webhook. */
@Entity('webhook_delivery')
@Index('webhook_delivery_due', ['state', 'nextAttemptAt'])
@Index('webhook_delivery_change', ['stateChangeId'], { unique: true })
export class WebhookDelivery {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  /** Unique: a change is told in one delivery, however often and by whomever it is found. */
  @Column({ type: 'int' })
  stateChangeId: number;

  @Column({ type: 'int' })
  inspectionId: number;

  /** The JSON as it is signed and sent. */
  @Column({ type: 'text' })
  body: string;

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

  @ManyToOne(() => Site, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;
}
