/**
 * @module From balls to decimals: raising the precision until digits are certain, and printing certain digits only.
 *
 * Purpose    the last step of every certified number: no digit is shown that the radius does not guarantee.
 * Method     a digit string of n digits is printed when both ends of the ball round to it (then so does every point between).
 * Bound      the printed value differs from every point of the ball by at most half a unit of its last digit.
 */
import { bitLength, shift } from './bits.js';
import { ln2 } from './ball/constants.js';
import { exp, log } from './ball/elementary.js';
import * as R from './ball/real.js';
import type { Ball } from './ball/real.js';

const LOG2_10 = Math.log2(10);
/** Precision never exceeds this multiple of the first attempt … */
const CAP_FACTOR = 16;
/** … plus this many bits: a value that cannot be told from zero by then is returned as it is. */
const CAP_BITS = 4096;
/** Binary exponents beyond this are brought into range by a logarithm instead of exact integers. */
const EXACT_EXPONENT = 1 << 16;
/** Decimal exponents printed in positional notation. */
const POSITIONAL = { from: -6, below: 15 } as const;

/** Number of decimal digits that the ball certainly holds (0 when it may be zero; Infinity when exact and not zero). */
export function certainDigits(a: Ball): number {
  const bits = R.accuracyBits(a);
  return bits === Infinity ? Infinity : Math.max(0, Math.floor((bits - 1) / LOG2_10));
}

/**
 * Evaluates with growing precision (bits) until the result holds `digits` certain decimal digits, is exact, or the cap is
 * reached. Returns the sharpest ball met; the caller looks at its radius.
 */
export function raisePrecision(digits: number, evaluate: (prec: number) => Ball): Ball {
  const want = Math.ceil(digits * LOG2_10) + 2;
  const cap = CAP_FACTOR * want + CAP_BITS;
  let best = R.INDETERMINATE;
  for (let prec = want + 8; ;) {
    const value = evaluate(prec);
    if (best.rad === Infinity || R.radiusBits(value) < R.radiusBits(best)) best = value;
    const lack = want - R.accuracyBits(best);
    if (!(lack > 0) || prec >= cap) return best;
    // The lack is what was lost; when nothing is certain yet, double.
    prec = Math.min(cap, prec + Math.ceil(Math.min(lack + 8, prec)));
  }
}

export interface DecimalText {
  /** The number; `±1e-40` (a bound on the size) when not even one digit is certain. */
  readonly text: string;
  /** How many significant digits the text holds, all of them certain. */
  readonly certainDigits: number;
}

/**
 * Up to `digits` significant digits of a ball, as many as are certain. Ties of exact numbers go away from zero. Positional
 * notation from 1e-6 to below 1e15 unless that would need digits that are not certain; exponent notation elsewhere.
 * An exact number that ends sooner is printed without trailing zeros.
 */
export function toDecimal(a: Ball, digits: number): DecimalText {
  if (R.isExactZero(a)) return { text: '0', certainDigits: digits };
  if (a.rad === Infinity) return { text: '±Infinity', certainDigits: 0 };
  if (R.containsZero(a)) return bound(a);
  if (Math.abs(a.exp + bitLength(a.mid)) > EXACT_EXPONENT) return remote(a, digits);
  const start = Math.max(1, Math.floor(digits));
  const known = Math.min(start, Math.max(1, certainDigits(a) + 2));
  for (let n = known; n >= 1; n--) {
    const found = roundBoth(a, n);
    if (found !== undefined) return { text: write(found, n), certainDigits: n };
  }
  // Next to a tie a longer string can be certain where the short one is not.
  for (let n = start + 1; n <= start + 3; n++) {
    const found = roundBoth(a, n);
    if (found !== undefined) return { text: write(found, n), certainDigits: n };
  }
  return bound(a);
}

/** Sign, digits and decimal exponent of the first digit. */
interface Digits {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
  /** The ball is a single point and this is it. */
  readonly exact: boolean;
}

