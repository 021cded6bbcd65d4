/**
 * @module The gluon condensate's renormalon as a series: what the subtraction takes out of D.
 *
 *   D ∋ K C(x(−s)) ∫_0^∞ du e^{−u/ā(−s)} (2 − u)^{−1−4b},   ā = β_0 α̂/(4π), α̂ the C-scheme coupling with C = 0,
 *   b = β_1/(2β_0²), C = 1 + C_1 x + …; in that coupling the form is exact. With
 *   Σ_l r_l ā^l = the expansion of the integral,  r_l = 2^{−l−4b} Γ(l+4b)/Γ(1+4b),
 * the combination (R²/(−s))² K C(x(−s)) Σ r_l ā(R²)^l has the same renormalon at any scale R: subtracted from D it leaves a
 * series without it. Its principal value, with c̄ = 2^{−4b} F_{4b}(2/ā(R²)) in place of the sum, is added back.
 *
 * Reference  M. Benitez-Rathgeb, D. Boito, A. H. Hoang, M. Jamin, arXiv:2202.10957, 2207.01116 (abstracts read; the series
 *            follows from the exact invariance of (Λ/Q)^4); C-scheme: arXiv:1606.06175.
 */
import {
  addExact,
  branchSame,
  divExact,
  exact,
  exactReal,
  log,
  mulExact,
  pow,
  R,
  Rational,
} from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import {
  ballFlow,
  ballLogOfInverse,
  betaCoefficients,
  cSchemeBeta,
  compose,
  divisorSize,
  liftExact,
  mulSeries,
  pathBlocked,
  polynomialRing,
  refuse,
  relationOfBetas,
  shiftCoupling,
  uPerT,
} from '../qcd/index.js';
import type { Refusal, Ring } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { loopsOf } from './loops.js';

/** 4b = 2 β_1/β_0²; zero in a world of one loop. */
export function fourB({ flavours, loops }: ContourOrigin): Exact {
  if (loops === 1) return exact(0);
  const [b0 = exact(1), b1 = exact(0)] = betaCoefficients(flavours);
  return divExact(mulExact(exact(2), b1), mulExact(b0, b0));
}

/** r_1 … r_n in powers of X = α̂/divisor: r_l (u per t)^l. */
function renormalonSeries(origin: ContourOrigin, n: number): Exact[] {
  const b4 = fourB(origin);
  const half = divExact(uPerT(origin.flavours, origin.divisor), exact(2));
  const list: Exact[] = [];
  // r_1 = 2^{−1−4b}, r_{l+1}/r_l = (l + 4b)/2.
  let r: Exact = mulExact(powerOfTwo(b4), half);
  for (let l = 1; l <= n; l++) {
    list.push(r);
    r = mulExact(mulExact(r, half), addExact(exact(l), b4));
  }
  return list;
}

/** 2^{−q}. */
const powerOfTwo = (q: Exact): Exact =>
  q.rational?.isInteger() === true
    ? exact(Rational.of(2).pow(-Number(q.rational.num)))
    : exactReal((prec) => R.div(R.ONE, pow(R.fromNumber(2), q.ball(prec + 20), prec + 20), prec + 10));

/** b_0 … of the truncated running, zeros beyond. */
function betaOf(origin: ContourOrigin, n: number): Exact[] {
  const known = betaCoefficients(origin.flavours, origin.divisor).slice(0, origin.loops);
  return Array.from({ length: n }, (_, k) => known[k] ?? exact(0));
}

export interface SubtractionSeries {
  /** s_1, s_2, … of Σ r_l ā(R²)^l in powers of x(R). */
  readonly atR: readonly Exact[];
  /** Row n − 1: the polynomial in L = ln(R²/μ²) that multiplies x(μ)^n in C(x(μ)) Σ r_l ā(R²)^l. */
  readonly withLogs: readonly (readonly Exact[])[];
  /** b_k of the running, for re-expansions. */
  readonly beta: readonly Exact[];
}

