import { appendFileSync } from 'node:fs';

/** Prints one plain closing line and, where TEST_TALLY names a file, adds its counts to it for the whole run's summary. */
export default class ClosingReporter {
  onTestRunEnd(modules) {
    const counts = { passed: 0, failed: 0, skipped: 0 };
    for (const module of modules) {
      let failedHere = 0;
      for (const test of module.children.allTests()) {
        const { state } = test.result();
        counts[state === 'passed' || state === 'failed' ? state : 'skipped'] += 1;
        if (state === 'failed') failedHere += 1;
      }
      if (!module.ok() && failedHere === 0) counts.failed += 1;
    }
    if (process.env.TEST_TALLY) appendFileSync(process.env.TEST_TALLY, `${JSON.stringify(counts)}\n`);
    console.log(`\n${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} skipped`);
  }
}
