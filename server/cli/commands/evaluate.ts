import { readFile, writeFile } from 'node:fs/promises';
import { methodVersion } from '#shared/signal/screen-waveform.ts';
import type { CaseOutcome } from '../evaluate/case-outcome.ts';
import { fitReport } from '../evaluate/fit-report.ts';
import { gatherFigures } from '../evaluate/gather-figures.ts';
import { printFigures } from '../evaluate/print-figures.ts';
import { screenRealRecordings } from '../evaluate/real-recordings.ts';
import { runTasks } from '../evaluate/run-tasks.ts';
import { withConstants } from '../evaluate/write-constants.ts';
import { readArguments, tellArgumentFaults } from './command-arguments.ts';

const optionNames = ['machines', 'seed', 'real', 'json', 'noise'];

const constantsFile = new URL('../../../shared/signal/score-constants.ts', import.meta.url);
const fitSeed = 1;

/** Machines of a fit and of an evaluation never meet: their seeds differ. */
const evaluationSeed = 2;
const machinesAtATime = 4;

/**
 * `evaluate [--machines N] [--seed N] [--noise N] [--real FOLDER] [--json FILE]`: judges the method
 * on simulated machines it was not fitted on; `evaluate --fit` fits the score's constants first.
 */
export function run(args: string[]): Promise<number> {
  return tellArgumentFaults('evaluate', async () => {
    const { values } = readArguments(
      args.filter((arg) => arg !== '--fit' && arg !== '--join-real'),
      optionNames,
    );
    const machines = Math.round(values.positive('machines', 100_000) ?? 400);
    const realFolder = values.text('real');
    const real = realFolder === undefined ? [] : await screenRealRecordings(realFolder);
    if (args.includes('--fit')) {
      const cases = await simulate(fitSeed, machines, true);
      const { text, constants } = fitReport(cases, real, args.includes('--join-real'));
      process.stdout.write(text);
      const file = await readFile(constantsFile, 'utf8');
      await writeFile(constantsFile, withConstants(file, constants));
      return 0;
    }
    const seed = Math.round(values.positive('seed', 1e9) ?? evaluationSeed);
    const noise = Math.round(values.positive('noise', 1e6) ?? 3000);
    const cases = await simulate(seed, machines, false);
    const figures = gatherFigures(
      { cases, real, ...(await specialChecks(noise)) },
      { methodVersion, evaluatedOn: new Date().toISOString().slice(0, 10), machines, seed },
    );
    process.stdout.write(printFigures(figures));
    const json = values.text('json');
    if (json !== undefined) await writeFile(json, `${JSON.stringify(figures, null, 2)}\n`);
    return 0;
  });
}

async function specialChecks(noise: number) {
  const parts = (count: number, size: number) =>
    Array.from({ length: Math.ceil(count / size) }, (_, index) => ({
      first: index * size,
      count: Math.min(size, count - index * size),
    }));
  const quiet = () => undefined;
  return {
    noise: await runTasks<'noise'>(
      parts(noise, 50).map((part) => ({ kind: 'noise', ...part })),
      progress('noise', Math.ceil(noise / 50)),
    ),
    weakFamilies: await runTasks<'weak family'>(
      parts(300, 50).map((part) => ({ kind: 'weak family', ...part })),
      quiet,
    ),
    speedBounds: await runTasks<'speed bound'>(
      [1, 6].flatMap((orders) =>
        parts(200, 50).map((part) => ({ kind: 'speed bound' as const, orders, ...part })),
      ),
      quiet,
    ),
    segments: await runTasks<'segments'>(
      parts(80, 10).map((part) => ({ kind: 'segments', ...part })),
      progress('segments', 8),
    ),
  };
}

function simulate(seed: number, machines: number, withFeatures: boolean): Promise<CaseOutcome[]> {
  const tasks = Array.from({ length: Math.ceil(machines / machinesAtATime) }, (_, index) => ({
    kind: 'machines' as const,
    seed,
    first: index * machinesAtATime,
    machines: Math.min(machinesAtATime, machines - index * machinesAtATime),
    withFeatures,
  }));
  return runTasks<'machines'>(tasks, progress('machines', tasks.length));
}

/** Says on standard error how far the work is: standard output carries the figures. */
function progress(what: string, tasks: number) {
  return (done: number) => {
    if (done % 10 === 0 || done === tasks) {
      process.stderr.write(`\r${what}: ${Math.round((100 * done) / tasks)} %  `);
      if (done >= tasks) process.stderr.write('\n');
    }
  };
}
