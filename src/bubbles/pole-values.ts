/**
 * @module Functionals of single poles without an integral: Taylor coefficients at u = 0, the distribution of virtualities,
 * values at a point.
 *
 * Taylor         [u^n] (u − p)^(−m) = (−1)^m C(n+m−1, n) p^(−n−m).
 * Distribution   w of b(u) = ∫ dτ/τ w(τ) τ^(−u), x = τ/κ: (u − p)^(−m) ↔ −x^p (ln x)^(m−1)/(m−1)! for p > 0, x < 1, and the
 *                same with + for p <= 0, x > 1; zero on the other side of x = 1.
 * Masses         powers of 1/p and of x are moments in k; with ln x as a factor that does not depend on k.
 */
import { R, Rational, log, pow } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Functional } from './functional.js';

const zeros = (orders: number): Ball[] => Array.from({ length: orders }, () => R.ZERO);

/** C(n+m−1, m−1). */
function binomial(n: number, m: number): Rational {
  let c = Rational.ONE;
  for (let i = 1; i < m; i++) c = c.mul(Rational.of(n + i, i));
  return c;
}

/** Powers of 1/p, kept from one order to the next. */
export class InversePowers {
  private readonly prec: number;
  private readonly lists = new Map<string, Ball[]>();

  constructor(prec: number) {
    this.prec = prec;
  }

  /** p^(−n). */
  of(at: Rational, n: number): Ball {
    const key = at.toString();
    const list = this.lists.get(key) ?? [R.ONE, R.fromRational(at.inv(), this.prec)];
    this.lists.set(key, list);
    for (let k = list.length; k <= n; k++) list.push(R.mul(list[k - 1]!, list[1]!, this.prec));
    return list[n]!;
  }
}

/** The coefficient of u^n; a pole at u = 0 has none. */
export function taylorAt(n: number, powers: InversePowers, prec: number): Functional {
  const size = (first: number, m: number): number => binomial(n, m).toNumber() * first ** (-n - m);
  return {
    moments(at, orders) {
      if (at.isZero()) return zeros(orders);
      return zeros(orders).map((_, i) => {
        const m = i + 1;
        const value = R.mul(R.fromRational(binomial(n, m), prec), powers.of(at, n + m), prec);
        return m % 2 === 0 ? value : R.neg(value);
      });
    },
    mass: (_side, first, m) => size(first, m),
    bound: size,
  };
}

/** w at x = τ/κ, from the poles of the side that contributes there. */
export function distributionAt(x: Rational, prec: number): Functional {
  const ball = R.fromRational(x, prec);
  const infrared = x.cmp(Rational.ONE) < 0;
  const logX = log(ball, prec);
  const logSize = Math.abs(R.toNumber(logX)) * 1.0001;
  const size = (first: number, m: number): number =>
    x.toNumber() ** (infrared ? first : -first) * 1.0001 * logSize ** (m - 1);
  return {
    moments(at, orders) {
      if (at.sign() > 0 !== infrared) return zeros(orders);
      let value = at.isInteger() ? R.powInt(ball, Number(at.num), prec) : pow(ball, R.fromRational(at, prec), prec);
      if (infrared) value = R.neg(value);
      return zeros(orders).map((_, i) => {
        if (i > 0) value = R.div(R.mul(value, logX, prec), R.fromNumber(i), prec);
        return value;
      });
    },
    mass: (side, first, m) => ((side === 'infrared') === infrared ? size(first, m) : 0),
    bound: size,
  };
}
