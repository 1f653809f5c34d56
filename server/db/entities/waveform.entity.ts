import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { ScreeningState } from '#shared/contracts/waveform.ts';
import type { Quantity, Unit } from '#shared/quantities/quantity.ts';
import { MeasuringPoint } from './measuring-point.entity.ts';
import { Survey } from './survey.entity.ts';

/**
 * One recorded time block at one point in one survey. The samples and the original file lie in
 * the data directory under the content hash; the row holds what is known of them and the state
 * of their screening.
 */
@Entity('waveform')
@Index('waveform_survey_content', ['surveyId', 'contentHash', 'channelIndex'], { unique: true })
@Index('waveform_screening_state', ['screeningState'])
export class Waveform {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  surveyId: number;

  @Column({ type: 'int' })
  measuringPointId: number;

  /** SHA-256 of the original file, hex. */
  @Column({ type: 'char', length: 64 })
  contentHash: string;

  /** Which of the file's channels, from 0. */
  @Column({ type: 'int', default: 0 })
  channelIndex: number;

  @Column({ type: 'varchar', length: 255 })
  fileName: string;

  @Column({ type: 'int' })
  fileBytes: number;

  @Column({ type: 'varchar', length: 16 })
  quantity: Quantity;

  @Column({ type: 'varchar', length: 8 })
  unit: Unit;

  @Column({ type: 'double' })
  sampleRateHz: number;

  @Column({ type: 'int' })
  sampleCount: number;

  @Column({ type: 'int', default: 0 })
  gapCount: number;

  /** Told speed of the machine, r/min. */
  @Column({ type: 'double', nullable: true })
  toldSpeedRpm: number | null;

  /** Line frequency as the file tells it, Hz. */
  @Column({ type: 'double', nullable: true })
  toldLineFrequencyHz: number | null;

  /** Range of the recorder in the recorded unit. */
  @Column({ type: 'double', nullable: true })
  fullScale: number | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  takenAt: Date | null;

  @Column({ type: 'datetime', precision: 3 })
  uploadedAt: Date;

  @Column({ type: 'int' })
  uploadedByUserId: number;

  @Column({ type: 'varchar', length: 12 })
  screeningState: ScreeningState;

  /** Which screening of this waveform is wanted now; counts up when it is screened again. */
  @Column({ type: 'int', default: 1 })
  screeningRun: number;

  @Column({ type: 'int', default: 0 })
  screeningAttempts: number;

  @Column({ type: 'text', nullable: true })
  screeningFailure: string | null;

  @ManyToOne(() => Survey, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'survey_id' })
  survey?: Relation<Survey>;

  @ManyToOne(() => MeasuringPoint, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'measuring_point_id' })
  measuringPoint?: Relation<MeasuringPoint>;
}
