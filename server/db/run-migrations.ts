import type { DataSource } from 'typeorm';

const lockName = 'fretline.migrations';
const lockWaitS = 60;

/**
 * Brings the schema up to date. MariaDB commits DDL as it goes, so two servers must not migrate at
 * once: a named lock keeps the second waiting.
 *
 * @returns names of the migrations that ran, in order
 * @throws {Error} if the lock is not free within a minute
 */
export async function runMigrations(dataSource: DataSource): Promise<string[]> {
  const lock = dataSource.createQueryRunner();
  await lock.connect();
  try {
    const [row] = (await lock.query('SELECT GET_LOCK(?, ?) AS got', [lockName, lockWaitS])) as {
      got: number | string | null;
    }[];
    if (Number(row?.got) !== 1) {
      throw new Error('Another process is migrating this database and has not finished.');
    }
    try {
      const ran = await dataSource.runMigrations({ transaction: 'each' });
      return ran.map((migration) => migration.name);
    } finally {
      await lock.query('SELECT RELEASE_LOCK(?)', [lockName]);
    }
  } finally {
    await lock.release();
  }
}
