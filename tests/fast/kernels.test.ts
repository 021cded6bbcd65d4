/** @module Prescriptions in doubles against the same prescriptions in enclosures. */
import { describe, expect, test } from 'vitest';
import { contourSum } from '../../src/contour/index.js';
import { fastSetting, makeKernel, readsCircle } from '../../src/fast/index.js';
import type { FastSetting } from '../../src/fast/index.js';
import { TabledSums } from '../../src/fast/tabled.js';
import { diagnoseGrowth } from '../../src/growth/index.js';
import type { Growth } from '../../src/growth/index.js';
import { exact, R, Rational, toNumberExact } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { PRESCRIPTIONS } from '../../src/prescriptions/index.js';
import type { Prescription, Sum } from '../../src/prescriptions/index.js';
import { loadSeries } from '../../src/series/index.js';
import type { Expansion } from '../../src/series/index.js';
import { expand } from '../../src/studies/expand.js';
import { benchExpansion, growthOf, readBench } from '../support/expansions.js';
import { uniform } from '../truncation/random.js';

const FAST = [
  'fixed-order',
  'least-term',
  'terminant',
  'pade',
  'wynn-epsilon',
  'levin',
  'weniger-delta',
  'borel-pade',
  'borel-leroy-pade',
  'borel-partial-pade',
  'borel-conformal',
  'singularity-model',
];

/** Largest allowed difference, relative to the sum without its additive part; measured, a regression fails. */
const ALLOWED = 5e-12;

interface Subject {
  readonly name: string;
  readonly e: Expansion;
  readonly growth: Growth;
}

const double = (x: number): Exact => exact(Rational.fromNumber(x));

const bench = (id: string, count: number): Subject => {
  const b = readBench(id);
  const e = benchExpansion(b, b.references[0]!.x, count);
  return { name: id, e, growth: growthOf(e) };
};

async function catalogue(id: string, at: number, count = 6): Promise<Subject> {
  const expanded = expand(await loadSeries(id), double(at), count);
  return { name: id, e: expanded.expansion, growth: diagnoseGrowth(expanded.growthInput) };
}

const prescription = (name: string): Prescription => PRESCRIPTIONS.find((p) => p.name === name)!;

function centralSum(p: Prescription, { e, growth }: Subject): Sum | undefined {
  return p.apply(e, growth, { digits: 13 }).find((o): o is Sum => o.kind === 'sum' && o.central === true);
}

/** R of the kernel, and of the prescription itself on the same expansion. */
function both(p: Prescription, s: Subject, sum: Sum, setting: FastSetting, x: number, c: readonly number[]) {
  const moved: Expansion = { ...s.e, x: double(x), coefficients: c.map(double) };
  const [slow] = p.apply(moved, s.growth, { digits: 13, only: sum.variant });
  const kernel = makeKernel(setting);
  const stands = kernel.prepare(Float64Array.from(c));
  const [additive, factor] = [toNumberExact(s.e.additive), toNumberExact(s.e.factor)];
  return { slow, stands, fast: additive + factor * x ** s.e.power * kernel.value(x), additive };
}

/** Does the setting stand for the entry of the central sum itself, and not for the corner of a block of equal entries? */
const isEntry = (setting: FastSetting, sum: Sum): boolean =>
  !('L' in setting) || sum.variant.includes(`[${setting.L}/${setting.M}]`);

const SUBJECTS: readonly (readonly [string, () => Promise<Subject> | Subject])[] = [
  ['Adler function', () => catalogue('adler-estimate', 0.32)],
  ['tau width', () => catalogue('tau-delta0-estimate', 0.32)],
  ['pole mass', () => catalogue('pole-msbar', 0.225)],
  ['Higgs to gluons', () => catalogue('higgs-gg', 0.113)],
  ['plaquette', () => catalogue('plaquette', 0.1)],
  ['alternating factorials', () => bench('s01_euler_alternating', 6)],
  ['two branch points', () => bench('s10_uv1_ir2_branch', 6)],
  ['a pole of second order', () => bench('s152_demo_tessel_uv', 7)],
  ['quartic oscillator', () => bench('s40_aho_quartic', 6)],
  ['complex pair', () => bench('s119_conj_cos3_5', 7)],
];

