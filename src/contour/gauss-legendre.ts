/**
 * @module Gauss–Legendre nodes on [0, π], in enclosures and in doubles.
 *
 * Purpose    integrals over the upper half of a circle: the integrand is analytic on the arc, but not periodic (a coupling
 *            has a cut along positive s), so that the trapezoidal rule would not do.
 * Method     zeros of P_n by Newton's method on the three-term recurrence, from cos(π(i − 1/4)/(n + 1/2)); weights
 *            2/((1 − x²) P_n′(x)²). The nodes are exact numbers next to the zeros: what that costs is far below the working
 *            precision, and the comparison of two rules has the last word.
 * Reference  DLMF 3.5(v), 18.9.
 */
import { R, pi, toNumberExact, exactReal } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';

export interface ArcNode {
  /** Angle φ in (0, π), −x = e^{iφ}. */
  readonly angle: Ball;
  /** Weight of ∫_0^π dφ/π. */
  readonly weight: Ball;
}

/** P_n(x) and P_{n−1}(x). */
function legendre(n: number, x: Ball, prec: number): { readonly p: Ball; readonly before: Ball } {
  let before = R.ONE;
  let p = x;
  for (let k = 2; k <= n; k++) {
    const next = R.sub(
      R.mul(R.mul(R.fromNumber(2 * k - 1), x, prec), p, prec),
      R.mul(R.fromNumber(k - 1), before, prec),
      prec,
    );
    before = p;
    p = R.exactMid(R.div(next, R.fromNumber(k), prec));
  }
  return { p, before };
}

/** P_n′(x) = n (x P_n − P_{n−1})/(x² − 1). */
function slope(n: number, x: Ball, p: Ball, before: Ball, prec: number): Ball {
  const top = R.mul(R.fromNumber(n), R.sub(R.mul(x, p, prec), before, prec), prec);
  return R.div(top, R.sub(R.sqr(x, prec), R.ONE, prec), prec);
}

/** Newton's method starts with so many bits, and doubles them. */
const START_BITS = 50;

function zero(n: number, i: number, prec: number): { readonly x: Ball; readonly slope: Ball } {
  let x = R.fromNumber(Math.cos((Math.PI * (i - 0.25)) / (n + 0.5)));
  // The first steps bring the start to full double precision, the following ones double its bits.
  for (let bits = 4; bits < 2 * prec; bits *= 2) {
    const work = Math.min(prec, Math.max(START_BITS, 2 * bits)) + 20;
    const { p, before } = legendre(n, x, work);
    x = R.exactMid(R.sub(x, R.div(p, slope(n, x, p, before, work), work), work));
  }
  const { p, before } = legendre(n, x, prec);
  return { x, slope: R.exactMid(slope(n, x, p, before, prec)) };
}

const kept = new Map<string, readonly ArcNode[]>();
/** Rules kept; a run uses a handful. */
const MOST_KEPT = 24;

/** The n-point rule at about `prec` bits, kept. */
export function arcNodes(n: number, prec: number): readonly ArcNode[] {
  const key = `${n} ${prec}`;
  let rule = kept.get(key);
  if (rule === undefined) {
    if (kept.size >= MOST_KEPT) kept.clear();
    rule = makeRule(n, prec + 20);
    kept.set(key, rule);
  }
  return rule;
}

function makeRule(n: number, prec: number): ArcNode[] {
  const half = R.mul2exp(pi(prec), -1);
  return Array.from({ length: n }, (_, k) => {
    // From φ = 0 on: x runs from −1 to 1.
    const { x, slope: d } = zero(n, n - k, prec);
    const denominator = R.mul(R.sub(R.ONE, R.sqr(x, prec), prec), R.sqr(d, prec), prec);
    return { angle: R.mul(half, R.add(R.ONE, x, prec), prec), weight: R.div(R.ONE, denominator, prec) };
  });
}

const doubles = new Map<number, readonly { readonly angle: number; readonly weight: number }[]>();

/** The n-point rule in doubles. */
export function arcNodesDouble(n: number): readonly { readonly angle: number; readonly weight: number }[] {
  let rule = doubles.get(n);
  if (rule === undefined) {
    const number = (b: Ball): number => toNumberExact(exactReal(() => b));
    rule = arcNodes(n, 80).map(({ angle, weight }) => ({ angle: number(angle), weight: number(weight) }));
    doubles.set(n, rule);
  }
  return rule;
}
