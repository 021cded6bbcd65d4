/** Mutated files: the reader answers with a series or an InputError, and quickly. */
import { readFileSync, readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { InputError, isNumberProblem, parseSeries, parseUncertain, writeSeries } from '../../src/series/index.js';

const CASES = 250 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const folder = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const read = (path: string): string[] =>
  readdirSync(folder(path))
    .filter((name) => /\.(?:yaml|json|csv|txt)$/.test(name) && name !== 'expected.txt')
    .map((name) => readFileSync(folder(path) + name, 'utf8').slice(0, 6_000));
const SEEDS = [...read('malformed/'), ...read('../../series/')];

/** Bits of files and of trouble that a mutation may put in. */
const PIECES = [
  '\n',
  '\n  - ',
  ': ',
  ' ',
  '"',
  "'",
  '[',
  ']',
  '{',
  '}',
  '&a ',
  '*a',
  '!!int ',
  '|',
  '>-',
  '#',
  ',',
  '(',
  ')',
  '^',
  '-',
  '+-',
  '1e9',
  '1/0',
  'NaN',
  'nf',
  'pi',
  '\0',
  '\uFEFF',
  '\u2028',
  '\uD800',
  '___',
  '%',
  '---\n',
  '...\n',
  '? ',
  '<<: ',
];

interface Change {
  readonly at: number;
  readonly cut: number;
  readonly put: string;
}
const change = fc.record({
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  cut: fc.oneof(fc.constant(0), fc.nat(3), fc.nat(200)),
  put: fc.oneof(fc.constantFrom(...PIECES), fc.string({ maxLength: 4, unit: 'binary' }), fc.constant('')),
});

function mutate(seed: string, changes: readonly Change[]): string {
  let text = seed;
  for (const { at, cut, put } of changes) {
    const i = Math.floor(at * text.length);
    text = text.slice(0, i) + put + text.slice(i + cut);
  }
  return text;
}

async function answer(text: string, form?: 'yaml' | 'csv' | 'list'): Promise<void> {
  try {
    const series = await parseSeries(text, { name: 'mutated', ...(form && { form }) });
    expect(series.coefficients.length).toBeGreaterThan(0);
    writeSeries(series);
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    expect(error.problems.length).toBeGreaterThan(0);
    for (const p of error.problems) {
      expect(p.found).not.toBe('');
      expect(p.wanted).not.toBe('');
      if (p.line !== undefined) expect(p.line).toBeGreaterThan(0);
    }
    // One line a problem: no line break of the file gets into a message.
    expect(error.message.split('\n')).toHaveLength(error.problems.length);
  }
}

describe('mutated files', () => {
  test('never crash the reader', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...SEEDS),
        fc.array(change, { minLength: 1, maxLength: 5 }),
        async (seed, changes) => {
          await answer(mutate(seed, changes));
        },
      ),
      { numRuns: CASES },
    );
  });

  test('nor read as another form', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...SEEDS),
        fc.constantFrom('yaml' as const, 'csv' as const, 'list' as const),
        answer,
      ),
      { numRuns: CASES / 5 },
    );
  });

  test('any text at all', async () => {
    await fc.assert(
      fc.asyncProperty(fc.string({ maxLength: 200, unit: 'binary' }), (text) => answer(text)),
      { numRuns: CASES },
    );
  });

  test('expressions put together at random', async () => {
    const word = fc.constantFrom(
      '1',
      '2.5',
      '1e3',
      'pi',
      'zeta(3)',
      'log(2)',
      'sqrt(',
      'nf',
      '(',
      ')',
      '+',
      '-',
      '*',
      '/',
      '^',
      '^2',
      '-1',
      'k',
      ' ',
      '0',
      'zeta',
      '!',
    );
    await fc.assert(
      fc.asyncProperty(fc.array(word, { maxLength: 12 }), (words) =>
        answer(`flavours: 3\nconstants: {k: nf - 3}\ncoefficients: [${JSON.stringify(words.join(''))}]`),
      ),
      { numRuns: CASES },
    );
  });
});

test('parseUncertain answers for any text', () => {
  const piece = fc.constantFrom(
    '1',
    '0.25',
    '(',
    ')',
    '3',
    '+-',
    '±',
    '+',
    '-',
    'e',
    'E-4',
    '.',
    ',',
    '/',
    ' ',
    '−',
    '%',
    'x',
  );
  fc.assert(
    fc.property(fc.array(piece, { maxLength: 10 }), (pieces) => {
      const found = parseUncertain(pieces.join(''));
      if (isNumberProblem(found)) expect(found.wanted).not.toBe('');
      else expect(found.value.rational).toBeDefined();
    }),
    { numRuns: CASES * 4 },
  );
});
