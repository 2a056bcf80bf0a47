/// <reference types="vitest/config" />
import { getViteConfig } from 'astro/config';

export default getViteConfig({
  test: {
    include: ['tests/**/*.test.{ts,tsx}'],
    exclude: ['tests/e2e/**', 'tests/bench/**', 'node_modules/**'],
    pool: 'forks',
    maxWorkers: 2,
    testTimeout: 60_000,
    hookTimeout: 60_000,
    setupFiles: ['tests/setup/no-console-error.ts'],
    reporters: ['default', './tests/setup/closing-reporter.mjs'],
  },
});
