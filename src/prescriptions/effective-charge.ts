/**
 * @module The effective charge of a series: the coupling scheme in which it has no corrections.
 *
 * Purpose    R = additive + factor c_0 D^p, D = x (1 + r_1 x + r_2 x² + …) with p the power of the first term. D is a coupling
 *            whose beta function follows from that of x and the coefficients: the content of FAC.
 * Method     p-th root of Σ (c_n/c_0) x^n; beta coefficients by matching (QCD room); D from
 *              b_0 ln(μ²/Λ_D²) = b_0 ln(μ²/Λ²) − r_1   (exact relation of the Λ's).
 *            The next coefficient is predicted by asking that the next beta coefficient of D be that of x.
 * Bound      enclosures.
 * Reference  G. Grunberg, Phys. Lett. B 95 (1980) 70, Phys. Rev. D 29 (1984) 2315; A. L. Kataev, V. V. Starshenko, Mod. Phys.
 *            Lett. A 10 (1995) 235 (prediction; formulas and the value 275 reproduced).
 */
import { divExact, exact, exactReal, R, Rational } from '../numerics/index.js';
import type { Ball, Exact, Field } from '../numerics/index.js';
import { onExact } from '../borel/index.js';
import { betaInCoupling } from '../qcd/index.js';
import type { Expansion } from '../series/index.js';
import { betaFunction, invertScale, scaleFunction } from './running-coupling.js';

/** 1, r_1, r_2, … of D. */
export function chargeCoefficients(e: Expansion): Exact[] {
  const head = e.coefficients[0]!;
  const ratios = e.coefficients.map((c, n) => (n === 0 ? exact(1) : divExact(c, head)));
  return e.power === 1
    ? ratios
    : onExact(ratios, ratios.length, <T>(field: Field<T>, f: readonly T[]) =>
        rationalPower(field, f, Rational.of(1, e.power)),
      );
}

/** (Σ f_n x^n)^q with f_0 = 1. */
export function rationalPower<T>(field: Field<T>, f: readonly T[], q: Rational): T[] {
  const g: T[] = [field.one];
  for (let n = 1; n < f.length; n++) {
    let sum = field.zero;
    for (let k = 1; k <= n; k++) {
      const weight = q
        .mul(Rational.of(k))
        .sub(Rational.of(n - k))
        .div(Rational.of(n));
      sum = field.add(sum, field.mul(field.fromRational(weight), field.mul(f[k]!, g[n - k]!)));
    }
    g.push(sum);
  }
  return g;
}

/** B_0, B_1, … of D's own beta function, as far as coefficients and beta function reach. */
export const chargeBeta = (beta: readonly Exact[], r: readonly Exact[]): Exact[] => betaInCoupling(beta, r);

/** D by its own renormalisation group with the first `loops` beta coefficients of both; undefined when it has none. */
export function effectiveCharge(
  beta: readonly Exact[],
  r: readonly Exact[],
  x: Exact,
  loops: number,
  prec: number,
): Ball | undefined {
  const work = prec + 24;
  const own = chargeBeta(beta, r).slice(0, loops);
  const ofX = betaFunction(
    beta.slice(0, loops).map((b) => b.ball(work)),
    work,
  );
  const ofD = betaFunction(
    own.map((b) => b.ball(work)),
    work,
  );
  const f = scaleFunction(ofX, work);
  if (f === undefined || loops < 1) return undefined;
  const at = x.ball(work);
  const target = R.sub(f(at), (r[1] ?? exact(0)).ball(work), work);
  return invertScale(ofD, target, R.toNumber(at), work);
}

/**
 * r_N predicted from r_1 … r_{N−1}: with r_N = 0 the beta coefficient is B_N = b_N + rest, and r_N enters it as (N−1) b_0 r_N.
 * Undefined for N < 2 and where the beta function is not known to b_N.
 */
export function predictedCoefficient(beta: readonly Exact[], r: readonly Exact[]): Exact | undefined {
  const N = r.length;
  if (N < 2 || beta.length <= N) return undefined;
  const [b0, bN] = [beta[0]!, beta[N]!];
  const B = chargeBeta(beta, [...r, exact(0)])[N];
  if (B === undefined) return undefined;
  if (B.rational !== undefined && bN.rational !== undefined && b0.rational !== undefined)
    return exact(bN.rational.sub(B.rational).div(b0.rational.mul(Rational.of(N - 1))));
  return exactReal((prec) => {
    const work = prec + 24;
    const below = R.mul(b0.ball(work), R.fromNumber(N - 1), work);
    return R.div(R.sub(bN.ball(work), B.ball(work), work), below, work);
  });
}
