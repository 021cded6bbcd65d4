/**
 * @module Real trigonometric functions: sin and cos together, sin πx and cos πx, atan, atan2.
 *
 * Purpose    enclosures with relative accuracy next to the zeros, as far as the argument allows.
 * Method     sin, cos: reduction to [0, π/4] with as many bits of π as the argument and a near zero need, then sinCosFixed.
 *            sin πx, cos πx: reduction modulo 1/2 is exact.
 *            atan2: with φ the double value of the angle in the first octant, atan(y/x) = φ + artan((yc − xs)/(xc + ys)),
 *            c + is = e^(iφ), with φ cut to 16 bits and e^(iφ) from the tables of sin and cos (beyond them φ in full).
 * Bound      |sin(m+d) − sin m| <= |cos m| r + r²/2, same with sin and cos exchanged; never above 1.
 *            atan2: |dθ| <= ((|x|+rx) ry + (|y|+ry) rx)/min(x² + y²) over the rectangle.
 */
import { bitLength, shift } from '../bits.js';
import { pi, piFixed } from './constants.js';
import { wordPrec } from './fixed.js';
import { FIXED_ULPS, sinCosFixed, sinCosLeading, TABLE_ULPS } from './fixed-tables.js';
import {
  addMag,
  addMagLower,
  divMag,
  magBits,
  magLower,
  magRadius,
  magUpper,
  mulMag,
  mulMagLower,
  widenMag,
} from './mag.js';
import type { Mag } from './mag.js';
import { ODD_ULPS, oddSeries } from './odd-series.js';
import * as R from './real.js';
import type { Ball } from './real.js';

export interface SinCos {
  readonly sin: Ball;
  readonly cos: Ball;
}

const GUARD = 20;
/** Arguments beyond 2^HUGE_BITS are not reduced: the answer is [−1, 1]. */
const HUGE_BITS = 1 << 16;
/** Levels of the tables that make atan's start value, and the working precision up to which they serve (heuristic). */
const START_LEVELS = 2;
const TABLE_START = 4096;
/** A reduced argument this many bits below 1 makes the reduction start again with more bits. */
const NEAR_ZERO = 12;
const UNIT: Ball = { mid: 0n, exp: 0, rad: 1 };
/** [−π, π] and a little. */
const ANY_ANGLE: Ball = { mid: 0n, exp: 0, rad: Math.PI * (1 + 1e-12) };

/** sin and cos of t·2^-wp for t off by `ulps`, turned by n quarter turns; 0 <= t <= π/4. */
function assemble(t: bigint, wp: number, n: number, swap: boolean, ulps: number, prec: number): SinCos {
  let [c, s] = sinCosFixed(t, wp);
  if (swap) [c, s] = [s, c];
  const rad = FIXED_ULPS + ulps;
  const cos = R.ball(n & 1 ? s : c, -wp, rad, prec);
  const sin = R.ball(n & 1 ? c : s, -wp, rad, prec);
  return { sin: n & 2 ? R.neg(sin) : sin, cos: (n + 1) & 2 ? R.neg(cos) : cos };
}

/** Widens sin and cos of a midpoint for a radius r·2^e of the argument. */
function spread(v: SinCos, r: number, e: number): SinCos {
  if (r === 0) return v;
  const step = r * 2 ** Math.max(e, -1000);
  if (!(step < 2)) return { sin: UNIT, cos: UNIT };
  const s = Math.min(1, Math.abs(R.toNumber(v.sin)) * (1 + 1e-12) + R.radiusToNumber(v.sin) + step / 2);
  const c = Math.min(1, Math.abs(R.toNumber(v.cos)) * (1 + 1e-12) + R.radiusToNumber(v.cos) + step / 2);
  return { sin: R.addError(v.sin, c * r, e), cos: R.addError(v.cos, s * r, e) };
}

