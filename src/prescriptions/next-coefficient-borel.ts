/**
 * @module The coefficient b_N of the Borel transform that an approximant of it implies from b_0 … b_{N−1}.
 *
 * Method     whatever an approximant makes of b_0 … b_{N−1} and a free b_N is linear in b_N, and it implies the b_N that
 *            leaves it as it is:
 *              logarithmic derivative  d_{N−1} of the [L/M] of B′/B;  N b_N = Σ_{j<N} d_j b_{N−1−j}
 *              known factors           coefficient N of the [L/M] of the rest, the factors multiplied back
 *              quadratic               coefficient N of P + Q B + R B² vanishes
 *              conformal               coefficient N in the mapped variable vanishes
 *              hypergeometric          the fitted ratio at N−1 times b_{N−1}
 * Bound      enclosures of what the approximant implies.
 * Reference  M. A. Samuel, J. Ellis, M. Karliner, Phys. Rev. Lett. 74 (1995) 4380 (Padé prediction; from memory).
 */
import { C, exact, R } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import {
  borelTransform,
  inverseMapSeries,
  logarithmicDerivative,
  padeOf,
  quadraticApproximant,
  remap,
  withoutFactors,
} from '../borel/index.js';
import type { Cuts, KnownFactor } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import { fittedTransform } from './borel-hypergeometric.js';
import { placeOf } from './climb.js';
import { cutsOf, softeningOf } from './conformal.js';

/** Σ_{k<=n} a_k b_{n−k}, lists ending where they end. */
function convolved(a: readonly Ball[], b: readonly Ball[], n: number, prec: number): Ball {
  return a.reduce<Ball>((sum, x, k) => {
    const other = k > n ? undefined : b[n - k];
    return other === undefined ? sum : R.add(sum, R.mul(x, other, prec), prec);
  }, R.ZERO);
}

/** Coefficient n of the [L/M] of a list of n coefficients; undefined where the entry does not use all of them. */
export function padeImplies(list: readonly Exact[], variant: string, prec: number): Ball | undefined {
  const place = placeOf(variant);
  const n = list.length;
  if (place === undefined || place[0] + place[1] + 1 !== n) return undefined;
  const entry = padeOf(list, place[0], place[1], prec);
  if (entry.exists !== true) return undefined;
  const known = list.map((c) => c.ball(prec));
  const [q0, ...q] = entry.denominator;
  const next = R.neg(convolved([R.ZERO, ...q], [...known, R.ZERO], n, prec));
  return q0 === undefined ? undefined : R.div(next, q0, prec);
}

export function dlogImplies(c: readonly Exact[], variant: string, prec: number): Ball | undefined {
  const b = borelTransform(c);
  const d = logarithmicDerivative(b);
  const next = padeImplies(d, variant, prec);
  if (next === undefined) return undefined;
  const known = d.map((x) => x.ball(prec));
  const sum = convolved(
    [...known, next],
    b.map((x) => x.ball(prec)),
    b.length - 1,
    prec,
  );
  return R.div(sum, R.fromNumber(b.length), prec);
}

export function partialImplies(
  c: readonly Exact[],
  factors: readonly KnownFactor[],
  variant: string,
  prec: number,
): Ball | undefined {
  const b = borelTransform(c);
  const next = padeImplies(withoutFactors(b, factors), variant, prec);
  // With b_N = 0 the rest has this coefficient N; b_N itself enters it with weight one.
  const without = withoutFactors([...b, exact(0)], factors)[b.length];
  return next === undefined || without === undefined ? undefined : R.sub(next, without.ball(prec), prec);
}

export function quadraticImplies(c: readonly Exact[], variant: string, prec: number): Ball | undefined {
  const [p, q, r] = (/^\[(\d+),(\d+),(\d+)\]$/.exec(variant) ?? []).slice(1).map(Number);
  if (p === undefined || q === undefined || r === undefined || p + q + r + 2 !== c.length) return undefined;
  const list = borelTransform(c);
  const a = quadraticApproximant(list, [p, q, r], prec);
  if (typeof a === 'string') return undefined;
  const b = list.map((x) => x.ball(prec));
  const n = b.length;
  const square = Array.from({ length: n + 1 }, (_, k) => convolved(b, b, k, prec));
  const rest = R.add(convolved(a.q, b, n, prec), convolved(a.r, square, n, prec), prec);
  return R.neg(R.div(rest, a.rootAtOrigin, prec));
}

export function conformalImplies(e: Expansion, variant: string, prec: number): Ball | undefined {
  const cuts: Cuts = cutsOf(e);
  const softening = softeningOf(cuts, variant);
  if (softening === undefined) return undefined;
  const b = borelTransform(e.coefficients).map((x) => x.ball(prec));
  const n = b.length;
  const last = remap([...b, R.ZERO], cuts, softening, prec).coefficients[n];
  const slope = inverseMapSeries(cuts, 2, prec)[1];
  if (last === undefined || slope === undefined) return undefined;
  return R.neg(R.div(last, R.powInt(slope, n, prec), prec));
}

export function hypergeometricImplies(c: readonly Exact[], prec: number): Ball | undefined {
  const fit = fittedTransform(c, prec);
  if (fit === undefined) return undefined;
  const { apart, transform } = fit;
  const used = c.slice(apart);
  const b = borelTransform(used);
  const n = R.fromNumber(b.length - 1);
  const product = (list: readonly Complex[]): Complex =>
    list.reduce((acc, z) => C.mul(acc, { re: R.add(z.re, n, prec), im: z.im }, prec), C.ONE);
  const ratio = C.div(product(transform.upper), product(transform.lower), prec);
  const step = R.div(R.mul(transform.K, ratio.re, prec), R.add(n, R.ONE, prec), prec);
  const next = R.mul(b[b.length - 1]!.ball(prec), step, prec);
  if (apart === 0) return next;
  // The coefficient after a first term that stands apart: its transform is counted from there.
  return R.div(next, R.fromNumber(b.length + apart), prec);
}
