import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { InspectionReport, InspectionState } from '#shared/contracts/inspection.ts';
import { Finding } from './finding.entity.ts';
import { User } from './user.entity.ts';

/** The fit-inspection task for a finding. */
@Entity('inspection')
@Index('inspection_assignee_state', ['assigneeUserId', 'state'])
export class Inspection {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  findingId: number;

  @Column({ type: 'varchar', length: 12 })
  state: InspectionState;

  @Column({ type: 'int' })
  assigneeUserId: number;

  @Column({ type: 'int' })
  assignedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  assignedAt: Date;

  @Column({ type: 'date' })
  dueOn: string;

  @Column({ type: 'boolean' })
  checkShaftSeat: boolean;

  @Column({ type: 'boolean' })
  checkHousingSeat: boolean;

  /** Pedestal, foot or frame are checked in place first. */
  @Column({ type: 'boolean' })
  checkInPlace: boolean;

  /** Reference in the plant's own maintenance system. */
  @Column({ type: 'varchar', length: 60, nullable: true })
  workOrderReference: string | null;

  @Column({ type: 'text', nullable: true })
  instructions: string | null;

  /** What the owner reported; null until then. */
  @Column({ type: 'json', nullable: true })
  report: InspectionReport | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  reportedAt: Date | null;

  @Column({ type: 'int', default: 1 })
  version: number;

  @ManyToOne(() => Finding, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'finding_id' })
  finding?: Relation<Finding>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'assignee_user_id' })
  assignee?: Relation<User>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'assigned_by_user_id' })
  assignedBy?: Relation<User>;
}
