/**
 * @module Order-dependent mapping, for alternating series whose strong-coupling behaviour is known.
 *
 * g = ρ λ/(1−λ)^a with the exponents of the strong-coupling expansion, ρ from the last term's largest positive zero.
 * Truncation error: the larger of the last two steps in the order. Refused without strong-coupling exponents: no QCD series
 * has them, and a guess would decide the value.
 * Reference: R. Seznec, J. Zinn-Justin, J. Math. Phys. 20 (1979) 1398 (from memory).
 */
import { R } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { orderDependentSum } from '../sequences/index.js';
import type { MappedSum, StrongCoupling } from '../sequences/index.js';
import type { Expansion } from '../series/index.js';
import { cleanPart, inputObjection, termsBeforeAlternation, trustOf } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

/** Most coefficients used. Heuristic: cost. */
const MOST = 40;
/** Digits of the evaluations that only serve the error. */
const ERROR_DIGITS = 15;
/** Bits lost per order in the alternating binomial sums. Heuristic start; precision rises as needed. */
const LOSS = 4;

function evaluate(e: Expansion, K: number, strong: StrongCoupling, digits: number): MappedSum | undefined {
  const found = toDigits(
    digits,
    (prec) => orderDependentSum(e.coefficients, K, strong, e.x.ball(prec + LOSS * K), prec + LOSS * K),
    (s) => s?.value ?? R.ZERO,
  );
  return found !== undefined && found.value.rad < Infinity ? found : undefined;
}

export const orderDependentMap: Prescription = {
  name: 'order-dependent-map',
  title: 'order-dependent mapping',
  summary: 'mapping with the strong-coupling exponents built in, for alternating series; needs those exponents',
  family: 'coupling',
  apply(full, growth, request): readonly Outcome[] {
    const e = cleanPart(full, growth, MOST);
    const K = e.coefficients.length - 1;
    const variant = `order ${K}`;
    const strong = full.strongCoupling;
    if (strong === undefined)
      return [
        refusal(
          variant,
          'no strong-coupling exponents are given',
          'give --strong-coupling 1/3,2/3 (power and spacing of that expansion), or the field "strong coupling" in the series file; none is known in QCD',
        ),
      ];
    if (strong.spacing.sign() <= 0)
      return [
        refusal(variant, 'the spacing of the strong-coupling expansion is not positive', 'give a positive spacing'),
      ];
    if (growth.verdict === 'terminating') return [refusal(variant, 'the series terminates', 'use the fixed-order sum')];
    const no = inputObjection(e, growth, variant, 3);
    if (no !== undefined) return [no];
    if (termsBeforeAlternation(e) === undefined)
      return [
        refusal(variant, 'the signs do not alternate: the map would run along the cut', 'use a Borel prescription'),
      ];
    const best = evaluate(e, K, strong, request.digits);
    if (best === undefined)
      return [
        refusal(
          variant,
          'no positive scale makes the last term or its slope vanish',
          'use one coefficient fewer (--order)',
        ),
      ];
    const prec = Math.max(128, request.digits * 4 + 64);
    const value = dressed(e, best.value, prec);
    const truncation = request.only === undefined ? lastSteps(e, K, strong, best.value) : undefined;
    return [
      {
        kind: 'sum',
        variant,
        value,
        ...(truncation === undefined ? {} : { truncation }),
        termsUsed: K + 1,
        trust: trustOf(value, truncation),
        notes: [
          `scale ρ = ${R.toNumber(best.rho).toPrecision(5)}, a zero of the ${best.of === 'last term' ? 'last term' : 'slope of the last term'}`,
        ],
        central: true,
      },
    ];
  },
};

function lastSteps(e: Expansion, K: number, strong: StrongCoupling, best: Ball): number | undefined {
  const before = [K - 1, K - 2].filter((k) => k >= 1).map((k) => evaluate(e, k, strong, ERROR_DIGITS)?.value);
  const chain = [best, ...before].filter((v): v is Ball => v !== undefined);
  const steps = chain.slice(1).map((v, i) => Math.abs(R.toNumber(scaled(e, R.sub(chain[i]!, v, 128), 128))));
  return steps.length === 0 ? undefined : Math.max(...steps);
}
