import { createRequire } from 'node:module';
import { afterAll, describe, expect, it } from 'vitest';
import { run } from '#server/cli/setup/run.mjs';
import { binary, plantTree } from './planted-tree.ts';

const leaf = 'export const leaf = 1;\n';
const leaves = [
  'fixtures/signals/leaf.ts',
  'server/cli/leaf.ts',
  'server/compose.ts',
  'server/features/other/leaf.ts',
  'server/leaf.ts',
  'shared/contracts/leaf.ts',
  'src/app/leaf.ts',
  'src/features/other/leaf.ts',
  'src/leaf.ts',
  'tests/leaf.ts',
];

/** One planted import that each rule must refuse. */
const plants: Record<string, [path: string, imported: string]> = {
  'no-cycles': ['shared/fits/ring.ts', './ring.ts'],
  'shared-stands-alone': ['shared/fits/a.ts', '#server/leaf.ts'],
  'shared-packages': ['shared/fits/b.ts', 'node:fs'],
  'zod-in-contracts-only': ['shared/fits/c.ts', 'zod'],
  'client-not-server': ['src/app/d.ts', '#server/leaf.ts'],
  'server-not-client': ['server/http/e.ts', '#src/leaf.ts'],
  'fixtures-for-tools-only': ['server/http/f.ts', '#fixtures/signals/leaf.ts'],
  'tools-are-leaves': ['server/http/g.ts', '#server/cli/leaf.ts'],
  'composition-is-the-top': ['server/http/h.ts', '#server/compose.ts'],
  'production-needs-no-dev-packages': ['server/http/i.ts', 'supertest'],
  'every-import-leads-somewhere': ['server/http/j.ts', 'a-package-that-nobody-listed'],
  'nobody-imports-tests': ['server/http/k.ts', '#tests/leaf.ts'],
  'fixtures-import-shared-only': ['fixtures/signals/l.ts', '#server/leaf.ts'],
  'features-apart-in-client': ['src/features/one/m.ts', '#src/features/other/leaf.ts'],
  'features-not-app': ['src/features/one/n.ts', '#src/app/leaf.ts'],
  'components-know-no-features': ['src/charts/o.ts', '#src/features/other/leaf.ts'],
  'lib-is-lowest': ['src/lib/p.ts', '#src/features/other/leaf.ts'],
  'features-apart-in-server': ['server/features/one/q.ts', '#server/features/other/leaf.ts'],
  'typeorm-at-home': ['server/features/one/r.service.ts', 'typeorm'],
};

/** What the rules allow, so that a rule that refuses everything is found out too. */
const allowed: [path: string, imported: string][] = [
  ['shared/contracts/s.ts', 'zod'],
  ['server/features/one/t.repository.ts', 'typeorm'],
  ['server/cli/u.ts', '#fixtures/signals/leaf.ts'],
  ['src/app/v.ts', '#src/features/other/leaf.ts'],
  ['src/features/one/w.ts', '#shared/contracts/leaf.ts'],
  ['tests/x.ts', '#server/compose.ts'],
];

const importing = (imported: string) =>
  `import * as it from '${imported}';\nexport const used = it;\n`;
const { directory, remove } = plantTree({
  ...Object.fromEntries(leaves.map((path) => [path, leaf])),
  ...Object.fromEntries(
    [...Object.values(plants), ...allowed].map(([path, imported]) => [path, importing(imported)]),
  ),
});
afterAll(remove);

const require = createRequire(import.meta.url);
const { forbidden } = require('./dependency-rules.cjs') as { forbidden: { name: string }[] };
const rulesFile = 'tests/architecture/dependency-rules.cjs';
const folders = ['src', 'server', 'shared', 'fixtures', 'tests'];
const args = ['--config', rulesFile, '--output-type', 'json', ...folders];
const cruise = run(binary('depcruise'), args, { cwd: directory }).then(
  ({ output }) =>
    JSON.parse(output) as { summary: { violations: { from: string; rule: { name: string } }[] } },
);

describe('the dependency rules', () => {
  it('have a planted violation each', () => {
    expect(Object.keys(plants).sort()).toEqual(forbidden.map(({ name }) => name).sort());
  });

  it.each(Object.entries(plants))('%s refuses the import it is for', async (rule, [path]) => {
    const { summary } = await cruise;
    const refused = summary.violations.filter(({ from }) => from === path);
    expect(refused.map(({ rule: { name } }) => name)).toContain(rule);
  });

  it.each(allowed)('let %s import %s', async (path) => {
    const { summary } = await cruise;
    expect(summary.violations.filter(({ from }) => from === path)).toEqual([]);
  });
});
