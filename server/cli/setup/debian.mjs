import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';
import { SetupError } from './say.mjs';

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
 * @returns {Promise<string>} its full path
 */
export async function ensureProgram(program, packages) {
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
    const environment = ['DEBIAN_FRONTEND=noninteractive'];
    const command = ['env', ...environment, 'apt-get', '-y', '-q', ...args];
    const [first = 'env', ...rest] = asRoot ? command : ['sudo', '-n', ...command];
    return run(first, rest);
  };
  const install = ['install', '--no-install-recommends', ...packages];
  let result = await apt(install);
  if (result.code !== 0) {
    // A fresh machine has no package lists, an old one stale ones.
    await apt(['update']);
    result = await apt(install);
  }
  const path = findProgram(program);
  if (result.code !== 0 || path === null) {
    throw new SetupError(
      `${packages.join(', ')} could not be installed. ${byHand}\napt-get said:\n${result.output.trim().split('\n').slice(-8).join('\n')}`,
    );
  }
  return path;
}

/** The server alone: this package brings no daemon of its own that would be left running. */
export const ensureMariadb = async () => {
  const server = await ensureProgram('mariadbd', ['mariadb-server-core', 'mariadb-client-core']);
  const maker = await ensureProgram('mariadb-install-db', ['mariadb-server-core']);
  await ensureProgram('my_print_defaults', ['mariadb-client-core']);
  return { server, maker };
};

export const ensureChromium = () => ensureProgram('chromium', ['chromium']);
