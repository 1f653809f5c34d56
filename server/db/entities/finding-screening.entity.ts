import { Entity, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm';
import { Finding } from './finding.entity.ts';
import { Screening } from './screening.entity.ts';

/** A screening that shows the finding. */
@Entity('finding_screening')
export class FindingScreening {
  @PrimaryColumn({ type: 'int' })
  findingId: number;

  @PrimaryColumn({ type: 'int' })
  screeningId: number;

  @ManyToOne(() => Finding, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'finding_id' })
  finding?: Relation<Finding>;

  @ManyToOne(() => Screening, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'screening_id' })
  screening?: Relation<Screening>;
}
