/**
 * @module Out-of-sample prediction: hide the last coefficients and predict the last one.
 *
 * Purpose    the evidence a reader believes at once: which model would have predicted what came next.
 * Method     factorial and geometric lines through ln|c_n| of the coefficients left (the last WINDOW of them), and the next
 *            Taylor coefficient of the near-diagonal Padé approximant of the Borel transform (of its tail, for long series:
 *            Σ_j b_{n0+j} t^j is rational whenever B is).
 * Bound      the miss itself is the result.
 * Reference  M. A. Samuel, J. Ellis and M. Karliner, Phys. Rev. Lett. 74 (1995) 4380 (Padé prediction of coefficients).
 */
import { PadeDouble, logGammaDouble } from '../numerics/index.js';
import type { Prediction } from './growth.js';
import { leastSquares } from './least-squares.js';
import type { Point } from './reading.js';

/** Coefficients that the lines are fitted to, at most. */
const WINDOW = 8;
/** Coefficients that the Padé approximant is built from, at most. */
const PADE_WINDOW = 9;
/** An approximant with a smaller pivot than this, relative, sits in or near a block: a smaller one is taken. */
const SINGULAR = 1e-11;
/** Coefficients that must remain. */
const MIN_LEFT = 3;

function linePrediction(left: readonly Point[], target: Point, part: (p: Point) => number): number | undefined {
  const used = left.slice(-WINDOW);
  const fit = leastSquares(
    [used.map(() => 1), used.map((p) => p.k)],
    used.map((p) => p.y - part(p)),
  );
  if (fit === undefined) return undefined;
  return fit.coefficients[0]! + fit.coefficients[1]! * target.k + part(target) - target.y;
}

/** Known Borel coefficients, scaled to moderate size; the scale drops out of every ratio. */
function scaledBorel(points: readonly Point[], q: number): number[] {
  const log = (p: Point): number => p.y - logGammaDouble(q * p.k + 1);
  const first = points[0]!;
  const last = points[points.length - 1]!;
  const slope = (log(last) - log(first)) / (last.k - first.k);
  return points.map((p) => p.sign * Math.exp(log(p) - log(first) - slope * (p.k - first.k)));
}

/** Predicted over known coefficient from the largest near-diagonal entry that exists. `hidden` points end the list. */
function padePrediction(
  points: readonly Point[],
  hidden: number,
  q: number,
): { ratio: number; label: string } | undefined {
  const longest = Math.min(PADE_WINDOW, points.length - hidden);
  for (let length = longest; length >= MIN_LEFT; length--) {
    const used = points.slice(points.length - hidden - length);
    if (used.some((p, i) => p.k !== used[0]!.k + i)) return undefined;
    const known = scaledBorel(used, q);
    const b = known.slice(0, length);
    const m = Math.floor((length - 1) / 2);
    const pade = new PadeDouble(length - 1 - m, m);
    if (!pade.fit(b) || pade.pivotRatio < SINGULAR) continue;
    for (let n = length; n < used.length; n++) {
      let next = 0;
      for (let j = 1; j <= m; j++) next -= pade.denominator[j]! * b[n - j]!;
      b.push(next);
    }
    return { ratio: b[used.length - 1]! / known[used.length - 1]!, label: `Borel–Padé [${length - 1 - m}/${m}]` };
  }
  return undefined;
}

/** Misses for the last coefficient with one and with two hidden. The factorial model is Γ(qk + 1 + shift). */
export function predictions(
  points: readonly Point[],
  q: number,
  sign: 'same' | 'alternating' | undefined,
  shift: number,
): Prediction[] {
  const target = points[points.length - 1];
  if (target === undefined) return [];
  const out: Prediction[] = [];
  for (const hidden of [1, 2]) {
    const left = points.slice(0, points.length - hidden);
    if (left.length < MIN_LEFT) continue;
    const suffix = hidden === 1 ? '' : ', two hidden';
    const last = left[left.length - 1]!;
    const expectedSign = sign === 'alternating' && (target.k - last.k) % 2 === 1 ? -last.sign : last.sign;
    const push = (method: string, ratio: number | undefined): void => {
      if (ratio !== undefined && !Number.isNaN(ratio)) {
        out.push({ n: target.n, method: method + suffix, relativeMiss: ratio - 1 });
      }
    };
    for (const factorial of [true, false]) {
      const log = linePrediction(left, target, (p) => (factorial ? logGammaDouble(q * p.k + 1 + shift) : 0));
      push(
        factorial ? 'factorial fit' : 'geometric fit',
        log === undefined ? undefined : Math.exp(log) * expectedSign * target.sign,
      );
    }
    const pade = padePrediction(points, hidden, q);
    if (pade !== undefined) push(pade.label, pade.ratio);
  }
  return out;
}
