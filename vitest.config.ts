import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.ts'],
    exclude: ['tests/bench/**'],
    testTimeout: 60_000,
    maxWorkers: 2,
    reporters: ['default', './tests/tally.reporter.ts'],
  },
});
