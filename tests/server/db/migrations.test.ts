import { describe, expect, it } from 'vitest';
import { migrations } from '#server/db/migrations/index.ts';
import { runMigrations } from '#server/db/run-migrations.ts';
import { useTestDatabase } from '#tests/support/test-database.ts';

const dataSource = useTestDatabase();

describe('the migrations', () => {
  it('make exactly the schema that the entities describe', async () => {
    const difference = await dataSource().driver.createSchemaBuilder().log();
    expect(difference.upQueries.map(({ query }) => query)).toEqual([]);
  });

  it('have nothing to do the second time', async () => {
    expect(await runMigrations(dataSource())).toEqual([]);
  });

  it('can be taken back to an empty database and run again', async () => {
    for (const _migration of migrations) await dataSource().undoLastMigration();
    const tables = await dataSource().query<unknown[]>('SHOW TABLES');
    expect(tables).toHaveLength(1);
    expect(await runMigrations(dataSource())).toHaveLength(migrations.length);
  });
});