/** sin x and cos x. */
export function sinCos(x: Ball, prec: number): SinCos {
  const up = R.upperBits(x);
  if (up > HUGE_BITS) return { sin: UNIT, cos: UNIT };
  if (R.isExactZero(x)) return { sin: R.ZERO, cos: R.ONE };
  if (-up > prec / 8 + 4) return tinySinCos(x, -up, prec);
  // More bits than this cannot help: the argument's own radius is larger.
  const useful = x.rad === 0 ? Infinity : Math.max(prec, Math.ceil(-R.radiusBits(x))) + 2 * GUARD;
  const extra = Math.max(0, up) + 4;
  for (let wp = wordPrec(prec + GUARD + Math.max(0, -up)); ;) {
    const quarter = piFixed(wp + extra) >> 1n;
    const a = shift(x.mid, x.exp + wp + extra);
    const n = a < 0n ? (a + 1n) / quarter - 1n : a / quarter;
    const rest = (a - n * quarter) >> BigInt(extra);
    const q = quarter >> BigInt(extra);
    const swap = rest > q >> 1n;
    const t = swap ? q - rest : rest;
    const lost = wp - bitLength(t);
    const want = wordPrec(Math.min(useful, prec + GUARD + lost));
    if (lost > NEAR_ZERO && want > wp) {
      wp = want;
      continue;
    }
    return spread(assemble(t, wp, Number(BigInt.asUintN(2, n)), swap, 8, prec), x.rad, x.exp);
  }
}

/** |x| < 2^-e with e large: sin x = x Σ (−x²)^k/(2k+1)!, cos x = Σ (−x²)^k/(2k)!; tails below 2^(−2en). */
function tinySinCos(x: Ball, e: number, prec: number): SinCos {
  const n = Math.ceil(prec / (2 * e)) + 1;
  const work = prec + 8;
  const x2 = R.neg(R.sqr(x, work));
  let s: Ball = R.ONE;
  let c: Ball = R.ONE;
  for (let k = n; k >= 1; k--) {
    s = R.add(R.ONE, R.div(R.mul(s, x2, work), R.fromNumber(2 * k * (2 * k + 1)), work), work);
    c = R.add(R.ONE, R.div(R.mul(c, x2, work), R.fromNumber(2 * k * (2 * k - 1)), work), work);
  }
  return { sin: R.mul(x, R.addError(s, 1, -2 * e * n), prec), cos: R.round(R.addError(c, 1, -2 * e * n), prec) };
}

/** sin πx and cos πx; exact at multiples of 1/2, relatively accurate next to them. */
export function sinCosPi(x: Ball, prec: number): SinCos {
  if (x.rad === Infinity) return { sin: UNIT, cos: UNIT };
  const r = x.rad * Math.PI * (1 + 1e-12);
  // x = n/2 + f with |f| <= 1/4, exactly.
  let n = 0;
  let f = x.mid;
  if (x.exp >= 0) {
    n = Number(BigInt.asUintN(2, shift(f, x.exp + 1)));
    f = 0n;
  } else if (x.exp <= -2) {
    const half = BigInt(-x.exp - 1);
    const m = (f + (1n << (half - 1n))) >> half;
    n = Number(BigInt.asUintN(2, m));
    f -= m << half;
  } else {
    n = Number(BigInt.asUintN(2, f));
    f = 0n;
  }
  if (f === 0n) return spread(quarterTurn(n), r, x.exp);
  const e = -x.exp - bitLength(f);
  const arg = R.mul(R.ball(f < 0n ? -f : f, x.exp), pi(prec + GUARD), prec + GUARD);
  const base = sinCosSmall(arg, e, prec);
  const v = f < 0n ? { sin: R.neg(base.sin), cos: base.cos } : base;
  const turned: SinCos = n & 1 ? { sin: v.cos, cos: R.neg(v.sin) } : v;
  return spread(n & 2 ? { sin: R.neg(turned.sin), cos: R.neg(turned.cos) } : turned, r, x.exp);
}

/** sin and cos of 0 < x < 0.79, |x| < 2^(2−e). */
function sinCosSmall(x: Ball, e: number, prec: number): SinCos {
  if (e - 2 > prec / 8 + 4) return tinySinCos(x, e - 2, prec);
  const wp = wordPrec(prec + GUARD + Math.max(0, e));
  const v = assemble(shift(x.mid, x.exp + wp), wp, 0, false, 2, prec);
  return spread(v, x.rad, x.exp);
}

function quarterTurn(n: number): SinCos {
  const cycle: Ball[] = [R.ZERO, R.ONE, R.ZERO, R.neg(R.ONE)];
  return { sin: cycle[n & 3]!, cos: cycle[(n + 1) & 3]! };
}

