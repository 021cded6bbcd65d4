/** @module Complex numbers in doubles, as much as the running coupling needs. */

export interface ComplexNumber {
  readonly re: number;
  readonly im: number;
}

export const cadd = (a: ComplexNumber, b: ComplexNumber): ComplexNumber => ({ re: a.re + b.re, im: a.im + b.im });
export const csub = (a: ComplexNumber, b: ComplexNumber): ComplexNumber => ({ re: a.re - b.re, im: a.im - b.im });
export const cscale = (a: ComplexNumber, x: number): ComplexNumber => ({ re: a.re * x, im: a.im * x });
export const cmul = (a: ComplexNumber, b: ComplexNumber): ComplexNumber => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
export function cdiv(a: ComplexNumber, b: ComplexNumber): ComplexNumber {
  const n = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / n, im: (a.im * b.re - a.re * b.im) / n };
}
export const cabs = (a: ComplexNumber): number => Math.hypot(a.re, a.im);

/** Principal logarithm of 1 + a, accurate for small a. */
export const clog1p = (a: ComplexNumber): ComplexNumber => ({
  re: Math.log1p(a.re * (2 + a.re) + a.im * a.im) / 2,
  im: Math.atan2(a.im, 1 + a.re),
});

/** Value of Σ s_k x^k. */
export function polynomialAt(s: readonly number[], x: ComplexNumber): ComplexNumber {
  let sum: ComplexNumber = { re: 0, im: 0 };
  for (let k = s.length - 1; k >= 0; k--) sum = cadd(cmul(sum, x), { re: s[k] ?? 0, im: 0 });
  return sum;
}
