/**
 * @module bubbles --cut: a chain without the momenta below μ_f, and what they contribute beside it.
 *
 * The coefficients lose their infrared factorial; the part k < μ_f is a sum of powers (Λ/Q)^d of which the first stands for
 * the condensate; the sum does not depend on μ_f. Both series go through the growth diagnosis.
 */
import {
  chainSum,
  borelPoles,
  couplingAtCut,
  cutCoefficients,
  cutObjection,
  cutSum,
  distribution,
  factorBall,
  logLength,
  lowPart,
  rangeObjection,
} from '../bubbles/index.js';
import type { ChainPoint, Quantity } from '../bubbles/index.js';
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import { VERSION, ballText, exactText, growthStudy, indicative } from '../studies/index.js';
import type { GrowthReport } from '../studies/index.js';
import type { BubbleCutResult, CutPower, CutRow } from './bubble-result.js';
import { chainSeries } from './bubble-series.js';
import { bitsFor, couplingWords, pointOf, quantityWords } from './bubble-words.js';
import type { BubbleQuestion } from './bubble-words.js';

/** Powers of Λ/Q that are shown. */
const POWERS = 4;
const POWER_REACH = 6;
/** Coefficients that the growth diagnosis sees. */
const LEAST_GROWTH_ORDER = 16;
const GROWTH_ORDER = 32;
/** Cuts beside the one asked for, as multiples of it. */
const NEIGHBOURS = [[7, 10], [17, 20], [6, 5], [3, 2]] as const; // prettier-ignore
const DIRECT_DIGITS = 10;

/** ∫_{τ_f}^∞ of the momentum integral, by Simpson's rule in ln τ between and beyond the kinks of w; no contour kernel. */
export function directHigh(quantity: Quantity, point: ChainPoint, cut: Rational): number | undefined {
  if (quantity.components.some((c) => c.kernel.kind === 'sine' || c.rest !== undefined)) return undefined;
  if (quantity.subtraction !== undefined) return undefined;
  const L = R.toNumber(logLength(point, 80));
  const beta = (33 - 2 * point.flavours) / (12 * Math.PI);
  const f = (y: number): number =>
    R.toNumber(distribution(quantity, Rational.fromNumber(Math.exp(y))).ball(56)) / (L + y);
  const rule = (from: number, to: number, panels: number): number => {
    const h = (to - from) / (2 * panels);
    let sum = f(from) + f(to);
    for (let i = 1; i < 2 * panels; i++) sum += (i % 2 === 1 ? 4 : 2) * f(from + i * h);
    return (sum * h) / 3;
  };
  const start = 2 * Math.log(cut.toNumber());
  // w is analytic on either side of τ = 1 and falls off like 1/τ.
  const below = start < 0 ? rule(start, -1e-12, 40) : 0;
  const norm = R.toNumber(factorBall(quantity.norm.factor, 64));
  return (norm / beta) * (below + rule(1e-12, 8, 120) + rule(8, 30, 120));
}

function row(question: BubbleQuestion, cut: Rational, lowest: Rational | undefined): CutRow {
  const { quantity, digits } = question;
  const point = pointOf(question);
  const bits = bitsFor(digits);
  const { high, low, whole } = cutSum(quantity, point, cut);
  const leading = lowest === undefined ? undefined : lowPart(quantity, point, cut, lowest);
  const direct = directHigh(quantity, point, cut);
  const text = (x: Exact): string => ballText(x.ball(bits), digits);
  return {
    cut: indicative(cut.toNumber(), 6),
    high: text(high),
    low: text(low),
    sum: text(whole),
    leading: leading === undefined ? '0' : text(leading),
    remainder: leading === undefined ? text(low) : indicative(toNumberExact(low) - toNumberExact(leading), 4),
    direct: direct === undefined ? '' : indicative(direct, DIRECT_DIGITS),
  };
}

function powers(question: BubbleQuestion, cut: Rational, low: number): CutPower[] {
  const { quantity, digits } = question;
  let sum = 0;
  return borelPoles({ ...quantity, components: underContour(quantity) }, POWER_REACH)
    .filter(({ u }) => u.sign() > 0)
    .slice(0, POWERS)
    .map(({ u }) => {
      const part = lowPart(quantity, pointOf(question), cut, u);
      sum += toNumberExact(part);
      return {
        dimension: u.mul(Rational.of(2)).toString(),
        value: ballText(part.ball(bitsFor(digits)), digits),
        upToHere: indicative(sum, 8),
        left: indicative(low - sum, 4),
      };
    });
}

