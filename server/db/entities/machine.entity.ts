import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { Criticality, MachineKind, Mounting } from '#shared/contracts/machine.ts';
import { Site } from './site.entity.ts';
import { User } from './user.entity.ts';

/** A driven train with a tag, e.g. a motor and a pump on one base. */
@Entity('machine')
@Index('machine_site_tag', ['siteId', 'tag'], { unique: true })
// One for each sort of the list, with what a search or filter looks at besides.
@Index('machine_site_tag_name', ['siteId', 'tag', 'name'])
@Index('machine_site_name', ['siteId', 'name', 'tag', 'kind', 'criticality'])
@Index('machine_site_stop', ['siteId', 'nextPlannedStopOn', 'tag', 'name', 'kind', 'criticality'])
@Index('machine_site_kind', ['siteId', 'kind', 'tag', 'name', 'criticality'])
@Index('machine_site_criticality', ['siteId', 'criticality', 'tag', 'name', 'kind'])
export class Machine {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  @Column({ type: 'varchar', length: 40 })
  tag: string;

  @Column({ type: 'varchar', length: 120 })
  name: string;

  @Column({ type: 'varchar', length: 32 })
  kind: MachineKind;

  /** What drives it, in words: "direct coupled", "V-belt" … */
  @Column({ type: 'varchar', length: 120, nullable: true })
  drive: string | null;

  @Column({ type: 'double', nullable: true })
  powerKw: number | null;

  @Column({ type: 'double', nullable: true })
  nominalSpeedRpm: number | null;

  @Column({ type: 'double', nullable: true })
  speedMinRpm: number | null;

  @Column({ type: 'double', nullable: true })
  speedMaxRpm: number | null;

  @Column({ type: 'double', nullable: true })
  lineFrequencyHz: number | null;

  @Column({ type: 'varchar', length: 16, nullable: true })
  mounting: Mounting | null;

  @Column({ type: 'int', nullable: true })
  bladeCount: number | null;

  @Column({ type: 'int', nullable: true })
  gearTeethCount: number | null;

  @Column({ type: 'double', nullable: true })
  beltFrequencyHz: number | null;

  @Column({ type: 'varchar', length: 16 })
  criticality: Criticality;

  @Column({ type: 'date', nullable: true })
  nextPlannedStopOn: string | null;

  @Column({ type: 'text', nullable: true })
  notes: string | null;

  /** The asset owner, who is asked to inspect. */
  @Column({ type: 'int', nullable: true })
  ownerUserId: number | null;

  /** Counts the edits: a form that was opened before another's edit is told so. */
  @Column({ type: 'int', default: 1 })
  version: number;

  @ManyToOne(() => Site, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'owner_user_id' })
  owner?: Relation<User> | null;
}
