import { Column, Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { MeasuringPoint } from './measuring-point.entity.ts';
import { Route } from './route.entity.ts';

/** A measuring point's place on a route. */
@Entity('route_point')
export class RoutePoint {
  @PrimaryColumn({ type: 'int' })
  routeId: number;

  @PrimaryColumn({ type: 'int' })
  measuringPointId: number;

  /** Place on the walk, from 1. */
  @Column({ type: 'int' })
  sequence: number;

  @ManyToOne(() => Route, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'route_id' })
  route?: Relation<Route>;

  @ManyToOne(() => MeasuringPoint, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'measuring_point_id' })
  measuringPoint?: Relation<MeasuringPoint>;
}
