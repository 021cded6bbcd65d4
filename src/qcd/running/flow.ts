/**
 * @module The solution of the truncated renormalisation-group equation in closed form, ready for evaluation in doubles.
 *
 * Method     With S(α) = 1 + (b_1/b_0)α + … = Π(1 − α/z_i), q = b_1/b_0, b_k = β_k/(4π)^(k+1), partial fractions give
 *            ln(μ²/Λ²) = (1/b_0) [1/α + q ln(b_0 α) − Σ_i A_i ln(1 − α/z_i)],  A_i = 1/(z_i² S′(z_i)),
 *            which is the exact Λ_MSbar definition; α(μ) is its inverse. No expansion anywhere.
 * Bound      a few units of 2^-53 of ln(μ²/Λ²).
 * Reference  definition of Λ: FLAG Review 2024, arXiv:2411.04268, Eq. (285); Bardeen, Buras, Duke, Muta 1978.
 */
import { betaNumbers, type Loops } from '../beta-function.js';
import { polynomialAt, zerosOf, type ComplexNumber } from './beta-zeros.js';

export interface Flow {
  readonly flavours: number;
  readonly loops: Loops;
  /** b_0 in dα/d ln μ² = −b_0 α² S(α). */
  readonly b0: number;
  /** Coefficients of S, ascending, s_0 = 1. */
  readonly s: readonly number[];
  readonly zeros: readonly ComplexNumber[];
  /** A_i belonging to the zeros. */
  readonly residues: readonly ComplexNumber[];
  /** Smallest positive zero of S (an infrared fixed point that α never passes), Infinity when there is none. */
  readonly fixedPoint: number;
  /** ln(μ²/Λ²) at which α becomes infinite; -Infinity with a fixed point, where α exists at every scale. */
  readonly landauLog: number;
}

const flows = new Map<number, Flow>();

/** The flow for n_f flavours (an integer from 0 to 16) and 1–5 loops; computed once. */
export function flowOf(flavours: number, loops: Loops): Flow {
  const key = flavours * 8 + loops;
  let flow = flows.get(key);
  if (flow === undefined) {
    flow = createFlow(flavours, loops);
    flows.set(key, flow);
  }
  return flow;
}

function createFlow(flavours: number, loops: Loops): Flow {
  const b = betaNumbers(flavours, loops, '1');
  const b0 = b[0] ?? NaN;
  const s = b.map((x) => x / b0);
  const zeros = zerosOf(s);
  const slope = s.slice(1).map((c, k) => c * (k + 1));
  const residues = zeros.map((z) => {
    const d = polynomialAt(slope, z);
    const square = { re: z.re * z.re - z.im * z.im, im: 2 * z.re * z.im };
    const p = { re: square.re * d.re - square.im * d.im, im: square.re * d.im + square.im * d.re };
    const n = p.re * p.re + p.im * p.im;
    return { re: p.re / n, im: -p.im / n };
  });
  const fixedPoint = Math.min(Infinity, ...zeros.filter((z) => z.im === 0 && z.re > 0).map((z) => z.re));
  return {
    flavours, loops, b0, s, zeros, residues, fixedPoint,
    landauLog: fixedPoint < Infinity ? -Infinity : landauLog(b0, s, zeros, residues),
  };
}

/** Limit α → ∞ of the closed form: q ln(b_0 α) and Σ A_i ln α cancel, since Σ A_i = q. */
function landauLog(
  b0: number,
  s: readonly number[],
  zeros: readonly ComplexNumber[],
  residues: readonly ComplexNumber[],
): number {
  let sum = (s[1] ?? 0) * Math.log(b0);
  zeros.forEach((z, i) => {
    const a = residues[i] ?? { re: 0, im: 0 };
    // ln(−α/z) for large α, real part of A ln(−1/z).
    sum -= -a.re * Math.log(Math.hypot(z.re, z.im)) - a.im * Math.atan2(z.im, -z.re);
  });
  return sum / b0;
}

/** S(α) on the real axis. */
export function bracketAt(flow: Flow, alpha: number): number {
  let sum = 0;
  for (let k = flow.s.length - 1; k >= 0; k--) sum = sum * alpha + (flow.s[k] ?? 0);
  return sum;
}

/** ln(μ²/Λ²) for 0 < α < fixedPoint: the exact definition of Λ_MSbar at the loop order of the flow. */
export function logOverLambda(flow: Flow, alpha: number): number {
  let sum = 1 / alpha + (flow.s[1] ?? 0) * Math.log(flow.b0 * alpha);
  for (let i = 0; i < flow.zeros.length; i++) {
    const z = flow.zeros[i];
    const a = flow.residues[i];
    if (z === undefined || a === undefined) continue;
    if (z.im === 0) {
      sum -= a.re * Math.log1p(-alpha / z.re);
    } else if (z.im > 0) {
      // The pair z, z̄ contributes twice the real part of A ln(1 − α/z).
      const n = z.re * z.re + z.im * z.im;
      const re = (-alpha * z.re) / n;
      const im = (alpha * z.im) / n;
      sum -= a.re * Math.log1p(re * (2 + re) + im * im) - 2 * a.im * Math.atan2(im, 1 + re);
    }
  }
  return sum / flow.b0;
}
