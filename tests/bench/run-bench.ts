/**
 * Everything that is promised of speed, measured and printed beside what is wanted.
 *
 *   npm run bench              all of it
 *   npm run bench -- screening memory register      some of it
 */
import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { benchRegisterSize, describeRegisterSize } from './register-size.ts';
import { benchScreeningSpeed, describeScreeningSpeed } from './screening-speed.ts';

const print = (lines: readonly string[]) => process.stdout.write(`${lines.join('\n')}\n\n`);

const parts: Readonly<Record<string, () => Promise<unknown> | void>> = {
  screening: async () => print(describeScreeningSpeed(await benchScreeningSpeed())),
  memory: () => {
    // In a process of its own: the peak is to be the reader's.
    const file = fileURLToPath(new URL('./ten-million-rows.ts', import.meta.url));
    spawnSync(process.execPath, ['--import', 'tsx', file], { stdio: 'inherit' });
    print([]);
  },
  register: async () => print(describeRegisterSize(await benchRegisterSize())),
};

const asked = process.argv.slice(2);
const unknown = asked.filter((name) => !(name in parts));
if (unknown.length > 0) {
  process.stderr.write(
    `There is no part ${unknown.join(', ')}; there are ${Object.keys(parts).join(', ')}.\n`,
  );
  process.exitCode = 2;
} else {
  for (const [name, run] of Object.entries(parts)) {
    if (asked.length > 0 && !asked.includes(name)) continue;
    print([`== ${name}`]);
    await run();
  }
}
