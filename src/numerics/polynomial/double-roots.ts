/**
 * @module Roots of a real polynomial in plain doubles, for thousands of small polynomials in a row.
 *
 * Purpose    poles of replica approximants; no proof, no allocation after construction.
 * Method     the variable is scaled by a power of two that balances a_0 and a_n; starting radii from the Newton polygon;
 *            Ehrlich–Aberth with Horner's rule, on the reversed polynomial outside the unit circle. Roots are then
 *            matched with their mirror images: one that is nearer to its own image than to any other root is real.
 * Bound      none. Well-conditioned roots are right to a few units in the last place times the degree.
 * Reference  O. Aberth, Math. Comput. 27 (1973) 339; D. A. Bini, Numer. Algorithms 13 (1996) 179.
 */

/** Heuristics as in roots-start.ts. */
const MAX_SWEEPS = 80;
const SMALL_STEP = 2 ** -51;
const START_ANGLE = 0.7;
/** Rounding of a complex Horner step, relative to the sum of moduli. */
const NOISE = 2 ** -51;

/** Workspace for polynomials up to a degree; `re[i] + i·im[i]`, i < count, after `find`. */
export class DoubleRoots {
  readonly re: Float64Array;
  readonly im: Float64Array;
  count = 0;
  private readonly c: Float64Array;
  private readonly log: Float64Array;
  private readonly hull: Int32Array;
  private readonly done: Uint8Array;
  private nr = 0;
  private ni = 0;

  constructor(maxDegree: number) {
    this.re = new Float64Array(maxDegree);
    this.im = new Float64Array(maxDegree);
    this.c = new Float64Array(maxDegree + 1);
    this.log = new Float64Array(maxDegree + 1);
    this.hull = new Int32Array(maxDegree + 1);
    this.done = new Uint8Array(maxDegree);
  }

  /**
   * Finds the roots of Σ a_k x^k, k <= degree. Trailing zero coefficients lower the degree, leading ones give roots 0.
   * False when a coefficient is not finite, all are zero, or the iteration does not come to rest.
   */
  find(a: ArrayLike<number>, degree: number): boolean {
    let top = degree;
    while (top >= 0 && a[top] === 0) top--;
    let low = 0;
    while (low < top && a[low] === 0) low++;
    this.count = 0;
    if (top < 0) return false;
    for (; this.count < low; this.count++) {
      this.re[this.count] = 0;
      this.im[this.count] = 0;
    }
    const n = top - low;
    if (n === 0) return Number.isFinite(a[top]!);
    const shift = Math.round((Math.log2(Math.abs(a[low]!)) - Math.log2(Math.abs(a[top]!))) / n);
    let peak = -Infinity;
    for (let k = 0; k <= n; k++) {
      this.log[k] = Math.log2(Math.abs(a[low + k]!)) + shift * k;
      peak = Math.max(peak, this.log[k]!);
    }
    if (!Number.isFinite(peak)) return false;
    for (let k = 0; k <= n; k++) this.c[k] = a[low + k]! * 2 ** (shift * k - Math.ceil(peak));
    const first = this.count;
    this.start(n, first);
    const rests = this.iterate(n, first);
    this.count = first + n;
    this.mirror(first);
    const unit = 2 ** shift;
    for (let i = first; i < this.count; i++) {
      this.re[i]! *= unit;
      this.im[i]! *= unit;
    }
    return rests;
  }

  /** Points on circles with the radii of the Newton polygon. */
  private start(n: number, first: number): void {
    const { log, hull } = this;
    let size = 0;
    for (let k = 0; k <= n; k++) {
      if (log[k] === -Infinity) continue;
      while (size >= 2) {
        const a = hull[size - 2]!;
        const b = hull[size - 1]!;
        if ((log[b]! - log[a]!) * (k - a) > (log[k]! - log[a]!) * (b - a)) break;
        size--;
      }
      hull[size++] = k;
    }
    for (let s = 0; s + 1 < size; s++) {
      const from = hull[s]!;
      const to = hull[s + 1]!;
      const r = 2 ** ((log[from]! - log[to]!) / (to - from));
      for (let k = from; k < to; k++) {
        const angle = (2 * Math.PI * (k - from)) / (to - from) + START_ANGLE + (2 * Math.PI * s) / n;
        this.re[first + k] = r * Math.cos(angle);
        this.im[first + k] = r * Math.sin(angle);
      }
    }
  }

