import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { outputInWords, SetupError } from './say.mjs';

/** Servers lie in sbin, which an ordinary user's PATH often lacks. */
const folders = () => [
  ...(process.env.PATH ?? '').split(':').filter(Boolean),
  '/usr/local/sbin',
  '/usr/sbin',
  '/sbin',
  '/usr/bin',
];

/**
 * @param {string} program
 * @returns {string | null} its full path
 */
export function findProgram(program) {
  for (const folder of folders()) {
    const path = join(folder, program);
    if (existsSync(path)) return path;
  }
  return null;
}

/**
 * Finds a program, installing the Debian packages that bring it where it is missing: as root, or
 * through a sudo that asks no password.
 *
 * @param {string} program
 * @param {readonly string[]} packages
 * @param {(words: string) => void} note
 * @returns {Promise<string>} its full path
 */
export async function ensureProgram(program, packages, note) {
  const there = findProgram(program);
  if (there !== null) return there;
  const byHand = `Install it by hand: apt-get install ${packages.join(' ')}`;
  if (findProgram('apt-get') === null) {
    throw new SetupError(`${program} is missing, and this is no Debian. ${byHand}`);
  }
  const asRoot = process.getuid?.() === 0;
  if (!asRoot && (await run('sudo', ['-n', 'true'])).code !== 0) {
    throw new SetupError(
      `${program} is missing, and this user may not install packages. ${byHand} (as root).`,
    );
  }
  /** @param {readonly string[]} args */
  const apt = (args) => {
    const command = ['env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-y', '-q', ...args];
    const [first = 'env', ...rest] = asRoot ? command : ['sudo', '-n', ...command];
    // Half an installation would be in the way of every later one.
    return run(first, rest, { mayEnd: false });
  };
  note(`installing ${packages.join(' and ')} with apt-get`);
  const install = ['install', '--no-install-recommends', ...packages];
  let result = await apt(install);
  if (result.code !== 0) {
    // A fresh machine has no package lists, an old one stale ones.
    const { code, output } = await apt(['update']);
    result = await apt(install);
    if (result.code !== 0 && code !== 0) result.output += output;
  }
  const path = findProgram(program);
  if (result.code !== 0 || path === null) {
    throw new SetupError(
      outputInWords(
        `${packages.join(' and ')} could not be installed. ${byHand} (as root).`,
        result.output,
      ),
    );
  }
  return path;
}

const silent = () => undefined;

/** The server alone: this package brings no daemon of its own that would be left running. */
export const ensureMariadb = async (/** @type {(words: string) => void} */ note = silent) => {
  const packages = ['mariadb-server-core', 'mariadb-client-core'];
  const server = await ensureProgram('mariadbd', packages, note);
  const maker = await ensureProgram('mariadb-install-db', packages, note);
  // mariadb-install-db calls it, and Debian keeps it in the client's package.
  await ensureProgram('my_print_defaults', packages, note);
  return { server, maker };
};

export const ensureChromium = (/** @type {(words: string) => void} */ note = silent) =>
  ensureProgram('chromium', ['chromium'], note);
