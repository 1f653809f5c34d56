import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run.mjs';

/**
 * @typedef {object} Gates
 * @property {{ passed: number, failed: number }} counts over all gates so far
 * @property {(name: string, program: string, args: readonly string[]) => Promise<void>} whole a gate
 *   that passes or fails as one, and counts as one test
 * @property {(name: string, projects: readonly string[]) => Promise<void>} tests a gate of vitest
 *   projects: every test counts
 * @property {() => void} breakOff begins no further gate, and says nothing of those that are broken off
 */

/**
 * The gates of one run. Each prints one line, and in full what failed in it.
 *
 * @param {string} projectDirectory
 * @param {string} scratch a folder for this run alone
 * @returns {Gates}
 */
export function createGates(projectDirectory, scratch) {
  const counts = { passed: 0, failed: 0 };
  let brokenOff = false;
  // Colours are for a terminal, and this output is kept; vitest takes FORCE_COLOR=0 for a yes.
  /** @type {NodeJS.ProcessEnv} */
  const env = { ...process.env, NO_COLOR: '1' };
  delete env.FORCE_COLOR;
  // React refuses to be tested where this says production.
  delete env.NODE_ENV;
  const bin = (/** @type {string} */ program) =>
    join(projectDirectory, 'node_modules', '.bin', program);

  /** @param {string} program @param {readonly string[]} args @param {NodeJS.ProcessEnv} [more] */
  const timed = async (program, args, more = {}) => {
    const begun = performance.now();
    const result = await run(bin(program), args, {
      cwd: projectDirectory,
      env: { ...env, ...more },
    });
    return { ...result, seconds: ((performance.now() - begun) / 1000).toFixed(1) };
  };
  const tell = (
    /** @type {boolean} */ good,
    /** @type {string} */ line,
    /** @type {string} */ output,
  ) => {
    if (brokenOff) return;
    process.stdout.write(`${good ? 'passed' : 'FAILED'}  ${line}\n`);
    if (!good) process.stdout.write(`${output.trim()}\n`);
  };

  return {
    counts,
    breakOff: () => void (brokenOff = true),

    whole: async (name, program, args) => {
      if (brokenOff) return;
      const { code, output, seconds } = await timed(program, args);
      const good = code === 0;
      if (!brokenOff) counts[good ? 'passed' : 'failed'] += 1;
      tell(good, `${name} (${seconds} s)`, output);
    },

    tests: async (name, projects) => {
      if (brokenOff) return;
      const file = join(scratch, `${name}.json`);
      const chosen = projects.flatMap((project) => ['--project', project]);
      const reporters = ['--reporter=default', '--reporter=./tests/support/count-reporter.ts'];
      const { code, output, seconds } = await timed('vitest', ['run', ...chosen, ...reporters], {
        TEST_COUNTS_FILE: file,
      });
      const { passed, failed } = countsIn(file, code);
      if (!brokenOff) {
        counts.passed += passed;
        counts.failed += failed;
      }
      tell(failed === 0, `${name}: ${passed} passed, ${failed} failed (${seconds} s)`, output);
    },
  };
}

/** A run that ended badly, or without counts, has failed even where no test says so. @param {string} file @param {number} code */
function countsIn(file, code) {
  const none = { passed: 0, failed: 0 };
  const counted = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : none;
  const nothingRan = counted.passed === 0 && counted.failed === 0;
  if (counted.failed === 0 && (code !== 0 || nothingRan)) return { ...counted, failed: 1 };
  return counted;
}
