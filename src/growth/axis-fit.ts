/**
 * @module Position, exponent and strength of a singularity that dominates on one axis.
 *
 * Purpose    from a tail of regular signs: T, γ and S of c_k → S Γ(qk+γ) T^(−k), q the growth order per step.
 * Method     ratios D_k = c_k/(c_{k−1}·factorial step) → (1/T)(1 + (γ−1)/k + …), extrapolated by Richardson on enclosures
 *            (exact input) or doubles, or by the log fit (noise), whichever states the smaller error; a few ratios go to the
 *            fit with priors. γ from k(k−1)(D_{k−1}−D_k)/D_k, which needs no T.
 * Bound      heuristic: last difference of the table times INFLATION; never below the rounding of a double.
 * Reference  C. Domb and M. F. Sykes 1957; R. B. Dingle 1973.
 */
import { R, type Ball, type Exact } from '../numerics/index.js';
import type { Estimate } from './growth.js';
import { logFit, type LogFit } from './log-fit.js';
import { logGamma } from './log-gamma.js';
import { fallingStep } from './ratio-test.js';
import type { Point } from './reading.js';
import { ballArithmetic, doubleArithmetic, extrapolate, richardsonWeights } from './richardson.js';
import { shortFit } from './short-fit.js';

/** Stated error = last difference of the extrapolation times this. */
export const INFLATION = 5;
/** The same for the posterior width of the fit with priors. */
const SHORT_INFLATION = 3;
/** Ratios needed before the first one of a late pattern may be left out, and how far it must be off the next one. */
const LATE_RATIOS = 4;
const ODD_RATIO = 0.5;
/** Coefficients with a median error above this also get the fit with priors, which noise harms least. */
const NOISY = 1e-3;
/** Tails shorter than this have only the fit with priors. */
export const SHORT_TAIL = 10;
/** Highest order of the Richardson table: doubles lose their digits by then; enclosures by the other. */
const MAX_ORDER = 8;
const MAX_ORDER_EXACT = 40;
/** Working precision of the enclosures in bits. */
const PREC = 640;
const EPSILON = 2 ** -52;
/** A method whose error is within this factor of the best one is listened to. */
const COMPARABLE = 10;
/** Two methods agree when they differ by no more than this many of their uninflated errors. */
const AGREEMENT = 3;
/** Rounding of a difference of two logarithms, relative to their size. */
const LOG_ROUNDING = 4 * EPSILON;

export interface AxisFit {
  /** ln|T| per step. */
  readonly logT: number;
  /** 1/|T| without the detour over the logarithm, where it is in the range of doubles. */
  readonly inverse?: number;
  /** Relative error of T. */
  readonly relativeError: number;
  readonly exponent: Estimate;
  /** S, when it could be extrapolated. */
  readonly stokes?: Estimate;
  /** Two methods agree within their stated errors. */
  readonly agreed: boolean;
  readonly method: string;
}

interface Part {
  readonly inflation: number;
  readonly logT: number;
  readonly inverse?: number;
  readonly relativeError: number;
  readonly exponent: Estimate;
  readonly method: string;
}

const clampError = (value: number, error: number): number => Math.max(error, Math.abs(value) * EPSILON, EPSILON);

/** Propagated error of T_m for a sequence whose k-th member changes by Σ_j stencil[j](k)·ε_{k−j}. */
function noiseOf(points: readonly Point[], stencil: readonly ((k: number) => number)[]): (m: number) => number {
  const lastK = points[points.length - 1]!.k;
  const sigma = new Map(points.map((p) => [p.k, p.sigma]));
  return (m) => {
    const w = richardsonWeights(lastK, m);
    const total = new Map<number, number>();
    w.forEach((v, i) => {
      const k = lastK - m + i;
      stencil.forEach((f, j) => total.set(k - j, (total.get(k - j) ?? 0) + v * f(k)));
    });
    let sum = 0;
    for (const [k, v] of total) sum += (v * (sigma.get(k) ?? 0)) ** 2;
    return Math.sqrt(sum);
  };
}

