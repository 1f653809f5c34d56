import { afterAll, describe, expect, it } from 'vitest';
import { run } from '#server/cli/setup/run.mjs';
import { binary, plantTree } from './planted-tree.ts';

const statements = (count: number) =>
  Array.from({ length: count }, (_, index) => `export const n${index} = ${index};`).join('\n');

/** File, what is planted in it, and the words of the complaint; null for what is allowed. */
const plants: [path: string, text: string, complaint: string | null][] = [
  ['shared/a.ts', 'export const a = Math.random();', 'Randomness comes in'],
  ['shared/b.ts', 'export const b = new Date();', 'Time comes in'],
  ['fixtures/c.ts', 'export const c = Date.now();', 'Time comes in'],
  ['shared/d.ts', 'export const d = new Date(0);', null],
  ['server/http/e.ts', 'export const e = process.env.HOME;', 'Only server/config'],
  ['server/http/f.ts', 'const { env } = process;\nexport const f = env;', 'Only server/config'],
  ['server/config/g.ts', 'export const g = process.env.HOME;', null],
  ['src/h.ts', 'const h = 1;\nexport default h;', 'Named exports only'],
  ['src/i.ts', 'export const i = (x: any) => x;', 'no-explicit-any'],
  [
    'src/j.ts',
    'export async function wait() { await 0; }\nexport function go() { wait(); }',
    'no-floating-promises',
  ],
  [
    'src/k.ts',
    'export const k = (run: () => void) => run();\nk(async () => { await 0; });',
    'no-misused-promises',
  ],
  ['src/l.ts', '// @ts-expect-error for the test\nexport const l: number = 1;', 'ban-ts-comment'],
  ['src/m.ts', `/* eslint-disable max-lines */\n${statements(301)}`, 'max-lines'],
  ['src/n.ts', `${'// a comment\n\n'.repeat(200)}${statements(300)}`, null],
  ['src/o.ts', "console.log('o');\nexport const o = 1;", 'no-console'],
  ['server/cli/p.mjs', 'const unused = 1;\nexport const p = 2;', 'no-unused-vars'],
];

const { directory, remove } = plantTree(
  Object.fromEntries(plants.map(([path, text]) => [path, `${text}\n`])),
);
afterAll(remove);

interface FileResult {
  filePath: string;
  messages: { ruleId: string | null; message: string; severity: number }[];
}
const lint = run(
  binary('eslint'),
  ['-c', 'tests/lint/eslint.config.js', '--format', 'json', 'shared', 'fixtures', 'server', 'src'],
  { cwd: directory },
).then(({ output }) => JSON.parse(output) as FileResult[]);

async function complaintsAbout(path: string): Promise<string[]> {
  const file = (await lint).find(({ filePath }) => filePath.endsWith(`/${path}`));
  if (file === undefined) throw new Error(`${path} was not linted.`);
  return file.messages
    .filter(({ severity }) => severity === 2)
    .map(({ ruleId, message }) => `${ruleId}: ${message}`);
}

describe('the lint rules', () => {
  it.each(plants.flatMap(([path, , complaint]) => (complaint === null ? [] : [[path, complaint]])))(
    'complain about %s: %s',
    async (path = '', complaint) => {
      expect((await complaintsAbout(path)).join('\n')).toContain(complaint);
    },
  );

  it.each(plants.filter(([, , complaint]) => complaint === null).map(([path]) => path))(
    'let %s be',
    async (path) => {
      expect(await complaintsAbout(path)).toEqual([]);
    },
  );
});
