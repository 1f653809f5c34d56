import { writeFileSync } from 'node:fs';
import type { Reporter, TestModule, SerializedError } from 'vitest/node';

/** Hands the numbers of a run to the gates script, in the file that TEST_COUNTS_FILE names. */
export default class CountReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], errors: readonly SerializedError[]): void {
    const path = process.env.TEST_COUNTS_FILE;
    if (path === undefined) return;
    let passed = 0;
    let failed = errors.length;
    for (const module of modules) {
      let failedHere = 0;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === 'passed') passed += 1;
        else if (state === 'failed') failedHere += 1;
      }
      // A file that can't be loaded has no failed test, and must not pass for it.
      failed += failedHere === 0 && module.state() === 'failed' ? 1 : failedHere;
    }
    writeFileSync(path, JSON.stringify({ passed, failed }));
  }
}
