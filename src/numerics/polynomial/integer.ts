/**
 * @module Polynomials with integer coefficients: the representation inside every exact algorithm on rationals.
 *
 * Purpose    exact arithmetic without a greatest common divisor per coefficient.
 * Method     ascending coefficient arrays of BigInt without trailing zeros; [] is the zero polynomial.
 * Bound      exact.
 * Reference  J. von zur Gathen, J. Gerhard, "Modern Computer Algebra", chapters 2 and 6.
 */
import { bitLength } from '../bits.js';
import { gcdBigInt } from '../rational.js';

/** Ascending integer coefficients, last one non-zero; [] for the zero polynomial. */
export type IntPoly = readonly bigint[];

/** Drops trailing zeros. */
export function trimInt(a: readonly bigint[]): IntPoly {
  let n = a.length;
  while (n > 0 && a[n - 1] === 0n) n--;
  return n === a.length ? a : a.slice(0, n);
}

/** Degree; -1 for the zero polynomial. */
export const degreeInt = (a: IntPoly): number => a.length - 1;

export function addInt(a: IntPoly, b: IntPoly): IntPoly {
  const n = Math.max(a.length, b.length);
  const out: bigint[] = new Array<bigint>(n);
  for (let i = 0; i < n; i++) out[i] = (a[i] ?? 0n) + (b[i] ?? 0n);
  return trimInt(out);
}

export const negInt = (a: IntPoly): IntPoly => a.map((c) => -c);

export const subInt = (a: IntPoly, b: IntPoly): IntPoly => addInt(a, negInt(b));

export const scaleInt = (a: IntPoly, k: bigint): IntPoly => (k === 0n ? [] : a.map((c) => c * k));

/** Product, or its first `length` coefficients. */
export function mulInt(a: IntPoly, b: IntPoly, length = Infinity): IntPoly {
  if (a.length === 0 || b.length === 0) return [];
  const n = Math.min(length, a.length + b.length - 1);
  const out = new Array<bigint>(n).fill(0n);
  for (let i = 0; i < Math.min(a.length, n); i++) {
    const x = a[i]!;
    if (x === 0n) continue;
    const top = Math.min(b.length, n - i);
    for (let j = 0; j < top; j++) out[i + j]! += x * b[j]!;
  }
  return trimInt(out);
}

export const derivativeInt = (a: IntPoly): IntPoly => trimInt(a.slice(1).map((c, i) => c * BigInt(i + 1)));

/** gcd of the coefficients, non-negative; 0 for the zero polynomial. */
export function contentInt(a: readonly bigint[]): bigint {
  // Starting from the shortest coefficient keeps every later step a single short division.
  let start = -1;
  let best = Infinity;
  for (let i = 0; i < a.length; i++) {
    if (a[i] === 0n) continue;
    const bits = bitLength(a[i]!);
    if (bits < best) [start, best] = [i, bits];
  }
  if (start < 0) return 0n;
  let g = a[start]! < 0n ? -a[start]! : a[start]!;
  for (let i = 0; i < a.length && g !== 1n; i++) if (i !== start) g = gcdBigInt(a[i]! % g, g);
  return g;
}

/** a over its content, leading coefficient positive. */
export function primitiveInt(a: IntPoly): IntPoly {
  if (a.length === 0) return a;
  let g = contentInt(a);
  if (a[a.length - 1]! < 0n) g = -g;
  return g === 1n ? a : a.map((c) => c / g);
}

/** a/b when b divides a over the integers, else undefined. b must not be zero. */
export function divideExactInt(a: IntPoly, b: IntPoly): IntPoly | undefined {
  if (b.length === 0) throw new RangeError('divideExactInt: division by the zero polynomial');
  if (a.length === 0) return [];
  if (a.length < b.length) return undefined;
  const lead = b[b.length - 1]!;
  const rest = a.slice();
  const quotient = new Array<bigint>(a.length - b.length + 1);
  for (let k = a.length - b.length; k >= 0; k--) {
    const top = rest[k + b.length - 1]!;
    const c = top / lead;
    if (c * lead !== top) return undefined;
    quotient[k] = c;
    if (c !== 0n) for (let j = 0; j < b.length - 1; j++) rest[k + j]! -= c * b[j]!;
  }
  for (let j = 0; j < b.length - 1; j++) if (rest[j] !== 0n) return undefined;
  return quotient;
}

/** Sign of a(num/den), den > 0, by Horner's rule on den^deg·a(num/den). */
export function signAtInt(a: IntPoly, num: bigint, den: bigint): -1 | 0 | 1 {
  let value = 0n;
  let power = 1n;
  for (let i = a.length - 1; i >= 0; i--) {
    value = value * num + a[i]! * power;
    power *= den;
  }
  return value > 0n ? 1 : value < 0n ? -1 : 0;
}

/** a(x + 1): n²/2 additions (Horner's triangle). */
export function shiftByOneInt(a: IntPoly): IntPoly {
  const c = a.slice();
  const n = c.length;
  for (let i = 0; i < n - 1; i++) for (let j = n - 2; j >= i; j--) c[j]! += c[j + 1]!;
  return c;
}

/** Sum of the bits of the largest coefficient; a size measure. */
export function heightBits(a: IntPoly): number {
  let bits = 0;
  for (const c of a) bits = Math.max(bits, bitLength(c));
  return bits;
}
