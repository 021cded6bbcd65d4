/**
 * @module The bubble chain of a series summed to all orders: the known coefficients exactly, the rest from its large-β0 limit.
 *
 *   R = additive + factor [ Σ_{n<N} (c_n − ĉ_n) x^(n+1) + (c_0/b_0) PV ∫ du e^(−u/a) B(u)/B(0) ],  ĉ_n = c_0 b_0^n n! [u^n] B/B(0),
 * a = b_0 x, b_0 the first coefficient of the series' own β function. This is naive non-abelianisation, or the
 * Brodsky–Lepage–Mackenzie prescription with one scale for each order, all of them resummed; the principal value is taken.
 * Truncation error: the last correction, (c_(N−1) − ĉ_(N−1)) x^N; with one coefficient only there is none.
 * Reference: M. Beneke, V. M. Braun, Phys. Lett. B 348 (1995) 513, hep-ph/9411229; M. Neubert, Phys. Rev. D 51 (1995) 5924.
 *
 * The chains are made by the bubbles room when somebody has loaded it; only series that name one need it.
 */
import type * as Bubbles from '../bubbles/index.js';
import { R, divExact, exactReal, mulExact, toNumberExact } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Expansion } from '../series/index.js';
import { inputObjection } from './eligibility.js';
import type { Prescription, Refusal } from './prescription.js';
import { refusal, scaled, toDigits } from './prescription.js';

/** What the prescription needs of the bubbles room. */
export type BubbleEngine = Pick<
  typeof Bubbles,
  'betaNought' | 'chainCoefficients' | 'chainSum' | 'factorBall' | 'quantityNamed' | 'rangeObjection' | 'QUANTITY_NAMES'
>;

/** Known before anything of the chains is loaded. */
export const BUBBLE_CHAIN = {
  name: 'bubble-chain',
  title: 'bubble chain to all orders',
  summary:
    'known coefficients exactly, the rest from the large-beta_0 limit of the quantity; error: the last correction',
  family: 'model',
} as const satisfies Omit<Prescription, 'apply'>;

const VARIANT = 'principal value of the chain';

interface Matched {
  /** ĉ_n, normalised to c_0. */
  readonly chain: readonly Exact[];
  /** (c_0/b_0)(…) of the chain, and its imaginary part: parts of Σ c_n x^(n+1). */
  readonly pv: Exact;
  readonly im: Exact;
}

/** The chain at the series' own coupling and scale, with its first coefficient. */
function matched(e: Expansion, name: string, engine: BubbleEngine): Matched | Refusal {
  const quantity = engine.quantityNamed(name);
  if (quantity === undefined) {
    return refusal(VARIANT, `no bubble chain "${name}"`, `name one of ${engine.QUANTITY_NAMES.join(', ')}`);
  }
  const { running } = e;
  const b0 = running?.beta[0];
  if (running?.flavours === undefined || b0 === undefined) {
    return refusal(VARIANT, 'the running of its coupling is not known', 'name scheme and flavours in the series file');
  }
  const { flavours, scaleRatio } = running;
  if (e.power !== 1) {
    return refusal(
      VARIANT,
      `the series starts at the power ${e.power}`,
      'only series that start at the first power have it',
    );
  }
  if (quantity.subtraction !== undefined && toNumberExact(scaleRatio) !== 1) {
    return refusal(VARIANT, 'the mass of the series runs: its chain is known at μ = m', 'bring the series to μ = m');
  }
  const beta = exactReal((prec) => engine.betaNought(flavours, prec));
  const alpha = divExact(mulExact(b0, e.x), beta);
  const point = { alpha, flavours, ratio: scaleRatio };
  const objection = engine.rangeObjection(quantity, point);
  if (objection !== undefined) return refusal(VARIANT, objection.reason, objection.remedy);
  const own = engine.chainCoefficients(quantity, e.coefficients.length, scaleRatio);
  const unit = divExact(e.coefficients[0]!, own[0]!);
  let power: Exact | undefined;
  const chain = own.map((c) => {
    power = power === undefined ? unit : mulExact(power, b0);
    return mulExact(c, power);
  });
  const sum = engine.chainSum(quantity, point);
  // The chain's R is norm·α Σ ĉ_n aⁿ; ours is (c_0/ĉ_0) x Σ ĉ_n aⁿ.
  const front = exactReal((prec) => {
    const norm = R.mul(engine.factorBall(quantity.norm.factor, prec), alpha.ball(prec), prec);
    return R.div(R.mul(unit.ball(prec), e.x.ball(prec), prec), norm, prec);
  });
  return { chain, pv: mulExact(front, sum.pv), im: mulExact(front, sum.im) };
}

/** Σ (c_n − ĉ_n) x^n. */
function corrections(e: Expansion, chain: readonly Exact[], prec: number): Ball {
  const x = e.x.ball(prec);
  let sum: Ball = R.ZERO;
  for (let n = e.coefficients.length - 1; n >= 0; n--) {
    const own = n === 0 ? R.ZERO : R.sub(e.coefficients[n]!.ball(prec), chain[n]!.ball(prec), prec);
    sum = R.add(R.mul(sum, x, prec), own, prec);
  }
  return sum;
}

/** "the chain gives 4.43 (1.64), …": its coefficients and the known ones. */
function comparison(e: Expansion, chain: readonly Exact[]): string {
  const pairs = chain
    .slice(1)
    .map((c, i) => `${toNumberExact(c).toPrecision(4)} (${toNumberExact(e.coefficients[i + 1]!).toPrecision(4)})`);
  return `the chain's c₁, c₂, … (known): ${pairs.join(', ')}`;
}

/** The prescription, from the bubbles room. */
export function bubbleChain(engine: BubbleEngine): Prescription {
  return {
    ...BUBBLE_CHAIN,
    apply(e, growth, request) {
      if (e.bubbleChain === undefined) {
        return [
          refusal(VARIANT, 'no bubble chain is named', 'write "bubble chain: adler" or the like into the series file'),
        ];
      }
      const no = inputObjection(e, growth, VARIANT, 1);
      if (no !== undefined) return [no];
      const found = matched(e, e.bubbleChain, engine);
      if ('kind' in found) return [found];
      const { chain, pv, im } = found;
      const at = (prec: number): { value: Ball; imaginary: Ball } => {
        // pv is a part of x Σ c_n x^n, and `scaled` puts one power of x in front.
        const known = scaled(e, corrections(e, chain, prec), prec);
        const front = e.factor.ball(prec);
        const value = R.add(known, R.mul(front, pv.ball(prec), prec), prec);
        return { value: R.add(e.additive.ball(prec), value, prec), imaginary: R.mul(front, im.ball(prec), prec) };
      };
      const { value, imaginary } = toDigits(request.digits, at, (v) => v.value);
      const last = e.coefficients.length - 1;
      const correction = R.sub(e.coefficients[last]!.ball(160), chain[last]!.ball(160), 160);
      const x = R.powInt(e.x.ball(160), last, 160);
      const truncation = last === 0 ? undefined : Math.abs(R.toNumber(scaled(e, R.mul(correction, x, 160), 160)));
      return [
        {
          kind: 'sum',
          variant: VARIANT,
          value,
          imaginary,
          ...(truncation === undefined ? {} : { truncation }),
          termsUsed: e.coefficients.length,
          trust: 'indicative',
          notes: [`chain: ${e.bubbleChain}`, ...(last === 0 ? [] : [comparison(e, chain)])],
          central: true,
        },
      ];
    },
  };
}
