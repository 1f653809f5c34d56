import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import { Finding } from './finding.entity.ts';
import { User } from './user.entity.ts';

/** One change of state of a finding or of its inspection: who, when and why. */
@Entity('state_change')
@Index('state_change_finding', ['findingId', 'changedAt'])
export class StateChange {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  findingId: number;

  /** Null where the finding itself changed. */
  @Column({ type: 'int', nullable: true })
  inspectionId: number | null;

  /** Null at the beginning. */
  @Column({ type: 'varchar', length: 12, nullable: true })
  fromState: string | null;

  @Column({ type: 'varchar', length: 12 })
  toState: string;

  @Column({ type: 'text', nullable: true })
  reason: string | null;

  @Column({ type: 'int' })
  changedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  changedAt: Date;

  @ManyToOne(() => Finding, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'finding_id' })
  finding?: Relation<Finding>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'changed_by_user_id' })
  changedBy?: Relation<User>;
}
