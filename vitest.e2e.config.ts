import { defineConfig } from 'vitest/config';

/** Browser tests: against the built site, in Debian's Chromium, one file after the other. */
export default defineConfig({
  test: {
    include: ['tests/e2e/**/*.test.ts'],
    pool: 'forks',
    maxWorkers: 1,
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 120_000,
    reporters: ['default', './tests/setup/closing-reporter.mjs'],
  },
});
