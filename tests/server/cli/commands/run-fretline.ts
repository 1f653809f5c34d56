import { spawn } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll } from 'vitest';

const projectFolder = fileURLToPath(new URL('../../../../', import.meta.url));

export interface CommandOutcome {
  status: number | null;
  stdout: string;
  stderr: string;
  /** Standard output read as one JSON object a line. */
  lines: Record<string, unknown>[];
}

/** Runs the real command in a process of its own, in the given folder. */
export function runFretline(args: readonly string[], cwd: string): Promise<CommandOutcome> {
  return runProcess(
    process.execPath,
    [join(projectFolder, 'server/cli/fretline.mjs'), ...args],
    cwd,
  );
}

/** Runs it as the documentation says, through npm. */
export function runThroughNpm(args: readonly string[], cwd: string): Promise<CommandOutcome> {
  const npmArgs = ['--prefix', projectFolder, 'run', '--silent', 'fretline', '--', ...args];
  return runProcess('npm', npmArgs, cwd);
}

function runProcess(file: string, args: readonly string[], cwd: string): Promise<CommandOutcome> {
  return new Promise((resolve, reject) => {
    const child = spawn(file, args, { cwd, stdio: ['ignore', 'pipe', 'pipe'] });
    let stdout = '';
    let stderr = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => (stdout += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (stderr += text));
    child.on('error', reject);
    child.on('close', (status) => {
      const texts = stdout.split('\n').filter((line) => line.startsWith('{'));
      const lines = texts.map((line) => JSON.parse(line) as Record<string, unknown>);
      resolve({ status, stdout, stderr, lines });
    });
  });
}

/** A folder of files for the tests of one file; made before and removed after them. */
export function folderOfFiles(files: Readonly<Record<string, string | Uint8Array>>): {
  path: string;
} {
  const folder = { path: '' };
  beforeAll(() => {
    folder.path = mkdtempSync(join(tmpdir(), 'fretline-cli-'));
    for (const [name, content] of Object.entries(files)) {
      mkdirSync(dirname(join(folder.path, name)), { recursive: true });
      writeFileSync(join(folder.path, name), content);
    }
  });
  afterAll(() => rmSync(folder.path, { recursive: true }));
  return folder;
}

/** A shaft at 1500 r/min with a little noise, sampled for 1.6 s: sound, and long enough to judge. */
export function soundSamples(): number[] {
  let state = 7;
  const noise = () => {
    state = (Math.imul(state, 1103515245) + 12345) & 0x7fffffff;
    return state / 0x7fffffff - 0.5;
  };
  return Array.from(
    { length: 4096 },
    (_, i) => Math.sin((2 * Math.PI * 25 * i) / 2560) + 0.2 * noise(),
  );
}

/** The samples as one column with its comment lines. */
export function waveformFile(head: readonly string[], samples = soundSamples()): string {
  return `${head.join('\n')}\n${samples.map((value) => value.toFixed(5)).join('\n')}\n`;
}
