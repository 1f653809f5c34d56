import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ensureClient } from './client-build.mjs';
import { checkNode, ensurePackages } from './packages.mjs';
import { checkPort, takePlace } from './one-start.mjs';
import { installationSecrets, startPrivateMariadb } from './private-mariadb.mjs';
import { run } from './run.mjs';
import { faultInWords, SetupError, step } from './say.mjs';

const defaultPort = 4173;

/**
 * Does everything between a fresh clone and a running product, and ends all of it on a signal.
 *
 * @param {string} projectDirectory
 * @param {{ buildClient: boolean, serverArguments: readonly string[], beside?: (port: number) => import('node:child_process').ChildProcess, address?: string }} mode
 */
export async function serve(projectDirectory, mode) {
  /** @type {(() => Promise<void> | void)[]} what must be undone, last first */
  const endings = [];
  let ending = false;
  const end = async (/** @type {number} */ code) => {
    if (ending) return;
    ending = true;
    for (const undo of endings.reverse()) {
      try {
        await undo();
      } catch (error) {
        process.stderr.write(`${faultInWords(error)}\n`);
      }
    }
    process.exit(code);
  };
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => {
      if (!ending) process.stdout.write('\nStopping …\n');
      void end(0);
    });
  }
  try {
    checkNode();
    const host = process.env.HOST ?? '127.0.0.1';
    const port = Number(process.env.PORT ?? defaultPort);
    const data = join(projectDirectory, '.data');
    endings.push(takePlace(data));
    await checkPort(host, port);
    await step('npm packages', () => ensurePackages(projectDirectory), String);
    const secrets = installationSecrets(data);
    let databaseUrl = process.env.DATABASE_URL;
    if (!databaseUrl) {
      const database = await step(
        'MariaDB',
        () => startPrivateMariadb(data),
        ({ how }) => how,
      );
      endings.push(database.stop);
      databaseUrl = database.url;
    }
    const files = process.env.DATA_DIR ?? join(data, 'files');
    mkdirSync(files, { recursive: true, mode: 0o700 });
    const demo = process.env.DEMO ?? '1';
    const environment = {
      LOG_LEVEL: 'warn',
      ...process.env,
      DATABASE_URL: databaseUrl,
      DATA_DIR: files,
      HOST: host,
      PORT: String(port),
      AUTH_SECRET: process.env.AUTH_SECRET ?? secrets.authSecret,
      DEMO: demo,
    };
    if (mode.buildClient) await step('Client', () => ensureClient(projectDirectory), String);
    if (demo === '1' || demo === 'true') {
      await step('Demo data', () => loadDemo(projectDirectory, environment), String);
    }
    if (ending) return;
    await startServer(projectDirectory, mode, environment, endings, end);
    if (mode.beside) {
      const beside = mode.beside(port);
      endings.push(() => stopChild(beside));
    }
    printAddress(mode.address ?? `http://${host}:${port}`, files, demo);
  } catch (error) {
    if (ending) return;
    process.stderr.write(`\n${faultInWords(error)}\n`);
    await end(1);
  }
}

/** @param {string} projectDirectory @param {NodeJS.ProcessEnv} environment */
async function loadDemo(projectDirectory, environment) {
  const { code, output } = await run(
    process.execPath,
    ['--import', 'tsx', 'server/cli/load-demo.ts'],
    { cwd: projectDirectory, env: environment },
  );
  if (code !== 0) throw new SetupError(`The demo data could not be loaded:\n${output.trim()}`);
  return output.trim().split('\n').at(-1) ?? '';
}

/**
 * @param {string} projectDirectory
 * @param {{ serverArguments: readonly string[] }} mode
 * @param {NodeJS.ProcessEnv} environment
 * @param {(() => Promise<void> | void)[]} endings
 * @param {(code: number) => Promise<void>} end
 * @returns {Promise<void>} when it listens
 */
function startServer(projectDirectory, mode, environment, endings, end) {
  return step('Server', () => {
    // Detached: a Ctrl-C of the terminal reaches this process alone, which then ends the rest in order.
    const server = spawn(process.execPath, [...mode.serverArguments, 'server/main.ts'], {
      cwd: projectDirectory,
      env: environment,
      stdio: ['ignore', 'pipe', 'inherit'],
      detached: true,
    });
    endings.push(() => stopChild(server));
    return new Promise((resolve, reject) => {
      let listening = false;
      server.stdout.on('data', (chunk) => {
        const text = String(chunk);
        if (!listening && text.includes('listening on')) {
          listening = true;
          resolve(undefined);
          return;
        }
        if (!text.startsWith('listening on')) process.stdout.write(text);
      });
      server.on('error', reject);
      server.on('exit', (code) => {
        if (!listening) reject(new SetupError('The server could not start; see above.'));
        else {
          process.stderr.write(`The server ended by itself (${code}). Start again: npm start\n`);
          void end(1);
        }
      });
    });
  });
}

/** @param {import('node:child_process').ChildProcess} child @returns {Promise<void>} */
function stopChild(child) {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) {
      resolve();
      return;
    }
    child.removeAllListeners('exit');
    const impatient = setTimeout(() => child.kill('SIGKILL'), 20_000);
    child.once('exit', () => {
      clearTimeout(impatient);
      resolve();
    });
    child.kill('SIGTERM');
  });
}

/** @param {string} address @param {string} files @param {string} demo */
function printAddress(address, files, demo) {
  process.stdout.write(`\nFretline is at ${address}   (Ctrl-C ends it)\n`);
  const accounts = join(files, 'demo-accounts.json');
  if ((demo !== '1' && demo !== 'true') || !existsSync(accounts)) return;
  process.stdout.write('\nDemo accounts:\n');
  for (const { role, email, password } of JSON.parse(readFileSync(accounts, 'utf8'))) {
    process.stdout.write(`  ${role.padEnd(17)} ${email.padEnd(30)} ${password}\n`);
  }
  process.stdout.write('\n');
}