/** The components without their contour kernels: the poles that the powers belong to. */
const underContour = (quantity: Quantity): Quantity['components'] =>
  quantity.components.map((c) => ({ ...c, kernel: { kind: 'plain' as const } }));

const verdictOf = ({ verdict, statement, signPattern }: GrowthReport): Pick<GrowthReport, 'verdict' | 'statement' | 'signPattern'> => ({ verdict, statement, signPattern }); // prettier-ignore

/** <(α/π)G²>(μ_f) = (3/(2π²)) Q⁴ times the dimension-4 part of the Adler function: coefficient 2π²/3. */
function condensate(question: BubbleQuestion, cut: Rational): BubbleCutResult['cut']['condensate'] {
  const { quantity, scale } = question;
  if (quantity.name !== 'adler' || scale === undefined) return undefined;
  const part = toNumberExact(lowPart(quantity, pointOf(question), cut, Rational.of(2)));
  return {
    name: '<(alpha_s/pi) G G>(mu_f), perturbative',
    value: indicative((3 / (2 * Math.PI ** 2)) * part * scale.toNumber() ** 4, 4),
    unit: 'GeV^4',
  };
}

/** The chain cut at μ_f = cut · Q, or why it cannot be. */
export function bubbleCut(question: BubbleQuestion, cut: Rational): BubbleCutResult | Refusal {
  const { quantity, order, digits, scale, request, ratio } = question;
  const point = pointOf(question);
  const objection = rangeObjection(quantity, point) ?? cutObjection(quantity, point, cut);
  if (objection !== undefined) return objection;
  const bits = bitsFor(digits);
  const { low } = cutSum(quantity, point, cut);
  const { im } = chainSum(quantity, point);
  const length = Math.max(order, Math.min(GROWTH_ORDER, Math.max(LEAST_GROWTH_ORDER, 2 * order)));
  const parts = cutCoefficients(quantity, ratio, cut, length);
  const text = (c: Exact): string => exactText(c, digits);
  const lowest = borelPoles({ ...quantity, components: underContour(quantity) }, POWER_REACH).find(
    ({ u }) => u.sign() > 0,
  );
  const grown = (coefficients: readonly Exact[], title: string): ReturnType<typeof verdictOf> => {
    const series = chainSeries(quantity, point, length, { coefficients, title, side: 'ultraviolet' });
    return verdictOf(growthStudy({ ...series, singularities: [] }, { digits, request }).growth);
  };
  const cuts = NEIGHBOURS.map(([n, d]) => cut.mul(Rational.of(n, d))).filter(
    (c) => cutObjection(quantity, point, c) === undefined,
  );
  const all = [...cuts, cut].sort((a, b) => a.cmp(b));
  const gluons = condensate(question, cut);
  return {
    leastterm: VERSION,
    request,
    quantity: quantityWords(quantity),
    coupling: couplingWords(question),
    cut: {
      overHard: indicative(cut.toNumber(), 8),
      ...(scale === undefined ? {} : { GeV: indicative(cut.mul(scale).toNumber(), 6) }),
      coupling: indicative(couplingAtCut(point, cut), 6),
      imaginary: { low: ballText(im.ball(bits), digits), high: '0' },
      terms: Array.from({ length: order }, (_, n) => ({
        n,
        whole: text(parts.whole[n]!),
        low: text(parts.low[n]!),
        window: text(parts.window[n]!),
        ultraviolet: text(parts.ultraviolet[n]!),
        high: text(parts.high[n]!),
      })),
      powers: powers(question, cut, toNumberExact(low)),
      ...(gluons === undefined ? {} : { condensate: gluons }),
      rows: all.map((c) => row(question, c, lowest?.u)),
      growth: {
        whole: grown(parts.whole, 'all momenta'),
        high: grown(parts.high, 'k > mu_f'),
        window: grown(parts.window, 'mu_f < k < Q'),
      },
    },
    cautions: [],
  };
}