/** Prescriptions compared so far. */
const seen = new Set<string>();

describe.each(SUBJECTS)('%s', (_, make) => {
  test('fast and certified versions agree at the central values, at another coupling, with other coefficients', async () => {
    const s = await make();
    const random = uniform(20240611);
    const central = s.e.coefficients.map(toNumberExact);
    const x = toNumberExact(s.e.x);
    let compared = 0;
    for (const name of FAST) {
      const p = prescription(name);
      const sum = centralSum(p, s);
      const setting = sum && fastSetting(name, s.e, s.growth, sum);
      if (sum === undefined || setting === undefined) continue;
      const entry = isEntry(setting, sum);
      const cases: [number, number[]][] = [[x * 0.8, central]];
      if (entry) cases.push([x * 1.05, central.map((c) => c * (1 + 0.02 * (random() - 0.5)))]);
      for (const [at, c] of [[x, central] as const, ...cases]) {
        const { slow, stands, fast, additive } = both(p, s, sum, setting, at, c);
        if (slow?.kind !== 'sum' || slow.variant !== sum.variant) continue;
        // The member was asked for by name: the prescription then keeps its doubts to itself, the replica does not.
        if (!stands && c !== central) continue;
        expect(stands, `${name} at ${at}`).toBe(true);
        const value = R.toNumber(slow.value);
        const gap = Math.abs(fast - value) / Math.abs(value - additive);
        expect(gap, `${name} ${sum.variant} at ${at}: ${fast} against ${value}`).toBeLessThan(ALLOWED);
        compared++;
        seen.add(name);
      }
    }
    expect(compared).toBeGreaterThan(5);
  });
});

test('every prescription with a fast version is compared somewhere', () => {
  expect([...seen].sort()).toEqual([...FAST].sort());
});

describe('contour improved', () => {
  test('the tabled integrals give what the integral around the circle gives, at any coefficients', async () => {
    const s = await catalogue('tau-contour-estimate', 0.32);
    const { contour } = s.e;
    if (contour === undefined) expect.fail('no contour quantity');
    const sum = centralSum(prescription('fixed-order'), s)!;
    const setting = fastSetting('contour-improved', s.e, s.growth, sum)!;
    expect(readsCircle(setting)).toBe(true);
    const kernel = makeKernel(setting);
    const central = contour.coefficients.map(toNumberExact);
    const [factor, additive, power] = [toNumberExact(s.e.factor), toNumberExact(s.e.additive), s.e.power];
    for (const [alpha, by] of [
      [0.32, 0],
      [0.3, 0.05],
      [0.35, -0.1],
    ] as const) {
      const c = central.map((v, n) => v * (1 + by * n));
      expect(kernel.prepare(Float64Array.from(c))).toBe(true);
      const x = alpha / Math.PI;
      const fast = additive + factor * x ** power * kernel.value(x);
      const slow = contourSum({ ...s.e, contour }, 'contour-improved', alpha, c);
      if (typeof slow !== 'number') expect.fail(slow.reason);
      expect(Math.abs(fast / slow - 1)).toBeLessThan(1e-12);
    }
    expect(kernel.value(2)).toBeNaN();
  });
});

