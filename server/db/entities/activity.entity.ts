import { Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm';

/** The activity record: who did what to which object. Kept without foreign keys, to outlive them. */
@Entity('activity')
@Index('activity_site_time', ['siteId', 'happenedAt'])
export class Activity {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int', nullable: true })
  siteId: number | null;

  @Column({ type: 'int', nullable: true })
  userId: number | null;

  /** e.g. "machine.created" */
  @Column({ type: 'varchar', length: 60 })
  action: string;

  @Column({ type: 'varchar', length: 32 })
  objectType: string;

  @Column({ type: 'int', nullable: true })
  objectId: number | null;

  @Column({ type: 'json', nullable: true })
  details: Record<string, unknown> | null;

  @Column({ type: 'datetime', precision: 3 })
  happenedAt: Date;
}
