import { Column, Entity, PrimaryGeneratedColumn } from 'typeorm';

/** A person's account. */
@Entity('user')
export class User {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'varchar', length: 254, unique: true })
  email: string;

  @Column({ type: 'varchar', length: 120 })
  name: string;

  /** argon2id, with its parameters and salt. */
  @Column({ type: 'varchar', length: 255 })
  passwordHash: string;

  @Column({ type: 'boolean', default: false })
  isAdministrator: boolean;

  @Column({ type: 'datetime', precision: 3 })
  createdAt: Date;
}