  private iterate(n: number, first: number): boolean {
    const { re, im, done } = this;
    done.fill(0);
    let left = n;
    for (let sweep = 0; sweep < MAX_SWEEPS && left > 0; sweep++) {
      for (let i = first; i < first + n; i++) {
        if (done[i] === 1) continue;
        const noise = this.newton(n, re[i]!, im[i]!);
        let sr = 0;
        let si = 0;
        for (let j = first; j < first + n; j++) {
          if (j === i) continue;
          const x = re[i]! - re[j]!;
          const y = im[i]! - im[j]!;
          const d = x * x + y * y;
          if (d === 0) continue;
          sr += x / d;
          si -= y / d;
        }
        const fr = 1 - (this.nr * sr - this.ni * si);
        const fi = -(this.nr * si + this.ni * sr);
        const f = fr * fr + fi * fi;
        if (!(f > 0) || !Number.isFinite(f)) {
          re[i]! *= 1.01; // a stationary point of the iteration: leave it
          continue;
        }
        const dx = (this.nr * fr + this.ni * fi) / f;
        const dy = (this.ni * fr - this.nr * fi) / f;
        re[i]! -= dx;
        im[i]! -= dy;
        if (noise || Math.abs(dx) + Math.abs(dy) <= SMALL_STEP * (Math.abs(re[i]!) + Math.abs(im[i]!))) {
          done[i] = 1;
          left--;
        }
      }
    }
    return left === 0;
  }

  /** p/p' at x + iy to nr + i·ni; true when |p| is at its rounding level. */
  private newton(n: number, x: number, y: number): boolean {
    const { c } = this;
    const modulus = Math.sqrt(x * x + y * y);
    const inside = modulus <= 1;
    // Outside the unit circle: p(z) = z^n r(1/z), p/p' = z r/(n r − r'/z).
    const norm = modulus * modulus;
    const zr = inside ? x : x / norm;
    const zi = inside ? y : -y / norm;
    const size = inside ? modulus : 1 / modulus;
    let pr = inside ? c[n]! : c[0]!;
    let pi = 0;
    let dr = 0;
    let di = 0;
    let bound = Math.abs(pr);
    for (let k = 1; k <= n; k++) {
      const next = inside ? c[n - k]! : c[k]!;
      const tr = dr * zr - di * zi + pr;
      di = dr * zi + di * zr + pi;
      dr = tr;
      const ur = pr * zr - pi * zi + next;
      pi = pr * zi + pi * zr;
      pr = ur;
      bound = bound * size + Math.abs(next);
    }
    let gr = dr;
    let gi = di;
    let hr = pr;
    let hi = pi;
    if (!inside) {
      gr = n * pr - (dr * zr - di * zi);
      gi = n * pi - (dr * zi + di * zr);
      hr = pr * x - pi * y;
      hi = pr * y + pi * x;
    }
    const g = gr * gr + gi * gi;
    this.nr = (hr * gr + hi * gi) / g;
    this.ni = (hi * gr - hr * gi) / g;
    return Math.abs(pr) + Math.abs(pi) <= bound * n * NOISE;
  }

  /** Makes the set symmetric: pairs become exact conjugates, real roots real; upper member of a pair first. */
  private mirror(first: number): void {
    const { re, im } = this;
    for (let i = first; i < this.count; i++) {
      let best = i;
      let least = 2 * Math.abs(im[i]!);
      for (let j = i + 1; j < this.count; j++) {
        const gap = Math.hypot(re[i]! - re[j]!, im[i]! + im[j]!);
        if (gap < least) [best, least] = [j, gap];
      }
      if (best === i) {
        im[i] = 0;
        continue;
      }
      const x = (re[i]! + re[best]!) / 2;
      const y = Math.abs(im[i]! - im[best]!) / 2;
      re[best] = re[i + 1]!;
      im[best] = im[i + 1]!;
      re[i] = x;
      re[i + 1] = x;
      im[i] = y;
      im[i + 1] = -y;
      i++;
    }
  }
}

/** Roots of Σ a_k x^k as {re, im} pairs; [] for constants, undefined when `find` fails. One-off convenience. */
export function rootsDouble(a: readonly number[]): { re: number; im: number }[] | undefined {
  const work = new DoubleRoots(Math.max(0, a.length - 1));
  if (!work.find(a, a.length - 1)) return undefined;
  return Array.from({ length: work.count }, (_, i) => ({ re: work.re[i]!, im: work.im[i]! }));
}
