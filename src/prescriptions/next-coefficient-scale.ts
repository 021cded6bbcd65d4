/**
 * @module The coefficient that scale and scheme setting, and a terminant, imply.
 *
 * Method     effective charge: the next beta coefficients of charge and coupling are alike. Minimal sensitivity, re-expanded:
 *            the same with three terms, and r_2 larger by c_1²/4 with two (re-derived; c_1 = b_1/b_0).
 *            Terminant: c_{k+1} = c_k (k+γ)/t* from the first omitted term on.
 * Bound      enclosures.
 * Reference  A. L. Kataev, V. V. Starshenko, Mod. Phys. Lett. A 10 (1995) 235 (memory, reproduced).
 */
import { addExact, exact, R, Rational } from '../numerics/index.js';
import type { Ball, Field } from '../numerics/index.js';
import { onExact } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import { chargeCoefficients, predictedCoefficient, rationalPower } from './effective-charge.js';

/** c_N of the charge with r_N predicted. */
export function chargeImplies(e: Expansion, prec: number): Ball | undefined {
  const { running } = e;
  if (running === undefined || e.power < 1) return undefined;
  const r = chargeCoefficients(e);
  const next = predictedCoefficient(running.beta, r);
  if (next === undefined) return undefined;
  const powers = onExact([...r, next], r.length + 1, <T>(field: Field<T>, f: readonly T[]) =>
    rationalPower(field, f, Rational.of(e.power)),
  );
  return R.mul(e.coefficients[0]!.ball(prec), powers[r.length]!.ball(prec), prec);
}

/** c_N of the optimum that uses all coefficients. */
export function optimumImplies(e: Expansion, variant: string, prec: number): Ball | undefined {
  const N = e.coefficients.length;
  const beta = e.running?.beta;
  if (e.power !== 1 || beta === undefined || (N !== 2 && N !== 3)) return undefined;
  if (variant !== `optimum, ${N === 2 ? '' : 'next-to-'}next-to-leading order`) return undefined;
  const same = chargeImplies(e, prec);
  if (N === 3 || same === undefined) return same;
  const c1 = R.div(beta[1]!.ball(prec), beta[0]!.ball(prec), prec);
  const more = R.mul(e.coefficients[0]!.ball(prec), R.mul2exp(R.sqr(c1, prec), -2), prec);
  return R.add(same, more, prec);
}

export function terminantImplies(e: Expansion, variant: string, prec: number): Ball | undefined {
  const s = e.stated[0];
  const n = Number(/^(\d+) terms$/.exec(variant)?.[1]);
  const N = e.coefficients.length;
  const first = e.coefficients[n];
  if (s?.exponent === undefined || first === undefined) return undefined;
  let c = first.ball(prec);
  for (let k = n; k < N; k++) {
    const up = addExact(s.exponent, exact(k)).ball(prec);
    c = R.div(R.mul(c, up, prec), s.t.ball(prec), prec);
  }
  return c;
}
