import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { SetupError } from './say.mjs';

const oldestNode = [20, 11];

/** Refuses a Node that is too old, before anything that needs a newer one. */
export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const [wantedMajor = 0, wantedMinor = 0] = oldestNode;
  if (major < wantedMajor || (major === wantedMajor && minor < wantedMinor)) {
    throw new SetupError(
      `Fretline needs Node ${oldestNode.join('.')} or newer; this is ${process.versions.node}.`,
    );
  }
}

/**
 * Installs the npm packages where they are missing or no longer those of the lock file.
 *
 * @param {string} projectDirectory
 * @returns {Promise<'installed' | 'there already'>}
 */
export async function ensurePackages(projectDirectory) {
  const lock = readFileSync(join(projectDirectory, 'package-lock.json'));
  const wanted = createHash('sha256').update(lock).digest('hex');
  // Inside node_modules, so that it goes when that folder goes.
  const stamp = join(projectDirectory, 'node_modules', '.fretline-lock');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return 'there already';
  // The build and the tests need the development packages, whatever NODE_ENV says.
  const { code, output } = await run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: projectDirectory,
    env: { ...process.env, NODE_ENV: 'development' },
  });
  if (code !== 0) {
    throw new SetupError(
      `The npm packages could not be installed (npm ci ended with ${code}). Its last words:\n${output.trim().split('\n').slice(-12).join('\n')}`,
    );
  }
  writeFileSync(stamp, wanted);
  return 'installed';
}
