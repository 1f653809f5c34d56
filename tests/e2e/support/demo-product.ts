import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { afterAll, beforeAll } from 'vitest';
import { loadPeople, loadRegister } from '#server/cli/demo/load-register.ts';
import { ensureClient } from '#server/cli/setup/client-build.mjs';
import { compose } from '#server/compose.ts';
import { readConfig } from '#server/config/config.ts';
import { writeDemoAccounts, type DemoAccounts } from '#server/config/demo-accounts.ts';
import { createDataSource } from '#server/db/data-source.ts';
import { emptyTables } from '#server/db/empty-tables.ts';
import { runMigrations } from '#server/db/run-migrations.ts';
import { startRealServer, type RealServer } from '#tests/support/real-server.ts';
import {
  createTestDatabase,
  testDatabaseEnvironment,
  testDatabaseOptions,
} from '#tests/support/test-database.ts';

const projectDirectory = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '');

export interface DemoProduct {
  url: string;
  account: (role: string) => DemoAccounts[number];
}

/** The built client and the real server over a database with the demo plant, but without surveys. */
export function useDemoProduct(): () => DemoProduct {
  let server: RealServer | undefined;
  let accounts: DemoAccounts = [];
  const files = mkdtempSync(join(tmpdir(), 'fretline-e2e-'));
  beforeAll(async () => {
    await ensureClient(projectDirectory);
    await createTestDatabase();
    const environment = {
      ...testDatabaseEnvironment(),
      DATA_DIR: files,
      AUTH_SECRET: 'a secret of the browser tests, long enough',
      DEMO: '1',
    };
    const dataSource = createDataSource(testDatabaseOptions());
    await dataSource.initialize();
    await runMigrations(dataSource);
    await emptyTables(dataSource);
    const { services, stop } = compose(
      readConfig(environment),
      dataSource,
      pino({ level: 'silent' }),
      { publicUrl: () => '' },
    );
    const people = await loadPeople(services.administration);
    await loadRegister(services, people);
    writeDemoAccounts(files, people.accounts);
    accounts = people.accounts;
    await stop();
    await dataSource.destroy();
    server = await startRealServer(environment);
  });
  afterAll(async () => {
    await server?.kill('SIGTERM');
    rmSync(files, { recursive: true, force: true });
  });
  return () => {
    if (server === undefined) throw new Error('The product is not running yet.');
    return {
      url: server.url,
      account: (role) => {
        const found = accounts.find((account) => account.role === role);
        if (found === undefined) throw new Error(`The demo has no ${role}.`);
        return found;
      },
    };
  };
}
