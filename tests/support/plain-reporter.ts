import type { Reporter, TestModule } from "vitest/node";

/** Closes a run with one plain line, `tests: N passed, N failed, N skipped`, for people and scripts that read only that. */
export default class PlainReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], errors: readonly unknown[]): void {
    const count = { passed: 0, failed: errors.length, skipped: 0, pending: 0 };
    for (const module of modules) {
      const tests = [...module.children.allTests()];
      for (const test of tests) count[test.result().state]++;
      const brokenFile = tests.length === 0 ? module.state() === "failed" : module.errors().length > 0;
      if (brokenFile) count.failed++;
    }
    process.stdout.write(
      `\ntests: ${count.passed} passed, ${count.failed} failed, ${count.skipped + count.pending} skipped\n`,
    );
  }
}
