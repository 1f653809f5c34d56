import type { DataSource, EntityManager } from 'typeorm';

/** What repositories read and write through: the pool, or one transaction. */
export type Db = EntityManager;

/** The database as services see it: something to read with, and transactions. */
export class Database {
  readonly dataSource: DataSource;

  constructor(dataSource: DataSource) {
    this.dataSource = dataSource;
  }

  /** Reads and single writes outside a transaction. */
  get db(): Db {
    return this.dataSource.manager;
  }

  /** Runs the work in one transaction: all of it or nothing. */
  transaction<T>(work: (db: Db) => Promise<T>): Promise<T> {
    return this.dataSource.transaction(work);
  }
}
