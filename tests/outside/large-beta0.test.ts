/**
 * Large-β0 results against quadrature: sums, imaginary parts and coefficients computed with mpmath 1.2.1 (rotated Borel
 * contours, Euclidean and dispersive integrals) and PARI/GP 2.15 (power series), to 40 digits and more; the values and how
 * each was had are in data/large-beta0.json. Leading n_f terms: the published coefficients named there.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import {
  betaNought,
  chainCoefficients,
  chainSum,
  cutCoefficients,
  cutSum,
  factorBall,
  quantityNamed,
} from '../../src/bubbles/index.js';
import type { ChainPoint, Quantity } from '../../src/bubbles/index.js';
import { R, Rational, exact, toNumberExact } from '../../src/numerics/index.js';
import type { Ball, Exact } from '../../src/numerics/index.js';

interface Data {
  readonly checks: readonly { readonly id: string; readonly value: string }[];
  readonly coefficients: Readonly<Record<string, readonly string[]>>;
  readonly cut: {
    readonly resummed: readonly (readonly [tau: string, high: string, low: string])[];
    readonly table: Readonly<Record<string, readonly (readonly string[])[]>>;
  };
  readonly truncation: Readonly<
    Record<string, { readonly nmin: number; readonly tmin: string; readonly Smin: string }>
  >;
}
const data = JSON.parse(readFileSync(new URL('data/large-beta0.json', import.meta.url), 'utf8')) as unknown as Data;

const PREC = 180;
const rational = (text: string): Rational => {
  const q = Rational.parse(text.replace('e+', 'e'));
  if (q === undefined) throw new Error(`${text} is no number`);
  return q;
};
const named = (name: string): Quantity => {
  const found = quantityNamed(name);
  if (found === undefined) throw new Error(`no quantity ${name}`);
  return found;
};

/** The value lies within half a unit of its last digit around the ball. */
function expectDigits(ball: Ball, text: string, digits: number): void {
  const want = R.fromRational(rational(text), 400);
  const gap = Math.abs(R.toNumber(R.div(R.sub(ball, want, 400), want, 60)));
  expect(gap).toBeLessThan(1.01 * 10 ** (1 - digits));
  expect(R.accuracyBits(ball)).toBeGreaterThan(digits * 3.32);
}
const significant = (text: string): number => text.replace(/e.*/, '').replace(/[-.]/g, '').replace(/^0+/, '').length;

const at = (flavours: number, alpha: string): ChainPoint => ({
  alpha: exact(rational(alpha)),
  flavours,
  ratio: exact(1),
});
const value = (id: string): string => data.checks.find((c) => c.id === id)!.value;

describe('principal values and imaginary parts', () => {
  test.each([
    ['adler', 'adler', at(3, '0.32')],
    ['r-ratio', 'R', at(3, '0.32')],
    ['tau-width', 'tau', at(3, '0.32')],
    ['bjorken', 'bjorken', at(3, '0.32')],
    ['gross-llewellyn-smith', 'bjorken', at(3, '0.32')],
    ['static-potential', 'potential', at(3, '0.25')],
    ['pole-mass', 'pole_b', at(4, '0.22')],
    ['pole-mass', 'pole_t', at(5, '0.108')],
    ['b-to-u-pole', 'b_u.pole', at(4, '0.22')],
    ['b-to-u-msbar', 'b_u.MS', at(4, '0.22')],
  ])('%s (%s)', (name, id, point) => {
    const { pv, im } = chainSum(named(name), point);
    expectDigits(pv.ball(PREC), value(`${id}.PV`), 40);
    expectDigits(im.ball(PREC), value(`${id}.Im`), 40);
  });
});

describe('coefficients', () => {
  test.each([
    ['adler', 'adler', false],
    ['r-ratio', 'R', false],
    ['tau-width', 'tau', false],
    ['bjorken', 'bj', false],
    ['static-potential', 'pot', false],
    ['pole-mass', 'pole', false],
    ['b-to-u-pole', 'bu_pole', true],
    ['b-to-u-msbar', 'bu_MS', true],
  ])('%s', (name, id, asTheyAre) => {
    const list = data.coefficients[id]!;
    const own = chainCoefficients(named(name), list.length);
    const first = asTheyAre ? exact(1) : own[0]!;
    list.forEach((text, n) =>
      expectDigits(R.div(own[n]!.ball(PREC), first.ball(PREC), PREC), text, Math.min(40, significant(text) - 1)),
    );
  });
});

