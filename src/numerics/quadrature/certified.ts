/**
 * @module Certified integrals of analytic functions along a straight segment.
 *
 * Purpose    ∫_a^b f with a proved error, for integrands that enclose their values over rectangles.
 * Method     on a piece with centre m and half length h the integrand is evaluated over a rectangle that holds the Bernstein ellipse
 *            m + h(ρe^{it} + ρ^{-1}e^{−it})/2; a finite enclosure M proves that f is analytic there and |f| <= M. The n-point rule is then used
 *            if the bound below meets the goal with a moderate n, for the best of several ρ; otherwise the piece is halved.
 * Bound      f = Σ a_k T_k with |a_k| <= 2Mρ^−k. The rule is exact below degree 2n, odd k drop out, and the integral and the sum of
 *            weights contribute at most 2/(k²−1) and 2 for the others: |E| <= |h| (64/15) M ρ^(−2n)/(1 − ρ^−2) for n >= 2.
 *            Pieces that cannot be halved further contribute |b−a|·f(piece), if that is finite.
 *            The integrand must be made of analytic functions (no modulus, conjugate, real part). Logarithms, roots and powers enclose
 *            their values on both sides of their cut, finitely: a rectangle on which they have met it proves nothing and is not used. The other
 *            functions with cuts have no value there.
 * Reference  L. N. Trefethen, SIAM Rev. 50 (2008) 67, theorem 4.5 (constant re-derived); K. Petras, J. Comput. Appl. Math. 145 (2002) 345.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import { cutCrossings } from '../ball/complex-elementary.js';
import { magBits, widenMag } from '../ball/mag.js';
import type { Mag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { modulusUpper } from '../special/spread.js';
import { legendreRule } from './legendre.js';
import { onPiece } from './panels.js';
import type { Integral, Integrand } from './types.js';

/** Ellipses tried (heuristic), and the numbers of nodes. */
const ELLIPSES = [8, 4, 2.5, 1.7, 1.3];
const NODES = [4, 8, 12, 16, 24, 32, 48, 64, 96, 128, 192, 256];
/** Pieces in all before the rest is enclosed as it stands; bits of the enclosures over rectangles. */
const MOST_PIECES = 2000;
const ROUGH = 60;

export interface CertifiedOptions {
  /** Bits relative to the first estimate of the integral's size; default prec. */
  readonly goal?: number;
  readonly mostPieces?: number;
}

/** z itself where the rectangle certainly avoids (−∞, 0], INDETERMINATE elsewhere: for branches of one's own making. */
export function awayFromCut(z: Complex): Complex {
  return R.isPositive(z.re) || !R.containsZero(z.im) ? z : C.INDETERMINATE;
}

/** ∫_a^b f, enclosed. f must be made of analytic functions; cuts of logarithms, roots and powers are noticed. The radius is near 2^-prec of the integral's size where the integrand allows it. */
export function integrateAnalytic(
  f: Integrand,
  a: Complex,
  b: Complex,
  prec: number,
  options: CertifiedOptions = {},
): Integral {
  const work = prec + 20;
  const most = options.mostPieces ?? MOST_PIECES;
  const rule = legendreRule(8, ROUGH);
  const first = modulusUpper(onPiece(f, a, b, rule, ROUGH));
  let size = first.m > 0 && first.m < Infinity ? magBits(first) : 0;
  let evaluations = 8;
  let pieces = 1;
  let value: Complex = C.ZERO;
  const stack: [Complex, Complex][] = [[a, b]];
  while (stack.length > 0) {
    const [p, q] = stack.pop()!;
    const plan = choose(f, p, q, size - (options.goal ?? prec) - Math.log2(pieces + stack.length + 1), prec);
    evaluations += ELLIPSES.length;
    if (plan !== undefined) {
      const part = onPiece(f, p, q, legendreRule(plan.n, work), work);
      evaluations += plan.n;
      value = C.add(value, { re: widenMag(part.re, plan.error), im: widenMag(part.im, plan.error) }, work);
      const sum = modulusUpper(value);
      if (sum.m > 0 && sum.m < Infinity) size = Math.max(size, magBits(sum));
      continue;
    }
    if (pieces >= most) {
      value = C.add(value, C.mul(f(hull(p, q), ROUGH), C.sub(q, p, ROUGH), ROUGH), work);
      evaluations++;
      if (value.re.rad === Infinity) break;
      continue;
    }
    pieces++;
    const middle = C.exactMid(C.mul2exp(C.add(p, q, work), -1));
    stack.push([middle, q], [p, middle]);
  }
  return { value: C.round(value, prec), standing: 'certified', evaluations };
}

/** A rectangle that holds the segment. */
function hull(p: Complex, q: Complex): Complex {
  const box = (x: Ball, y: Ball): Ball => {
    const centre = R.mul2exp(R.add(x, y, ROUGH), -1);
    return R.widen(centre, R.abs(R.mul2exp(R.sub(y, x, ROUGH), -1)));
  };
  return { re: box(p.re, q.re), im: box(p.im, q.im) };
}

/** Rule and error for a piece whose error may be 2^goal; undefined when it must be halved. */
function choose(
  f: Integrand,
  p: Complex,
  q: Complex,
  goal: number,
  prec: number,
): { n: number; error: Mag } | undefined {
  const half = C.mul2exp(C.sub(q, p, ROUGH), -1);
  const centre = C.mul2exp(C.add(p, q, ROUGH), -1);
  const length = magBits(modulusUpper(half));
  let best: { n: number; bits: number } | undefined;
  for (const rho of ELLIPSES) {
    const wide = (rho + 1 / rho) / 2;
    const high = (rho - 1 / rho) / 2;
    const ellipse: Complex = { re: R.ball(0n, 0, wide * (1 + 1e-12)), im: R.ball(0n, 0, high * (1 + 1e-12)) };
    const before = cutCrossings();
    const bound = modulusUpper(f(C.add(centre, C.mul(half, ellipse, ROUGH), ROUGH), ROUGH));
    if (cutCrossings() !== before || !(bound.m < Infinity)) continue;
    // log2 of |h| (64/15) M/(1 − ρ^−2), rounded up
    const fixed = bound.m === 0 ? -Infinity : length + magBits(bound) + 2.0932 - Math.log2(1 - rho ** -2) + 1e-6;
    const n = NODES.find((k) => fixed - 2 * k * Math.log2(rho) < goal);
    if (n !== undefined && (best === undefined || n < best.n)) best = { n, bits: fixed - 2 * n * Math.log2(rho) };
  }
  if (best === undefined || best.n > prec) return undefined;
  const bits = Math.max(best.bits, -1e9);
  return { n: best.n, error: { m: best.bits === -Infinity ? 0 : 1, e: Math.ceil(bits) } };
}
