/**
 * @module Three-term recurrence through consecutive coefficients: complex pairs and competing real pairs.
 *
 * Purpose    two singularities of similar modulus make the ratio test fail; two terms of the recurrence see both.
 * Method     β_{k+1} = P β_k − Q β_{k−1} through four consecutive Borel coefficients. Q > 0 with |P| < 2√Q: complex pair,
 *            B_k = √Q = (1/R)[1 + (γ−1)/k + …], cos θ_k = P/(2√Q) (the sequences of Mercer and Roberts). Real roots: the
 *            two positions. The sequences are fitted in powers of 1/k over the later half.
 * Bound      heuristic: change of the fit when one more power is allowed, and the scatter.
 * Reference  G. N. Mercer and A. J. Roberts, SIAM J. Appl. Math. 50 (1990) 1547.
 */
import type { Estimate } from './growth.js';
import { leastSquares } from './least-squares.js';

export interface RecurrenceRow {
  readonly k: number;
  readonly p: number;
  readonly q: number;
  /** Size of the determinant relative to its two products: 0 where the two equations coincide. */
  readonly weight: number;
}

/** Rows k = 2 … K−2 of β_0 … β_{K−1}; gaps give none. */
export function recurrence(beta: readonly (number | undefined)[]): RecurrenceRow[] {
  const rows: RecurrenceRow[] = [];
  for (let k = 2; k + 1 < beta.length; k++) {
    const [a, b, c, d] = [beta[k - 2], beta[k - 1], beta[k], beta[k + 1]];
    if (a === undefined || b === undefined || c === undefined || d === undefined) continue;
    const m = c * a - b * b;
    const size = Math.abs(c * a) + b * b;
    if (m === 0 || !(size > 0)) continue;
    rows.push({ k, p: (d * a - c * b) / m, q: (d * b - c * c) / m, weight: Math.abs(m) / size });
  }
  return rows;
}

/** B_k = √Q and cos θ_k; undefined where Q <= 0: the hypothesis "one pair dominates" is rejected at that k. */
export function mercerRoberts(row: RecurrenceRow): { readonly b: number; readonly cos: number } | undefined {
  if (!(row.q > 0)) return undefined;
  const b = Math.sqrt(row.q);
  return { b, cos: row.p / (2 * b) };
}

/** Positions 1/root of the two real roots, the nearer first; undefined for a complex pair. */
export function realPositions(row: RecurrenceRow): readonly [number, number] | undefined {
  const disc = row.p * row.p - 4 * row.q;
  if (!(disc >= 0)) return undefined;
  const big = (row.p + Math.sign(row.p || 1) * Math.sqrt(disc)) / 2;
  const small = row.q / big;
  return [1 / big, 1 / small];
}

export interface PairFit {
  /** Modulus R of the position, per step. */
  readonly modulus: Estimate;
  readonly cosine: Estimate;
  readonly exponent: Estimate;
  readonly rows: number;
}

/** Rows needed for a statement. */
const MIN_ROWS = 4;
/** Part of the later rows that must agree with a complex pair. */
const AGREE = 0.8;
/** Stated error over the change between neighbouring fits. */
const INFLATION = 3;

/** Straight line v = a + b·x and, when there are rows enough, the fit with one more power; a with its error. */
function intercept(
  rows: readonly { k: number; v: number; w: number }[],
  powers: readonly number[],
): { value: Estimate; slope: number; slopeError: number } | undefined {
  const y = rows.map((r) => r.v);
  const w = rows.map((r) => r.w);
  const columns = [rows.map(() => 1), ...powers.map((e) => rows.map((r) => r.k ** -e))];
  const simple = leastSquares(columns.slice(0, 2), y, w);
  const full = rows.length > 5 ? leastSquares(columns, y, w) : undefined;
  const best = full ?? simple;
  if (best === undefined || simple === undefined) return undefined;
  const dof = Math.max(1, rows.length - (full === undefined ? 2 : columns.length));
  const spread = Math.sqrt(best.rss / dof);
  const change = full === undefined ? 0 : Math.abs(full.coefficients[0]! - simple.coefficients[0]!);
  const slopeChange = full === undefined ? 0 : Math.abs(full.coefficients[1]! - simple.coefficients[1]!);
  return {
    value: {
      value: best.coefficients[0]!,
      error: INFLATION * Math.hypot(spread * Math.sqrt(best.unitVariances[0]!), change),
    },
    slope: best.coefficients[1]!,
    slopeError: INFLATION * Math.hypot(spread * Math.sqrt(best.unitVariances[1]!), slopeChange),
  };
}

/** Fits over rows[from…]; undefined when these do not look like one complex pair. */
export function complexPair(rows: readonly RecurrenceRow[]): PairFit | undefined {
  const late = rows.slice(Math.floor(rows.length / 2));
  if (late.length < MIN_ROWS) return undefined;
  const good = late.flatMap((r) => {
    const m = mercerRoberts(r);
    return m !== undefined && Math.abs(m.cos) < 1 ? [{ k: r.k, b: m.b, cos: m.cos, w: r.weight ** 2 }] : [];
  });
  if (good.length < MIN_ROWS || good.length < AGREE * late.length) return undefined;
  const b = intercept(
    good.map((r) => ({ k: r.k, v: r.b, w: r.w })),
    [1, 2],
  );
  const c = intercept(
    good.map((r) => ({ k: r.k, v: r.cos, w: r.w })),
    [2, 3],
  );
  if (b === undefined || c === undefined || !(b.value.value > 0)) return undefined;
  const inverse = b.value.value;
  const modulus = { value: 1 / inverse, error: b.value.error / inverse ** 2 };
  const exponent = {
    value: 1 + b.slope / inverse,
    error: Math.hypot(b.slopeError, (b.slope * b.value.error) / inverse) / inverse,
  };
  return { modulus, cosine: c.value, exponent, rows: good.length };
}
