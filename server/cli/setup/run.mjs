import { spawn } from 'node:child_process';

/**
 * Runs a program to its end.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, show?: boolean }} [options] `show`: its output is
 *   the person's to see; else it is kept and given back
 * @returns {Promise<{ code: number, output: string }>} code 127 where the program is missing
 */
export function run(command, args, { cwd, env, show = false } = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, {
      ...(cwd === undefined ? {} : { cwd }),
      env: env ?? process.env,
      stdio: ['ignore', show ? 'inherit' : 'pipe', show ? 'inherit' : 'pipe'],
    });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => resolve({ code: 127, output: error.message }));
    child.on('close', (code, signal) => resolve({ code: code ?? (signal ? 1 : 0), output }));
  });
}
