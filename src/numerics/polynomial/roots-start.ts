/**
 * @module Starting points for all roots of a real polynomial, in scaled doubles.
 *
 * Purpose    good approximations of well-conditioned roots, sensible ones of the others; nothing here is proved.
 * Method     radii from the upper convex hull of log2|a_k| (Newton polygon), then Ehrlich–Aberth iterations
 *            z_i ← z_i − N/(1 − N Σ_j 1/(z_i − z_j)), N = p/p'. Points are kept as y·2^e with |y| near 1 and p is
 *            evaluated in y with coefficients scaled by 2^(ke), so 1e-400 and 1e400 are ordinary coefficients.
 * Bound      none; the certification that follows does not trust these numbers.
 * Reference  O. Aberth, Math. Comput. 27 (1973) 339; D. A. Bini, Numer. Algorithms 13 (1996) 179 (starting radii).
 */

/** Points y·2^e in the complex plane. */
export interface Points {
  readonly re: Float64Array;
  readonly im: Float64Array;
  readonly exp: Int32Array;
}

/** p/p' (in y) at the point y·2^e, written to out[0], out[1]; returns true when |p| is at the rounding level. */
export type NewtonRatio = (re: number, im: number, exp: number, out: Float64Array) => boolean;

/** Heuristics: sweeps before giving up, relative step that counts as arrived, irrational start angle. */
const MAX_SWEEPS = 60;
const SMALL_STEP = 2 ** -50;
const START_ANGLE = 0.7;
/** Rounding of a complex Horner step, relative to the sum of moduli. */
const NOISE = 2 ** -51;
/** Points larger by more than 2^FAR do not move a point. */
const FAR = 500;

/** Start radii on the Newton polygon: log2 of |a_k| (−Infinity for zero), degree n >= 1, a_0 and a_n non-zero. */
export function startingPoints(logs: ArrayLike<number>): Points {
  const n = logs.length - 1;
  const hull: number[] = [];
  for (let k = 0; k <= n; k++) {
    if (logs[k] === -Infinity) continue;
    while (hull.length >= 2) {
      const a = hull[hull.length - 2]!;
      const b = hull[hull.length - 1]!;
      if ((logs[b]! - logs[a]!) * (k - a) > (logs[k]! - logs[a]!) * (b - a)) break;
      hull.pop();
    }
    hull.push(k);
  }
  const points: Points = { re: new Float64Array(n), im: new Float64Array(n), exp: new Int32Array(n) };
  for (let s = 0; s + 1 < hull.length; s++) {
    const from = hull[s]!;
    const count = hull[s + 1]! - from;
    const log = (logs[from]! - logs[hull[s + 1]!]!) / count;
    const e = Math.round(log);
    const r = 2 ** (log - e);
    for (let j = 0; j < count; j++) {
      const angle = (2 * Math.PI * j) / count + START_ANGLE + (2 * Math.PI * s) / n;
      points.re[from + j] = r * Math.cos(angle);
      points.im[from + j] = r * Math.sin(angle);
      points.exp[from + j] = e;
    }
  }
  return points;
}

/** p/p' for coefficients sign·2^log (log may be far outside the range of doubles). */
export function polynomialRatio(logs: ArrayLike<number>, signs: ArrayLike<number>): NewtonRatio {
  const n = logs.length - 1;
  const scaled = new Map<number, Float64Array>();
  const coefficients = (e: number): Float64Array => {
    let c = scaled.get(e);
    if (c === undefined) {
      c = new Float64Array(n + 1);
      let top = -Infinity;
      for (let k = 0; k <= n; k++) top = Math.max(top, logs[k]! + k * e);
      for (let k = 0; k <= n; k++) c[k] = signs[k]! * 2 ** (logs[k]! + k * e - top);
      scaled.set(e, c);
    }
    return c;
  };
  return (re, im, exp, out) => {
    const c = coefficients(exp);
    let pr = c[n]!;
    let pi = 0;
    let dr = 0;
    let di = 0;
    const modulus = Math.hypot(re, im);
    let size = Math.abs(pr);
    for (let k = n - 1; k >= 0; k--) {
      const tr = dr * re - di * im + pr;
      di = dr * im + di * re + pi;
      dr = tr;
      const ur = pr * re - pi * im + c[k]!;
      pi = pr * im + pi * re;
      pr = ur;
      size = size * modulus + Math.abs(c[k]!);
    }
    quotient(pr, pi, dr, di, out);
    return Math.abs(pr) + Math.abs(pi) <= size * n * NOISE;
  };
}

