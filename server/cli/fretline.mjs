#!/usr/bin/env node
/**
 * Starts a `fretline` command. Plain JavaScript, since it must run before anything is installed:
 * it installs the packages where they are missing, teaches Node TypeScript, and hands over.
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const commands = ['screen', 'spectrum', 'fit', 'limits', 'evaluate', 'help'];
const projectFolder = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** npm writes this file last, so half an installation counts as none. */
function installPackages() {
  if (existsSync(join(projectFolder, 'node_modules', '.package-lock.json'))) return;
  process.stderr.write('fretline: installing packages (once)\n');
  // Standard output carries results only: what npm says goes to standard error.
  const npm = process.platform === 'win32' ? 'npm.cmd' : 'npm';
  const { status, error } = spawnSync(npm, ['ci'], {
    cwd: projectFolder,
    stdio: ['ignore', 2, 2],
    shell: process.platform === 'win32',
  });
  if (status !== 0) {
    process.stderr.write(`fretline: npm ci failed${error ? `: ${error.message}` : ''}\n`);
    process.exit(1);
  }
}

/** npm runs scripts in the project's folder; paths are meant from where the person stands. */
function returnToCaller() {
  const { npm_lifecycle_event: script, INIT_CWD: folder } = process.env;
  if (script === 'fretline' && folder !== undefined && existsSync(folder)) process.chdir(folder);
}

const [name = '', ...args] = process.argv.slice(2);
const command = ['--help', '-h'].includes(name) ? 'help' : name;
installPackages();
returnToCaller();

// A reader that has seen enough (`… | head`) closes the pipe; that is no fault of ours.
process.stdout.on('error', (error) => {
  if (error.code !== 'EPIPE') throw error;
  process.exit(0);
});

const { register } = await import('tsx/esm/api');
register();
if (commands.includes(command)) {
  const { run } = await import(`./commands/${command}.ts`);
  process.exitCode = await run(args);
} else {
  const { usage } = await import('./commands/help.ts');
  const fault = name === '' ? 'Name a command.' : `There is no command "${name}".`;
  process.stderr.write(`${fault}\n\n${usage}`);
  process.exitCode = 2;
}
