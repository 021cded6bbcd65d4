/**
 * @module Padé approximants of low order in doubles, for diagnosis only.
 *
 * Purpose    D-log poles, and the prediction of hidden coefficients; the values of the assessment use the exact table.
 * Method     linear system for the denominator by Gaussian elimination with partial pivoting; roots by simultaneous
 *            iteration.
 * Bound      none; a pivot below SINGULAR relative to its row is taken as "does not exist".
 * Reference  G. A. Baker and P. Graves-Morris, "Padé Approximants", 1996; E. Durand 1960, I. O. Kerner 1966 (roots).
 */

const SINGULAR = 1e-12;

export interface SmallPade {
  readonly numerator: readonly number[];
  /** q_0 = 1. */
  readonly denominator: readonly number[];
}

/** Solves a·x = b; undefined when singular to double precision. */
export function solveLinear(a: readonly (readonly number[])[], b: readonly number[]): number[] | undefined {
  const n = b.length;
  const m = a.map((row, i) => [...row, b[i]!]);
  const size = m.map((row) => Math.max(...row.slice(0, n).map(Math.abs)));
  for (let j = 0; j < n; j++) {
    let pivot = j;
    for (let i = j + 1; i < n; i++) if (Math.abs(m[i]![j]!) > Math.abs(m[pivot]![j]!)) pivot = i;
    if (!(Math.abs(m[pivot]![j]!) > SINGULAR * Math.max(...size))) return undefined;
    [m[j], m[pivot]] = [m[pivot]!, m[j]!];
    for (let i = j + 1; i < n; i++) {
      const f = m[i]![j]! / m[j]![j]!;
      for (let l = j; l <= n; l++) m[i]![l]! -= f * m[j]![l]!;
    }
  }
  const x = Array.from({ length: n }, () => 0);
  for (let j = n - 1; j >= 0; j--) {
    let s = m[j]![n]!;
    for (let l = j + 1; l < n; l++) s -= m[j]![l]! * x[l]!;
    x[j] = s / m[j]![j]!;
  }
  return x;
}

/** [L/M] of Σ b_n t^n (b_0 … b_{L+M} needed); undefined when it does not exist in doubles. */
export function smallPade(b: readonly number[], l: number, m: number): SmallPade | undefined {
  if (b.length < l + m + 1) return undefined;
  const at = (i: number): number => (i < 0 ? 0 : b[i]!);
  const rows = Array.from({ length: m }, (_, i) => Array.from({ length: m }, (_x, j) => at(l + i - j)));
  const q = m === 0 ? [] : solveLinear(rows, Array.from({ length: m }, (_, i) => -at(l + 1 + i)));
  if (q === undefined) return undefined;
  const denominator = [1, ...q];
  const numerator = Array.from({ length: l + 1 }, (_, i) => denominator.reduce((s, v, j) => s + v * at(i - j), 0));
  return { numerator, denominator };
}

export interface ComplexNumber {
  readonly re: number;
  readonly im: number;
}

/** p(z) by Horner. */
export function evaluate(p: readonly number[], z: ComplexNumber): ComplexNumber {
  let re = 0;
  let im = 0;
  for (let i = p.length - 1; i >= 0; i--) [re, im] = [re * z.re - im * z.im + p[i]!, re * z.im + im * z.re];
  return { re, im };
}

const divide = (a: ComplexNumber, b: ComplexNumber): ComplexNumber => {
  const d = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / d, im: (a.im * b.re - a.re * b.im) / d };
};

/** Simultaneous iteration for all roots of a polynomial of low degree (ascending coefficients). */
export function smallRoots(p: readonly number[]): ComplexNumber[] {
  let top = p.length - 1;
  while (top > 0 && p[top] === 0) top--;
  if (top < 1) return [];
  const monic = p.slice(0, top + 1).map((v) => v / p[top]!);
  const radius = Math.abs(monic[0]!) ** (1 / top) || 1;
  let z = Array.from({ length: top }, (_, i) => {
    const angle = 0.7 + (2 * Math.PI * i) / top;
    return { re: radius * Math.cos(angle), im: radius * Math.sin(angle) };
  });
  for (let pass = 0; pass < 200; pass++) {
    let change = 0;
    z = z.map((v, i) => {
      let product: ComplexNumber = { re: 1, im: 0 };
      z.forEach((u, j) => {
        if (j === i) return;
        const d = { re: v.re - u.re, im: v.im - u.im };
        product = { re: product.re * d.re - product.im * d.im, im: product.re * d.im + product.im * d.re };
      });
      const step = divide(evaluate(monic, v), product);
      if (!Number.isFinite(step.re) || !Number.isFinite(step.im)) return v;
      change = Math.max(change, Math.hypot(step.re, step.im) / (Math.hypot(v.re, v.im) || 1));
      return { re: v.re - step.re, im: v.im - step.im };
    });
    if (change < 1e-15) break;
  }
  return z;
}

export { divide as divideComplex };
