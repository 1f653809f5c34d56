import { Column, Entity, PrimaryGeneratedColumn } from 'typeorm';

/** A plant. Everything a person sees belongs to one. */
@Entity('site')
export class Site {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'varchar', length: 120, unique: true })
  name: string;

  @Column({ type: 'datetime', precision: 3 })
  createdAt: Date;
}