/** Angle in [0, π/2] of the exact point (x, y), x, y >= 0 not both zero. */
function firstQuadrant(y: Ball, x: Ball, prec: number): Ball {
  const steep = R.compare(y, x, 64 + bitLength(x.mid) + bitLength(y.mid)) > 0;
  const [a, b] = steep ? [x, y] : [y, x]; // angle artan(a/b), a <= b
  let angle = R.ZERO;
  if (a.mid !== 0n) {
    const e = R.upperBits(b) - R.upperBits(a); // a/b < 2^(1−e)
    angle = e > 24 ? tinyAtan(R.div(a, b, prec + 8), e - 1, prec) : octant(a, b, Math.max(0, e), prec);
  }
  return steep ? R.sub(R.mul2exp(pi(prec + 4), -1), angle, prec) : angle;
}

/** artan(a/b) for 0 < a/b <= 1, a/b > 2^(−e−1), e <= 24. */
function octant(a: Ball, b: Ball, e: number, prec: number): Ball {
  const wp = wordPrec(prec + GUARD + 4 + e);
  const w = BigInt(wp);
  const scale = R.upperBits(b);
  const y = shift(a.mid, a.exp - scale + wp);
  const x = shift(b.mid, b.exp - scale + wp); // in [1/2, 1)
  const tabled = wp <= TABLE_START;
  const bits = tabled ? 8 * START_LEVELS : 52;
  const start = Math.round(Math.atan(Number((y << 53n) / x) * 2 ** -53) * 2 ** bits);
  const phi = BigInt(start) << BigInt(wp - bits);
  const [c, s] = tabled ? sinCosLeading(start, START_LEVELS, wp) : sinCosFixed(phi, wp);
  const ulps = tabled ? TABLE_ULPS : FIXED_ULPS;
  // Numerator off by at most 2·ulps + 2, denominator at least 1/2: z is right to 5·ulps + 8.
  const z = ((y * c - x * s) << w) / (x * c + y * s);
  return R.ball(phi + oddSeries(z, wp, -1), -wp, 6 * ulps + ODD_ULPS + 16, prec);
}

/** artan z for 0 < z < 2^-e, e >= 20: z Σ (−z²)^k/(2k+1), tail below 2^(−2en). */
function tinyAtan(z: Ball, e: number, prec: number): Ball {
  const n = Math.ceil(prec / (2 * e)) + 1;
  const work = prec + 8;
  const z2 = R.neg(R.sqr(z, work));
  let s: Ball = R.ZERO;
  for (let k = n; k >= 0; k--) {
    s = R.add(R.mul(s, z2, work), R.div(R.ONE, R.fromNumber(2 * k + 1), work), work);
  }
  return R.mul(z, R.addError(s, 1, -2 * e * n), prec);
}

/**
 * Angle of the point (x, y) in (−π, π]. On a rectangle that holds the origin or reaches across the negative x axis the
 * answer is [−π, π]; on the axis itself (y exactly 0, x < 0) it is π.
 */
export function atan2(y: Ball, x: Ball, prec: number): Ball {
  const onAxis = R.isExactZero(y);
  if (onAxis && R.isPositive(x)) return R.ZERO;
  if (onAxis && R.isNegative(x)) return pi(prec);
  if (x.rad === Infinity || y.rad === Infinity) return ANY_ANGLE;
  const cutFree = R.isPositive(x) || !R.containsZero(y);
  if (!cutFree) return ANY_ANGLE;
  const mid = firstQuadrant(R.exactMid(R.abs(y)), R.exactMid(R.abs(x)), prec + 2);
  let angle = x.mid < 0n ? R.sub(pi(prec + 4), mid, prec) : R.round(mid, prec);
  if (y.mid < 0n) angle = R.neg(angle);
  if (x.rad === 0 && y.rad === 0) return angle;
  const bound = angleError(y, x);
  return magBits(bound) < 2 ? widenMag(angle, bound) : ANY_ANGLE;
}

/** Bound (|x| ry + |y| rx)/min(x² + y²) over the rectangle. */
function angleError(y: Ball, x: Ball): Mag {
  const lx = magLower(x);
  const ly = magLower(y);
  const norm = addMagLower(mulMagLower(lx, lx), mulMagLower(ly, ly));
  return divMag(addMag(mulMag(magUpper(x), magRadius(y)), mulMag(magUpper(y), magRadius(x))), norm);
}

/** artan x in (−π/2, π/2). */
export function atan(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return { mid: 0n, exp: -1, rad: ANY_ANGLE.rad };
  return atan2(x, R.ONE, prec);
}
