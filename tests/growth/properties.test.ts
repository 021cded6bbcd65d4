/** What the diagnosis must not depend on: the unit of x, the sign of x, an overall factor. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { diagnoseGrowth, type Growth, type GrowthInput } from '../../src/growth/index.js';
import { Rational } from '../../src/numerics/index.js';
import { Dice, families } from './generate.js';
import { fromRationals } from './terms.js';

const RUNS = Math.max(10, Math.round(30 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? '1')));
const names = Object.keys(families);

const anyInput = fc
  .tuple(fc.constantFrom(...names), fc.integer({ min: 1, max: 1e6 }))
  .map(([name, seed]) => ({ name, input: families[name]!(new Dice(seed)).input }));

function mapTerms(
  input: GrowthInput,
  f: (t: GrowthInput['terms'][number], n: number) => GrowthInput['terms'][number],
): GrowthInput {
  return { ...input, terms: input.terms.map(f) };
}

/** Codes of flags that hang on thresholds of measured numbers may flip by rounding only; the rest may not change at all. */
const summary = (g: Growth): unknown => [g.verdict, g.order, g.signPattern, g.flags.map((f) => f.code)];

function close(a: number, b: number, within: number): void {
  expect(Math.abs(a - b), `${a} against ${b}`).toBeLessThanOrEqual(within);
}

describe('invariance', () => {
  it('c_n → c_n λ^n moves t to t/λ and changes nothing else', () => {
    fc.assert(
      fc.property(anyInput, fc.double({ min: -700, max: 700, noNaN: true }), ({ input }, logLambda) => {
        const a = diagnoseGrowth(input);
        const b = diagnoseGrowth(mapTerms(input, (t, n) => ({ ...t, logAbs: t.logAbs + n * logLambda })));
        expect(summary(b)).toEqual(summary(a));
        if (a.nearest === undefined || b.nearest === undefined) return;
        const relative = Math.max(a.nearest.t.error / Math.abs(a.nearest.t.value), 1e-9);
        close(b.nearest.logAbs, a.nearest.logAbs - logLambda, relative + 1e-7);
        expect(b.nearest.kind).toBe(a.nearest.kind);
        if (a.nearest.exponent !== undefined && b.nearest.exponent !== undefined) {
          close(
            b.nearest.exponent.value,
            a.nearest.exponent.value,
            a.nearest.exponent.error + b.nearest.exponent.error + 1e-6,
          );
        }
      }),
      { numRuns: RUNS, seed: 11 },
    );
  });

  it('c_n → −c_n and c_n → C c_n change no position', () => {
    fc.assert(
      fc.property(
        anyInput,
        fc.double({ min: -300, max: 300, noNaN: true }),
        fc.boolean(),
        ({ input }, logFactor, negate) => {
          const a = diagnoseGrowth(input);
          const b = diagnoseGrowth(
            mapTerms(input, (t) => ({
              ...t,
              logAbs: t.logAbs + logFactor,
              sign: negate ? (-t.sign as -1 | 0 | 1) : t.sign,
            })),
          );
          expect(summary(b)).toEqual(summary(a));
          if (a.nearest !== undefined && b.nearest !== undefined) {
            close(b.nearest.logAbs, a.nearest.logAbs, 1e-7 + a.nearest.t.error / Math.abs(a.nearest.t.value));
          }
        },
      ),
      { numRuns: RUNS, seed: 12 },
    );
  });

  it('x → −x mirrors the Borel plane', () => {
    fc.assert(
      fc.property(anyInput, ({ input }) => {
        const a = diagnoseGrowth(input);
        const b = diagnoseGrowth(mapTerms(input, (t, n) => (n % 2 === 1 ? { ...t, sign: -t.sign as -1 | 0 | 1 } : t)));
        expect(b.verdict).toBe(a.verdict);
        expect(b.order).toBe(a.order);
        if (a.nearest === undefined || b.nearest === undefined || a.stride !== 1) return;
        const mirrored = { 'positive axis': 'negative axis', 'negative axis': 'positive axis' } as const;
        const kind = a.nearest.kind;
        expect(b.nearest.kind).toBe(kind === 'positive axis' || kind === 'negative axis' ? mirrored[kind] : kind);
        close(b.nearest.logAbs, a.nearest.logAbs, 1e-9 + a.nearest.t.error / Math.abs(a.nearest.t.value));
      }),
      { numRuns: RUNS, seed: 13 },
    );
  });
});

describe('never throws', () => {
  it('on any list of sizes, signs and errors', () => {
    const anyTerm = fc.record({
      logAbs: fc.oneof(fc.double({ min: -1e5, max: 1e5, noNaN: true }), fc.constant(-Infinity), fc.constant(0)),
      sign: fc.constantFrom(-1 as const, 0 as const, 1 as const),
      relativeError: fc.oneof(fc.constant(0), fc.double({ min: 0, max: 3, noNaN: true }), fc.constant(Infinity)),
      estimated: fc.boolean(),
    });
    const consistent = anyTerm.map((t) =>
      t.sign === 0 || t.logAbs === -Infinity ? { ...t, sign: 0 as const, logAbs: -Infinity } : t,
    );
    fc.assert(
      fc.property(fc.array(consistent, { maxLength: 40 }), (terms) => {
        const g = diagnoseGrowth({
          terms,
          expected: [
            { t: -1, kind: 'ultraviolet' },
            { t: 2, exponent: 2.5, kind: 'infrared' },
          ],
        });
        expect(g.statement).not.toMatch(/NaN|undefined/);
        for (const f of g.flags) expect(f.text).not.toMatch(/NaN|undefined/);
        if (g.nearest !== undefined) {
          expect(g.nearest.t.error).toBeGreaterThanOrEqual(0);
          expect(Number.isNaN(g.nearest.t.value)).toBe(false);
        }
      }),
      { numRuns: 5 * RUNS, seed: 14 },
    );
  });

  it('on any list of exact numbers', () => {
    const anyRational = fc
      .tuple(fc.bigInt({ min: -(10n ** 40n), max: 10n ** 40n }), fc.bigInt({ min: 1n, max: 10n ** 20n }))
      .map(([a, b]) => Rational.of(a, b));
    const coefficient = fc.oneof(
      { weight: 4, arbitrary: anyRational },
      { weight: 1, arbitrary: fc.constant(Rational.ZERO) },
    );
    fc.assert(
      fc.property(fc.array(coefficient, { maxLength: 30 }), (all) => {
        const g = diagnoseGrowth(fromRationals(all));
        expect(g.statement).not.toMatch(/NaN|undefined/);
        if (all.length > 0 && all.every((q) => q.isZero())) expect(g.verdict).toBe('terminating');
      }),
      { numRuns: 5 * RUNS, seed: 15 },
    );
  });
});
