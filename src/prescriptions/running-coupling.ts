/**
 * @module A coupling with a truncated beta function given by its coefficients: ln(μ²/Λ²) in closed form, and its inverse.
 *
 * Purpose    couplings of any scheme and effective charges, whose beta functions are not in the QCD room's tables.
 * Method     dx/d ln μ² = −b_0 x² S(x), S = 1 + c_1 x + c_2 x² + …:
 *              b_0 ln(μ²/Λ²) = 1/x + c_1 ln(b_0 x) − ∫_0^x n(y)/S(y) dy,   n_k = c_1 c_{k+1} − c_{k+2},
 *            the integral from the zeros of S by partial fractions. The inverse by Newton's method, proved by a change of
 *            sign: the left side falls with x as long as S > 0.
 * Bound      enclosures.
 * Reference  definition of Λ_MSbar: FLAG Review 2024, arXiv:2411.04268, Eq. (285); W. Celmaster, R. Gonsalves, Phys. Rev.
 *            Lett. 42 (1979) 1435 (Λ of another scheme).
 */
import { C, certifiedRoots, clog, log, R } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';

/** b_0 and c_k = b_k/b_0, k = 1, 2, …. */
export interface BetaFunction {
  readonly b0: Ball;
  readonly c: readonly Ball[];
}

export function betaFunction(b: readonly Ball[], prec: number): BetaFunction {
  const b0 = b[0] ?? R.INDETERMINATE;
  return { b0, c: b.slice(1).map((x) => R.div(x, b0, prec)) };
}

/** S(x). */
export function bracket({ c }: BetaFunction, x: Ball, prec: number): Ball {
  return R.add(R.ONE, R.mul(horner(c, x, prec), x, prec), prec);
}

function horner(c: readonly Ball[], x: Ball, prec: number): Ball {
  return c.reduceRight<Ball>((acc, a) => R.add(R.mul(acc, x, prec), a, prec), R.ZERO);
}

/** c without trailing coefficients that may vanish: they would leave the degree of S uncertain. */
function certainPart(c: readonly Ball[]): readonly Ball[] {
  let n = c.length;
  while (n > 0 && R.containsZero(c[n - 1]!)) n--;
  return c.slice(0, n);
}

interface Fraction {
  /** 1/zero of S and the weight n(z)/S′(z) of ln(1 − x/z). */
  readonly inverse: Complex;
  readonly weight: Complex;
}

function fractions(beta: BetaFunction, prec: number): readonly Fraction[] | undefined {
  const c = certainPart(beta.c);
  if (c.length < 2) return c.length === 0 ? [] : singleFraction(c[0]!, prec);
  const at = (k: number): Ball => c[k - 1] ?? R.ZERO;
  const numerator = c.map((_, k) => R.sub(R.mul(at(1), at(k + 1), prec), at(k + 2), prec));
  const S = [R.ONE, ...c];
  const roots = certifiedRoots(S, prec);
  if ('failed' in roots) return undefined;
  const slope = S.slice(1).map((a, k) => R.mul(a, R.fromNumber(k + 1), prec));
  const value = (p: readonly Ball[], z: Complex): Complex =>
    p.reduceRight<Complex>((acc, a) => C.add(C.mul(acc, z, prec), C.fromReal(a), prec), C.ZERO);
  return roots.roots.map(({ value: z }) => ({
    inverse: C.inv(z, prec),
    weight: C.div(value(numerator, z), value(slope, z), prec),
  }));
}

/** S = 1 + c_1 x: n = c_1², one zero at −1/c_1, weight c_1. */
const singleFraction = (c1: Ball, _prec: number): readonly Fraction[] => [
  { inverse: C.fromReal(R.neg(c1)), weight: C.fromReal(c1) },
];

