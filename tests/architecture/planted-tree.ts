import {
  cpSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const settings = [
  'tests/architecture/dependency-rules.cjs',
  'tests/lint/eslint.config.js',
  'tests/lint/tsconfig.json',
  'tsconfig.json',
];

/** A small tree with the project's rules and the given files alone: fast, and nothing to clean up in the real one. */
export function plantTree(files: Record<string, string>): {
  directory: string;
  remove: () => void;
} {
  const directory = mkdtempSync(join(tmpdir(), 'fretline-planted-'));
  const write = (path: string, text: string) => {
    mkdirSync(dirname(join(directory, path)), { recursive: true });
    writeFileSync(join(directory, path), text);
  };
  for (const path of settings) {
    mkdirSync(dirname(join(directory, path)), { recursive: true });
    cpSync(join(root, path), join(directory, path));
  }
  write('package.json', readFileSync(join(root, 'package.json'), 'utf8'));
  symlinkSync(join(root, 'node_modules'), join(directory, 'node_modules'));
  for (const [path, text] of Object.entries(files)) write(path, text);
  return { directory, remove: () => rmSync(directory, { recursive: true, force: true }) };
}

export const binary = (name: string): string => join(root, 'node_modules', '.bin', name);
