import {
  accessSync,
  constants,
  existsSync,
  mkdirSync,
  readFileSync,
  realpathSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { createServer } from 'node:net';
import { dirname, join } from 'node:path';
import { commandLine, endProcess, isRunning, workingFolder } from './processes.mjs';
import { SetupError } from './say.mjs';

const serverEndsWithinMs = 30_000;

/** @param {string} path */
function pidIn(path) {
  try {
    return Number(readFileSync(path, 'utf8'));
  } catch {
    return 0;
  }
}

/** A pid is used again by other programs: look at what it runs. @param {number} pid */
function isStart(pid) {
  const words = commandLine(pid);
  return words.length === 0 || words.some((word) => /server\/cli\/(start|dev)\.mjs$/.test(word));
}

/**
 * Makes sure that one start at a time works on a data directory.
 *
 * @param {string} dataDirectory
 * @returns {() => void} gives the place free again
 * @throws {SetupError} if another start has it
 */
export function takePlace(dataDirectory) {
  // Asked beforehand, since mkdir on a read-only file system speaks of a missing folder.
  if (!existsSync(dataDirectory)) accessSync(dirname(dataDirectory), constants.W_OK);
  mkdirSync(dataDirectory, { recursive: true, mode: 0o700 });
  const path = join(dataDirectory, 'start.pid');
  for (;;) {
    try {
      // Exclusive: of two starts in the same moment one is told of the other.
      writeFileSync(path, String(process.pid), { flag: 'wx' });
      return () => rmSync(path, { force: true });
    } catch (error) {
      if (/** @type {{ code?: string }} */ (error).code !== 'EEXIST') throw error;
    }
    const pid = pidIn(path);
    if (pid > 0 && pid !== process.pid && isRunning(pid) && isStart(pid)) {
      throw new SetupError(
        `Fretline is already running here (process ${pid}). Use that one, or end it first (kill ${pid}).`,
      );
    }
    rmSync(path, { force: true });
  }
}

const serverPidFile = (/** @type {string} */ dataDirectory) => join(dataDirectory, 'server.pid');

/**
 * Remembers a server, for the case that this start is killed and cannot end it.
 *
 * @param {string} dataDirectory
 * @param {number} pid
 * @returns {() => void} forgets it
 */
export function rememberServer(dataDirectory, pid) {
  writeFileSync(serverPidFile(dataDirectory), String(pid));
  return () => rmSync(serverPidFile(dataDirectory), { force: true });
}

/**
 * Ends the server of a start that was killed: it still holds the port, and nobody looks after it.
 *
 * @param {string} projectDirectory
 * @param {string} dataDirectory
 * @returns {Promise<boolean>} whether there was one
 */
export async function endLeftServer(projectDirectory, dataDirectory) {
  const pid = pidIn(serverPidFile(dataDirectory));
  const ours =
    pid > 0 &&
    commandLine(pid).includes('server/main.ts') &&
    workingFolder(pid) === realpathSync(projectDirectory);
  if (ours && !(await endProcess(pid, serverEndsWithinMs))) {
    throw new SetupError(
      `The server of an earlier start (process ${pid}) does not end. End it by force (kill -9 ${pid}) and start again.`,
    );
  }
  rmSync(serverPidFile(dataDirectory), { force: true });
  return ours;
}

/**
 * The port to listen on, by what the person said.
 *
 * @param {string | undefined} text
 * @param {number} usual
 * @returns {number}
 */
export function portOf(text, usual) {
  if (text === undefined || text === '') return usual;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new SetupError(`PORT must be a whole number from 0 to 65535, not "${text}".`);
  }
  return port;
}

/**
 * @param {string} host
 * @param {number} port
 * @returns {Promise<void>}
 * @throws {SetupError} if nothing of ours could listen there
 */
export function checkPort(host, port) {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (error) => {
      const { code } = /** @type {{ code?: string }} */ (error);
      reject(new SetupError(portFault(code, host, port)));
    });
    probe.listen({ host, port, exclusive: true }, () => probe.close(() => resolve()));
  });
}

/** @param {string | undefined} code @param {string} host @param {number} port */
function portFault(code, host, port) {
  const another = port < 65_535 ? port + 1 : 4173;
  if (code === 'EADDRINUSE') {
    return `Port ${port} is taken by another program. End that one, or choose another port: PORT=${another} npm start`;
  }
  if (code === 'EACCES') {
    return `This user may not listen on port ${port}: ports below 1024 are the system's. Choose another: PORT=4173 npm start`;
  }
  if (code === 'EADDRNOTAVAIL' || code === 'ENOTFOUND') {
    return `HOST=${host} is no address of this machine. Leave HOST out for 127.0.0.1, or give an address that "ip addr" shows.`;
  }
  return `Nothing can listen on ${host}, port ${port} (${code}). Choose others with HOST and PORT.`;
}
