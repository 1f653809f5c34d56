import { existsSync, mkdirSync, readFileSync, statfsSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureClient } from './client-build.mjs';
import { createEndings } from './endings.mjs';
import { checkGivenDatabase, givenDatabaseUrl } from './given-database.mjs';
import { checkPort, endLeftServer, portOf, rememberServer, takePlace } from './one-start.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { installationSecrets, startPrivateMariadb } from './private-mariadb.mjs';
import { run } from './run.mjs';
import { faultInWords, outputInWords, SetupError, step } from './say.mjs';
import { startServerProcess, stopChild } from './server-process.mjs';

const usualPort = 4173;
const megabyte = 1024 * 1024;
/** MariaDB's own files, the packages and the demo take about 600 MB; a start of what is there little. */
const roomMegabytes = { first: 800, later: 50 };

/**
 * @typedef {object} Mode
 * @property {boolean} buildClient
 * @property {readonly string[]} serverArguments
 * @property {NodeJS.ProcessEnv} [environment] what holds where the person says nothing else
 * @property {(serverAddress: string) => { child: import('node:child_process').ChildProcess, address: string }} [beside]
 *   a process beside the server, and the address people use then
 */

/**
 * Does everything between a fresh clone and a running product, and ends all of it on a signal.
 *
 * @param {string} projectDirectory
 * @param {Mode} mode
 */
export async function serve(projectDirectory, mode) {
  const endings = createEndings('Stopping …');
  try {
    checkNode();
    const environment = { ...mode.environment, ...(await prepare(projectDirectory, endings)) };
    if (mode.buildClient) await step('Client', () => ensureClient(projectDirectory), String);
    const demo = ['1', 'true'].includes(environment.DEMO);
    if (demo) await step('Demo data', () => loadDemo(projectDirectory, environment), String);
    if (endings.begun()) return;
    const { address: serverAddress, said } = await step(
      'Server',
      () => startServer(projectDirectory, mode, environment, endings),
      () => 'listening',
    );
    for (const line of said) process.stdout.write(`${line}\n`);
    let address = serverAddress;
    if (mode.beside) {
      const beside = mode.beside(serverAddress);
      endings.add(() => stopChild(beside.child));
      beside.child.once('exit', (code) => {
        if (endings.begun()) return;
        process.stderr.write(`The client's development server ended by itself (${code}).\n`);
        void endings.end(1);
      });
      address = beside.address;
    }
    printAddress(address, environment.DATA_DIR, demo);
  } catch (error) {
    if (endings.begun()) return;
    process.stderr.write(`\n${faultInWords(error)}\n`);
    await endings.end(1);
  }
}

/**
 * Packages, database and secrets: all that must be there before the product's own code can run.
 *
 * @param {string} projectDirectory
 * @param {import('./endings.mjs').Endings} endings
 */
async function prepare(projectDirectory, endings) {
  const { env } = process;
  const host = env.HOST || '127.0.0.1';
  const port = portOf(env.PORT, usualPort);
  const data = join(projectDirectory, '.data');
  endings.add(takePlace(data));
  if (await endLeftServer(projectDirectory, data)) {
    process.stdout.write('Ended the server of an earlier start that was killed.\n');
  }
  await checkPort(host, port);
  checkRoom(data, existsSync(join(data, 'files')) ? 'later' : 'first');
  await step('npm packages', (note) => ensurePackages(projectDirectory, note), String);

  const secrets = installationSecrets(data);
  const files = env.DATA_DIR || join(data, 'files');
  const given = givenDatabaseUrl(env);
  const url =
    given ??
    (
      await step(
        'MariaDB',
        (note) => startPrivateMariadb(data, { note, onStop: endings.add }),
        ({ how }) => how,
      )
    ).url;
  if (given !== null) {
    await step('MariaDB', () => checkGivenDatabase(given, env.DATABASE_SOCKET), String);
  }
  mkdirSync(files, { recursive: true, mode: 0o700 });
  return {
    LOG_LEVEL: 'warn',
    ...env,
    DATABASE_URL: url,
    ...(env.AUTH_SECRET || env.AUTH_SECRET_FILE ? {} : { AUTH_SECRET: secrets.authSecret }),
    DATA_DIR: files,
    HOST: host,
    PORT: String(port),
    DEMO: env.DEMO || '1',
  };
}

/** A disk that fills up half-way through says so in a hundred ways; this one is plain. @param {string} folder @param {'first' | 'later'} start */
function checkRoom(folder, start) {
  const { bavail, bsize } = statfsSync(folder);
  const freeMegabytes = Math.floor((bavail * bsize) / megabyte);
  if (freeMegabytes >= roomMegabytes[start]) return;
  throw new SetupError(
    `The disk is full: ${freeMegabytes} MB are free where ${folder} lies, and a start needs ${roomMegabytes[start]} MB. Free some space, then start again.`,
  );
}

/**
 * Fills an empty database with the demo. Looking whether it is empty takes a second or two, so a
 * mark beside the private database remembers it, and goes when that database goes.
 *
 * @param {string} projectDirectory
 * @param {NodeJS.ProcessEnv} environment
 */
async function loadDemo(projectDirectory, environment) {
  const own = givenDatabaseUrl(process.env) === null;
  const mark = own ? join(projectDirectory, '.data', 'mariadb', 'demo') : null;
  if (mark !== null && existsSync(mark)) return 'there already';
  const { code, output } = await run(
    process.execPath,
    ['--import', 'tsx', 'server/cli/load-demo.ts'],
    { cwd: projectDirectory, env: environment },
  );
  if (code !== 0) throw new SetupError(outputInWords('The demo could not be loaded.', output));
  if (mark !== null) writeFileSync(mark, '');
  return output.trim().split('\n').at(-1) ?? '';
}

/**
 * @param {string} projectDirectory
 * @param {Mode} mode
 * @param {NodeJS.ProcessEnv} environment
 * @param {import('./endings.mjs').Endings} endings
 * @returns {Promise<{ address: string, said: string[] }>}
 */
function startServer(projectDirectory, mode, environment, endings) {
  return startServerProcess(projectDirectory, {
    args: mode.serverArguments,
    env: environment,
    onSpawn: (child) => {
      endings.add(rememberServer(join(projectDirectory, '.data'), child.pid ?? 0));
      endings.add(() => stopChild(child));
    },
    onCrash: (how) => {
      if (endings.begun()) return;
      process.stderr.write(
        `The server ended by itself (${how}); its last words are above. Stopping the rest. Start again with npm start; what was being screened goes on then.\n`,
      );
      void endings.end(1);
    },
  });
}

/** @param {string} address @param {string} files @param {boolean} demo */
function printAddress(address, files, demo) {
  process.stdout.write(`\nFretline is at ${address}   (Ctrl-C ends it)\n`);
  const accounts = join(files, 'demo-accounts.json');
  if (!demo || !existsSync(accounts)) return;
  process.stdout.write('\nDemo accounts:\n');
  for (const { role, email, password } of JSON.parse(readFileSync(accounts, 'utf8'))) {
    process.stdout.write(`  ${role.padEnd(17)} ${email.padEnd(30)} ${password}\n`);
  }
  process.stdout.write('\n');
}
