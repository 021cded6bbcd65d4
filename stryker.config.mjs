/**
 * Mutation tests of src/numerics: `npm run mutation -- --mutate src/numerics/rational.ts`. docs/numerics-mutants.md says how to choose
 * files, tests, a sample or the survivors of an earlier run, and what was measured.
 */
export default {
  packageManager: 'npm',
  plugins: ['@stryker-mutator/vitest-runner', './stryker.sample.mjs'],
  testRunner: 'vitest',
  vitest: { configFile: 'vitest.mutation.config.ts', related: false },
  checkers: ['sample'],
  mutate: ['src/numerics/**/*.ts'],
  ignorePatterns: [
    '/dist',
    '/docs/**',
    '!/docs/numerics.md',
    '/series',
    '/src/**',
    '!/src/numerics/**',
    '/tests/**',
    '!/tests/{numerics,support}/**',
    '!/tests/truncation/random.ts',
  ],
  // Texts are for people: tests that fix the wording of every refusal would only repeat the source.
  mutator: { excludedMutations: ['StringLiteral'] },
  coverageAnalysis: 'perTest',
  // A constant of a module is read before any test begins, so that all tests would have to run for it.
  ignoreStatic: process.env['LEASTTERM_MUTATION_STATIC'] === undefined,
  concurrency: 1,
  timeoutMS: 3000,
  timeoutFactor: 1.5,
  reporters: ['json', 'clear-text', 'progress-append-only'],
  clearTextReporter: { logTests: false, reportTests: false, allowColor: false },
  jsonReporter: { fileName: process.env['LEASTTERM_MUTATION_REPORT'] ?? 'reports/mutation.json' },
  warnings: { slow: false },
};
