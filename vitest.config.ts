import { defineConfig } from 'vitest/config';

/** Files that replace modules by counting ones: they need modules of their own. */
const MOCKING = ['tests/numerics/polynomial/pade-work.test.ts'];

export default defineConfig({
  test: {
    testTimeout: 60_000,
    hookTimeout: 60_000,
    maxWorkers: 2,
    reporters: ['default', './tests/tally.reporter.ts'],
    projects: [
      {
        extends: true,
        // Files of one worker share their modules: nothing here keeps state but caches, and loading costs more than most tests.
        test: {
          name: 'shared',
          include: ['tests/**/*.test.ts'],
          exclude: ['tests/bench/**', ...MOCKING],
          isolate: false,
        },
      },
      { extends: true, test: { name: 'apart', include: MOCKING, isolate: true } },
    ],
  },
});