function doublePart(points: readonly Point[], q: number): Part | undefined {
  const last = points[points.length - 1]!;
  const before = points[points.length - 2]!;
  const scale = last.y - before.y - Math.log(fallingStep(last.k, q));
  const d: number[] = [];
  for (let i = 1; i < points.length; i++) {
    d.push(Math.exp(points[i]!.y - points[i - 1]!.y - scale) / fallingStep(points[i]!.k, q));
  }
  const max = Math.min(MAX_ORDER, Math.floor(d.length / 2));
  const dOf = (k: number): number => d[k - points[1]!.k]!;
  const position = extrapolate(d, last.k, doubleArithmetic, max, noiseOf(points, [dOf, (k) => -dOf(k)]));
  const g: number[] = [];
  for (let i = 1; i < d.length; i++) {
    const k = points[i + 1]!.k;
    g.push((k * (k - 1) * (d[i - 1]! - d[i]!)) / d[i]!);
  }
  const scaleG = (k: number): number => k * (k - 1);
  const exponent = extrapolate(
    g,
    last.k,
    doubleArithmetic,
    Math.min(max, Math.floor(g.length / 2)),
    noiseOf(points, [(k) => -scaleG(k), (k) => 2 * scaleG(k), (k) => -scaleG(k)]),
  );
  if (position === undefined || exponent === undefined || !(position.value > 0)) return undefined;
  return {
    inflation: INFLATION,
    logT: -Math.log(position.value) - scale,
    relativeError: position.error / position.value,
    exponent: { value: 1 + exponent.value, error: exponent.error },
    method: `Richardson order ${position.order}`,
  };
}

/** The same on enclosures of the exact coefficients. */
function exactPart(points: readonly Point[], exact: readonly Exact[], stride: number, q: number): Part | undefined {
  const a = ballArithmetic(PREC);
  const need = 2 * MAX_ORDER_EXACT + 4;
  const tail = points.slice(Math.max(0, points.length - need));
  const c: Ball[] = [];
  for (const p of tail) {
    const e = exact[p.k * stride];
    if (e === undefined) return undefined;
    c.push(R.abs(e.ball(PREC)));
  }
  const d: Ball[] = [];
  for (let i = 1; i < c.length; i++) {
    d.push(R.div(c[i]!, R.mul(c[i - 1]!, R.fromNumber(fallingStep(tail[i]!.k, q)), PREC), PREC));
  }
  const lastK = tail[tail.length - 1]!.k;
  const lastD = d[d.length - 1]!;
  const scaled = d.map((v) => R.div(v, lastD, PREC));
  const max = Math.min(MAX_ORDER_EXACT, Math.floor(d.length / 2));
  const none = (): number => 0;
  const position = extrapolate(scaled, lastK, a, max, none);
  const g: Ball[] = [];
  for (let i = 1; i < d.length; i++) {
    const k = tail[i + 1]!.k;
    g.push(R.mul(R.fromNumber(k * (k - 1)), R.div(R.sub(d[i - 1]!, d[i]!, PREC), d[i]!, PREC), PREC));
  }
  const exponent = extrapolate(g, lastK, a, Math.min(max, Math.floor(g.length / 2)), none);
  if (position === undefined || exponent === undefined || !(position.value > 0)) return undefined;
  const direct = R.toNumber(R.mul(position.top, lastD, PREC));
  const last = tail[tail.length - 1]!;
  const before = tail[tail.length - 2]!;
  const inRange = direct > 1e-307 && direct < 1e307;
  return {
    inflation: INFLATION,
    ...(inRange ? { inverse: direct } : {}),
    logT: inRange ? -Math.log(direct) : -Math.log(position.value) - (last.y - before.y - Math.log(fallingStep(lastK, q))),
    relativeError: position.error / position.value,
    exponent: { value: 1 + exponent.value, error: exponent.error },
    method: `Richardson order ${position.order} on enclosures`,
  };
}

function logPart(fit: LogFit): Part {
  return { inflation: INFLATION, logT: -fit.slope.value, relativeError: fit.slope.error, exponent: fit.exponent, method: 'least squares of ln|c_n|' };
}

