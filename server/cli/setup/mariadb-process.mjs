import { spawn } from 'node:child_process';
import {
  existsSync,
  openSync,
  closeSync,
  readFileSync,
  rmSync,
  writeFileSync,
  mkdirSync,
} from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';
import { userInfo } from 'node:os';
import { setTimeout as sleep } from 'node:timers/promises';
import { run } from './run.mjs';
import { SetupError } from './say.mjs';

/**
 * @typedef {object} Programs
 * @property {string} server path of mariadbd
 * @property {string} maker path of mariadb-install-db
 */

const readyWithinMs = 60_000;

const asRoot = () => process.getuid?.() === 0;

/** Whether a server answers on the socket or port. @param {{ path: string } | { port: number, host: string }} where */
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
    throw new SetupError(
      `MariaDB's data directory could not be made in ${data}:\n${output.trim().split('\n').slice(-8).join('\n')}`,
    );
  }
  writeFileSync(mark, new Date().toISOString());
  return 'made';
}

/**
 * Starts mariadbd and waits until it answers on its socket.
 *
 * @param {Programs} programs
 * @param {{ directory: string, socketPath: string, extra: string[] }} options
 * @returns {Promise<{ pid: number }>}
 */
export async function startServer(programs, { directory, socketPath, extra }) {
  const log = join(directory, 'mariadb.log');
  rmSync(socketPath, { force: true });
  const output = openSync(log, 'a');
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
  let ended = false;
  child.on('exit', () => (ended = true));
  child.on('error', () => (ended = true));
  child.unref();
  const until = Date.now() + readyWithinMs;
  while (!(await answers({ path: socketPath }))) {
    if (ended || Date.now() > until) {
      const said = existsSync(log) ? readFileSync(log, 'utf8').trim().split('\n') : [];
      throw new SetupError(serverFault(said, directory));
    }
    await sleep(50);
  }
  return { pid: child.pid ?? 0 };
}

/** @param {string[]} lines @param {string} directory */
function serverFault(lines, directory) {
  const tail = lines.slice(-60).join('\n');
  const errors = lines
    .filter((line) => line.includes('[ERROR]'))
    .slice(-6)
    .join('\n');
  if (/No space left|Errcode: 28/i.test(tail)) {
    return 'MariaDB could not start: the disk is full. Free some space and start again.';
  }
  if (/Address already in use/i.test(tail)) {
    return 'MariaDB could not start: its port was taken in the same moment. Start again.';
  }
  if (/corrupt|Unable to (lock|open).*ibdata1|Cannot find checkpoint/i.test(tail)) {
    return `MariaDB could not start: its files in ${directory} are damaged or in use.\n${errors}\nIf no other process uses them, put the folder .data back from a backup, or move it away: the next start makes a new, empty one with the demo.`;
  }
  return `MariaDB could not start. It said:\n${errors || tail}`;
}

/** @param {number} pid */
export function isRunning(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}

/** Asks the server to shut down and waits for it. @param {number} pid */
export async function stopServer(pid) {
  if (pid <= 0 || !isRunning(pid)) return;
  process.kill(pid, 'SIGTERM');
  const until = Date.now() + 60_000;
  while (isRunning(pid) && Date.now() < until) await sleep(50);
}
