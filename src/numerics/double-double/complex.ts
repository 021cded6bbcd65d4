/**
 * @module Complex numbers in double-double arithmetic, four doubles each.
 *
 * Purpose    as in real.ts.
 * Method     the textbook formulas; functions from those of the parts.
 * Bound      as in real.ts: relative to the modulus, a few UNIT an operation; logarithms absolutely.
 */
import type { Complex as ComplexBall } from '../ball/complex.js';
import { atan2, exp as realExp, log as realLog, sinCos } from './elementary.js';
import * as D from './real.js';
import type { DoubleDouble } from './real.js';

export interface Complex {
  readonly re: DoubleDouble;
  readonly im: DoubleDouble;
}

export const ZERO: Complex = { re: [0, 0], im: [0, 0] };
export const ONE: Complex = { re: [1, 0], im: [0, 0] };

/** Midpoint of a complex ball. */
export const fromBall = (z: ComplexBall): Complex => ({ re: D.fromBall(z.re), im: D.fromBall(z.im) });

export const fromReal = (x: DoubleDouble): Complex => ({ re: x, im: [0, 0] });

export const add = (a: Complex, b: Complex): Complex => ({ re: D.add(a.re, b.re), im: D.add(a.im, b.im) });

export const sub = (a: Complex, b: Complex): Complex => ({ re: D.sub(a.re, b.re), im: D.sub(a.im, b.im) });

export const neg = (a: Complex): Complex => ({ re: D.neg(a.re), im: D.neg(a.im) });

export const mul = (a: Complex, b: Complex): Complex => ({
  re: D.sub(D.mul(a.re, b.re), D.mul(a.im, b.im)),
  im: D.add(D.mul(a.re, b.im), D.mul(a.im, b.re)),
});

export const mulReal = (a: Complex, x: DoubleDouble): Complex => ({ re: D.mul(a.re, x), im: D.mul(a.im, x) });

export const mul2exp = (a: Complex, k: number): Complex => ({ re: D.mul2exp(a.re, k), im: D.mul2exp(a.im, k) });

export const norm = (a: Complex): DoubleDouble => D.add(D.mul(a.re, a.re), D.mul(a.im, a.im));

export function div(a: Complex, b: Complex): Complex {
  const n = norm(b);
  const top = mul(a, { re: b.re, im: D.neg(b.im) });
  return { re: D.div(top.re, n), im: D.div(top.im, n) };
}

/** |a| as a double. */
export const size = (a: Complex): number => Math.hypot(a.re[0], a.im[0]);

export function exp(z: Complex): Complex {
  const r = realExp(z.re);
  const [sin, cos] = sinCos(z.im);
  return { re: D.mul(r, cos), im: D.mul(r, sin) };
}

/** Principal logarithm. */
export const log = (z: Complex): Complex => ({ re: D.mul2exp(realLog(norm(z)), -1), im: atan2(z.im, z.re) });

/** Principal square root. */
export function sqrt(z: Complex): Complex {
  const modulus = D.sqrt(norm(z));
  if (modulus[0] === 0) return ZERO;
  const right = z.re[0] >= 0;
  const large = D.sqrt(D.mul2exp(D.add(modulus, right ? z.re : D.neg(z.re)), -1));
  const small = D.div(D.mul2exp(z.im, -1), large);
  if (right) return { re: large, im: small };
  const up = z.im[0] >= 0;
  return { re: up ? small : D.neg(small), im: up ? large : D.neg(large) };
}

/** Σ p_k t^k by Horner's rule, real coefficients. */
export function polynomial(p: readonly DoubleDouble[], t: Complex): Complex {
  let value = ZERO;
  for (let k = p.length - 1; k >= 0; k--) {
    const product = mul(value, t);
    value = { re: D.add(product.re, p[k]!), im: product.im };
  }
  return value;
}
