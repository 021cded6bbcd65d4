import { BaseSequencer, type TestSpecification } from 'vitest/node';
import { defineConfig } from 'vitest/config';

/** Test files of one run in the order in which they are tried: what is quick and close to the mutated file first. */
const asked = process.env['LEASTTERM_MUTATION_TESTS']?.split(',').map((path) => `tests/numerics/${path}`);

class InTheOrderAsked extends BaseSequencer {
  override async sort(files: TestSpecification[]): Promise<TestSpecification[]> {
    if (asked === undefined) return super.sort(files);
    const place = (file: TestSpecification): number => asked.findIndex((path) => file.moduleId.endsWith(path));
    return files.toSorted((a, b) => place(a) - place(b));
  }
}

export default defineConfig({
  test: {
    testTimeout: 60_000,
    include: asked ?? ['tests/numerics/**/*.test.ts'],
    // It counts the work of modules that it replaces; mutants are judged by answers.
    exclude: ['tests/numerics/polynomial/pade-work.test.ts'],
    isolate: false,
    sequence: { sequencer: InTheOrderAsked },
  },
});
