import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { accessSync, constants, mkdtempSync, statfsSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureMariadb } from './debian.mjs';
import { makeDataDirectory, startServer } from './mariadb-process.mjs';

const roomBytes = 400 * 1024 * 1024;

/** Memory where there is room in it (containers often have 64 MB there), else the temporary folder. */
function parentFolder() {
  try {
    accessSync('/dev/shm', constants.W_OK);
    const { bavail, bsize } = statfsSync('/dev/shm');
    return bavail * bsize > roomBytes ? '/dev/shm' : tmpdir();
  } catch {
    return tmpdir();
  }
}

/**
 * A MariaDB of the tests' own: socket only, in memory where there is room, gone afterwards.
 *
 * @returns {Promise<{ socketPath: string, username: string, password: string, database: string, stop: () => Promise<void> }>}
 */
export async function startEphemeralMariadb() {
  const programs = await ensureMariadb();
  const directory = mkdtempSync(join(parentFolder(), 'fretline-test-'));
  const account = {
    database: 'fretline_test',
    user: 'fretline',
    password: randomBytes(12).toString('hex'),
  };
  const small = ['--innodb-log-file-size=8M'];
  const socketPath = join(directory, 's');
  const stop = guard(directory);
  try {
    await makeDataDirectory(programs, { directory, ...account, extra: small, mayCreate: true });
    await startServer(programs, {
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
  } catch (error) {
    await stop();
    throw error;
  }
  const { database, user: username, password } = account;
  return { socketPath, username, password, database, stop };
}

/** @param {string} directory @returns {() => Promise<void>} ends what works in the folder, and the folder */
function guard(directory) {
  const script = fileURLToPath(new URL('./ephemeral-guardian.mjs', import.meta.url));
  const guardian = spawn(process.execPath, [script, directory], {
    stdio: ['pipe', 'ignore', 'ignore'],
    detached: true,
  });
  const gone = new Promise((resolve) => guardian.once('exit', resolve));
  return async () => {
    guardian.stdin.end();
    await gone;
  };
}