/** out ← (ar + i ai)/(br + i bi), scaled against overflow; a zero divisor gives the nudge 1e-3(1 + i). */
function quotient(ar: number, ai: number, br: number, bi: number, out: Float64Array): void {
  const scale = Math.max(Math.abs(br), Math.abs(bi));
  if (scale === 0 || !Number.isFinite(scale)) {
    out[0] = 1e-3;
    out[1] = 1e-3;
    return;
  }
  const x = br / scale;
  const y = bi / scale;
  const d = (x * x + y * y) * scale;
  out[0] = (ar * x + ai * y) / d;
  out[1] = (ai * x - ar * y) / d;
}

/** Σ_j 1/(y_i − y_j 2^(e_j − e_i)) in the units of point i, written to out; points of far larger modulus count as 0. */
export function aberthSum(points: Points, i: number, out: Float64Array): void {
  const { re, im, exp } = points;
  const n = re.length;
  const x = re[i]!;
  const y = im[i]!;
  const e = exp[i]!;
  let sr = 0;
  let si = 0;
  for (let j = 0; j < n; j++) {
    if (j === i || exp[j]! - e > FAR) continue;
    const scale = exp[j] === e ? 1 : 2 ** (exp[j]! - e);
    const dr = x - re[j]! * scale;
    const di = y - im[j]! * scale;
    const d = dr * dr + di * di;
    if (d === 0 || d === Infinity) continue;
    sr += dr / d;
    si -= di / d;
  }
  out[0] = sr;
  out[1] = si;
}

/** Ehrlich–Aberth sweeps until every point rests. The points are changed in place. */
export function aberthSweeps(points: Points, ratio: NewtonRatio): void {
  const n = points.re.length;
  const newton = new Float64Array(2);
  const sum = new Float64Array(2);
  const step = new Float64Array(2);
  const resting = new Uint8Array(n);
  for (let sweep = 0, left = n; sweep < MAX_SWEEPS && left > 0; sweep++) {
    for (let i = 0; i < n; i++) {
      if (resting[i] === 1) continue;
      const noise = ratio(points.re[i]!, points.im[i]!, points.exp[i]!, newton);
      aberthSum(points, i, sum);
      const fr = 1 - (newton[0]! * sum[0]! - newton[1]! * sum[1]!);
      const fi = -(newton[0]! * sum[1]! + newton[1]! * sum[0]!);
      quotient(newton[0]!, newton[1]!, fr, fi, step);
      moveBy(points, i, step[0]!, step[1]!);
      const small = Math.hypot(step[0]!, step[1]!) <= SMALL_STEP * Math.hypot(points.re[i]!, points.im[i]!);
      if (noise || small) {
        resting[i] = 1;
        left--;
      }
    }
  }
}

/** y_i ← y_i − step, brought back to |y| near 1; a step that is not finite is dropped. */
function moveBy(points: Points, i: number, stepRe: number, stepIm: number): void {
  let x = points.re[i]! - stepRe;
  let y = points.im[i]! - stepIm;
  const size = Math.hypot(x, y);
  if (!Number.isFinite(size) || size === 0) return;
  if (size > 1.5 || size < 0.65) {
    const s = Math.max(-1000, Math.min(1000, Math.round(Math.log2(size))));
    x *= 2 ** -s;
    y *= 2 ** -s;
    points.exp[i]! += s;
  }
  points.re[i] = x;
  points.im[i] = y;
}
