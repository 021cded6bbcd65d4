/**
 * @module The logarithms of a re-expansion, worked out once for all scales.
 *
 * Purpose    the coefficients at many scales: a table costs N² operations a beta coefficient, a scale N² more.
 * Method     with L = ln(μ_0²/μ²), D(x(μ_0)) = exp(L β ∂_x) D(x(μ)): row k holds (β ∂_x)^k D/k!,
 *              T_k[m] = −(1/k) Σ_j b_j (m−1−j) T_{k−1}[m−1−j],   m the power of x;  coefficients Σ_k L^k T_k[m].
 * Bound      enclosures.
 * Reference  the renormalisation group; the same numbers as a composition of series (see the tests).
 */
import { R, type Ball, type Exact } from '../../numerics/index.js';

/** Spare bits for the sums over powers of L. */
const SPARE = 64;

/** T_k[n] for a series Σ c_n x^(n + firstPower) at μ_0, rows k = 0 … N−1, computed with `prec` bits. */
export function logRows(
  coefficients: readonly Exact[],
  firstPower: number,
  beta: readonly Exact[],
  prec: number,
): Ball[][] {
  const b = beta.map((x) => x.ball(prec));
  const rows: Ball[][] = [coefficients.map((c) => c.ball(prec))];
  for (let k = 1; k < coefficients.length; k++) {
    const last = rows[k - 1]!;
    const over = R.div(R.ONE, R.fromNumber(-k), prec);
    rows.push(
      last.map((_, n) => {
        let sum: Ball = R.ZERO;
        for (let j = 0; j < b.length && n - 1 - j >= k - 1; j++) {
          const power = R.fromNumber(n - 1 - j + firstPower);
          sum = R.add(sum, R.mul(R.mul(b[j]!, power, prec), last[n - 1 - j]!, prec), prec);
        }
        return R.mul(sum, over, prec);
      }),
    );
  }
  return rows;
}

/** Coefficients at ln(μ²/μ_0²) = logRatio, enclosed to about `bits` bits. */
export function logTable(
  coefficients: readonly Exact[],
  firstPower: number,
  beta: readonly Exact[],
  bits: number,
): (logRatio: number) => Ball[] {
  const prec = bits + SPARE;
  const rows = logRows(coefficients, firstPower, beta, prec);
  return (logRatio) => {
    const L = R.fromNumber(-logRatio);
    return coefficients.map((_, n) => {
      let sum: Ball = R.ZERO;
      for (let k = n; k >= 0; k--) sum = R.add(R.mul(sum, L, prec), rows[k]![n]!, prec);
      return sum;
    });
  };
}
