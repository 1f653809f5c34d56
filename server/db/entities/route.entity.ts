import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import { Site } from './site.entity.ts';

/** An ordered list of measuring points, and what to record there. */
@Entity('route')
@Index('route_site_name', ['siteId', 'name'], { unique: true })
export class Route {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  @Column({ type: 'varchar', length: 120 })
  name: string;

  @Column({ type: 'double', nullable: true })
  topFrequencyHz: number | null;

  @Column({ type: 'int', nullable: true })
  lineCount: number | null;

  @Column({ type: 'int', default: 1 })
  version: number;

  @ManyToOne(() => Site, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;
}
