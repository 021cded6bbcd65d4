/**
 * @module Linear systems with ball entries: an enclosure of every solution, tighter than elimination on balls.
 *
 * Purpose    the solution set of A x = b for all A, b in the balls, with radii near the true sensitivity.
 * Method     R ≈ (mid A)^{-1} and x̃ = R mid b in plain numbers; then the residual with balls.
 * Bound      with G = I − R A and ‖G‖ < 1 (maximum row sum) every A in the balls is regular and
 *            |x − x̃|_i <= |R(b − A x̃)|_i + Σ_j|G_ij| ‖R(b − A x̃)‖/(1 − ‖G‖), since x − x̃ = Σ_k G^k R(b − A x̃).
 * Reference  S. M. Rump, Acta Numerica 19 (2010) 287, section 10; R. Krawczyk, Computing 4 (1969) 187.
 */
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { bitLength } from '../bits.js';
import { ballField } from '../field.js';
import { lu, solveFactored, type Matrix } from './lu.js';

/** Heuristic: bits carried beyond prec while forming the approximate inverse. */
const GUARD_BITS = 16;
/** Bits of the numbers that only bound others. */
const RADIUS_BITS = 60;

/**
 * Balls for x with A x = b, working with `prec` bits. Undefined when the regularity of A cannot be shown at this
 * precision. Radii shrink with prec down to what the radii of A and b allow.
 */
export function solveBall(a: Matrix<Ball>, b: readonly Ball[], prec: number): Ball[] | undefined {
  const n = a.length;
  const work = prec + GUARD_BITS;
  const plain = ballField(work);
  const middle: typeof plain = {
    ...plain,
    add: (x, y) => R.exactMid(R.add(x, y, work)),
    sub: (x, y) => R.exactMid(R.sub(x, y, work)),
    mul: (x, y) => R.exactMid(R.mul(x, y, work)),
    div: (x, y) => R.exactMid(R.div(x, y, work)),
  };
  const f = lu(
    middle,
    a.map((row) => row.map(R.exactMid)),
  );
  if (f.kind !== 'regular') return undefined;
  const columns = a.map((_, j) => solveFactored(middle, f, unit(n, j)));
  const inverse = a.map((_, i) => columns.map((column) => column[i]!));
  const x = solveFactored(middle, f, b.map(R.exactMid));
  const residual = a.map((row, i) => R.sub(b[i]!, dot(row, x, 2 * work), work));
  const correction = inverse.map((row) => dot(row, residual, work));
  const g = inverse.map((row, i) =>
    a.map((_, j) =>
      R.sub(
        i === j ? R.ONE : R.ZERO,
        dot(
          row,
          a.map((r) => r[j]!),
          work,
        ),
        work,
      ),
    ),
  );
  const rowSums = g.map((row) => row.map(upper).reduce(exactSum, R.ZERO));
  const gap = R.sub(R.ONE, rowSums.reduce(larger, R.ZERO), Infinity);
  if (!R.isPositive(gap)) return undefined;
  const reach = R.div(correction.map(upper).reduce(larger, R.ZERO), gap, RADIUS_BITS);
  return x.map((v, i) => {
    const spread = R.mul(rowSums[i]!, reach, RADIUS_BITS);
    return R.round(R.widen(R.widen(v, correction[i]!), spread), prec);
  });
}

const unit = (n: number, j: number): Ball[] => Array.from({ length: n }, (_, i) => (i === j ? R.ONE : R.ZERO));

function dot(a: readonly Ball[], b: readonly Ball[], prec: number): Ball {
  return a.reduce((acc, x, i) => R.add(acc, R.mul(x, b[i]!, prec), prec), R.ZERO);
}

const exactSum = (a: Ball, b: Ball): Ball => R.add(a, b, Infinity);

const larger = (a: Ball, b: Ball): Ball => (R.compare(a, b, Infinity) >= 0 ? a : b);

/** An exact number of at most RADIUS_BITS + 2 bits that bounds |a| from above. */
function upper(a: Ball): Ball {
  if (R.isExactZero(a) || a.rad === Infinity) return a;
  const drop = Math.max(0, bitLength(a.mid) - RADIUS_BITS);
  const mid = (a.mid < 0n ? -a.mid : a.mid) >> BigInt(drop);
  return R.ball(mid + 1n + BigInt(Math.ceil(a.rad * 2 ** -drop)), a.exp + drop);
}
