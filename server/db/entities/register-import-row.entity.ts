import {
  Column,
  Entity,
  Index,
  JoinColumn,
  ManyToOne,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm';
import type { RowChange, RowFate, RowFault } from '#shared/contracts/register-import.ts';
import { RegisterImport } from './register-import.entity.ts';

/** Values of a register row by the entity's property. */
export type PlannedValues = Record<string, string | number | boolean | null>;

/** What is written for a row: `before` is null for a new one. */
export interface RowPlan {
  before: PlannedValues | null;
  after: PlannedValues;
}

/** One row of an imported file: its fate and, where something is to be written, its plan. */
@Entity('register_import_row')
@Index('register_import_row_number', ['registerImportId', 'rowNumber'], { unique: true })
@Index('register_import_row_fate', ['registerImportId', 'fate', 'rowNumber'])
export class RegisterImportRow {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'int' })
  registerImportId: number;

  /** As a spreadsheet counts: the header is row 1. */
  @Column({ type: 'int' })
  rowNumber: number;

  @Column({ type: 'varchar', length: 8 })
  fate: RowFate;

  @Column({ type: 'varchar', length: 160 })
  label: string;

  @Column({ type: 'json', nullable: true })
  faults: RowFault[] | null;

  @Column({ type: 'json', nullable: true })
  changes: RowChange[] | null;

  @Column({ type: 'json', nullable: true })
  plan: RowPlan | null;

  /** The register row that is changed, or that was made when the import was applied. */
  @Column({ type: 'int', nullable: true })
  objectId: number | null;

  @ManyToOne(() => RegisterImport, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'register_import_id' })
  registerImport?: Relation<RegisterImport>;
}
