// The last words of a test run: `N passed, N failed`. A file that does not load and an error outside any test count as
// one failure each, so that the line never reads better than the run was. With TAUTLINE_TOTALS set, CI reads the same
// two numbers from the file of that name.
import { writeFileSync } from 'node:fs';
import type { Reporter, TestModule } from 'vitest/node';

export default class TotalsReporter implements Reporter {
  onTestRunEnd(modules: readonly TestModule[], unhandledErrors: readonly unknown[]): void {
    let passed = 0;
    let failed = unhandledErrors.length;
    for (const module of modules) {
      if (module.errors().length > 0) failed += 1;
      for (const suite of module.children.allSuites()) failed += suite.errors().length;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        if (state === 'passed') passed += 1;
        if (state === 'failed') failed += 1;
      }
    }
    const file = process.env.TAUTLINE_TOTALS;
    if (file !== undefined) writeFileSync(file, JSON.stringify({ passed, failed }));
    // Vitest writes its own summary in the same turn; this goes behind it.
    process.on('exit', () => process.stdout.write(`\n${passed} passed, ${failed} failed\n`));
  }
}
