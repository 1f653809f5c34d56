import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Site } from './site.entity.ts';

/** Where a site's own maintenance system is told of inspections; one for each site. */
@Entity('webhook')
export class Webhook {
  @PrimaryColumn({ type: 'int' })
  siteId: number;

  @Column({ type: 'varchar', length: 500 })
  url: string;

  /** Signs what is sent, so it is needed as it is; never shown again. */
  @Column({ type: 'varchar', length: 200 })
  secret: string;

  /** What changed before is not told. */
  @Column({ type: 'datetime', precision: 3 })
  since: Date;

  @ManyToOne(() => Site, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;
}
