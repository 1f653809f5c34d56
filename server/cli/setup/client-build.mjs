import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { outputInWords, SetupError } from './say.mjs';

const sources = [
  'src',
  'shared',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
];

/** @param {string} path @param {import('node:crypto').Hash} hash */
function addTo(hash, path) {
  if (statSync(path).isDirectory()) {
    for (const name of readdirSync(path).sort()) addTo(hash, join(path, name));
    return;
  }
  hash.update(path).update(readFileSync(path));
}

/**
 * Builds the client where its sources are not those of the last build.
 *
 * @param {string} projectDirectory
 * @returns {Promise<'built' | 'up to date'>}
 */
export async function ensureClient(projectDirectory) {
  const hash = createHash('sha256');
  for (const source of sources) addTo(hash, join(projectDirectory, source));
  const wanted = hash.digest('hex');
  const output = join(projectDirectory, 'dist', 'client');
  const stamp = join(projectDirectory, 'dist', 'client.sources');
  if (
    existsSync(join(output, 'index.html')) &&
    existsSync(stamp) &&
    readFileSync(stamp, 'utf8') === wanted
  ) {
    return 'up to date';
  }
  const vite = join(projectDirectory, 'node_modules', 'vite', 'bin', 'vite.js');
  const { code, output: said } = await run(process.execPath, [vite, 'build'], {
    cwd: projectDirectory,
  });
  if (code !== 0) throw new SetupError(outputInWords('The client could not be built.', said));
  writeFileSync(stamp, wanted);
  return 'built';
}
