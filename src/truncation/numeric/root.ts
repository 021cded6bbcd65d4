/** @module The root of a monotone function in doubles. */

const MOST_STEPS = 200;

/**
 * x with f(x) = 0 for an increasing f.
 *
 * Method     the bracket grows from `start` by doubled steps, then shrinks by the Illinois rule (M. Dowell, P. Jarratt
 *            1971), halved where that stalls.
 * Bound      the bracket is shorter than `tolerance`, absolute, or f is exactly 0.
 * @param step first step from `start`
 * @returns undefined when no sign change is found
 */
export function increasingRoot(
  f: (x: number) => number,
  start: number,
  step: number,
  tolerance: number,
): number | undefined {
  const at = f(start);
  if (at === 0) return start;
  const direction = at > 0 ? -1 : 1;
  let [near, far] = [start, start];
  let [fNear, fFar] = [at, at];
  for (let k = 0; fFar * at > 0; k++) {
    if (k > 60 || !Number.isFinite(fFar)) return undefined;
    [near, fNear] = [far, fFar];
    far = near + direction * step * 2 ** k;
    fFar = f(far);
  }
  let [low, high, fLow, fHigh] = direction > 0 ? [near, far, fNear, fFar] : [far, near, fFar, fNear];
  let side = 0;
  for (let k = 0; k < MOST_STEPS && high - low > tolerance; k++) {
    const secant = (low * fHigh - high * fLow) / (fHigh - fLow);
    const middle = k % 3 === 2 || !(secant > low && secant < high) ? (low + high) / 2 : secant;
    const value = f(middle);
    if (value === 0) return middle;
    if (value < 0) {
      [low, fLow] = [middle, value];
      if (side < 0) fHigh /= 2;
      side = -1;
    } else {
      [high, fHigh] = [middle, value];
      if (side > 0) fLow /= 2;
      side = 1;
    }
  }
  return (low + high) / 2;
}
