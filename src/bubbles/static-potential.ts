/**
 * @module The static potential in coordinate space in the large-β0 limit, V(r) = −(C_F/r) X.
 *
 *   X = (1/β0) ∫ du e^(−u/a) e^(5u/3) (μr)^(2u) b(u),  b(u) = Γ(1/2+u)Γ(1/2−u)/[π Γ(1+2u)] = 1/[cos(πu) Γ(1+2u)]
 *     = (2/π) ∫_0^∞ dt/t sin t · t^(−2u).
 * The part t < T of the integral is the sum over the poles u = 1/2 + k, scaled by T^(2u): residues −(−1)^k/(π (2k+1)!).
 * Its Laplace integral is (2/π) ∫_T^∞ dt sin t/(t(L + 2 ln t)) = (2/π) Im [i e^(iT) ∫_0^∞ ds e^(−s)/(t(L + 2 ln t))], t = T + is.
 *
 * Bound      of the integral over s: on a panel's ellipse Re t >= T − hB = δ, so the integrand is at most
 *            e^(−Re s)/(δ(L + 2 ln δ)); beyond the last panel e^(−s)/(T(L + 2 ln T)).
 * Reference  U. Aglietti, Z. Ligeti, Phys. Lett. B 364 (1995) 75, hep-ph/9503209 (formula from memory; in momentum space the
 *            chain is geometric, which fixes it).
 */
import { C, R, Rational, cexp, clog, pi, sinCos } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import { gaussLegendre } from './gauss-legendre.js';
import { PLAIN } from './tower.js';
import type { Component, Tower } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);

/** T: momenta above T/r are integrated, those below summed. A choice of speed. */
const SPLIT = 12;
/** Parameter of the ellipses; their half-height is the distance from T to δ. */
const RHO = 3;
const DELTA = 1.5;
/** Lengths of rules come in steps, so that few of them are made. */
const STEP = 16;
const WIDTH = (RHO + 1 / RHO) / 2;
const HEIGHT = (RHO - 1 / RHO) / 2;

const factorials: bigint[] = [1n];
function factorial(n: number): bigint {
  for (let k = factorials.length; k <= n; k++) factorials.push(factorials[k - 1]! * BigInt(k));
  return factorials[n]!;
}

const INFRARED: Tower = {
  side: 'infrared',
  first: q(1, 2),
  parts: (k) => [Rational.of(k % 2 === 0 ? -1 : 1, factorial(2 * k + 1))],
  decay: {
    kind: 'geometric',
    // T²/((2k+2)(2k+3)) <= 1/2 from here on.
    ratio: 0.5,
    from: 8,
    bound: (k) => Math.exp((2 * k + 1) * Math.log(SPLIT) - Math.log(Number(factorial(2 * k + 1)))) * 1.001,
  },
};

/** e^(−s)/(t (L + 2 ln t)). */
function integrand(s: Ball, L: Ball, prec: number): Complex {
  const t: Complex = { re: R.fromNumber(SPLIT), im: s };
  const log = C.mul2exp(clog(t, prec), 1);
  const below = C.mul(t, { re: R.add(log.re, L, prec), im: log.im }, prec);
  return C.div(cexp(C.fromReal(R.neg(s)), prec), below, prec);
}

/** ∫_0^∞ ds e^(−s)/(t (L + 2 ln t)) in panels of one length, each with as many points as it needs. */
function tail(L: Ball, prec: number): Complex {
  const half = (SPLIT - DELTA) / HEIGHT;
  const length = R.toNumber(L);
  const top = 1 / (DELTA * (length * 0.999 + 2 * Math.log(DELTA)));
  let sum: Complex = C.ZERO;
  let end = 0;
  for (; end * Math.LOG2E < prec + 2; end += 2 * half) {
    const centre = end + half;
    const bits = (half * WIDTH - centre) * Math.LOG2E + Math.log2(top);
    const least = (prec + bits + 5) / (2 * Math.log2(RHO)) + 1;
    const n = STEP * Math.max(1, Math.ceil(least / STEP));
    let panel: Complex = C.ZERO;
    for (const { x, weight } of gaussLegendre(n, prec)) {
      const s = R.add(R.fromNumber(centre), R.mul(R.fromNumber(half), x, prec), prec);
      panel = C.add(panel, C.mulReal(integrand(s, L, prec), weight, prec), prec);
    }
    const error = bits + 3 + (1 - 2 * n) * Math.log2(RHO) - Math.log2(RHO - 1);
    sum = C.add(sum, C.mulReal(withError(panel, error), R.fromNumber(half), prec), prec);
  }
  return withError(sum, -end * Math.LOG2E);
}

const withError = (z: Complex, bits: number): Complex => ({
  re: R.addError(z.re, 1, Math.ceil(bits)),
  im: R.addError(z.im, 1, Math.ceil(bits)),
});

/** 2 ∫_T^∞ dt sin t/(t(L + 2 ln t)). */
function restLaplace(L: Ball, prec: number): Ball {
  const integral = tail(L, prec);
  const { sin, cos } = sinCos(R.fromNumber(SPLIT), prec);
  // Im [i (cos T + i sin T) I] = Re[(cos T + i sin T) I].
  const real = R.sub(R.mul(cos, integral.re, prec), R.mul(sin, integral.im, prec), prec);
  return R.mul2exp(real, 1);
}

/** sin √τ. */
const sineOfRoot = (tau: Rational, prec: number): Ball =>
  sinCos(R.sqrt(R.fromRational(tau, prec + 16), prec + 16), prec).sin;

export const POTENTIAL: Component = {
  factor: { rational: q(1), pi: -1 },
  kernel: PLAIN,
  base: q(SPLIT * SPLIT),
  poles: [],
  towers: [INFRARED],
  rest: {
    laplace: (L, prec) => R.div(restLaplace(L, prec), pi(prec), prec),
    distribution: (tau, prec) => R.div(sineOfRoot(tau, prec), pi(prec), prec),
    // Yukawa's potential: r = e^(−√z).
    massiveGluon: (logZ) => {
      const root = Math.exp(logZ / 2);
      return { difference: Math.expm1(-root), slope: (-root / 2) * Math.exp(-root) };
    },
  },
};
