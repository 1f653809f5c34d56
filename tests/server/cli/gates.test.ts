import { chmodSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createGates } from '#server/cli/setup/gates.mjs';

let project: string;
let printed: string;

/** A tool of the project that does what the shell script says. */
const tool = (name: string, script: string) => {
  const path = join(project, 'node_modules', '.bin', name);
  writeFileSync(path, `#!/bin/sh\n${script}\n`);
  chmodSync(path, 0o755);
};

beforeEach(() => {
  project = mkdtempSync(join(tmpdir(), 'fretline-gates-test-'));
  mkdirSync(join(project, 'node_modules', '.bin'), { recursive: true });
  printed = '';
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    printed += String(text);
    return true;
  });
});
afterEach(() => {
  vi.restoreAllMocks();
  rmSync(project, { recursive: true, force: true });
});

describe('the gates of npm test', () => {
  it('count a tool that passes as one, and keep its chatter back', async () => {
    tool('linter', 'echo all is well');
    const gates = createGates(project, project);
    await gates.whole('lint', 'linter', []);
    expect(gates.counts).toEqual({ passed: 1, failed: 0 });
    expect(printed).toMatch(/^passed {2}lint \(\d+\.\d s\)\n$/);
  });

  it('show in full what a tool that fails has to say', async () => {
    tool('linter', 'echo line one is wrong; echo line two as well >&2; exit 3');
    const gates = createGates(project, project);
    await gates.whole('lint', 'linter', []);
    expect(gates.counts).toEqual({ passed: 0, failed: 1 });
    expect(printed).toContain('line one is wrong');
    expect(printed).toContain('line two as well');
  });

  it('count a tool that is missing, or that a signal ended, as failed', async () => {
    tool('crasher', 'kill -SEGV $$');
    const gates = createGates(project, project);
    await gates.whole('types', 'not-there', []);
    await gates.whole('lint', 'crasher', []);
    expect(gates.counts).toEqual({ passed: 0, failed: 2 });
  });

  it('count every test of a run', async () => {
    tool('vitest', `echo '{"passed":7,"failed":0}' > "$TEST_COUNTS_FILE"`);
    const gates = createGates(project, project);
    await gates.tests('shared', ['shared']);
    expect(gates.counts).toEqual({ passed: 7, failed: 0 });
  });

  it('fail a test run that broke without a failed test, or that ran nothing', async () => {
    const gates = createGates(project, project);
    tool('vitest', `echo '{"passed":7,"failed":0}' > "$TEST_COUNTS_FILE"; exit 1`);
    await gates.tests('broke', ['shared']);
    expect(gates.counts).toEqual({ passed: 7, failed: 1 });
    tool('vitest', 'exit 0');
    await gates.tests('nothing', ['shared']);
    expect(gates.counts).toEqual({ passed: 7, failed: 2 });
  });
});
