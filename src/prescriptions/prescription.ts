/**
 * @module The one interface of all prescriptions.
 *
 * A prescription turns an Expansion into sums, or says why it cannot: it never throws for what it cannot sum, and never
 * returns a number that it does not believe. Values are of the whole R (prefactor, power and additive part included).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import type { Growth } from '../growth/index.js';

export type Trust = 'certified' | 'converged' | 'indicative';

export interface Sum {
  readonly kind: 'sum';
  /** Member of the family: "[2/2]", "through order 4". */
  readonly variant: string;
  /** The value, an enclosure of the number that the prescription defines. */
  readonly value: Ball;
  /** Signed imaginary part of the upper lateral sum, where the prescription has one. */
  readonly imaginary?: Ball;
  /** Truncation error by the prescription's own recipe, absolute. */
  readonly truncation?: number;
  readonly termsUsed: number;
  /** Trust in the number as an answer. */
  readonly trust: Trust;
  /** Trust in the digits of `value`: certified by the enclosure unless said otherwise (quadrature: converged). */
  readonly digitsTrust?: Trust;
  readonly notes: readonly string[];
  /** Marks the family's own best member. */
  readonly central?: boolean;
}

export interface Refusal {
  readonly kind: 'refusal';
  readonly variant: string;
  readonly reason: string;
  readonly remedy: string;
}

export type Outcome = Sum | Refusal;

export interface Request {
  /** Certified decimal digits wanted of each value. */
  readonly digits: number;
  /** Only the family's own choice is wanted, with its error: its neighbours need no digits of their own, nor be returned. */
  readonly central?: boolean;
  /** Evaluate only this member, without its error estimate: used when inputs are varied. */
  readonly only?: string;
}

export interface Prescription {
  /** Stable name, as in --by. */
  readonly name: string;
  readonly title: string;
  /** One line: what it is, for lists. */
  readonly summary: string;
  readonly family: 'truncation' | 'scale' | 'coupling' | 'borel' | 'model' | 'contour';
  apply(expansion: Expansion, growth: Growth, request: Request): readonly Outcome[];
}

export const refusal = (variant: string, reason: string, remedy: string): Refusal => ({
  kind: 'refusal',
  variant,
  reason,
  remedy,
});

/** Working precision in bits for `digits` decimal digits. */
export const workingBits = (digits: number): number => Math.ceil(digits * 3.33) + 40;

/** Highest precision a prescription raises to before it gives the digits it has. */
export const PRECISION_CAP = 20_000;

/** Evaluates at rising precision until `digits` relative digits are certain, or the cap is reached. */
export function toDigits<T>(digits: number, evaluate: (prec: number) => T, worst: (result: T) => Ball): T {
  let prec = workingBits(digits);
  for (;;) {
    const result = evaluate(prec);
    const v = worst(result);
    if (R.accuracyBits(v) >= digits * 3.3219 + 1 || R.isExactZero(v) || prec * 2 > PRECISION_CAP) return result;
    prec *= 2;
  }
}

/** additive + factor · x^power · f. */
export function dressed(e: Expansion, f: Ball, prec: number): Ball {
  return R.add(e.additive.ball(prec), scaled(e, f, prec), prec);
}

/** factor · x^power · f: what turns a part of F (a term, an imaginary part) into a part of R. */
export function scaled(e: Expansion, f: Ball, prec: number): Ball {
  return R.mul(prefactor(e, prec), f, prec);
}

/** factor · x^power. */
export function prefactor(e: Expansion, prec: number): Ball {
  return R.mul(e.factor.ball(prec), R.powInt(e.x.ball(prec), e.power, prec), prec);
}

/** The terms factor · c_n x^(n+power). */
export function terms(e: Expansion, prec: number): Ball[] {
  const x = e.x.ball(prec);
  let weight = prefactor(e, prec);
  return e.coefficients.map((c, n) => {
    if (n > 0) weight = R.mul(weight, x, prec);
    return R.mul(c.ball(prec), weight, prec);
  });
}

/** Partial sums of R including the additive part: entry k holds the first k terms, k = 0 … N. */
export function partialSums(e: Expansion, prec: number): Ball[] {
  let sum = e.additive.ball(prec);
  const sums = [sum];
  for (const t of terms(e, prec)) {
    sum = R.add(sum, t, prec);
    sums.push(sum);
  }
  return sums;
}

/** Index of the smallest non-zero |term|; `tied` when the next one has exactly the same size to the known digits. */
export function leastTerm(t: readonly Ball[]): { index: number; tiedWith?: number } | undefined {
  let best = -1;
  let tied: number | undefined;
  t.forEach((term, n) => {
    if (R.isExactZero(term) || R.containsZero(term)) return;
    if (best < 0) {
      best = n;
      return;
    }
    const order = R.compare(R.abs(term), R.abs(t[best]!), 200);
    if (order < 0) {
      best = n;
      tied = undefined;
    } else if (order === 0) tied = n;
  });
  return best < 0 ? undefined : tied === undefined ? { index: best } : { index: best, tiedWith: tied };
}
