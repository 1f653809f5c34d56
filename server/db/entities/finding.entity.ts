import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { FindingState } from '#shared/contracts/finding.ts';
import { BearingPosition } from './bearing-position.entity.ts';
import { Site } from './site.entity.ts';

/** An accepted sign of looseness at one bearing position. */
@Entity('finding')
@Index('finding_site_state', ['siteId', 'state'])
export class Finding {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  @Column({ type: 'int' })
  bearingPositionId: number;

  @Column({ type: 'varchar', length: 12 })
  state: FindingState;

  @Column({ type: 'datetime', precision: 3 })
  openedAt: Date;

  /** Counts the changes of state: two people deciding at once are told apart by it. */
  @Column({ type: 'int', default: 1 })
  version: number;

  /** Null unless it is being monitored. */
  @Column({ type: 'datetime', precision: 3, nullable: true })
  monitoredSince: Date | null;

  /** The day by which the lead decides again. */
  @Column({ type: 'date', nullable: true })
  monitorUntilOn: string | null;

  /** After how many surveys of the position the lead decides again. */
  @Column({ type: 'int', nullable: true })
  monitorSurveys: number | null;

  @ManyToOne(() => Site, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;

  @ManyToOne(() => BearingPosition, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'bearing_position_id' })
  bearingPosition?: Relation<BearingPosition>;
}
