import { spawn } from 'node:child_process';
import { constants } from 'node:os';
import { setTimeout as sleep } from 'node:timers/promises';

/** What runs just now, with whether it may be broken off. @type {Map<import('node:child_process').ChildProcess, { mayEnd: boolean, gone: Promise<void> }>} */
const running = new Map();

/**
 * Runs a program to its end. It gets a process group of its own: a Ctrl-C of the terminal reaches
 * this process alone, which then ends everything in order.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, mayEnd?: boolean }} [options] `mayEnd: false` for
 *   what must not be broken off half-way, such as dpkg
 * @returns {Promise<{ code: number, output: string }>} code 127 where the program is missing, as a
 *   shell has it; 128 and the signal's number where a signal ended it
 */
export function run(command, args, { cwd, env, mayEnd = true } = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, {
      ...(cwd === undefined ? {} : { cwd }),
      env: env ?? process.env,
      stdio: ['ignore', 'pipe', 'pipe'],
      detached: true,
    });
    /** @type {Promise<void>} */
    const gone = new Promise((done) => {
      const end = (/** @type {number} */ code, /** @type {string} */ output) => {
        running.delete(child);
        done();
        resolve({ code, output });
      };
      /** @type {Buffer[]} */
      const output = [];
      child.stdout.on('data', (chunk) => output.push(chunk));
      child.stderr.on('data', (chunk) => output.push(chunk));
      child.on('error', (error) => end(127, error.message));
      child.on('close', (code, signal) => {
        const number = signal === null ? 1 : 128 + (constants.signals[signal] ?? 0);
        end(code ?? number, Buffer.concat(output).toString('utf8'));
      });
    });
    running.set(child, { mayEnd, gone });
  });
}

/** Sends a signal to a child and everything it started. @param {number | undefined} pid @param {NodeJS.Signals} signal */
export function signalGroup(pid, signal) {
  if (pid === undefined) return;
  try {
    process.kill(-pid, signal);
  } catch {
    // Gone already.
  }
}

/** Whether anything is left of a child and what it started. @param {number | undefined} pid */
function groupIsThere(pid) {
  if (pid === undefined) return false;
  try {
    process.kill(-pid, 0);
    return true;
  } catch {
    return false;
  }
}

/** Breaks off what `run` has going, and waits until it is gone with all it started. */
export async function stopRunning() {
  const until = Date.now() + 10_000;
  await Promise.all(
    [...running].map(async ([{ pid }, { mayEnd, gone }]) => {
      if (!mayEnd) {
        await gone;
        return;
      }
      signalGroup(pid, 'SIGTERM');
      // A child may end before what it started; a server of a test run waits for its database.
      while (groupIsThere(pid) && Date.now() < until) await sleep(50);
      signalGroup(pid, 'SIGKILL');
      await gone;
    }),
  );
}
