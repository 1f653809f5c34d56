// `npm test`: every gate, from a fresh clone. `--quick` leaves out what needs a browser.
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureChromium, ensureMariadb } from './setup/debian.mjs';
import { createGates } from './setup/gates.mjs';
import { checkNode, ensurePackages } from './setup/packages.mjs';
import { stopRunning } from './setup/run.mjs';
import { faultInWords, step } from './setup/say.mjs';

const projectDirectory = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');
const quick = process.argv.includes('--quick');
const scratch = mkdtempSync(join(tmpdir(), 'fretline-gates-'));
const gates = createGates(projectDirectory, scratch);

/** @param {number} code */
function close(code) {
  rmSync(scratch, { recursive: true, force: true });
  const { passed, failed } = gates.counts;
  process.stdout.write(`${passed} passed, ${failed} failed\n`);
  process.exitCode = code;
}

let brokenOff = false;
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, async () => {
    if (brokenOff) return;
    brokenOff = true;
    process.stdout.write(`\nBroken off (${signal}); stopping what runs …\n`);
    gates.breakOff();
    await stopRunning();
    gates.counts.failed += 1;
    close(130);
    process.exit();
  });
}
// A closed terminal takes the output away; what runs must be stopped all the same.
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);

const folders = ['shared', 'server', 'src', 'fixtures', 'tests'];
const dependencyRules = ['--config', 'tests/architecture/dependency-rules.cjs'];

try {
  checkNode();
  await step('npm packages', (note) => ensurePackages(projectDirectory, note), String);
  await step('MariaDB', ensureMariadb, ({ server }) => server);
  if (!quick) await step('Chromium', ensureChromium, String);
  // Two at a time, for two cores: the linter takes as long as the other three together.
  await Promise.all([
    gates.whole('lint', 'eslint', ['-c', 'tests/lint/eslint.config.js', '.']),
    (async () => {
      await gates.whole('types', 'tsc', ['-b', ...folders]);
      await gates.whole('dependency rules', 'depcruise', [...dependencyRules, ...folders]);
      await gates.whole('formatting', 'prettier', ['--check', '--log-level', 'warn', '.']);
      await gates.whole('client build', 'vite', ['build', '--outDir', join(scratch, 'client')]);
    })(),
  ]);
  await gates.tests('shared', ['shared']);
  await gates.tests('server', ['server']);
  await gates.tests('client', ['client']);
  if (!quick) await gates.tests('browser', ['e2e']);
} catch (error) {
  if (!brokenOff) {
    gates.counts.failed += 1;
    process.stdout.write(`${faultInWords(error)}\n`);
  }
}
if (!brokenOff) close(gates.counts.failed === 0 ? 0 : 1);
