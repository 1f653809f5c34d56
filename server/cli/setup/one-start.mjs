import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { connect } from 'node:net';
import { join } from 'node:path';
import { isRunning } from './mariadb-process.mjs';
import { SetupError } from './say.mjs';

/**
 * Makes sure that one start at a time works on a data directory.
 *
 * @param {string} dataDirectory
 * @returns {() => void} gives the place free again
 */
export function takePlace(dataDirectory) {
  mkdirSync(dataDirectory, { recursive: true, mode: 0o700 });
  const path = join(dataDirectory, 'start.pid');
  if (existsSync(path)) {
    const pid = Number(readFileSync(path, 'utf8'));
    if (pid > 0 && pid !== process.pid && isRunning(pid) && isStart(pid)) {
      throw new SetupError(
        `Fretline is already running here (process ${pid}). End that one first, or use it.`,
      );
    }
  }
  writeFileSync(path, String(process.pid));
  return () => rmSync(path, { force: true });
}

/** A pid is used again by other programs: look at what it runs. @param {number} pid */
function isStart(pid) {
  try {
    return /server\/cli\/(start|dev)\.mjs/.test(readFileSync(`/proc/${pid}/cmdline`, 'utf8'));
  } catch {
    return true;
  }
}

/**
 * @param {string} host
 * @param {number} port
 * @returns {Promise<void>}
 * @throws {SetupError} if somebody listens there
 */
export function checkPort(host, port) {
  return new Promise((resolve, reject) => {
    const socket = connect({ host, port });
    socket.once('connect', () => {
      socket.destroy();
      reject(
        new SetupError(
          `Port ${port} is taken by another program. Choose another: PORT=${port + 1} npm start`,
        ),
      );
    });
    socket.once('error', () => resolve());
  });
}