describe('tabled sums', () => {
  test('agree with the functions inside the range, and have no value outside', () => {
    const values = (x: number, out: Float64Array): void => {
      out[0] = Math.exp(-1 / x);
      out[1] = 1 / (2 + x);
    };
    const sums = new TabledSums(2, values, 0.3);
    const out = new Float64Array(2);
    sums.contract(Float64Array.of(3, -2));
    for (const x of [0.15, 0.2, 0.3, 0.42, 0.51]) {
      values(x, out);
      expect(Math.abs(sums.at(x) - (3 * out[0]! - 2 * out[1]!))).toBeLessThan(1e-14);
    }
    expect([sums.at(0.149), sums.at(0.52), sums.at(NaN)]).toEqual([NaN, NaN, NaN]);
  });

  test('of a function that is not smooth have no value anywhere', () => {
    const sums = new TabledSums(1, (x, out) => out.fill(Math.abs(x - 0.31)), 0.3);
    sums.contract(Float64Array.of(1));
    expect(sums.at(0.3)).toBeNaN();
  });

  test('a kernel is continuous where its table ends', async () => {
    const s = await catalogue('adler-estimate', 0.32);
    for (const name of ['borel-conformal', 'singularity-model', 'borel-partial-pade']) {
      const sum = centralSum(prescription(name), s)!;
      const kernel = makeKernel(fastSetting(name, s.e, s.growth, sum)!);
      kernel.prepare(Float64Array.from(s.e.coefficients, toNumberExact));
      const X = toNumberExact(s.e.x);
      for (const end of [0.5 * X, 1.7 * X]) {
        const [inside, outside] = [kernel.value(end * (1 + 1e-13)), kernel.value(end * (1 - 1e-13))];
        expect(Math.abs(inside / outside - 1), name).toBeLessThan(5e-12);
      }
    }
  });
});

describe('refusals', () => {
  test('a vanishing pivot: the Padé entry lies in a block', () => {
    const kernel = makeKernel({ kind: 'pade', L: 1, M: 2 });
    expect(kernel.prepare(Float64Array.of(1, 1, 1, 1))).toBe(false);
    expect(kernel.prepare(Float64Array.of(1, 1, 2, 6))).toBe(true);
  });

  test('signs that do not alternate', () => {
    const kernel = makeKernel({ kind: 'weniger-delta', variant: 'd', count: 4, start: 0 });
    expect(kernel.prepare(Float64Array.of(1, -1, 2, -6))).toBe(true);
    expect(kernel.prepare(Float64Array.of(1, -1, 2, 6))).toBe(false);
    expect(kernel.prepare(Float64Array.of(1, -1, 0, -6))).toBe(false);
    expect(kernel.prepare(Float64Array.of(1, -1, NaN, -6))).toBe(false);
  });

  test('a pole where none may be', () => {
    const geometric = Float64Array.of(1, 1, 2); // 1/(1 − t): a pole at t = 1
    const common = { kind: 'borel-pade', L: 0, M: 1, b: 0, lift: true, noise: 0, x: 0.2 } as const;
    expect(makeKernel({ ...common, innermost: 0.9 }).prepare(geometric)).toBe(true);
    expect(makeKernel({ ...common, innermost: 1.1 }).prepare(geometric)).toBe(false);
  });

  test('too few coefficients', () => {
    expect(makeKernel({ kind: 'fixed-order', terms: 4 }).prepare(Float64Array.of(1, 2, 3))).toBe(false);
    expect(makeKernel({ kind: 'least-term', terms: 3, half: true }).prepare(Float64Array.of(1, 2, 3))).toBe(false);
    expect(makeKernel({ kind: 'terminant', terms: 3, t: 1, exponent: 1 }).prepare(Float64Array.of(1, 2, 3))).toBe(
      false,
    );
  });
});

describe('closed forms', () => {
  test('B = 1/(1 − t): principal value e^{−1/x} Ei(1/x)/x; mpmath 1.3.0, 30 digits', () => {
    const kernel = makeKernel({ kind: 'borel-pade', L: 0, M: 1, b: 0, lift: true, innermost: 0, noise: 0, x: 0.25 });
    kernel.prepare(Float64Array.of(1, 1, 2));
    expect(Math.abs(kernel.value(0.25) - 1.438208031454483)).toBeLessThan(1e-14);
  });

  test('B = 1/(1 − t)²: two poles fall together, the ray takes over; Hadamard finite part, mpmath 1.3.0', () => {
    const kernel = makeKernel({ kind: 'borel-pade', L: 0, M: 2, b: 0, lift: true, innermost: 0, noise: 0, x: 0.25 });
    kernel.prepare(Float64Array.of(1, 2, 6));
    // (1/x) PV ∫ e^{−t/x} (1 − t)^{−2} dt = (1/x) (−1 + F_0(1/x)/x), F_0(w) = e^{−w} Ei(w).
    expect(Math.abs(kernel.value(0.25) - 1.752832125817931)).toBeLessThan(1e-13);
  });
});
