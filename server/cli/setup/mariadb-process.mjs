import { spawn } from 'node:child_process';
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { connect } from 'node:net';
import { userInfo } from 'node:os';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { endProcess } from './processes.mjs';
import { run } from './run.mjs';
import { outputInWords, SetupError } from './say.mjs';

/**
 * @typedef {object} Programs
 * @property {string} server path of mariadbd
 * @property {string} maker path of mariadb-install-db
 */

const readyWithinMs = 60_000;
const shutDownWithinMs = 60_000;

const asRoot = () => process.getuid?.() === 0;

/** Whether a server answers on the socket or port. @param {{ path: string } | { port: number, host: string }} where @returns {Promise<boolean>} */
export function answers(where) {
  return new Promise((resolve) => {
    const socket = connect(where);
    const end = (/** @type {boolean} */ answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.once('connect', () => end(true));
    socket.once('error', () => end(false));
    socket.setTimeout(2_000, () => end(false));
  });
}

/**
 * Makes a data directory with one empty database and its user. The finished mark is written last:
 * a folder without it was never complete and is made again.
 *
 * @param {Programs} programs
 * @param {{ directory: string, database: string, user: string, password: string, extra?: string[], mayCreate?: boolean }} options
 * @returns {Promise<'made' | 'there already'>}
 */
export async function makeDataDirectory(programs, options) {
  const { directory, database, user, password } = options;
  const data = join(directory, 'data');
  const mark = join(directory, 'made');
  if (existsSync(mark)) return 'there already';
  rmSync(data, { recursive: true, force: true });
  mkdirSync(directory, { recursive: true, mode: 0o700 });
  const boot = join(directory, 'boot.sql');
  const rights = options.mayCreate ? '*.*' : `\`${database}\`.*`;
  writeFileSync(
    boot,
    [
      // The grants are not loaded while MariaDB is being made: without this, no user can be.
      'FLUSH PRIVILEGES;',
      `CREATE DATABASE \`${database}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;`,
      ...['localhost', '127.0.0.1'].flatMap((host) => [
        `CREATE USER '${user}'@'${host}' IDENTIFIED BY '${password}';`,
        `GRANT ALL ON ${rights} TO '${user}'@'${host}';`,
      ]),
      '',
    ].join('\n'),
    { mode: 0o600 },
  );
  const { code, output } = await run(programs.maker, [
    '--no-defaults',
    ...(asRoot() ? ['--user=root'] : [`--auth-root-socket-user=${userInfo().username}`]),
    `--datadir=${data}`,
    '--skip-test-db',
    `--extra-file=${boot}`,
    ...(options.extra ?? []),
  ]);
  rmSync(boot, { force: true });
  if (code !== 0) {
    // It ends with a page of general advice; the cause stands in the lines before.
    const errors = output.split('\n').filter((line) => /error/i.test(line));
    const told = errors.length > 0 ? errors.join('\n') : output;
    throw new SetupError(outputInWords(`MariaDB could not be set up in ${data}.`, told));
  }
  writeFileSync(mark, new Date().toISOString());
  return 'made';
}

/**
 * Starts mariadbd and waits until it answers on its socket.
 *
 * @param {Programs} programs
 * @param {{ directory: string, socketPath: string, extra: string[], onSpawn?: (pid: number) => void }} options
 *   `onSpawn` hears of the process at once, so that a Ctrl-C in the next moment still ends it
 * @returns {Promise<{ pid: number }>}
 */
export async function startServer(programs, { directory, socketPath, extra, onSpawn }) {
  const log = join(directory, 'mariadb.log');
  rmSync(socketPath, { force: true });
  // Only what this start says tells of this start's fault.
  const output = openSync(log, 'w', 0o600);
  const child = spawn(
    programs.server,
    [
      '--no-defaults',
      ...(asRoot() ? ['--user=root'] : []),
      `--datadir=${join(directory, 'data')}`,
      `--socket=${socketPath}`,
      `--pid-file=${join(directory, 'mariadb.pid')}`,
      '--skip-name-resolve',
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_ci',
      '--max-allowed-packet=64M',
      '--default-time-zone=+00:00',
      ...extra,
    ],
    // A group of its own: Ctrl-C must reach us first, so that the database is the last to go.
    { stdio: ['ignore', output, output], detached: true },
  );
  closeSync(output);
  const pid = child.pid ?? 0;
  let ended = false;
  child.on('exit', () => (ended = true));
  child.on('error', () => (ended = true));
  child.unref();
  if (pid > 0) onSpawn?.(pid);
  const until = Date.now() + readyWithinMs;
  while (!(await answers({ path: socketPath }))) {
    if (ended || Date.now() > until) {
      if (!ended) await stopServer(pid);
      throw new SetupError(
        serverFault(existsSync(log) ? readFileSync(log, 'utf8') : '', directory),
      );
    }
    await sleep(25);
  }
  return { pid };
}

/** @param {string} log @param {string} directory */
function serverFault(log, directory) {
  if (/Address already in use/i.test(log)) {
    return 'MariaDB could not start: its port was taken in the same moment. Start again.';
  }
  const errors = log.split('\n').filter((line) => line.includes('[ERROR]'));
  const told = errors.length > 0 ? errors.slice(-8).join('\n') : log;
  if (
    /corrupt|missing|ibdata1|checkpoint|redo log|crash|signal \d+|Table 'mysql|doesn't exist/i.test(
      told,
    ) &&
    !/space|Errcode: (13|28|30)/i.test(told)
  ) {
    return [
      `MariaDB could not start: its files in ${directory} are damaged.`,
      `Put the folder .data back from a backup; or move it away (mv .data .data-damaged): the next start makes a new one with the demo plant. MariaDB's own words are in ${join(directory, 'mariadb.log')}.`,
    ].join('\n');
  }
  return outputInWords('MariaDB could not start.', told);
}

/** Asks the server to shut down and waits for it: a clean end needs no recovery at the next start. @param {number} pid */
export async function stopServer(pid) {
  if (!(await endProcess(pid, shutDownWithinMs))) {
    throw new SetupError(
      `MariaDB (process ${pid}) did not stop within a minute. It may still be writing: look at it before you end it by force.`,
    );
  }
}
