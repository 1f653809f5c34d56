import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import { Survey } from './survey.entity.ts';

/** A file of a survey that could not be read, with the line and the reason, so that nothing is lost silently. */
@Entity('rejected_file')
@Index('rejected_file_survey_content', ['surveyId', 'contentHash'], { unique: true })
export class RejectedFile {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  surveyId: number;

  @Column({ type: 'varchar', length: 255 })
  fileName: string;

  @Column({ type: 'char', length: 64 })
  contentHash: string;

  @Column({ type: 'varchar', length: 40 })
  errorCode: string;

  @Column({ type: 'int', nullable: true })
  errorLine: number | null;

  @Column({ type: 'text' })
  errorMessage: string;

  @Column({ type: 'datetime', precision: 3 })
  rejectedAt: Date;

  @ManyToOne(() => Survey, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'survey_id' })
  survey?: Relation<Survey>;
}
