import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type {
  DiameterUnit,
  FitSource,
  SeatBonding,
  SeatCondition,
  SeatName,
  SeatStage,
} from '#shared/contracts/fit-record.ts';
import { BearingPosition } from './bearing-position.entity.ts';
import { User } from './user.entity.ts';

/** What is known of one seat on one date. Added, never overwritten. */
@Entity('fit_record')
@Index('fit_record_position_seat_date', ['bearingPositionId', 'seat', 'recordedOn'])
export class FitRecord {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  bearingPositionId: number;

  @Column({ type: 'varchar', length: 8 })
  seat: SeatName;

  @Column({ type: 'date' })
  recordedOn: string;

  @Column({ type: 'varchar', length: 16 })
  source: FitSource;

  /** ISO 286 class from the drawing, e.g. k5 or H7. */
  @Column({ type: 'varchar', length: 8, nullable: true })
  toleranceClass: string | null;

  /** Mean diameter of the shaft or the housing bore at 20 °C. */
  @Column({ type: 'double', nullable: true })
  seatMeasuredMm: number | null;

  /** Mean bore or outside diameter of the bearing ring at 20 °C. */
  @Column({ type: 'double', nullable: true })
  ringMeasuredMm: number | null;

  /** Unit in which the diameters were read; they are kept in millimetres. */
  @Column({ type: 'varchar', length: 2, default: 'mm' })
  diameterUnit: DiameterUnit;

  /** Axial drive-up on a tapered seat. */
  @Column({ type: 'double', nullable: true })
  driveUpMm: number | null;

  /** Loss of radial internal clearance when driven up on a tapered seat. */
  @Column({ type: 'double', nullable: true })
  clearanceReductionUm: number | null;

  @Column({ type: 'varchar', length: 12, nullable: true })
  bonding: SeatBonding | null;

  @Column({ type: 'varchar', length: 32, nullable: true })
  condition: SeatCondition | null;

  @Column({ type: 'text', nullable: true })
  note: string | null;

  /** Of an inspection: before or after the work. */
  @Column({ type: 'varchar', length: 8, nullable: true })
  stage: SeatStage | null;

  /** The inspection that measured it, where one did. */
  @Column({ type: 'int', nullable: true })
  inspectionId: number | null;

  @Column({ type: 'int' })
  recordedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  createdAt: Date;

  @ManyToOne(() => BearingPosition, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'bearing_position_id' })
  bearingPosition?: Relation<BearingPosition>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'recorded_by_user_id' })
  recordedBy?: Relation<User>;
}
