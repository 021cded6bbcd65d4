/**
 * @module ln Γ(x) in doubles for x > 0.
 *
 * Purpose    factorials in the fits; the certified one of the numerics room is a thousand times slower.
 * Method     upward recurrence to x >= 12, then Stirling's series with seven terms.
 * Bound      truncation below 2e-17; rounding a few units in the last place of the largest part.
 * Reference  DLMF 5.11.1.
 */

const START = 12;
const HALF_LOG_TWO_PI = 0.9189385332046727;

export function logGamma(x: number): number {
  let product = 1;
  let logs = 0;
  while (x < START) {
    product *= x;
    x += 1;
  }
  if (product !== 1) logs = Math.log(product);
  const z = 1 / (x * x);
  const series =
    (1 / 12 - z * (1 / 360 - z * (1 / 1260 - z * (1 / 1680 - z * (1 / 1188 - z * (691 / 360360 - z / 156)))))) / x;
  return (x - 0.5) * Math.log(x) - x + HALF_LOG_TWO_PI + series - logs;
}
