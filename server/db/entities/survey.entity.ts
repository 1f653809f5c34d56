import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import { Route } from './route.entity.ts';
import { User } from './user.entity.ts';

/** One walk of a route on one date. */
@Entity('survey')
@Index('survey_route_date', ['routeId', 'surveyedOn'], { unique: true })
export class Survey {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  routeId: number;

  @Column({ type: 'date' })
  surveyedOn: string;

  @Column({ type: 'int' })
  createdByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  createdAt: Date;

  @ManyToOne(() => Route, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'route_id' })
  route?: Relation<Route>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'created_by_user_id' })
  createdBy?: Relation<User>;
}
