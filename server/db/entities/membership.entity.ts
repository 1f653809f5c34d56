import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import type { SiteRole } from '#shared/contracts/session.ts';
import { Site } from './site.entity.ts';
import { User } from './user.entity.ts';

/** A person's one role at a site. */
@Entity('membership')
export class Membership {
  @PrimaryColumn({ type: 'int' })
  userId: number;

  @PrimaryColumn({ type: 'int' })
  siteId: number;

  @Column({ type: 'varchar', length: 16 })
  role: SiteRole;

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id' })
  user?: Relation<User>;

  @ManyToOne(() => Site, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;
}
