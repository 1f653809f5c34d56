import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { ReviewDecision } from '#shared/contracts/review.ts';
import type { ScreeningResult, Verdict } from '#shared/signal/screening-types.ts';
import { User } from './user.entity.ts';
import { Waveform } from './waveform.entity.ts';

/**
 * What the method says of one waveform, written once for each run: the unique pair of waveform
 * and run is what makes finishing twice harmless. The analyst's decision is added later.
 */
@Entity('screening')
@Index('screening_waveform_run', ['waveformId', 'run'], { unique: true })
@Index('screening_queue', ['decision', 'verdict', 'score'])
export class Screening {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  waveformId: number;

  @Column({ type: 'int' })
  run: number;

  @Column({ type: 'varchar', length: 12 })
  verdict: Verdict;

  @Column({ type: 'double', nullable: true })
  score: number | null;

  /** Speed of the position's shaft, as found. */
  @Column({ type: 'double', nullable: true })
  speedHz: number | null;

  @Column({ type: 'double', nullable: true })
  overallMmPerSRms: number | null;

  @Column({ type: 'varchar', length: 32 })
  methodVersion: string;

  @Column({ type: 'json' })
  result: ScreeningResult;

  @Column({ type: 'datetime', precision: 3 })
  screenedAt: Date;

  @Column({ type: 'varchar', length: 12, nullable: true })
  decision: ReviewDecision | null;

  @Column({ type: 'text', nullable: true })
  decisionReason: string | null;

  @Column({ type: 'int', nullable: true })
  decidedByUserId: number | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  decidedAt: Date | null;

  @ManyToOne(() => Waveform, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'waveform_id' })
  waveform?: Relation<Waveform>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'decided_by_user_id' })
  decidedBy?: Relation<User> | null;
}
