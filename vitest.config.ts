import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['tests/**/*.test.ts'],
    exclude: ['tests/bench/**'],
    testTimeout: 60_000,
    maxWorkers: 2,
    // Files of one worker share their modules: nothing here keeps state but caches, and loading costs more than most tests.
    isolate: false,
    reporters: ['default', './tests/tally.reporter.ts'],
  },
});
