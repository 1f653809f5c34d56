import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { MailKind } from '#shared/contracts/mail.ts';
import { User } from './user.entity.ts';

/** A kind of mail that a person has switched off; without a row it is sent. */
@Entity('mail_opt_out')
export class MailOptOut {
  @PrimaryColumn({ type: 'int' })
  userId: number;

  @PrimaryColumn({ type: 'varchar', length: 12 })
  kind: MailKind;

  @Column({ type: 'datetime', precision: 3 })
  optedOutAt: Date;

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id' })
  user?: Relation<User>;
}
