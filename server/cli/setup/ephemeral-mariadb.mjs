import { randomBytes } from 'node:crypto';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { ensureMariadb } from './debian.mjs';
import { makeDataDirectory, startServer, stopServer } from './mariadb-process.mjs';

/**
 * A MariaDB of the tests' own: socket only, in memory where there is room, gone afterwards.
 *
 * @returns {Promise<{ socketPath: string, username: string, password: string, database: string, stop: () => Promise<void> }>}
 */
export async function startEphemeralMariadb() {
  const programs = await ensureMariadb();
  const parent = existsSync('/dev/shm') ? '/dev/shm' : tmpdir();
  const directory = mkdtempSync(join(parent, 'fretline-test-'));
  const password = randomBytes(12).toString('hex');
  const account = { database: 'fretline_test', user: 'fretline', password };
  const small = ['--innodb-log-file-size=8M'];
  const remove = () => rmSync(directory, { recursive: true, force: true });
  try {
    await makeDataDirectory(programs, { directory, ...account, extra: small, mayCreate: true });
    const socketPath = join(directory, 's');
    const { pid } = await startServer(programs, {
      directory,
      socketPath,
      extra: [
        '--skip-networking',
        ...small,
        '--innodb-flush-log-at-trx-commit=0',
        '--innodb-doublewrite=0',
        '--innodb-buffer-pool-size=64M',
      ],
    });
    return {
      socketPath,
      username: account.user,
      password,
      database: account.database,
      stop: async () => {
        await stopServer(pid);
        remove();
      },
    };
  } catch (error) {
    remove();
    throw error;
  }
}
