/**
 * @module Exact rational numbers on BigInt. Always reduced, denominator positive.
 * Purpose: coefficients as the file states them, and every algorithm that must decide "is it zero".
 */
import { gcdBigInt } from './integer-gcd.js';

/** Greatest common divisor of two integers, non-negative. */
export { gcdBigInt };

/** Longest run of digits and largest decimal exponent accepted by `Rational.parse`; a file that needs more is hostile. */
export const PARSE_LIMITS = { digits: 20_000, exponent: 20_000 } as const;

const DECIMAL = /^([+-]?)(\d*)(?:\.(\d*))?(?:[eE]([+-]?\d+))?$/;

/** n without its factors p, at most `most` of them, and how many were removed; squaring p keeps the steps few. */
function withoutFactor(n: bigint, p: bigint, most: number): [rest: bigint, removed: number] {
  if (most <= 0 || n % p !== 0n) return [n, 0];
  const [rest, squares] = withoutFactor(n / p, p * p, Math.floor((most - 1) / 2));
  const removed = 1 + 2 * squares;
  return removed < most && rest % p === 0n ? [rest / p, removed + 1] : [rest, removed];
}

export class Rational {
  readonly num: bigint;
  readonly den: bigint;

  private constructor(num: bigint, den: bigint) {
    this.num = num;
    this.den = den;
  }

  static readonly ZERO = new Rational(0n, 1n);
  static readonly ONE = new Rational(1n, 1n);

  /** num/den in lowest terms. Throws RangeError when den is 0. Numbers must be safe integers. */
  static of(num: bigint | number, den: bigint | number = 1n): Rational {
    let n = BigInt(num);
    let d = BigInt(den);
    if (d === 0n) throw new RangeError('Rational.of: denominator is zero');
    if (d < 0n) {
      n = -n;
      d = -d;
    }
    if (d === 1n) return new Rational(n, 1n);
    const g = gcdBigInt(n, d);
    return g === 1n ? new Rational(n, d) : new Rational(n / g, d / g);
  }

  /** num/den that the caller knows to be in lowest terms with den > 0; nothing is checked. */
  static ofReduced(num: bigint, den: bigint): Rational {
    return new Rational(num, den);
  }

  /** The exact value of a double. Throws RangeError for NaN and infinities. */
  static fromNumber(x: number): Rational {
    if (!Number.isFinite(x)) throw new RangeError(`Rational.fromNumber: ${x} is not finite`);
    if (Number.isInteger(x)) return new Rational(BigInt(x), 1n);
    let e = 0;
    while (!Number.isInteger(x)) {
      x *= 2;
      e++;
    }
    return Rational.of(BigInt(x), 1n << BigInt(e));
  }

  /**
   * Exact value of `-12.5e-3`, `365/24` or `1.5/2`; undefined when the text is not of that form,
   * divides by zero, or passes PARSE_LIMITS.
   */
  static parse(text: string): Rational | undefined {
    const s = text.trim();
    const slash = s.indexOf('/');
    if (slash >= 0) {
      const a = Rational.parse(s.slice(0, slash));
      const b = Rational.parse(s.slice(slash + 1));
      return a === undefined || b === undefined || b.num === 0n ? undefined : a.div(b);
    }
    if (s.length > PARSE_LIMITS.digits) return undefined;
    const m = DECIMAL.exec(s);
    if (m === null) return undefined;
    const [, sign, whole = '', fraction = '', exponent = '0'] = m;
    if (whole === '' && fraction === '') return undefined;
    const e = Number(exponent) - fraction.length;
    if (Math.abs(Number(exponent)) > PARSE_LIMITS.exponent) return undefined;
    const n = BigInt(whole + fraction);
    return Rational.ofDecimal(sign === '-' ? -n : n, e);
  }

  /** n·10^e in lowest terms. Only factors 2 and 5 can cancel, which spares the general divisor of two long integers. */
  static ofDecimal(n: bigint, e: number): Rational {
    if (e >= 0 || n === 0n) return new Rational(e > 0 ? n * 10n ** BigInt(e) : n, 1n);
    const [two, twos] = withoutFactor(n, 2n, -e);
    const [rest, fives] = withoutFactor(two, 5n, -e);
    return new Rational(rest, 2n ** BigInt(-e - twos) * 5n ** BigInt(-e - fives));
  }

  add(b: Rational): Rational {
    return this.den === b.den
      ? Rational.of(this.num + b.num, this.den)
      : Rational.of(this.num * b.den + b.num * this.den, this.den * b.den);
  }
  sub(b: Rational): Rational {
    return this.add(b.neg());
  }
  mul(b: Rational): Rational {
    return Rational.of(this.num * b.num, this.den * b.den);
  }
  /** Throws RangeError when b is zero. */
  div(b: Rational): Rational {
    return Rational.of(this.num * b.den, this.den * b.num);
  }
  neg(): Rational {
    return new Rational(-this.num, this.den);
  }
  abs(): Rational {
    return this.num < 0n ? this.neg() : this;
  }
  inv(): Rational {
    return Rational.of(this.den, this.num);
  }
  /** Integer power; a negative power of zero throws RangeError. */
  pow(n: number): Rational {
    if (n < 0) return this.inv().pow(-n);
    return new Rational(this.num ** BigInt(n), this.den ** BigInt(n));
  }

  sign(): -1 | 0 | 1 {
    return this.num > 0n ? 1 : this.num < 0n ? -1 : 0;
  }
  isZero(): boolean {
    return this.num === 0n;
  }
  isInteger(): boolean {
    return this.den === 1n;
  }
  cmp(b: Rational): -1 | 0 | 1 {
    const d = this.num * b.den - b.num * this.den;
    return d > 0n ? 1 : d < 0n ? -1 : 0;
  }
  equals(b: Rational): boolean {
    return this.num === b.num && this.den === b.den;
  }
  /** Largest integer not above the value. */
  floor(): bigint {
    const q = this.num / this.den;
    return this.num < 0n && q * this.den !== this.num ? q - 1n : q;
  }

  /** A double within a relative 3·2^-53 of the value; ±Infinity or 0 outside the range of doubles. */
  toNumber(): number {
    if (this.num === 0n) return 0;
    const direct = Number(this.num) / Number(this.den);
    if (Number.isFinite(direct) && Math.abs(direct) > 1e-290 && Number.isFinite(Number(this.den))) return direct;
    // 64 quotient bits, then scale by a power of two in two halves (either alone may leave the range).
    const shift = this.den.toString(16).length * 4 - this.num.toString(16).length * 4 + 80;
    const q = shift >= 0 ? (this.num << BigInt(shift)) / this.den : this.num / (this.den << BigInt(-shift));
    const half = Math.trunc(shift / 2);
    return Number(q) * 2 ** -half * 2 ** -(shift - half);
  }

  /** "p/q", or "p" for an integer. Parses back to the same value. */
  toString(): string {
    return this.den === 1n ? this.num.toString() : `${this.num}/${this.den}`;
  }
  toJSON(): string {
    return this.toString();
  }
}
