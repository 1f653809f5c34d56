import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import { Inspection } from './inspection.entity.ts';
import { User } from './user.entity.ts';

/** A photograph of an inspection; the picture itself lies in the data directory. */
@Entity('inspection_photo')
@Index('inspection_photo_content', ['inspectionId', 'contentHash'], { unique: true })
export class InspectionPhoto {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  inspectionId: number;

  /** Of the file as it was sent: the same picture sent twice is one. */
  @Column({ type: 'char', length: 64 })
  contentHash: string;

  @Column({ type: 'varchar', length: 255 })
  fileName: string;

  /** Of the picture as it is kept. */
  @Column({ type: 'int' })
  widthPx: number;

  @Column({ type: 'int' })
  heightPx: number;

  @Column({ type: 'int' })
  addedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  addedAt: Date;

  @ManyToOne(() => Inspection, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'inspection_id' })
  inspection?: Relation<Inspection>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'added_by_user_id' })
  addedBy?: Relation<User>;
}
