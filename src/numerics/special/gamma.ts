/**
 * @module Γ and 1/Γ on the real line.
 *
 * Purpose    normalisations of every kernel; 1/Γ is entire and exact zero at the poles of Γ.
 * Method     x > 0: Γ(x) = exp(log Γ(X))/(x(x+1)…(x+n−1)) (stirling.ts). x <= 0: reflection, DLMF 5.5.3, with sin πx reduced
 *            exactly, so that the neighbourhood of a pole keeps its relative accuracy. Small integers: factorials.
 * Bound      a radius r changes Γ by at most |Γ(m)|·(e^(r·sup|ψ|) − 1), |ψ(x)| <= |log x| + 1/x for x > 0.
 */
import { pi } from '../ball/constants.js';
import { exp, expm1, sinCosPi } from '../ball/elementary.js';
import { magBits, magRadius, magToNumber, magUpper, mulMag, widenMag } from '../ball/mag.js';
import * as R from '../ball/real.js';
import type { Ball } from '../ball/real.js';
import { psiBound, shiftedLogGamma } from './log-gamma.js';

/** Heuristic: exact integers up to this are done by multiplication. */
const FACTORIAL_LIMIT = 256n;
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
  const g = shiftedLogGamma(x, prec + 14);
  // The logarithm's absolute error is the relative error of Γ.
  return R.div(exp(g.log, prec + 8), g.product, prec);
}

const factorials: bigint[] = [1n];
function factorial(n: number): bigint {
  while (factorials.length <= n) factorials.push(factorials[factorials.length - 1]! * BigInt(factorials.length));
  return factorials[n]!;
}
