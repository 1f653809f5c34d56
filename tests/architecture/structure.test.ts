import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { basename } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { migrations } from '#server/db/migrations/index.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
/** What the repository holds: tracked files and new ones that are not ignored. */
const files = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard'], {
  cwd: root,
  encoding: 'utf8',
})
  .split('\n')
  .filter(Boolean);
const sources = files.filter((path) => /\.(ts|tsx|mjs)$/.test(path));
const read = (path: string) => readFileSync(`${root}/${path}`, 'utf8');

const topLevel = [
  'DEVELOPERS.md',
  'README.md',
  'fixtures',
  'index.html',
  'package-lock.json',
  'package.json',
  'server',
  'shared',
  'src',
  'tailwind.config.ts',
  'tests',
  'tsconfig.json',
  'vite.config.ts',
];

describe('the tree', () => {
  it('has the agreed entries at the top and no others', () => {
    const entries = new Set(files.map((path) => path.split('/')[0] ?? ''));
    expect([...entries].filter((entry) => !entry.startsWith('.')).sort()).toEqual(topLevel);
  });

  it('names files in kebab case', () => {
    const wrong = sources.filter(
      (path) => !/^[a-z0-9]+([-.][a-z0-9]+)*\.(ts|tsx|mjs)$/.test(basename(path)),
    );
    expect(wrong).toEqual([]);
  });

  it('has no barrel files', () => {
    const barrels = sources.filter((path) => {
      const lines = read(path)
        .split('\n')
        .filter((line) => line.trim() !== '' && !line.trim().startsWith('//'));
      return lines.length > 0 && lines.every((line) => /^export .* from /.test(line));
    });
    expect(barrels).toEqual([]);
  });

  it('lists every migration, oldest first', () => {
    const written = files
      .filter((path) => /^server\/db\/migrations\/\d+-/.test(path))
      .map((path) => /(\d+)-/.exec(basename(path))?.[1] ?? '')
      .sort();
    const listed = migrations.map((migration) => /(\d+)$/.exec(migration.name)?.[1] ?? '');
    expect(listed).toEqual(written);
  });

  it('lets nobody but the migrations shape the database', () => {
    const word = 'synchronize';
    const using = sources.filter((path) =>
      new RegExp(`${word}\\s*(:\\s*true|\\()`).test(read(path)),
    );
    expect(using).toEqual([]);
  });

  it('gives every script of package.json an existing file to run', () => {
    const { scripts } = JSON.parse(read('package.json')) as { scripts: Record<string, string> };
    const named = Object.values(scripts).flatMap((script) =>
      script.split(' ').filter((word) => /^(server|tests)\/.*\.(mjs|ts|js|cjs)$/.test(word)),
    );
    expect(named.length).toBeGreaterThan(3);
    expect(named.filter((path) => !files.includes(path))).toEqual([]);
  });

  it('names no package registry, so that each machine uses its own', () => {
    const hosts = [
      ['registry', 'npmjs', 'org'],
      ['registry', 'yarnpkg', 'com'],
      ['npm', 'pkg', 'github', 'com'],
      ['deb', 'debian', 'org'],
      ['security', 'debian', 'org'],
    ].map((parts) => parts.join('.'));
    const texts = files.filter((path) => /\.(json|ts|tsx|mjs|cjs|js|md|html|css)$|^\./.test(path));
    expect(texts).toContain('package-lock.json');
    const naming = texts.filter((path) => {
      const text = read(path);
      return hosts.some((host) => text.includes(host)) || /"resolved": "https?:/.test(text);
    });
    expect(naming).toEqual([]);
  });
});
