/**
 * @module Order-dependent mapping of an alternating series with known strong-coupling behaviour.
 *
 *   g = ρ λ/(1−λ)^a,   E(g) = (1−λ)^{−σ} Σ_{k≤K} P_k(ρ) λ^k,   P_k(ρ) = Σ_{n≤k} (−1)^{k−n} C(σ−an, k−n) E_n ρ^n.
 * Purpose    E ~ g^{σ/a} with corrections in g^{−1/a} at large g is built in. ρ is the largest positive zero of P_K (the last
 *            term vanishes), or of P_K′ where P_K has none.
 * Method     exact binomials; zeros certified; λ by bisection in doubles and Newton steps, its enclosure proved by a change
 *            of sign of ρλ − g(1−λ)^a, which rises with λ.
 * Bound      enclosure of the truncated sum.
 * Reference  R. Seznec, J. Zinn-Justin, J. Math. Phys. 20 (1979) 1398 (from memory; oscillator energies reproduced).
 */
import { certifiedRoots, pow, R, Rational } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';

export interface StrongCoupling {
  /** s of E ~ g^s at large g. */
  readonly power: Rational;
  /** Spacing of the corrections: g^{s−spacing}, g^{s−2·spacing}, …; positive. */
  readonly spacing: Rational;
}

/** C(p, k) for rational p. */
function binomial(p: Rational, k: number): Rational {
  let value = Rational.ONE;
  for (let i = 0; i < k; i++) value = value.mul(p.sub(Rational.of(i))).div(Rational.of(i + 1));
  return value;
}

/** Exponents a and σ of the map. */
export function mapExponents({ power, spacing }: StrongCoupling): { a: Rational; sigma: Rational } {
  const a = spacing.inv();
  return { a, sigma: power.mul(a) };
}

/** Weights (−1)^{k−n} C(σ−an, k−n), n = 0 … k, of P_k. */
function weights(k: number, a: Rational, sigma: Rational): Rational[] {
  return Array.from({ length: k + 1 }, (_, n) => {
    const c = binomial(sigma.sub(a.mul(Rational.of(n))), k - n);
    return (k - n) % 2 === 0 ? c : c.neg();
  });
}

/** Largest positive real zero of Σ c_n ρ^n; undefined when there is none that is certain. */
function largestPositiveZero(c: readonly Rational[] | readonly Ball[], prec: number): Ball | undefined {
  if (c.length < 2) return undefined;
  const found = certifiedRoots(c, prec);
  if ('failed' in found) return undefined;
  const positive = found.roots.filter((r) => r.real && R.isPositive(r.value.re)).map((r) => r.value.re);
  return positive[positive.length - 1];
}

/** ρ of order K and whether it makes the last term or its slope vanish. */
export function mapScale(
  E: readonly Exact[],
  K: number,
  strong: StrongCoupling,
  prec: number,
): { rho: Ball; of: 'last term' | 'its slope' } | undefined {
  const { a, sigma } = mapExponents(strong);
  const w = weights(K, a, sigma);
  const rationals = E.slice(0, K + 1).map((c) => c.rational);
  const isExact = rationals.every((c) => c !== undefined);
  const exactly = isExact ? w.map((x, n) => x.mul(rationals[n]!)) : undefined;
  const balls = w.map((x, n) => R.mul(R.fromRational(x, prec), E[n]!.ball(prec), prec));
  const zero = largestPositiveZero(exactly ?? balls, prec);
  if (zero !== undefined) return { rho: zero, of: 'last term' };
  const slope =
    exactly?.slice(1).map((c, n) => c.mul(Rational.of(n + 1))) ??
    balls.slice(1).map((c, n) => R.mul(c, R.fromNumber(n + 1), prec));
  const turning = largestPositiveZero(slope, prec);
  return turning === undefined ? undefined : { rho: turning, of: 'its slope' };
}

/** λ in (0, 1) with g = ρ λ/(1−λ)^a; undefined when it cannot be enclosed. */
export function mapVariable(g: Ball, rho: Ball, a: Rational, prec: number): Ball | undefined {
  const value = (x: Ball): Ball =>
    R.sub(R.mul(rho, x, prec), R.mul(g, pow(R.sub(R.ONE, x, prec), a, prec), prec), prec);
  const [gd, rd, ad] = [R.toNumber(g), R.toNumber(rho), a.toNumber()];
  let [low, high] = [0, 1];
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2;
    if (rd * middle - gd * (1 - middle) ** ad < 0) low = middle;
    else high = middle;
  }
  let x = R.fromNumber((low + high) / 2);
  for (let bits = 40; bits < 2 * prec; bits *= 2) {
    const rest = R.sub(R.ONE, x, prec);
    // Slope ρ + a g (1−λ)^{a−1}.
    const slope = R.add(
      rho,
      R.mul(R.mul(R.fromRational(a, prec), g, prec), pow(rest, a.sub(Rational.ONE), prec), prec),
      prec,
    );
    x = R.exactMid(R.sub(x, R.div(value(x), slope, prec), prec));
  }
  for (let slack = prec - 4; slack > 8; slack -= 8) {
    const step = R.mul2exp(R.ONE, R.upperBits(x) - slack);
    if (R.isNegative(value(R.sub(x, step, prec))) && R.isPositive(value(R.add(x, step, prec)))) return R.widen(x, step);
  }
  return undefined;
}

export interface MappedSum {
  readonly value: Ball;
  readonly rho: Ball;
  readonly of: 'last term' | 'its slope';
}

/** The sum of order K at g > 0; undefined when there is no scale ρ or no variable λ. */
export function orderDependentSum(
  E: readonly Exact[],
  K: number,
  strong: StrongCoupling,
  g: Ball,
  prec: number,
): MappedSum | undefined {
  const scale = mapScale(E, K, strong, prec);
  if (scale === undefined) return undefined;
  const { a, sigma } = mapExponents(strong);
  const lambda = mapVariable(g, scale.rho, a, prec);
  if (lambda === undefined) return undefined;
  let sum: Ball = R.ZERO;
  for (let k = K; k >= 0; k--) {
    const P = weights(k, a, sigma).reduceRight<Ball>(
      (acc, w, n) => R.add(R.mul(acc, scale.rho, prec), R.mul(R.fromRational(w, prec), E[n]!.ball(prec), prec), prec),
      R.ZERO,
    );
    sum = R.add(R.mul(sum, lambda, prec), P, prec);
  }
  const front = pow(R.sub(R.ONE, lambda, prec), sigma.neg(), prec);
  return { value: R.mul(sum, front, prec), ...scale };
}
