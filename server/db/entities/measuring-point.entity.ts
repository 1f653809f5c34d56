import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import { BearingPosition } from './bearing-position.entity.ts';

/** A bearing position and a direction. */
@Entity('measuring_point')
@Index('measuring_point_position_direction', ['bearingPositionId', 'direction'], { unique: true })
export class MeasuringPoint {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  bearingPositionId: number;

  @Column({ type: 'varchar', length: 12 })
  direction: Direction;

  @ManyToOne(() => BearingPosition, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'bearing_position_id' })
  bearingPosition?: Relation<BearingPosition>;
}
