/**
 * @module Position, exponent and strength of a singularity that dominates on one axis.
 *
 * Purpose    from a tail of regular signs: T, γ and S of c_k → S Γ(qk+γ) T^(−k), q the growth order per step.
 * Method     ratio table and log fit for tails of SHORT_TAIL coefficients or more, the fit with priors for shorter and for
 *            noisy ones; the one with the smallest stated error is taken. S from ln|c_k| + k ln T − ln Γ(qk+γ),
 *            extrapolated.
 * Bound      heuristic: method error times its inflation, never below what another method of comparable sharpness says, nor
 *            below the rounding of a double.
 * Reference  C. Domb and M. F. Sykes 1957; R. B. Dingle, "Asymptotic Expansions", 1973.
 */
import { type Exact, logGammaDouble } from '../numerics/index.js';
import { doublePart, exactPart, logPart, shortPart, type AxisPart } from './axis-parts.js';
import type { Estimate } from './growth.js';
import { logFit } from './log-fit.js';
import { plainError, statedError, type Measured } from './measured.js';
import { noiseOf } from './propagation.js';
import type { Point } from './reading.js';
import { doubleArithmetic, extrapolate } from './richardson.js';

/** Tails shorter than this have only the fit with priors. */
export const SHORT_TAIL = 10;
/** Coefficients with a median error above this also get the fit with priors, which noise harms least. */
const NOISY = 1e-3;
/** Coefficients quoted better than this count as exact, and go through the table on enclosures. */
const EXACT_ENOUGH = 1e-15;
const EPSILON = 2 ** -52;
/** A method whose error is within this factor of the best one is listened to. */
const COMPARABLE = 10;
/** Two methods agree when they differ by no more than this many of their uninflated errors. */
const AGREEMENT = 3;
/** … and when the position is known at least this well. */
const AGREED = 0.05;
/** Rounding of a difference of two logarithms, relative to their size. */
const LOG_ROUNDING = 4 * EPSILON;
/** Highest order of the extrapolation of S. */
const STOKES_ORDER = 4;

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
}

/**
 * ln of the running strength S_k = |c_k| T^k/Γ(qk+γ) for every point where Γ is away from its poles; → ln S.
 * N_k = S_k Γ(γ) → A is the running strength of A (1 − t/t*)^(−γ).
 */
export function logStrengths(
  points: readonly Point[],
  q: number,
  logT: number,
  gamma: number,
): { k: number; value: number }[] {
  return points.flatMap((p) =>
    q * p.k + gamma > 0.5 ? [{ k: p.k, value: p.y + p.k * logT - logGammaDouble(q * p.k + gamma) }] : [],
  );
}

/** S by extrapolation; its error includes what the errors of T and γ do to it. */
function stokesOf(
  points: readonly Point[],
  q: number,
  fit: Pick<AxisFit, 'logT' | 'relativeError' | 'exponent'>,
  sign: number,
): Estimate | undefined {
  const running = logStrengths(points, q, fit.logT, fit.exponent.value);
  const last = running.at(-1);
  if (last === undefined || running.length < 3) return undefined;
  const order = Math.min(STOKES_ORDER, Math.floor(running.length / 2));
  const values = running.map((r) => r.value);
  const limit = extrapolate(values, last.k, doubleArithmetic, order, noiseOf(points, [() => 1]));
  if (limit === undefined) return undefined;
  const value = sign * Math.exp(limit.limit.value);
  const error = Math.hypot(
    statedError(limit.limit),
    last.k * fit.relativeError,
    Math.log(q * last.k + 1) * fit.exponent.error,
  );
  return { value, error: Math.abs(value) * error };
}

/** Fit with priors (if it applies) and the others, each with its own error. */
function collect(
  points: readonly Point[],
  stride: number,
  q: number,
  exact: readonly Exact[] | undefined,
): { readonly parts: readonly AxisPart[]; readonly prior: AxisPart | undefined } {
  const sharp = points.every((p) => p.quoted < EXACT_ENOUGH);
  const sigma = points.map((p) => p.sigma).sort((a, b) => a - b)[Math.floor(points.length / 2)] ?? 0;
  const long = points.length >= SHORT_TAIL;
  const prior = !long || sigma > NOISY ? shortPart(points, q) : undefined;
  if (!long) return { parts: prior === undefined ? [] : [prior], prior };
  const enclosed = exact !== undefined && sharp ? exactPart(points, exact, stride, q) : undefined;
  const fit = logFit(points, q);
  const all = [prior, enclosed ?? doublePart(points, q), fit && logPart(fit)];
  return { parts: all.filter((p) => p !== undefined), prior };
}

/** The sharpest value; its error covers a second one of comparable sharpness. */
function sharpest(all: readonly Measured[]): Estimate & { readonly index: number } {
  const [first, second] = all.map((m, index) => ({ m, index })).sort((a, b) => statedError(a.m) - statedError(b.m));
  const error = statedError(first!.m);
  const listen = second !== undefined && statedError(second.m) < COMPARABLE * error;
  const apart = listen ? Math.abs(first!.m.value - second.m.value) : 0;
  return { value: first!.m.value, error: Math.max(error, apart), index: first!.index };
}

/** Do the two sharpest of the independent methods agree, and well enough to be called converged? */
function agree(all: readonly Measured[], rounding: number): boolean {
  const [first, second] = [...all].sort((a, b) => statedError(a) - statedError(b));
  if (first === undefined || second === undefined || plainError(first) > AGREED) return false;
  const joint = plainError(first) + plainError(second);
  return Math.abs(first.value - second.value) <= AGREEMENT * joint + rounding;
}

/** points: consecutive non-zero ones with a regular sign pattern; sign: their common sign. */
export function axisFit(
  points: readonly Point[],
  stride: number,
  q: number,
  sign: number,
  exact: readonly Exact[] | undefined,
): AxisFit | undefined {
  const { parts, prior } = collect(points, stride, q, exact);
  if (parts.length === 0) return undefined;
  const position = sharpest(parts.map((p) => p.logT));
  const gamma = sharpest(parts.map((p) => p.exponent));
  const logT = position.value;
  const relativeError = Math.max(position.error, EPSILON);
  const exponent = { value: gamma.value, error: Math.max(gamma.error, Math.abs(gamma.value) * EPSILON, EPSILON) };
  const stokes = stokesOf(points, q, { logT, relativeError, exponent }, sign);
  const { inverse } = parts[position.index]!;
  const rounding = LOG_ROUNDING * Math.abs(points[points.length - 1]!.y);
  const agreed =
    parts[position.index] !== prior &&
    agree(
      parts.filter((p) => p !== prior).map((p) => p.logT),
      rounding,
    );
  return {
    logT,
    ...(inverse === undefined ? {} : { inverse }),
    relativeError,
    exponent,
    ...(stokes === undefined ? {} : { stokes }),
    agreed,
  };
}
