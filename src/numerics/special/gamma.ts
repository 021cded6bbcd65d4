/**
 * @module Γ and 1/Γ on the real line.
 *
 * Purpose    normalisations of every kernel; 1/Γ is entire and exact zero at the poles of Γ.
 * Method     x > 0: at moderate size and precision Taylor polynomials of 1/Γ (gamma-taylor.ts) and a rising product; otherwise
 *            Γ(x) = exp(log Γ(X))/(x(x+1)…(x+n−1)) (stirling.ts). x <= 0: reflection, DLMF 5.5.3, with sin πx reduced
 *            exactly, so that the neighbourhood of a pole keeps its relative accuracy. Small integers: factorials.
 * Bound      a radius r changes Γ by at most |Γ(m)|·(e^(r·sup|ψ|) − 1), |ψ(x)| <= |log x| + 1/x for x > 0.
 */
import { shift } from '../bits.js';
import { pi } from '../ball/constants.js';
import { exp, expm1, sinCosPi } from '../ball/elementary.js';
import { wordPrec } from '../ball/fixed.js';
import { magBits, magRadius, magToNumber, magUpper, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { reciprocalGamma, TAYLOR_LIMIT } from './gamma-taylor.js';
import { psiBound, shiftedLogGamma } from './log-gamma.js';
import { risingProduct } from './stirling.js';

/** Heuristic: exact integers up to this are done by multiplication. */
const FACTORIAL_LIMIT = 256n;
/** Guard bits of the Taylor polynomials: their error stays below 2^11 units. */
const TAYLOR_GUARD = 16;
/** Heuristic: Taylor polynomials with a rising product serve up to this x. */
const TAYLOR_STEPS = { least: 16, slope: 0.1 } as const;
/** Γ of arguments beyond 2^HUGE_BITS is not followed. */
const HUGE_BITS = 40;

/** Γ(x); INDETERMINATE on a ball that holds 0, −1, −2, … (or exceeds 2^40). */
export function gamma(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return R.INDETERMINATE;
  if (R.isPositive(x)) return positive(x, prec);
  return R.div(R.ONE, rgamma(x, prec + 6), prec);
}

/** 1/Γ(x), entire. */
export function rgamma(x: Ball, prec: number): Ball {
  if (x.rad === Infinity) return R.INDETERMINATE;
  if (R.isPositive(x)) {
    if (R.upperBits(x) > HUGE_BITS) {
      // x > 2^38 gives Γ(x) > 2^x: next to nothing.
      return R.isPositive(R.sub(x, R.mul2exp(R.ONE, HUGE_BITS - 2), 64))
        ? R.ball(0n, -(2 ** (HUGE_BITS - 2)), 1)
        : R.INDETERMINATE;
    }
    return R.div(R.ONE, positive(x, prec + 6), prec);
  }
  // 1/Γ(x) = Γ(1−x) sin(πx)/π
  const { sin } = sinCosPi(x, prec + 8);
  if (R.isExactZero(sin)) return R.ZERO;
  const other = R.sub(R.ONE, x, x.rad === 0 ? 1e9 : prec + 80);
  if (!R.isPositive(other)) return R.INDETERMINATE;
  return R.div(R.mul(positive(other, prec + 8), sin, prec + 6), pi(prec + 8), prec);
}

function positive(x: Ball, prec: number): Ball {
  if (R.upperBits(x) > HUGE_BITS) return R.INDETERMINATE;
  const y = exactPositive(R.exactMid(x), prec);
  if (x.rad === 0) return y;
  const growth = mulMag(psiBound(x), magRadius(x));
  if (magBits(growth) < -2) {
    const t = magToNumber(growth);
    return widenMag(y, mulMag(magUpper(y), { m: growth.m * (1 + t), e: growth.e }));
  }
  return R.addRelativeError(
    y,
    R.toNumber(expm1(R.ball(BigInt(Math.ceil(magToNumber(growth) * 1024)), -10), 40)) * 1.001,
  );
}

function exactPositive(x: Ball, prec: number): Ball {
  if (x.exp >= 0 && x.mid << BigInt(x.exp) <= FACTORIAL_LIMIT)
    return R.round(R.fromNumber(factorial(Number(x.mid << BigInt(x.exp)) - 1)), prec);
  const wp = wordPrec(prec + TAYLOR_GUARD);
  if (wp <= TAYLOR_LIMIT && R.toNumber(x) < TAYLOR_STEPS.least + TAYLOR_STEPS.slope * wp) {
    const fixed = shift(x.mid, x.exp + wp);
    const w = BigInt(wp);
    const m = (fixed + (1n << (w - 1n))) >> w;
    const u = fixed - (m << w);
    const reciprocal = reciprocalGamma(u, wp);
    if (reciprocal !== undefined) return byTaylor(x, Number(m), u, reciprocal, wp, prec);
  }
  const g = shiftedLogGamma(x, prec + 14);
  // The logarithm's absolute error is the relative error of Γ.
  return R.div(exp(g.log, prec + 8), g.product, prec);
}

/** x = m + u: Γ(x) = (u+1)…(u+m−1)/(1/Γ(1+u)) for m >= 1, and 1/(x·1/Γ(1+x)) for m = 0; u in units of 2^-wp. */
function byTaylor(
  x: Ball,
  m: number,
  u: bigint,
  { value, ulps }: { value: bigint; ulps: number },
  wp: number,
  prec: number,
): Ball {
  // u is off by less than a unit, and |d/du 1/Γ(1+u)| <= 1.2 on [−1/2, 1/2]
  const f = R.ball(value, -wp, ulps + 2);
  if (m === 0) return R.div(R.ONE, R.mul(x, f, prec + 8), prec);
  if (m === 1) return R.div(R.ONE, f, prec);
  // u may be negative: start from u + 1
  const v = u + (1n << BigInt(wp));
  if (m === 2) return R.div(R.ball(v, -wp, 1), f, prec);
  const p = risingProduct(v, wp, m - 2);
  const product = R.mul(R.ball(p.mid, p.exp, m * 2 ** 6), R.ball(v, -wp, 1), wp);
  return R.div(product, f, prec);
}

const factorials: bigint[] = [1n];
function factorial(n: number): bigint {
  while (factorials.length <= n) factorials.push(factorials[factorials.length - 1]! * BigInt(factorials.length));
  return factorials[n]!;
}
