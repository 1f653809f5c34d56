// Stays beside a test run's MariaDB and takes it away when the run ends, however it ends: the pipe
// to the run closes also when the run is killed, and then nobody else is left to clean up.
import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { endProcess, findProcesses, isRunning } from './processes.mjs';

const directory = process.argv[2] ?? '';
const shutDownWithinMs = 10_000;

// A Ctrl-C is for the run, whose end is this one's sign.
for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
  process.on(signal, () => undefined);
}

/** The server's own word, for systems that do not show how a process was started. */
function pidTold() {
  try {
    return Number(readFileSync(join(directory, 'mariadb.pid'), 'utf8'));
  } catch {
    return 0;
  }
}

async function clearAway() {
  const told = pidTold();
  const ours = () => [
    ...findProcesses((words) => words.some((word) => word.includes(directory))),
    ...(told > 0 && isRunning(told) ? [told] : []),
  ];
  await Promise.all(ours().map((pid) => endProcess(pid, shutDownWithinMs)));
  for (const pid of ours()) process.kill(pid, 'SIGKILL');
  await sleep(50);
  rmSync(directory, { recursive: true, force: true, maxRetries: 5 });
  process.exit(0);
}

process.stdin.resume();
process.stdin.on('end', () => {
  // Never anything but a folder of the tests.
  if (/\/fretline-test-\w+$/.test(directory)) void clearAway();
  else process.exit(1);
});
