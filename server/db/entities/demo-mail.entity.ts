import { Column, Entity, PrimaryGeneratedColumn } from 'typeorm';

/** A mail the local fake SMTP server has received; read on the demo mailbox page. */
@Entity('demo_mail')
export class DemoMail {
  @PrimaryGeneratedColumn({ type: 'int' })
  id: number;

  @Column({ type: 'varchar', length: 254 })
  toAddress: string;

  @Column({ type: 'varchar', length: 254 })
  fromAddress: string;

  @Column({ type: 'varchar', length: 255 })
  subject: string;

  @Column({ type: 'mediumtext' })
  textBody: string;

  @Column({ type: 'mediumtext' })
  htmlBody: string;

  @Column({ type: 'datetime', precision: 3 })
  receivedAt: Date;
}