/** The n-digit decimal that all points of the ball round to, if there is one. */
function roundBoth(a: Ball, n: number): Digits | undefined {
  const negative = a.mid < 0n;
  const mid = negative ? -a.mid : a.mid;
  let low = mid;
  let high = mid;
  let e = a.exp;
  if (a.rad > 0) {
    // The radius as an integer in finer units, rounded up.
    const k = Math.max(0, 40 - Math.floor(Math.log2(a.rad)));
    const r = shift(BigInt(Math.ceil(a.rad * 2 ** Math.min(k, 900))), k - Math.min(k, 900)) + 1n;
    low = (mid << BigInt(k)) - r;
    high = (mid << BigInt(k)) + r;
    e -= k;
  }
  // First digit's exponent from the upper end; a lower end that starts one place lower is the same string or none.
  let d = Math.floor((bitLength(high) + e) / LOG2_10) + 1;
  while (scaled(high, e, n - 1 - d, false) < 10n ** BigInt(n - 1)) d--;
  const top = scaled(high, e, n - 1 - d, true);
  if (scaled(low, e, n - 1 - d, true) !== top) return undefined;
  let text = top.toString();
  if (text.length > n) {
    text = text.slice(0, n); // 9.99 rounded up to 10.0
    d++;
  }
  return { negative, digits: text, exponent: d, exact: a.rad === 0 && isExact(mid, a.exp, text, d) };
}

/** m·2^e·10^p as an integer, to the nearest with ties up, or the floor; m >= 0. */
function scaled(m: bigint, e: number, p: number, nearest: boolean): bigint {
  let num = m;
  let den = 1n;
  if (p >= 0) num *= 10n ** BigInt(p);
  else den = 10n ** BigInt(-p);
  if (e >= 0) num <<= BigInt(e);
  else den <<= BigInt(-e);
  return nearest ? (2n * num + den) / (2n * den) : num / den;
}

/** Is m·2^e = 0.d₁d₂…·10^(d+1) for the digit string? */
function isExact(m: bigint, e: number, digits: string, d: number): boolean {
  const p = digits.length - 1 - d;
  let left = m;
  let right = BigInt(digits);
  if (p >= 0) left *= 10n ** BigInt(p);
  else right *= 10n ** BigInt(-p);
  if (e >= 0) left <<= BigInt(e);
  else right <<= BigInt(-e);
  return left === right;
}

function write(d: Digits, n: number): string {
  let digits = d.digits;
  if (d.exact) digits = digits.replace(/0+$/, '') || '0';
  const sign = d.negative ? '-' : '';
  const x = d.exponent;
  // Positional integers need all their digits; an exact one may be padded with zeros, since these are certain.
  if (x >= POSITIONAL.from && x < POSITIONAL.below && (x < n || d.exact)) {
    if (x < 0) return `${sign}0.${'0'.repeat(-x - 1)}${digits}`;
    const whole = digits.slice(0, x + 1).padEnd(x + 1, '0');
    const rest = digits.slice(x + 1);
    return sign + whole + (rest === '' ? '' : `.${rest}`);
  }
  const rest = digits.slice(1);
  return `${sign}${digits.slice(0, 1)}${rest === '' ? '' : `.${rest}`}e${x}`;
}

/** `±1e-40`: a power of ten above every |x| of the ball. */
function bound(a: Ball): DecimalText {
  const exponent = Math.ceil(R.upperBits(a) / LOG2_10 + 1e-9 * Math.abs(R.upperBits(a)));
  return { text: `±1e${exponent}`, certainDigits: 0 };
}

/** Numbers like 2^(10^9): divided by a power of ten through logarithms, then printed with the exponent put back. */
function remote(a: Ball, digits: number): DecimalText {
  const prec = Math.ceil(digits * LOG2_10) + 40;
  const e = a.exp + bitLength(a.mid);
  const ln10 = log(R.fromNumber(10), prec + 60);
  const d = Math.floor(e / LOG2_10);
  const power = R.sub(
    R.mul(R.fromNumber(e), ln2(prec + 60), prec + 60),
    R.mul(R.fromNumber(d), ln10, prec + 60),
    prec + 60,
  );
  const near = R.mul(R.mul2exp(a, -e), exp(power, prec), prec);
  const text = toDecimal(near, digits);
  if (text.certainDigits === 0) return bound(a);
  const [mantissa, own] = toExponent(text.text);
  return { text: `${mantissa}e${Number(own) + d}`, certainDigits: text.certainDigits };
}

/** Splits a printed number near 1 into mantissa with one leading digit and exponent. */
function toExponent(text: string): [string, string] {
  const negative = text.startsWith('-');
  const plain = negative ? text.slice(1) : text;
  const [whole = '', rest = ''] = plain.split('.');
  const all = whole + rest;
  const lead = all.search(/[1-9]/);
  const digits = all.slice(lead);
  const mantissa = digits.slice(0, 1) + (digits.length > 1 ? `.${digits.slice(1)}` : '');
  return [(negative ? '-' : '') + mantissa, String(whole.length - 1 - lead)];
}
