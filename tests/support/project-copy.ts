import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { cpSync, mkdtempSync, realpathSync, rmSync, symlinkSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { endProcess, findProcesses } from '#server/cli/setup/processes.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url));
const parts = [
  'index.html',
  'package-lock.json',
  'package.json',
  'server',
  'shared',
  'src',
  'fixtures',
  'tailwind.config.ts',
  'tsconfig.json',
  'vite.config.ts',
];

/** A copy of the project with the packages of this one, to start in without touching this one's data. */
export function copyProject(): string {
  const directory = realpathSync(mkdtempSync(join(tmpdir(), 'fretline-copy-')));
  for (const part of parts) {
    cpSync(join(projectDirectory, part), join(directory, part), { recursive: true });
  }
  symlinkSync(join(projectDirectory, 'node_modules'), join(directory, 'node_modules'));
  return directory;
}

/** Processes that work in a folder or were started with it. */
export const processesOf = (directory: string): number[] =>
  findProcesses((words) => words.some((word) => word.includes(directory)));

/** Ends whatever a failed test may have left, and takes the copy away. */
export async function removeProject(directory: string): Promise<void> {
  await Promise.all(processesOf(directory).map((pid) => endProcess(pid, 10_000)));
  for (const pid of processesOf(directory)) process.kill(pid, 'SIGKILL');
  rmSync(directory, { recursive: true, force: true, maxRetries: 5 });
}

export interface Start {
  process: ChildProcess;
  /** What it has printed so far. */
  output: () => string;
  /** Waits until it printed the words. */
  printed: (words: RegExp) => Promise<RegExpExecArray>;
  /** Sends the signal and waits for the end; without one only waits. */
  ended: (signal?: NodeJS.Signals) => Promise<number | null>;
}

/** `npm start` in a copy, without npm itself. */
export function startProject(directory: string, environment: Record<string, string>): Start {
  const { DATABASE_URL: _url, PORT: _port, ...inherited } = process.env;
  const child = spawn(process.execPath, [join(directory, 'server/cli/start.mjs')], {
    cwd: directory,
    env: { ...inherited, DEMO: '0', ...environment },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  const waiting = new Set<() => void>();
  const hear = (part: Buffer) => {
    said += String(part);
    for (const look of [...waiting]) look();
  };
  child.stdout.on('data', hear);
  child.stderr.on('data', hear);
  const gone = once(child, 'close');
  return {
    process: child,
    output: () => said,
    printed: (words) =>
      new Promise((resolve, reject) => {
        const look = () => {
          const found = words.exec(said);
          if (found === null) return;
          waiting.delete(look);
          resolve(found);
        };
        waiting.add(look);
        look();
        void gone.then(() => reject(new Error(`It ended without ${words}:\n${said}`)));
      }),
    ended: async (signal) => {
      if (signal !== undefined) child.kill(signal);
      await gone;
      return child.exitCode;
    },
  };
}
