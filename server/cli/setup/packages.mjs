import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { outputInWords, SetupError } from './say.mjs';

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
 * @typedef {Record<string, { version?: string, integrity?: string, optional?: boolean }>} Packages
 */

/** @param {string} path @returns {Packages} */
function packagesOf(path) {
  const { '': _project, ...packages } = JSON.parse(readFileSync(path, 'utf8')).packages;
  return packages;
}

/**
 * Whether node_modules holds what the lock file asks for, by npm's own record of what it put there.
 * npm writes that record last and takes it away first, so half an installation has none; one made
 * with NODE_ENV=production lacks the development packages in it.
 *
 * @param {string} projectDirectory
 */
export function packagesAreThere(projectDirectory) {
  const record = join(projectDirectory, 'node_modules', '.package-lock.json');
  if (!existsSync(record)) return false;
  try {
    const there = packagesOf(record);
    const wanted = packagesOf(join(projectDirectory, 'package-lock.json'));
    const same = (/** @type {string} */ path) =>
      wanted[path]?.version === there[path]?.version &&
      wanted[path]?.integrity === there[path]?.integrity;
    return (
      Object.keys(there).every(same) &&
      // Packages for other processors and systems are optional, and never there.
      Object.keys(wanted).every((path) => same(path) || (wanted[path]?.optional && !there[path]))
    );
  } catch {
    return false;
  }
}

/**
 * Installs the npm packages where they are missing or no longer those of the lock file.
 *
 * @param {string} projectDirectory
 * @param {(words: string) => void} note
 * @returns {Promise<'installed' | 'there already'>}
 */
export async function ensurePackages(projectDirectory, note) {
  if (packagesAreThere(projectDirectory)) return 'there already';
  note('installing them, up to a minute');
  // The build and the tests need the development packages, whatever NODE_ENV says.
  const { code, output } = await run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: projectDirectory,
    env: { ...process.env, NODE_ENV: 'development' },
  });
  if (code === 127) {
    throw new SetupError('npm is missing. Install it with Node (package npm) and start again.');
  }
  if (code !== 0) {
    throw new SetupError(outputInWords('The npm packages could not be installed.', output));
  }
  return 'installed';
}
