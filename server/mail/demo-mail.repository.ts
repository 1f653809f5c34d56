import type { Db } from '#server/db/database.ts';
import { DemoMail } from '#server/db/entities/demo-mail.entity.ts';

export type ReceivedMail = Omit<DemoMail, 'id'>;

/** The demo mailbox: what the local fake SMTP server has received. */
export class DemoMailRepository {
  private readonly db: Db;

  constructor(db: Db) {
    this.db = db;
  }

  async add(mail: ReceivedMail): Promise<void> {
    await this.db.insert(DemoMail, mail);
  }

  newest(limit: number): Promise<DemoMail[]> {
    return this.db.find(DemoMail, { order: { id: 'DESC' }, take: limit });
  }
}
