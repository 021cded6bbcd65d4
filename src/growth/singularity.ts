/**
 * @module From a fit per step to a singularity in the Borel plane.
 *
 * Purpose    a fit in k = n/p (stride p) or of order q sees T = t^q: the q-th roots of T are the singularities in t.
 * Method     same signs: T > 0, roots |t| e^{2πi j/q}; alternating: T < 0, roots |t| e^{iπ(2j+1)/q}. The strength is shared
 *            by the q of them: A_j = S Γ(γ)/q.
 */
import type { Estimate, FoundSingularity } from './growth.js';
import type { AxisFit } from './axis-fit.js';
import { gammaDouble } from '../numerics/index.js';
import type { PairFit } from './two-root.js';

/** γ counts as 0, −1, −2, … when it is within this many stated errors of it … */
const NEAR = 1;
/** … and known this well. */
const KNOWN = 0.05;
/** Stokes constants worse than this, relative, are not shown. */
const USEFUL = 0.5;

/** A relative error of 1/T beyond this leaves the position open. */
const MAX_RELATIVE = 1;
/** Outward errors are not stated beyond this many times the position. */
const OUTWARD = 3;

/** Error of |t| = |1/T|^(−1/q) on its larger side: 1/T may be as small as (1 − relative) of its value. */
const outwardError = (modulus: number, relative: number, q: number): number =>
  relative < 0.1 ? (modulus * relative) / q : modulus * Math.min(OUTWARD, Math.max(0, 1 - relative) ** (-1 / q) - 1);

type Kind = FoundSingularity['kind'];

/** Where the roots of T lie, as seen from the positive axis. */
function placeOf(pattern: 'same' | 'alternating', q: number): { kind: Kind; angle: number } {
  if (pattern === 'same')
    return { kind: q === 1 ? 'positive axis' : q % 2 === 0 ? 'both axes' : 'positive axis', angle: 0 };
  if (q === 1) return { kind: 'negative axis', angle: Math.PI };
  return { kind: 'complex pair', angle: Math.PI / q };
}

/** Undefined when the error leaves the position open. */
export function singularityOfAxis(
  fit: AxisFit,
  pattern: 'same' | 'alternating',
  q: number,
): FoundSingularity | undefined {
  if (fit.relativeError > MAX_RELATIVE) return undefined;
  const { kind, angle } = placeOf(pattern, q);
  const logAbs = fit.logT / q;
  const modulus = fit.inverse === undefined ? Math.exp(logAbs) : q === 1 ? 1 / fit.inverse : fit.inverse ** (-1 / q);
  const t: Estimate = {
    value: kind === 'negative axis' ? -modulus : modulus,
    error: outwardError(modulus, fit.relativeError, q),
  };
  const gamma = fit.exponent;
  const pole = Math.round(gamma.value);
  const logarithmic = pole <= 0 && gamma.error < KNOWN && Math.abs(gamma.value - pole) <= NEAR * gamma.error;
  const s = fit.stokes;
  const shown = s !== undefined && s.error < USEFUL * Math.abs(s.value);
  const stokes = shown ? { value: s.value / q, error: s.error / q } : undefined;
  const factor = stokes === undefined || logarithmic ? undefined : gammaDouble(gamma.value);
  const relative = shown ? s.error / Math.abs(s.value) : 0;
  return {
    t,
    ...(kind === 'complex pair' ? { angle: { value: angle, error: 0 } } : {}),
    exponent: gamma,
    ...(stokes === undefined ? {} : { stokes }),
    ...(stokes !== undefined && factor !== undefined && Number.isFinite(factor)
      ? { strength: { value: stokes.value * factor, error: Math.abs(stokes.value * factor) * relative } }
      : {}),
    ...(logarithmic ? { logarithmic } : {}),
    logAbs,
    kind,
    standing: fit.agreed ? 'converged' : 'indicative',
  };
}

/** A complex pair of the recurrence; scale: ln of the factor per step taken out of the Borel coefficients. */
export function singularityOfPair(pair: PairFit, scale: number, q: number): FoundSingularity {
  const logAbs = (Math.log(pair.modulus.value) - scale) / q;
  const modulus = Math.exp(logAbs);
  const cos = Math.max(-1, Math.min(1, pair.cosine.value));
  const angle = Math.acos(cos);
  const sin = Math.max(Math.sin(angle), 1e-3);
  const relative = pair.modulus.error / pair.modulus.value;
  return {
    t: { value: modulus, error: (modulus * Math.max(relative, 1e-12)) / q },
    angle: { value: angle / q, error: Math.max(pair.cosine.error / sin, 1e-12) / q },
    exponent: pair.exponent,
    logAbs,
    kind: 'complex pair',
    standing: relative < 0.01 && pair.rows >= 10 ? 'converged' : 'indicative',
  };
}
