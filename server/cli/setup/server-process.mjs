import { spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import { signalGroup } from './run.mjs';
import { outputInWords, SetupError } from './say.mjs';

const endsWithinMs = 20_000;

/**
 * Starts the server and waits until it listens.
 *
 * @param {string} projectDirectory
 * @param {{ args: readonly string[], env: NodeJS.ProcessEnv, onSpawn: (child: import('node:child_process').ChildProcess) => void, onCrash: (how: string) => void }} options
 *   `onSpawn` hears of the process at once, `onCrash` when it ends by itself after it listened
 * @returns {Promise<{ address: string, said: string[] }>} where it listens, and what else it said until then
 */
export function startServerProcess(projectDirectory, { args, env, onSpawn, onCrash }) {
  const child = spawn(process.execPath, [...args, 'server/main.ts'], {
    cwd: projectDirectory,
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
    // A Ctrl-C of the terminal reaches the starter alone, which then ends the rest in order.
    detached: true,
  });
  onSpawn(child);
  return new Promise((resolve, reject) => {
    let listening = false;
    /** @type {string[]} */
    const early = [];
    const hear = (/** @type {NodeJS.WriteStream} */ to) => (/** @type {string} */ line) => {
      const address = /^listening on (\S+)/.exec(line)?.[1];
      if (address !== undefined) {
        if (!listening) resolve({ address, said: early });
        listening = true;
      } else if (listening) to.write(`${line}\n`);
      else early.push(line);
    };
    createInterface({ input: child.stdout }).on('line', hear(process.stdout));
    createInterface({ input: child.stderr }).on('line', hear(process.stderr));
    child.on('error', reject);
    child.on('close', (code, signal) => {
      if (listening) onCrash(signal === null ? `exit code ${code}` : `signal ${signal}`);
      else reject(new SetupError(outputInWords('The server could not start.', early.join('\n'))));
    });
  });
}

/** Ends a child and what it started. @param {import('node:child_process').ChildProcess} child @returns {Promise<void>} */
export function stopChild(child) {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) {
      resolve();
      return;
    }
    const impatient = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), endsWithinMs);
    child.once('exit', () => {
      clearTimeout(impatient);
      resolve();
    });
    child.kill('SIGTERM');
  });
}
