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
  BearingClass,
  BearingType,
  ClearanceGroup,
  HousingMaterial,
  LoadLevel,
  PositionKind,
  RingLoad,
  SeatTaper,
  ShaftMaterial,
  ShaftSeatForm,
} from '#shared/contracts/bearing-position.ts';
import { Machine } from './machine.entity.ts';

/** One bearing of a machine; a rolling bearing has two seats, a plain one none. */
@Entity('bearing_position')
@Index('bearing_position_machine_code', ['machineId', 'code'], { unique: true })
export class BearingPosition {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  machineId: number;

  /** Short name on the machine, e.g. "M-DE" (motor, drive end). */
  @Column({ type: 'varchar', length: 24 })
  code: string;

  @Column({ type: 'varchar', length: 120 })
  name: string;

  @Column({ type: 'varchar', length: 16 })
  kind: PositionKind;

  /** Speed of this position's shaft over the machine's told speed. */
  @Column({ type: 'double', default: 1 })
  shaftRatio: number;

  @Column({ type: 'varchar', length: 24, nullable: true })
  designation: string | null;

  @Column({ type: 'varchar', length: 20, nullable: true })
  bearingType: BearingType | null;

  /** Bore d, outside diameter D and width B of the bearing. */
  @Column({ type: 'double', nullable: true })
  boreMm: number | null;

  @Column({ type: 'double', nullable: true })
  outsideMm: number | null;

  @Column({ type: 'double', nullable: true })
  widthMm: number | null;

  @Column({ type: 'varchar', length: 8, nullable: true })
  bearingClass: BearingClass | null;

  @Column({ type: 'varchar', length: 4, nullable: true })
  clearanceGroup: ClearanceGroup | null;

  @Column({ type: 'varchar', length: 16, nullable: true })
  innerLoad: RingLoad | null;

  @Column({ type: 'varchar', length: 16, nullable: true })
  outerLoad: RingLoad | null;

  @Column({ type: 'varchar', length: 8, nullable: true })
  loadLevel: LoadLevel | null;

  @Column({ type: 'varchar', length: 16, nullable: true })
  shaftMaterial: ShaftMaterial | null;

  @Column({ type: 'varchar', length: 16, nullable: true })
  housingMaterial: HousingMaterial | null;

  @Column({ type: 'varchar', length: 20, default: 'cylindrical' })
  shaftSeatForm: ShaftSeatForm;

  @Column({ type: 'varchar', length: 4, nullable: true })
  seatTaper: SeatTaper | null;

  /** Bore of a hollow shaft; null for a solid one. */
  @Column({ type: 'double', nullable: true })
  shaftBoreMm: number | null;

  /** Wall round the bore; null where it is thick or not known. */
  @Column({ type: 'double', nullable: true })
  housingWallMm: number | null;

  @Column({ type: 'double', nullable: true })
  radialLoadN: number | null;

  /** Heat reaches the bearing along its shaft: the outer ring stays cooler. */
  @Column({ type: 'boolean', default: false })
  heatThroughShaft: boolean;

  @Column({ type: 'boolean', default: false })
  splitHousing: boolean;

  /** The floating bearing: its stationary ring must stay free to move. */
  @Column({ type: 'boolean', default: false })
  mustSlide: boolean;

  /** Running temperatures. */
  @Column({ type: 'double', nullable: true })
  shaftC: number | null;

  @Column({ type: 'double', nullable: true })
  innerRingC: number | null;

  @Column({ type: 'double', nullable: true })
  outerRingC: number | null;

  @Column({ type: 'double', nullable: true })
  housingC: number | null;

  /** Order along the train, from the driver's free end. */
  @Column({ type: 'int', default: 0 })
  sequence: number;

  @ManyToOne(() => Machine, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'machine_id' })
  machine?: Relation<Machine>;
}
