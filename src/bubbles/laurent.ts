/**
 * @module Short Laurent series in ε with exact coefficients, and rational functions expanded in them.
 *
 * A series is Σ c[k] ε^(low+k), known up to the last entry; products and sums end where the first factor ends.
 */
import { Rational } from '../numerics/index.js';
import { formalRational, formalRing, mulSeries } from '../qcd/index.js';
import type { Formal } from '../qcd/index.js';

export interface Laurent {
  readonly low: number;
  readonly c: readonly Formal[];
}

/** factor · Σ numerator[i] u^(degree−i) / Π (u − root). */
export interface Fraction {
  readonly factor: Rational;
  readonly numerator: readonly number[];
  readonly roots: readonly Rational[];
}

export function mulLaurent(a: Laurent, b: Laurent): Laurent {
  const length = Math.min(a.c.length, b.c.length);
  return { low: a.low + b.low, c: mulSeries(formalRing, a.c, b.c, length) };
}

export function addLaurent(a: Laurent, b: Laurent): Laurent {
  const low = Math.min(a.low, b.low);
  const end = Math.min(a.low + a.c.length, b.low + b.c.length);
  const at = (x: Laurent, n: number): Formal => x.c[n - x.low] ?? formalRing.zero;
  return { low, c: Array.from({ length: end - low }, (_, k) => formalRing.add(at(a, low + k), at(b, low + k))) };
}

export function deriveLaurent(a: Laurent): Laurent {
  return {
    low: a.low - 1,
    c: a.c.map((x, k) => formalRing.mul(x, formalRational(Rational.of(a.low + k)))),
  };
}

/** Coefficients of ε^−1, ε^−2, …, as far as there are any. */
export function principal(a: Laurent): Formal[] {
  const count = Math.max(0, -a.low);
  return Array.from({ length: count }, (_, i) => a.c[-1 - i - a.low] ?? formalRing.zero);
}

/** Ascending Taylor coefficients of the numerator about `at`. */
function shifted(numerator: readonly number[], at: Rational): Rational[] {
  const c = numerator.toReversed().map((n) => Rational.of(n));
  for (let i = 0; i < c.length; i++) {
    for (let j = c.length - 2; j >= i; j--) c[j] = c[j]!.add(c[j + 1]!.mul(at));
  }
  return c;
}

/** The Laurent series of a fraction about a point, `length` entries. */
export function expandFraction(f: Fraction, at: Rational, length: number): Laurent {
  let c = shifted(f.numerator, at).map((x) => x.mul(f.factor));
  c = Array.from({ length }, (_, k) => c[k] ?? Rational.ZERO);
  let low = 0;
  for (const root of f.roots) {
    const gap = at.sub(root);
    if (gap.isZero()) {
      low--;
      continue;
    }
    // Division by gap + ε.
    for (let k = 0; k < length; k++) c[k] = c[k]!.sub(k === 0 ? Rational.ZERO : c[k - 1]!).div(gap);
  }
  // Leading zeros would cost a product its last orders.
  const zeros = Math.max(
    0,
    c.findIndex((x) => !x.isZero()),
  );
  return { low: low + zeros, c: c.slice(zeros).map(formalRational) };
}

/** The value of a fraction where it has no pole. */
export function valueAt(f: Fraction, at: Rational): Rational {
  const top = f.numerator.reduce((sum, c) => sum.mul(at).add(Rational.of(c)), Rational.ZERO);
  return f.roots.reduce((value, root) => value.div(at.sub(root)), top.mul(f.factor));
}

/** Its derivative there. */
export function slopeAt(f: Fraction, at: Rational): Rational {
  const degree = f.numerator.length - 1;
  const slope: Fraction = {
    ...f,
    numerator: f.numerator.slice(0, -1).map((c, i) => c * (degree - i)),
  };
  const log = f.roots.reduce((sum, root) => sum.add(at.sub(root).inv()), Rational.ZERO);
  return valueAt(slope, at).sub(valueAt(f, at).mul(log));
}
