// `npm test`: every gate, from a fresh clone. `--quick` leaves out what needs a browser.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureChromium, ensureMariadb } from './setup/debian.mjs';
import { checkNode, ensurePackages } from './setup/packages.mjs';
import { run } from './setup/run.mjs';
import { faultInWords, step } from './setup/say.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const quick = process.argv.includes('--quick');
const scratch = mkdtempSync(join(tmpdir(), 'fretline-gates-'));
const counts = { passed: 0, failed: 0 };

/** @param {string} program */
const bin = (program) => join(projectDirectory, 'node_modules', '.bin', program);

/**
 * A gate that passes or fails as a whole.
 *
 * @param {string} name
 * @param {readonly string[]} command
 */
async function gate(name, [program = '', ...args]) {
  const begun = performance.now();
  const { code, output } = await run(bin(program), args, { cwd: projectDirectory });
  const seconds = ((performance.now() - begun) / 1000).toFixed(1);
  counts[code === 0 ? 'passed' : 'failed'] += 1;
  process.stdout.write(`${code === 0 ? 'passed' : 'FAILED'}  ${name} (${seconds} s)\n`);
  if (code !== 0) process.stdout.write(`${output.trim()}\n`);
}

/** @param {string} name @param {readonly string[]} projects */
async function tests(name, projects) {
  const begun = performance.now();
  const file = join(scratch, `${name}.json`);
  const args = projects.flatMap((project) => ['--project', project]);
  const { code, output } = await run(
    bin('vitest'),
    ['run', ...args, '--reporter=default', '--reporter=./tests/support/count-reporter.ts'],
    { cwd: projectDirectory, env: { ...process.env, TEST_COUNTS_FILE: file, FORCE_COLOR: '0' } },
  );
  const seconds = ((performance.now() - begun) / 1000).toFixed(1);
  const counted = existsSync(file)
    ? JSON.parse(readFileSync(file, 'utf8'))
    : { passed: 0, failed: 1 };
  if (code !== 0 && counted.failed === 0) counted.failed = 1;
  counts.passed += counted.passed;
  counts.failed += counted.failed;
  const verdict = counted.failed === 0 ? 'passed' : 'FAILED';
  process.stdout.write(
    `${verdict}  ${name}: ${counted.passed} passed, ${counted.failed} failed (${seconds} s)\n`,
  );
  if (counted.failed > 0) process.stdout.write(`${output.trim()}\n`);
}

const clean = () => rmSync(scratch, { recursive: true, force: true });
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => {
    clean();
    process.exit(130);
  });
}

try {
  checkNode();
  await step('npm packages', () => ensurePackages(projectDirectory), String);
  await step('MariaDB', ensureMariadb, ({ server }) => server);
  if (!quick) await step('Chromium', ensureChromium, String);
  // Two at a time, for two cores: the linter takes as long as the other three together.
  await Promise.all([
    gate('lint', ['eslint', '-c', 'tests/lint/eslint.config.js', '.']),
    (async () => {
      await gate('types', ['tsc', '-b', 'shared', 'server', 'src', 'fixtures', 'tests']);
      await gate('dependency rules', [
        'depcruise',
        '--config',
        'tests/architecture/dependency-rules.cjs',
        'src',
        'server',
        'shared',
        'fixtures',
        'tests',
      ]);
      await gate('formatting', ['prettier', '--check', '--log-level', 'warn', '.']);
    })(),
  ]);
  await tests('shared', ['shared']);
  await tests('server', ['server']);
  await tests('client', ['client']);
  await gate('client build', ['vite', 'build', '--outDir', join(scratch, 'client')]);
  if (!quick) await tests('browser', ['e2e']);
} catch (error) {
  counts.failed += 1;
  process.stdout.write(`${faultInWords(error)}\n`);
}
clean();
process.exitCode = counts.failed === 0 ? 0 : 1;
process.stdout.write(`${counts.passed} passed, ${counts.failed} failed\n`);
