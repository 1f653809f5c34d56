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
  CsvEncoding,
  CsvSeparator,
  ImportState,
  RegisterKind,
} from '#shared/contracts/register-import.ts';
import { Site } from './site.entity.ts';
import { User } from './user.entity.ts';

/** One file sent into the register, with what became of it. */
@Entity('register_import')
@Index('register_import_site', ['siteId', 'id'])
export class RegisterImport {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  siteId: number;

  @Column({ type: 'varchar', length: 16 })
  kind: RegisterKind;

  @Column({ type: 'varchar', length: 12 })
  state: ImportState;

  @Column({ type: 'varchar', length: 255 })
  fileName: string;

  @Column({ type: 'varchar', length: 16 })
  encoding: CsvEncoding;

  @Column({ type: 'varchar', length: 12 })
  separator: CsvSeparator;

  @Column({ type: 'int' })
  rowCount: number;

  @Column({ type: 'int', default: 0 })
  newCount: number;

  @Column({ type: 'int', default: 0 })
  changedCount: number;

  @Column({ type: 'int', default: 0 })
  sameCount: number;

  @Column({ type: 'int', default: 0 })
  wrongCount: number;

  /** Why the dry run broke off. */
  @Column({ type: 'text', nullable: true })
  failure: string | null;

  @Column({ type: 'int' })
  uploadedByUserId: number;

  @Column({ type: 'datetime', precision: 3 })
  uploadedAt: Date;

  @Column({ type: 'int', nullable: true })
  appliedByUserId: number | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  appliedAt: Date | null;

  @Column({ type: 'int', nullable: true })
  undoneByUserId: number | null;

  @Column({ type: 'datetime', precision: 3, nullable: true })
  undoneAt: Date | null;

  @ManyToOne(() => Site, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'site_id' })
  site?: Relation<Site>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'uploaded_by_user_id' })
  uploadedBy?: Relation<User>;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'applied_by_user_id' })
  appliedBy?: Relation<User> | null;

  @ManyToOne(() => User, { onDelete: 'RESTRICT' })
  @JoinColumn({ name: 'undone_by_user_id' })
  undoneBy?: Relation<User> | null;
}