/** n_f^n coefficient of (α_s/π)^(n+1): norm c_n β0^n with β0 → −n_f/(6π). */
function leadingFlavours(name: string, norm: Rational, n: number): Exact {
  const c = chainCoefficients(named(name), n + 1)[n]!;
  const factor = norm.mul(Rational.of(-1, 6).pow(n));
  return { ball: (prec) => R.mul(c.ball(prec), R.fromRational(factor, prec), prec) };
}

test.each([
  ['adler', 'adler', Rational.ONE, [1, 2, 3]],
  ['bjorken', 'bj', Rational.ONE, [1, 2, 3]],
  ['pole-mass', 'pole', Rational.of(4, 3), [1, 2]],
  ['b-to-u-pole', 'bu_pole', Rational.of(4, 3), [1]],
] as const)('leading n_f terms of %s', (name, id, norm, orders) => {
  for (const n of orders) expectDigits(leadingFlavours(name, norm, n).ball(PREC), value(`nf.${id}.${n}`), 40);
});

test('leading n_f terms found through integer relations', () => {
  const c = Rational.of(4, 3);
  expectDigits(leadingFlavours('pole-mass', c, 3).ball(PREC), value('nf.pole.nl3'), 40);
  expectDigits(leadingFlavours('b-to-u-pole', c, 2).ball(PREC), value('nf.b_u.nl2'), 40);
  expectDigits(leadingFlavours('b-to-u-pole', c, 3).ball(PREC), value('nf.b_u.nl3'), 40);
});

describe('the cut of the Adler function', () => {
  const adler = named('adler');
  test.each(data.cut.resummed)('k² > %s Q²', (tau, high, low) => {
    const cut = rational(tau);
    // τ_f = μ_f²/Q²: the cut is its root, a rational only for 1/4; elsewhere a rational beyond all digits.
    const root = R.sqrt(R.fromRational(cut, 400), 400);
    const near = Rational.of(root.mid, 1n << BigInt(-root.exp));
    const sum = cutSum(adler, at(3, '0.32'), near);
    expectDigits(sum.high.ball(PREC), high, 40);
    expectDigits(sum.low.ball(PREC), low, 38);
  });

  test.each([
    ['0.25', '1/2'],
    ['0.0625', '1/4'],
  ] as const)('coefficients by momentum, τ_f = %s', (tau, cut) => {
    const parts = cutCoefficients(adler, exact(1), rational(cut), 33);
    for (const [n, whole, low, high, window, ultraviolet] of data.cut.table[tau]!) {
      const rows = [parts.whole, parts.low, parts.high, parts.window, parts.ultraviolet];
      [whole, low, high, window, ultraviolet].forEach((text, i) =>
        expectDigits(rows[i]![Number(n)]!.ball(PREC), text!, Math.min(20, significant(text!) - 1)),
      );
    }
  });
});

test.each([
  ['adler', 'adler', at(3, '0.32')],
  ['r-ratio', 'R', at(3, '0.32')],
  ['tau-width', 'tau', at(3, '0.32')],
  ['bjorken', 'bj', at(3, '0.32')],
  ['static-potential', 'pot', at(3, '0.25')],
  ['pole-mass', 'pole_b', at(4, '0.22')],
  ['pole-mass', 'pole_t', at(5, '0.108')],
  ['b-to-u-pole', 'bu_pole', at(4, '0.22')],
  ['b-to-u-msbar', 'bu_MS', at(4, '0.22')],
])('least term and partial sum of %s (%s)', (name, id, point) => {
  const quantity = named(name);
  const { nmin, tmin, Smin } = data.truncation[id]!;
  const a = toNumberExact(point.alpha) * R.toNumber(betaNought(point.flavours, 80));
  const scale = toNumberExact(point.alpha) * R.toNumber(factorBall(quantity.norm.factor, 80));
  const terms = chainCoefficients(quantity, 16).map((c, n) => scale * toNumberExact(c) * a ** n);
  // The published tables end at n = 12 but for the width.
  const shown = terms.slice(0, id.startsWith('bu') ? 16 : 13).map(Math.abs);
  expect(shown.indexOf(Math.min(...shown))).toBe(nmin);
  expect(terms[nmin]! / Number(tmin)).toBeCloseTo(1, 12);
  expect(terms.slice(0, nmin + 1).reduce((s, t) => s + t, 0) / Number(Smin)).toBeCloseTo(1, 12);
});
