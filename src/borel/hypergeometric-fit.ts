/**
 * @module Hypergeometric Borel transforms fitted to the ratios of their coefficients.
 *
 * Purpose    b_{n+1}/b_n = ρ(n) a rational function of n makes B(t) = b_0 · ₚ₊₁Fₚ(A; Y; K t), singular at t = 1/K alone.
 * Method     m ratios: for odd m = 2ℓ+1, ρ = P/Q with deg P = deg Q = ℓ (then 1 is an upper parameter); for even m = 2ℓ,
 *            (n+1) ρ = P/Q with deg P = ℓ, deg Q = ℓ−1; Q(0) = 1. A linear system. A = −(zeros of P), Y = −(zeros of Q),
 *            K the ratio of the leading coefficients. Rational ratios that a smaller system already explains are taken
 *            by that one: the transform is then of this class as far as the coefficients show.
 * Bound      parameters are enclosures.
 * Reference  H. Mera, T. G. Pedersen, B. K. Nikolić, Phys. Rev. Lett. 115 (2015) 143001, arXiv:1405.7956; arXiv:1802.06034
 *            (abstract seen). The even case is the 2F1 form without a forced parameter.
 */
import {
  C,
  certifiedRoots,
  divExact,
  exact,
  isZeroExact,
  mulExact,
  R,
  Rational,
  rationalField,
  solveBall,
  solveField,
} from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';

export interface HypergeometricTransform {
  readonly head: Exact;
  readonly upper: readonly Complex[];
  readonly lower: readonly Complex[];
  readonly K: Ball;
}

export interface RatioFit {
  /** Ratios that fixed it. */
  readonly ratios: number;
  /** Ratios beyond those were reproduced exactly. */
  readonly explained: boolean;
  /** The transform with parameters to about `prec` bits; a string tells why there is none. */
  readonly at: (prec: number) => HypergeometricTransform | string;
}

/** Polynomials ascending: P over Q, and whether the factor n+1 was divided out. */
interface Quotient<T> {
  readonly P: readonly T[];
  readonly Q: readonly T[];
}

/** Rows of the linear system for m ratios: unknowns p_0 … p_ℓ, q_1 …. */
function system(rho: readonly Exact[]): { matrix: Exact[][]; right: Exact[]; degree: number } {
  const m = rho.length;
  const odd = m % 2 === 1;
  const degree = odd ? (m - 1) / 2 : m / 2;
  const below = odd ? degree : degree - 1;
  const right = rho.map((r, n) => (odd ? r : mulExact(r, exact(n + 1))));
  const matrix = right.map((r, n) => [
    ...Array.from({ length: degree + 1 }, (_, k) => exact(power(n, k))),
    ...Array.from({ length: below }, (_, k) => mulExact(r, exact(-power(n, k + 1)))),
  ]);
  return { matrix, right, degree };
}

const power = (n: number, k: number): bigint => BigInt(n) ** BigInt(k);

function split<T>(solved: readonly T[], degree: number, one: T): Quotient<T> {
  return { P: solved.slice(0, degree + 1), Q: [one, ...solved.slice(degree + 1)] };
}

function exactQuotient(rho: readonly Exact[]): Quotient<Rational> | undefined {
  const { matrix, right, degree } = system(rho);
  const solved = solveField(
    rationalField,
    matrix.map((row) => row.map((x) => x.rational!)),
    right.map((x) => x.rational!),
  );
  return solved === undefined ? undefined : split(solved, degree, Rational.ONE);
}

function ballQuotient(rho: readonly Exact[], prec: number): Quotient<Ball> | undefined {
  const { matrix, right, degree } = system(rho);
  const solved = solveBall(
    matrix.map((row) => row.map((x) => x.ball(prec))),
    right.map((x) => x.ball(prec)),
    prec,
  );
  return solved === undefined ? undefined : split(solved, degree, R.ONE);
}

/** ρ(n) of an exact quotient fitted to m ratios. */
function ratioAt({ P, Q }: Quotient<Rational>, n: number, odd: boolean): Rational | undefined {
  const at = (c: readonly Rational[]): Rational =>
    c.reduceRight((acc, x) => acc.mul(Rational.of(n)).add(x), Rational.ZERO);
  const below = odd ? at(Q) : at(Q).mul(Rational.of(n + 1));
  return below.isZero() ? undefined : at(P).div(below);
}

/** Zeros of Σ c_k n^k with opposite sign, repeated by multiplicity. */
function parameters(c: readonly Rational[] | readonly Ball[], prec: number): Complex[] | string {
  if (c.length < 2) return [];
  const found = certifiedRoots(c, prec);
  if ('failed' in found) return found.failed;
  return found.roots.flatMap((r) => Array.from({ length: r.multiplicity }, () => C.neg(r.value)));
}

function transform(
  head: Exact,
  q: Quotient<Rational> | Quotient<Ball>,
  odd: boolean,
  K: Ball,
  prec: number,
): HypergeometricTransform | string {
  const upper = parameters(q.P, prec);
  const lower = parameters(q.Q, prec);
  if (typeof upper === 'string') return `upper parameters: ${upper}`;
  if (typeof lower === 'string') return `lower parameters: ${lower}`;
  return { head, upper: odd ? [C.ONE, ...upper] : upper, lower, K };
}

const last = <T>(list: readonly T[]): T => list[list.length - 1]!;

/** Spare bits for the linear system, for each ratio. Heuristic. */
const LOSS = 12;

/** Fit to all ratios of b_0, b_1, …, none of which may vanish (b is the Borel transform's coefficient list). */
export function fitRatios(b: readonly Exact[]): RatioFit | string {
  if (b.length < 2) return 'fewer than two coefficients';
  if (b.some(isZeroExact)) return 'a coefficient vanishes';
  const rho = b.slice(1).map((next, n) => divExact(next, b[n]!));
  const allRational = rho.every((r) => r.rational !== undefined);
  if (!allRational) {
    const odd = rho.length % 2 === 1;
    const at = (prec: number): HypergeometricTransform | string => {
      const q = ballQuotient(rho, prec + LOSS * rho.length);
      if (q === undefined) return 'the system of the ratios cannot be solved at this precision';
      const K = R.div(last(q.P), last(q.Q), prec + 16);
      return K.rad < Infinity
        ? transform(b[0]!, q, odd, K, prec)
        : 'the leading coefficient of the denominator may vanish';
    };
    return { ratios: rho.length, explained: false, at };
  }
  for (let m = 1; m <= rho.length; m++) {
    const odd = m % 2 === 1;
    const q = exactQuotient(rho.slice(0, m));
    const explained =
      q !== undefined && rho.slice(m).every((r, i) => ratioAt(q, m + i, odd)?.equals(r.rational!) === true);
    if (q === undefined || (!explained && m < rho.length)) continue;
    if (last(q.P).isZero() || last(q.Q).isZero())
      return 'a leading coefficient vanishes: the ratios do not tend to a finite singularity';
    const K = last(q.P).div(last(q.Q));
    return {
      ratios: m,
      explained: m < rho.length,
      at: (prec) => transform(b[0]!, q, odd, R.fromRational(K, prec + 16), prec),
    };
  }
  return 'the system of the ratios is singular';
}
