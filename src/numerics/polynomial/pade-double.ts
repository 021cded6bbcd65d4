/**
 * @module [L/M] in plain doubles with poles and amplitudes, for thousands of replicas in a row.
 *
 * Purpose    the inner step of Monte-Carlo error propagation through Borel–Padé; no proof, no allocation after
 *            construction.
 * Method     the Toeplitz system of pade-field.ts by elimination with row pivoting in one Float64Array; roots of the
 *            denominator by double-roots.ts; amplitudes A = −p(z)/(z q'(z)) of A/(1 − t/z), simple poles assumed.
 * Bound      none; `pivotRatio` (smallest pivot over largest entry) near 2^-53 says that the entry is close to a block.
 * Reference  G. A. Baker, P. Graves-Morris, "Padé Approximants", section 2.1; Golub–Van Loan, "Matrix Computations",
 *            section 3.4.
 */
import { DoubleRoots } from './double-roots.js';

export class PadeDouble {
  readonly L: number;
  readonly M: number;
  /** p_0..p_L and q_0..q_M of the last fit. */
  readonly numerator: Float64Array;
  readonly denominator: Float64Array;
  pivotRatio = 0;
  /** Poles of the last `findPoles`, upper member of a conjugate pair first, and their amplitudes. */
  readonly poleRe: Float64Array;
  readonly poleIm: Float64Array;
  readonly amplitudeRe: Float64Array;
  readonly amplitudeIm: Float64Array;
  poleCount = 0;
  /** Coefficients of the polynomial part, L − deg q + 1 of them (0 when negative). */
  readonly polynomial: Float64Array;
  polynomialLength = 0;
  private readonly matrix: Float64Array;
  private readonly rest: Float64Array;
  private readonly roots: DoubleRoots;

  constructor(L: number, M: number) {
    this.L = L;
    this.M = M;
    this.numerator = new Float64Array(L + 1);
    this.denominator = new Float64Array(M + 1);
    this.roots = new DoubleRoots(M);
    this.poleRe = this.roots.re;
    this.poleIm = this.roots.im;
    this.amplitudeRe = new Float64Array(M);
    this.amplitudeIm = new Float64Array(M);
    this.polynomial = new Float64Array(L + 1);
    this.matrix = new Float64Array(M * (M + 1));
    this.rest = new Float64Array(L + 1);
  }

  /** Fits b_0..b_{L+M}; false when the system is singular in doubles or something is not finite. */
  fit(b: ArrayLike<number>): boolean {
    const { L, M, matrix: m } = this;
    const width = M + 1;
    let largest = 0;
    for (let i = 0; i < M; i++) {
      for (let j = 0; j < M; j++) {
        const k = L - j + i;
        const v = k < 0 ? 0 : b[k]!;
        m[i * width + j] = v;
        largest = Math.max(largest, Math.abs(v));
      }
      m[i * width + M] = -b[L + 1 + i]!;
    }
    this.pivotRatio = M === 0 ? 1 : Infinity;
    for (let k = 0; k < M; k++) {
      let best = k;
      for (let i = k + 1; i < M; i++) if (Math.abs(m[i * width + k]!) > Math.abs(m[best * width + k]!)) best = i;
      const pivot = m[best * width + k]!;
      this.pivotRatio = Math.min(this.pivotRatio, Math.abs(pivot) / largest);
      if (pivot === 0 || !Number.isFinite(pivot)) return false;
      if (best !== k) {
        for (let j = k; j <= M; j++) {
          const t = m[k * width + j]!;
          m[k * width + j] = m[best * width + j]!;
          m[best * width + j] = t;
        }
      }
      for (let i = k + 1; i < M; i++) {
        const f = m[i * width + k]! / pivot;
        if (f === 0) continue;
        for (let j = k + 1; j <= M; j++) m[i * width + j]! -= f * m[k * width + j]!;
      }
    }
    const q = this.denominator;
    q[0] = 1;
    for (let i = M - 1; i >= 0; i--) {
      let v = m[i * width + M]!;
      for (let j = i + 1; j < M; j++) v -= m[i * width + j]! * q[j + 1]!;
      q[i + 1] = v / m[i * width + i]!;
    }
    let finite = true;
    for (let i = 0; i <= L; i++) {
      let v = 0;
      for (let j = 0; j <= M && j <= i; j++) v += q[j]! * b[i - j]!;
      this.numerator[i] = v;
      finite = finite && Number.isFinite(v);
    }
    for (let j = 0; j <= M; j++) finite = finite && Number.isFinite(q[j]!);
    return finite;
  }

  /** p(t)/q(t) of the last fit. */
  evaluate(t: number): number {
    let p = 0;
    for (let i = this.L; i >= 0; i--) p = p * t + this.numerator[i]!;
    let q = 0;
    for (let j = this.M; j >= 0; j--) q = q * t + this.denominator[j]!;
    return p / q;
  }

  /** Poles, amplitudes and polynomial part of the last fit; false when the root iteration does not come to rest. */
  findPoles(): boolean {
    if (!this.roots.find(this.denominator, this.M)) return false;
    this.poleCount = this.roots.count;
    for (let k = 0; k < this.poleCount; k++) this.amplitude(k);
    this.divide();
    return true;
  }

  private amplitude(k: number): void {
    const x = this.poleRe[k]!;
    const y = this.poleIm[k]!;
    let pr = 0;
    let pi = 0;
    for (let i = this.L; i >= 0; i--) {
      const t = pr * x - pi * y + this.numerator[i]!;
      pi = pr * y + pi * x;
      pr = t;
    }
    let dr = 0;
    let di = 0;
    for (let j = this.poleCount; j >= 1; j--) {
      const t = dr * x - di * y + j * this.denominator[j]!;
      di = dr * y + di * x;
      dr = t;
    }
    // −p/(z q')
    const zr = dr * x - di * y;
    const zi = dr * y + di * x;
    const norm = zr * zr + zi * zi;
    this.amplitudeRe[k] = -(pr * zr + pi * zi) / norm;
    this.amplitudeIm[k] = y === 0 ? 0 : -(pi * zr - pr * zi) / norm;
  }

  private divide(): void {
    const n = this.poleCount;
    this.polynomialLength = Math.max(0, this.L - n + 1);
    this.rest.set(this.numerator);
    for (let k = this.L - n; k >= 0; k--) {
      const c = this.rest[n + k]! / this.denominator[n]!;
      this.polynomial[k] = c;
      for (let j = 0; j < n; j++) this.rest[k + j]! -= c * this.denominator[j]!;
    }
  }
}

/** [L/M] of b in doubles, one-off; undefined when `fit` fails. */
export function padeDouble(
  b: readonly number[],
  L: number,
  M: number,
): { numerator: Float64Array; denominator: Float64Array; pivotRatio: number } | undefined {
  const work = new PadeDouble(L, M);
  if (!work.fit(b)) return undefined;
  return { numerator: work.numerator, denominator: work.denominator, pivotRatio: work.pivotRatio };
}
