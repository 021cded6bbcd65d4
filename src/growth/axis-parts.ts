/**
 * @module The ways to 1/T and γ from a regular tail: ratio table on enclosures or doubles, log fit, fit with priors.
 *
 * Purpose    each gives ln T with its relative error and γ; axis-fit.ts chooses.
 * Method     ratios D_k = c_k/(c_{k−1}·factorial step) → (1/T)(1 + (γ−1)/k + …) and g_k = k(k−1)(D_{k−1}−D_k)/D_k → γ−1,
 *            which needs no T, both extrapolated by Richardson.
 * Bound      method and noise errors as in measured.ts.
 * Reference  C. Domb and M. F. Sykes, Proc. R. Soc. Lond. A 240 (1957) 214.
 */
import { R, type Ball, type Exact } from '../numerics/index.js';
import type { Estimate } from './growth.js';
import type { LogFit } from './log-fit.js';
import type { Measured } from './measured.js';
import { noiseOf } from './propagation.js';
import { fallingStep, logFallingStep } from './ratio-test.js';
import type { Point } from './reading.js';
import { ballArithmetic, doubleArithmetic, extrapolate } from './richardson.js';
import { shortFit } from './short-fit.js';

/**
 * The posterior width of the fit with priors counts as noise. At order three it is the broad prior that speaks; at
 * seven and more the guessed remainder: the width counts `short` times there and `long` times here.
 */
const POSTERIOR = { short: 0.6, long: 1.2, from: 3, enough: 7 };
/** Ratios needed before the first one of a late pattern may be left out, and how far it must be off the next one. */
const LATE_RATIOS = 4;
const ODD_RATIO = 0.5;
/** Highest order of the Richardson table: doubles lose their digits by then; enclosures by the other. */
const MAX_ORDER = 8;
const MAX_ORDER_EXACT = 40;
/** Working precision of the enclosures in bits. */
const PREC = 448;
/** 1/|T| and |T| inside this range are given as doubles. */
const SMALLEST = 1e-307;

export interface AxisPart {
  /** ln|T| per step; its errors are relative errors of T. */
  readonly logT: Measured;
  /** 1/|T| without the detour over the logarithm, where it is in the range of doubles. */
  readonly inverse?: number;
  /** γ. */
  readonly exponent: Measured;
}

/** ln T and γ from the limits of D_k (times e^{−scale}) and of g_k. */
function fromLimits(d: Measured, scale: number, g: Measured): AxisPart {
  return {
    logT: { value: -Math.log(d.value) - scale, method: d.method / d.value, noise: d.noise / d.value },
    exponent: { ...g, value: 1 + g.value },
  };
}

/** Ratio table in doubles, errors of the coefficients propagated. */
export function doublePart(points: readonly Point[], q: number): AxisPart | undefined {
  const last = points[points.length - 1]!;
  const before = points[points.length - 2]!;
  const scale = last.y - before.y - logFallingStep(last.k, q);
  const d: number[] = [];
  for (let i = 1; i < points.length; i++) {
    d.push(Math.exp(points[i]!.y - points[i - 1]!.y - scale - logFallingStep(points[i]!.k, q)));
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
  if (position === undefined || exponent === undefined || !(position.limit.value > 0)) return undefined;
  return fromLimits(position.limit, scale, exponent.limit);
}

/** The same on enclosures of the exact coefficients, widened by their quoted errors. */
export function exactPart(
  points: readonly Point[],
  exact: readonly Exact[],
  stride: number,
  q: number,
): AxisPart | undefined {
  const a = ballArithmetic(PREC);
  const order = Math.min(MAX_ORDER_EXACT, Math.floor((points.length - 1) / 2));
  // Two entries of the highest column, and one ratio more for the exponent.
  const tail = points.slice(-(order + 4));
  const c: Ball[] = [];
  for (const p of tail) {
    const e = exact[p.k * stride];
    if (e === undefined) return undefined;
    const value = R.abs(e.ball(PREC));
    c.push(p.quoted > 0 ? R.widen(value, R.mul(value, R.fromNumber(p.quoted), PREC)) : value);
  }
  const d: Ball[] = [];
  for (let i = 1; i < c.length; i++) {
    d.push(R.div(c[i]!, R.mul(c[i - 1]!, R.fromNumber(fallingStep(tail[i]!.k, q)), PREC), PREC));
  }
  const lastK = tail[tail.length - 1]!.k;
  const lastD = d[d.length - 1]!;
  const scaled = d.map((v) => R.div(v, lastD, PREC));
  const none = (): number => 0;
  const position = extrapolate(scaled, lastK, a, order, none);
  const g: Ball[] = [];
  for (let i = 1; i < d.length; i++) {
    const k = tail[i + 1]!.k;
    g.push(R.mul(R.fromNumber(k * (k - 1)), R.div(R.sub(d[i - 1]!, d[i]!, PREC), d[i]!, PREC), PREC));
  }
  const exponent = extrapolate(g, lastK, a, order, none);
  if (position === undefined || exponent === undefined || !(position.limit.value > 0)) return undefined;
  const last = tail[tail.length - 1]!;
  const scale = last.y - tail[tail.length - 2]!.y - logFallingStep(lastK, q);
  const part = fromLimits(position.limit, scale, exponent.limit);
  const direct = R.toNumber(R.mul(position.top, lastD, PREC));
  if (!(direct > SMALLEST && direct < 1 / SMALLEST)) return part;
  return { ...part, logT: { ...part.logT, value: -Math.log(direct) }, inverse: direct };
}

/** From the fit to ln|c_n|. */
export function logPart(fit: LogFit): AxisPart {
  return { logT: { ...fit.slope, value: -fit.slope.value }, exponent: fit.exponent };
}

/** Fit with priors to the plain ratios. */
export function shortPart(points: readonly Point[], q: number): AxisPart | undefined {
  const last = points[points.length - 1]!;
  const scale = last.y - points[points.length - 2]!.y - logFallingStep(last.k, q);
  const ratios = points.slice(1).map((p, i) => {
    const d = Math.exp(p.y - points[i]!.y - scale - logFallingStep(p.k, q));
    return { k: p.k, d, sigma: d * Math.hypot(p.sigma, points[i]!.sigma) };
  });
  // A pattern that sets in late does so at a coefficient made small by a cancellation: its ratio says nothing.
  const odd = Math.abs(ratios[0]!.d / (ratios[1]?.d ?? ratios[0]!.d) - 1) > ODD_RATIO;
  const late = points[0]!.k > 0 && ratios.length >= LATE_RATIOS && odd;
  const fit = shortFit(late ? ratios.slice(1) : ratios);
  if (fit === undefined || !(fit.limit.value > 0)) return undefined;
  const { short, long, from, enough } = POSTERIOR;
  const part = Math.min(1, Math.max(0, (last.k - from) / (enough - from)));
  const factor = short + (long - short) * part;
  const posterior = (e: Estimate): Measured => ({ value: e.value, method: 0, noise: factor * e.error });
  return fromLimits(posterior(fit.limit), scale, posterior({ ...fit.exponent, value: fit.exponent.value - 1 }));
}
