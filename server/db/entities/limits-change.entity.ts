import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { MachineKind } from '#shared/contracts/machine.ts';
import { Site } from './site.entity.ts';
import { User } from './user.entity.ts';

/**
 * A setting of the verdict's limits for a site or for one kind of its machines. Rows are added, never
 * overwritten: the newest of a kind counts, and without one the newest of the site.
 */
@Entity('limits_change')
@Index('limits_change_site', ['siteId', 'machineKind'])
export class LimitsChange {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  /** Null where it is for the whole site. */
  @Column({ type: 'varchar', length: 32, nullable: true })
  machineKind: MachineKind | null;

  /** 0–1; both null where the kind follows the site again, or the site the method. */
  @Column({ type: 'double', nullable: true })
  suspectedScore: number | null;

  @Column({ type: 'double', nullable: true })
  likelyScore: number | null;

  @Column({ type: 'text' })
  reason: string;

  @Column({ type: 'int' })
  changedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  changedAt: Date;

  @ManyToOne(() => Site, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'changed_by_user_id' })
  changedBy?: Relation<User>;
}