/** The series of the renormalon to `n` orders; `wilson` holds C_1, C_2, …. */
export function subtractionSeries(origin: ContourOrigin, wilson: readonly Exact[], n: number): SubtractionSeries {
  const beta = betaOf(origin, n);
  const whole = cSchemeBeta(origin.flavours, origin.divisor, n);
  // One loop knows no other scheme.
  const inC = origin.loops === 1 ? beta : whole;
  const r = renormalonSeries(origin, n);
  const C = wilson.slice(0, n);
  const inputs = [...beta, ...inC, ...r, ...C];
  const split = <T>(x: readonly T[]) => ({
    b: x.slice(0, n),
    bC: x.slice(n, 2 * n),
    r: x.slice(2 * n, 3 * n),
    C: x.slice(3 * n),
  });
  const atR = liftExact(inputs, (ring, x) => inMSbar(ring, split(x), n));
  const flat = liftExact(inputs, <T>(base: Ring<T>, x: readonly T[]): T[] => {
    const parts = split(x);
    const ring = polynomialRing(base);
    const lift = (list: readonly T[]): (readonly T[])[] => list.map((c) => [c]);
    const relation = shiftCoupling(ring, lift(parts.b), [base.zero, base.one], n + 1);
    const moved = compose(ring, [ring.zero, ...lift(inMSbar(base, parts, n))], relation, n + 1);
    const product = mulSeries(ring, [ring.one, ...lift(parts.C)], moved, n + 1);
    return product.slice(1).flatMap((row, i) => Array.from({ length: i + 1 }, (_, k) => row[k] ?? base.zero));
  });
  const withLogs = Array.from({ length: n }, (_, i) => flat.slice((i * (i + 1)) / 2, ((i + 1) * (i + 2)) / 2));
  return { atR, withLogs, beta };
}

interface Parts<T> {
  readonly b: readonly T[];
  readonly bC: readonly T[];
  readonly r: readonly T[];
}

/** Σ r_l X^l with X in powers of the MSbar x, coefficients of x^1 … x^n. */
function inMSbar<T>(ring: Ring<T>, { b, bC, r }: Parts<T>, n: number): T[] {
  const relation = relationOfBetas(ring, bC, b, ring.zero, n);
  return compose(ring, [ring.zero, ...r], [ring.zero, ...relation], n + 1).slice(1);
}

/** Y = 1/X of the C-scheme coupling, Y − q ln Y + q ln b_0 = b_0 ln(R²/Λ²), by Newton's method: converged, not enclosed. */
function inverseCoupling(b0: Ball, q: Ball, target: Ball, start: number, prec: number): Ball {
  let y = R.fromNumber(start);
  const constant = R.sub(R.mul(q, log(b0, prec), prec), R.mul(b0, target, prec), prec);
  for (let step = 0; step < NEWTON_STEPS; step++) {
    const f = R.add(R.sub(y, R.mul(q, log(y, prec), prec), prec), constant, prec);
    const move = R.div(f, R.sub(R.ONE, R.div(q, y, prec), prec), prec);
    const before = y;
    y = R.exactMid(R.sub(y, move, prec));
    const bits = R.upperBits(R.sub(y, before, prec));
    // A step of half the digits leaves an error of all of them.
    if (bits < R.upperBits(y) - prec / 2 - 8) return R.addError(y, 1, R.upperBits(y) - prec + 16);
  }
  return R.INDETERMINATE;
}

const NEWTON_STEPS = 60;
const GUARD = 40;
/** ln(R²/Λ²) must be so far above the singularity of the C-scheme coupling; nearer to it no digit means anything. */
const CLOSE = 0.05;

const tooLow: Refusal = refuse(
  'the scale R of the subtraction lies at or below the Landau singularity of the coupling',
  'use a larger R (--subtraction-scale 1) or a smaller coupling',
);

/**
 * c̄ = PV ∫_0^∞ du e^{−u/ā(R²)} (2 − u)^{−1−4b}. `log` is ln(R²/μ²), μ the scale of x.
 */
export function renormalonIntegral(origin: ContourOrigin, x: Exact, logR: Exact, prec: number): Ball | Refusal {
  const work = prec + GUARD;
  const flow = ballFlow(origin.flavours, loopsOf(origin.loops), work);
  if (flow === undefined) return pathBlocked;
  const alpha = R.mul(x.ball(work), divisorSize(origin.divisor).ball(work), work);
  const logLambda = R.add(ballLogOfInverse(flow, R.div(R.ONE, alpha, work), work), logR.ball(work), work);
  const [b0 = exact(1), b1 = exact(0)] = betaCoefficients(origin.flavours, '1');
  const q = origin.loops === 1 ? R.ZERO : R.div(b1.ball(work), b0.ball(work), work);
  // Y − q ln Y falls to its least value at Y = q: below that the coupling has no value at R.
  const [b, qn] = [R.toNumber(b0.ball(work)), R.toNumber(q)];
  const least = qn > 0 ? (qn * (1 - Math.log(qn) + Math.log(b))) / b : 0;
  if (!(R.toNumber(logLambda) > least + CLOSE)) return tooLow;
  const start = Math.max(R.toNumber(R.mul(b0.ball(work), logLambda, work)), R.toNumber(q) + 1);
  const y = inverseCoupling(b0.ball(work), q, logLambda, start, work);
  // 1/ā = 4π Y/β_0 = Y/b_0 for α normalised couplings.
  const w = R.mul2exp(R.div(y, b0.ball(work), work), 1);
  const b4 = fourB(origin);
  return R.mul(powerOfTwo(b4).ball(work), branchSame(b4, w, work).pv, prec);
}
