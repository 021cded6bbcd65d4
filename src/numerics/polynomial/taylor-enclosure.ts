/**
 * @module Taylor coefficients of a polynomial at a certified root, enclosed.
 *
 * Purpose    residues: p(ζ) and q'(ζ) for every point ζ of a box, without the loss of ball arithmetic on high powers.
 * Method     f_k = f^(k)/k! is evaluated in fixed point at the exact centre c of the box; the box is treated as the disc
 *            |ζ − c| <= r around it.
 * Bound      |f_k(ζ) − f_k(c)| <= (k+1) r |f_{k+1}(c)| + C(k+2, 2) r² Σ_j |coefficient_j of f_{k+2}| (|c| + r)^j
 *            (Taylor's formula: f_k'' = (k+1)(k+2) f_{k+2}), plus the errors of evaluation. The bounds are base-2
 *            logarithms in doubles, each rounded up by MARGIN.
 * Reference  L. Ahlfors, "Complex Analysis", section 4.3.1; N. J. Higham, "Accuracy and Stability of Numerical
 *            Algorithms", section 5.1.
 */
import * as C from '../ball/complex.js';
import type { Complex } from '../ball/complex.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { shift } from '../bits.js';
import {
  evaluateAt,
  log2Length,
  scaleCoefficients,
  usefulBits,
  valueErrorBound,
  type ScaledCoefficients,
} from './scaled-polynomial.js';

/** Far above the rounding of a few hundred logarithms. */
const MARGIN = 2 ** -20;
/** Working bits beyond what the radii of the coefficients make useful. */
const SPARE_BITS = 64;

/** A box as a disc around a centre (re + i·im)·2^(exp − w) with modulus near 2^exp; log2 of its radius. */
interface Disc {
  readonly re: bigint;
  readonly im: bigint;
  readonly exp: number;
  readonly w: number;
  readonly radius: number;
}

/** f_0, f_1, … of one polynomial, prepared for many points. */
export class TaylorEnclosure {
  private readonly rows: (readonly Ball[])[];
  private readonly scaled = new Map<string, ScaledCoefficients>();

  constructor(coefficients: readonly Ball[]) {
    let n = coefficients.length;
    while (n > 0 && R.isExactZero(coefficients[n - 1]!)) n--;
    this.rows = [coefficients.slice(0, n)];
  }

  /** f^(k)/k! for every point of the box, evaluated with w bits. */
  coefficient(k: number, box: Complex, w: number): Complex {
    if (this.row(k).length === 0) return C.ZERO;
    const exp = sizeOf(box);
    if (exp === -Infinity) return C.fromReal(this.row(k)[0]!);
    const disc = discOf(box, exp, Math.min(w, usefulBits(this.row(k), exp) + SPARE_BITS));
    const value = this.evaluate(k, disc);
    const slope = this.row(k + 1).length === 0 ? -Infinity : this.evaluate(k + 1, disc).size + Math.log2(k + 1);
    const curve = this.sumOfModuli(k + 2, disc) + Math.log2(((k + 1) * (k + 2)) / 2);
    const error = log2Sum(slope + disc.radius, curve + 2 * disc.radius) + MARGIN;
    const part = (v: bigint): Ball => addLog2Error(R.ball(v, value.unit, value.error), error);
    return { re: part(value.re), im: R.isExactZero(box.im) ? R.ZERO : part(value.im) };
  }

  /** Coefficients C(j+k, k) a_{j+k} of f_k. */
  private row(k: number): readonly Ball[] {
    while (this.rows.length <= k) {
      const order = this.rows.length;
      this.rows.push(
        this.rows[0]!.slice(order).map((c, j) => R.mul(c, R.fromNumber(binomial(j + order, order)), Infinity)),
      );
    }
    return this.rows[k]!;
  }

  private evaluate(k: number, disc: Disc) {
    const key = `${k},${disc.exp},${disc.w}`;
    let s = this.scaled.get(key);
    if (s === undefined) this.scaled.set(key, (s = scaleCoefficients(this.row(k), disc.exp, disc.w)));
    const { re, im } = evaluateAt(s, disc.re, disc.im, false);
    const error = valueErrorBound(s, 2 ** (modulusLog(disc) - disc.exp), false);
    return { re, im, unit: s.unit, error, size: log2Sum(log2Length(re, im), Math.log2(error)) + s.unit };
  }

  /** log2 of Σ_j |coefficient_j of f_k| (|c| + r)^j, rounded up. */
  private sumOfModuli(k: number, disc: Disc): number {
    const reach = log2Sum(modulusLog(disc), disc.radius);
    let sum = -Infinity;
    this.row(k).forEach((c, j) => (sum = log2Sum(sum, R.upperBits(c) + j * reach)));
    return sum;
  }
}

function binomial(n: number, k: number): bigint {
  let out = 1n;
  for (let i = 1; i <= k; i++) out = (out * BigInt(n - k + i)) / BigInt(i);
  return out;
}

/** Nearest integer to log2 of the modulus of the centre; −Infinity for the exact point 0. */
function sizeOf({ re, im }: Complex): number {
  return Math.round(R.isExactZero(re) ? logOf(im) : R.isExactZero(im) ? logOf(re) : Math.max(logOf(re), logOf(im)));
}

/** The disc around a box whose centre has modulus near 2^exp. */
function discOf({ re, im }: Complex, exp: number, w: number): Disc {
  const lost = re.exp < exp - w || im.exp < exp - w ? exp - w + 0.5 : -Infinity;
  const box = log2Sum(2 * (Math.log2(re.rad) + re.exp), 2 * (Math.log2(im.rad) + im.exp)) / 2;
  return {
    re: shift(re.mid, re.exp - exp + w),
    im: shift(im.mid, im.exp - exp + w),
    exp,
    w,
    radius: log2Sum(box, lost) + MARGIN,
  };
}

const logOf = (a: Ball): number => log2Length(a.mid, 0n) + a.exp;

const modulusLog = (disc: Disc): number => log2Length(disc.re, disc.im) - disc.w + disc.exp + MARGIN;

/** log2(2^a + 2^b), rounded up by far more than its error. */
function log2Sum(a: number, b: number): number {
  const top = Math.max(a, b);
  if (top === -Infinity || top === Infinity) return top;
  return top + Math.log2(1 + 2 ** (Math.min(a, b) - top)) + 2 ** -40 * Math.max(1, Math.abs(top));
}

/** Adds 2^e to the radius. */
function addLog2Error(a: Ball, e: number): Ball {
  if (e === -Infinity) return a;
  if (!(e < Infinity)) return R.INDETERMINATE;
  const whole = Math.floor(e);
  return R.addError(a, 2 ** (e - whole), whole);
}