function shortPart(points: readonly Point[], q: number): Part | undefined {
  const last = points[points.length - 1]!;
  const scale = last.y - points[points.length - 2]!.y - Math.log(fallingStep(last.k, q));
  const ratios = points.slice(1).map((p, i) => {
    const d = Math.exp(p.y - points[i]!.y - scale) / fallingStep(p.k, q);
    return { k: p.k, d, sigma: d * Math.hypot(p.sigma, points[i]!.sigma) };
  });
  // A pattern that sets in late does so at a coefficient made small by a cancellation: its ratio says nothing.
  const odd = Math.abs(ratios[0]!.d / (ratios[1]?.d ?? ratios[0]!.d) - 1) > ODD_RATIO;
  const late = points[0]!.k > 0 && ratios.length >= LATE_RATIOS && odd;
  const fit = shortFit(late ? ratios.slice(1) : ratios);
  if (fit === undefined || !(fit.limit.value > 0)) return undefined;
  return {
    inflation: SHORT_INFLATION,
    logT: -Math.log(fit.limit.value) - scale,
    relativeError: fit.limit.error / fit.limit.value,
    exponent: fit.exponent,
    method: 'ratio fit with priors',
  };
}

/** S from ln|c_k| + k ln T − ln Γ(qk+γ), extrapolated. */
function stokesOf(points: readonly Point[], q: number, part: Part, sign: number): Estimate | undefined {
  const s = points.filter((p) => q * p.k + part.exponent.value > 0.5);
  if (s.length < 3) return undefined;
  const last = s[s.length - 1]!;
  const values = s.map((p) => p.y + p.k * part.logT - logGamma(q * p.k + part.exponent.value));
  const fit = extrapolate(values, last.k, doubleArithmetic, Math.min(4, Math.floor(s.length / 2)), noiseOf(s, [() => 1]));
  if (fit === undefined) return undefined;
  const value = sign * Math.exp(fit.value);
  const k = last.k;
  const error = Math.hypot(fit.error * INFLATION, k * part.relativeError, Math.log(q * k + 1) * part.exponent.error);
  return { value, error: Math.abs(value) * error };
}

/** points: consecutive non-zero ones with a regular sign pattern; sign: their common sign. */
export function axisFit(
  points: readonly Point[],
  stride: number,
  q: number,
  sign: number,
  exact: readonly Exact[] | undefined,
): AxisFit | undefined {
  const parts: Part[] = [];
  const noisy = points.some((p) => p.quoted > 0);
  const sigma = points.map((p) => p.sigma).sort((a, b) => a - b)[Math.floor(points.length / 2)]!;
  const prior = points.length < SHORT_TAIL || sigma > NOISY ? shortPart(points, q) : undefined;
  if (prior !== undefined) parts.push(prior);
  if (points.length >= SHORT_TAIL) {
    const table = (exact !== undefined && !noisy ? exactPart(points, exact, stride, q) : undefined) ?? doublePart(points, q);
    if (table !== undefined) parts.push(table);
    const fit = logFit(points, q);
    if (fit !== undefined) parts.push(logPart(fit));
  }
  const last = points[points.length - 1]!;
  const [first, second] = [...parts].sort((a, b) => a.relativeError * a.inflation - b.relativeError * b.inflation);
  if (first === undefined) return undefined;
  const agreed =
    second !== undefined &&
    !parts.some((p) => p === prior && (p === first || p === second)) &&
    Math.abs(first.logT - second.logT) <=
      AGREEMENT * (first.relativeError + second.relativeError) + LOG_ROUNDING * Math.abs(last.y) &&
    first.relativeError < 0.05;
  // Where a second method is nearly as sharp, the stated error covers what it says.
  const near = second !== undefined && second.relativeError < COMPARABLE * first.relativeError ? second : undefined;
  const apart = near === undefined ? 0 : Math.abs(first.logT - near.logT);
  const relativeError = Math.max(first.relativeError * first.inflation, apart, EPSILON);
  const [sharpest, blunter] = [...parts].sort((a, b) => a.exponent.error - b.exponent.error);
  const gamma = sharpest!.exponent;
  const other = blunter !== undefined && blunter.exponent.error < COMPARABLE * gamma.error ? blunter.exponent.value : gamma.value;
  const exponent = {
    value: gamma.value,
    error: Math.max(clampError(gamma.value, gamma.error * sharpest!.inflation), Math.abs(gamma.value - other)),
  };
  const stokes = stokesOf(points, q, { ...first, relativeError, exponent }, sign);
  return {
    logT: first.logT,
    ...(first.inverse === undefined ? {} : { inverse: first.inverse }),
    relativeError,
    exponent,
    ...(stokes === undefined ? {} : { stokes }),
    agreed,
    method: first.method,
  };
}