/** b_0 ln(μ²/Λ²) as a function of x; undefined when the zeros of S cannot be separated. */
export function scaleFunction(beta: BetaFunction, prec: number): ((x: Ball) => Ball) | undefined {
  const parts = fractions(beta, prec);
  if (parts === undefined) return undefined;
  const c1 = beta.c[0] ?? R.ZERO;
  return (x) => {
    const logs = parts.reduce((sum, { inverse, weight }) => {
      const ratio = C.sub(C.ONE, C.mulReal(inverse, x, prec), prec);
      return R.add(sum, C.mul(weight, clog(ratio, prec), prec).re, prec);
    }, R.ZERO);
    const main = R.add(R.div(R.ONE, x, prec), R.mul(c1, log(R.mul(beta.b0, x, prec), prec), prec), prec);
    return R.sub(main, logs, prec);
  };
}

/** Largest coupling that is still taken as one. Heuristic: beyond, the truncated beta function means nothing. */
const LARGEST = 4;
const NEWTON_STEPS = 60;

/**
 * x with scaleFunction(x) = target, enclosed; `start` a guess. Undefined when there is none below the first zero of S or
 * below LARGEST/(4π b_0-like size), that is at or below the Landau pole.
 */
export function invertScale(
  beta: BetaFunction,
  target: Ball,
  start: number,
  prec: number,
  f = scaleFunction(beta, prec),
): Ball | undefined {
  if (f === undefined) return undefined;
  const goal = R.exactMid(target);
  let x = start;
  for (let i = 0; i < NEWTON_STEPS; i++) {
    const ball = R.fromNumber(x);
    const S = R.toNumber(bracket(beta, ball, 64));
    if (!(S > 0)) x /= 2;
    else {
      const excess = R.toNumber(R.sub(f(ball), goal, prec));
      // d(left side)/dx = −1/(x² S); in 1/x the function is nearly linear.
      const next = 1 / (1 / x - excess * S);
      const moved = next > 0 && next < 10 * x ? next : excess > 0 ? x * 2 : x / 2;
      if (Math.abs(moved - x) <= 1e-14 * x) {
        x = moved;
        break;
      }
      x = moved;
    }
    if (!(x > 0 && x < LARGEST)) return undefined;
  }
  return sharpen(beta, f, goal, target, x, prec);
}

function sharpen(
  beta: BetaFunction,
  f: (x: Ball) => Ball,
  goal: Ball,
  target: Ball,
  start: number,
  prec: number,
): Ball | undefined {
  let x = R.fromNumber(start);
  for (let bits = 45; bits < 2 * prec; bits *= 2) {
    const S = bracket(beta, x, prec);
    const move = R.mul(R.sub(f(x), goal, prec), S, prec);
    x = R.exactMid(R.div(R.ONE, R.sub(R.div(R.ONE, x, prec), move, prec), prec));
    if (!(x.mid > 0n)) return undefined;
  }
  // Widest sensible radius last: the target's own radius decides how far one must go.
  for (let slack = prec - 8; slack > 8; slack -= 8) {
    const step = R.mul2exp(R.ONE, R.upperBits(x) - slack);
    const low = R.sub(f(R.sub(x, step, prec)), target, prec);
    const high = R.sub(f(R.add(x, step, prec)), target, prec);
    if (R.isPositive(low) && R.isNegative(high))
      return R.isPositive(bracket(beta, R.widen(x, step), prec)) ? R.widen(x, step) : undefined;
  }
  return undefined;
}

/** x at ln μ² larger by a shift, for any number of shifts; the zeros of S are found once. Undefined below the Landau pole. */
export function runner(beta: BetaFunction, x: Ball, prec: number): (shift: Ball) => Ball | undefined {
  const f = scaleFunction(beta, prec);
  if (f === undefined || !R.isPositive(bracket(beta, x, prec))) return () => undefined;
  const here = f(x);
  const start = R.toNumber(x);
  return (shift) => invertScale(beta, R.add(here, R.mul(beta.b0, shift, prec), prec), start, prec, f);
}

/** x at ln μ² larger by `shift`, from x; undefined below the Landau pole. */
export const runCoupling = (beta: BetaFunction, x: Ball, shift: Ball, prec: number): Ball | undefined =>
  runner(beta, x, prec)(shift);
