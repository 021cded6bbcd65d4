/**
 * @module Errors of pole positions from the quoted errors of the coefficients.
 * Method     poles of the approximant in doubles at coefficients moved by half a standard deviation either way, matched to
 *            the nearest; √(J C Jᵀ). A pole that another one overtakes, or that leaves the axis, has no first-order error.
 * Bound      indicative: to first order.
 */
import { PadeDouble, R } from '../numerics/index.js';
import type { Exact, Rational } from '../numerics/index.js';

export interface Position {
  readonly re: number;
  readonly im: number;
}

/** Moves beyond this part of the pole's modulus are no small ones. Heuristic. */
const LARGEST = 0.5;

/** Factors c_n → b_n of the Borel–Leroy transform, 1/(1+b)_n. */
function weights(count: number, b: Rational): number[] {
  const shift = b.toNumber();
  let weight = 1;
  return Array.from({ length: count }, (_, n) => (n === 0 ? weight : (weight /= n + shift)));
}

/** Poles of [L/M] in doubles, both members of a pair; empty where the entry does not exist. */
function polesOf(pade: PadeDouble, b: readonly number[]): Position[] {
  if (!pade.fit(b) || !pade.findPoles()) return [];
  return Array.from({ length: pade.poleCount }, (_, i) => ({ re: pade.poleRe[i]!, im: pade.poleIm[i]! }));
}

const nearest = (list: readonly Position[], z: Position): Position | undefined => {
  let best: Position | undefined;
  let least = Infinity;
  for (const p of list) {
    const d = Math.hypot(p.re - z.re, p.im - z.im);
    if (d < least) [best, least] = [p, d];
  }
  return best;
};

/** One standard deviation of each pole of [L/M], in the order of `poles`; undefined where there is no first-order one. */
export function poleErrors(
  coefficients: readonly Exact[],
  errors: readonly number[],
  correlation: readonly (readonly number[])[] | undefined,
  leroy: Rational,
  [L, M]: readonly [number, number],
  poles: readonly Position[],
): (Position | undefined)[] {
  const count = L + M + 1;
  const weight = weights(count, leroy);
  const b = coefficients.slice(0, count).map((c, n) => R.toNumber(c.ball(64)) * weight[n]!);
  const noisy = errors.slice(0, count).flatMap((s, n) => (s > 0 ? [n] : []));
  if (noisy.length === 0 || !b.every(Number.isFinite)) return poles.map(() => undefined);
  const pade = new PadeDouble(L, M);
  const moved = (n: number, sign: number): Position[] =>
    polesOf(
      pade,
      b.map((x, k) => (k === n ? x + (sign * errors[n]! * weight[n]!) / 2 : x)),
    );
  const all = noisy.map((n) => [moved(n, 1), moved(n, -1)] as const);
  return poles.map((z) => {
    const slopes = all.map(([up, down]) => {
      const [a, c] = [nearest(up, z), nearest(down, z)];
      if (a === undefined || c === undefined) return undefined;
      const onAxis = z.im === 0;
      if (onAxis !== (a.im === 0) || onAxis !== (c.im === 0)) return undefined;
      return { re: a.re - c.re, im: a.im - c.im };
    });
    if (!slopes.every((s) => s !== undefined)) return undefined;
    const total = (part: keyof Position): number => {
      let variance = 0;
      noisy.forEach((n, i) =>
        noisy.forEach((m, j) => {
          variance += (i === j ? 1 : (correlation?.[n]?.[m] ?? 0)) * slopes[i]![part] * slopes[j]![part];
        }),
      );
      return Math.sqrt(Math.max(0, variance));
    };
    const error = { re: total('re'), im: total('im') };
    return Math.hypot(error.re, error.im) < LARGEST * Math.hypot(z.re, z.im) ? error : undefined;
  });
}
