/**
 * @module bubbles: a quantity of the large-β0 limit at a coupling, as a laboratory: coefficients, Borel poles, the exact
 * principal value with its ambiguity, and how every prescription fares when it is given the first coefficients only.
 */
import {
  borelPoles,
  chainCoefficients,
  chainSum,
  exactForms,
  formText,
  imaginaryShare,
  lambdaOverQ,
  rangeObjection,
} from '../bubbles/index.js';
import type { BorelPole, Quantity } from '../bubbles/index.js';
import { R, Rational, exact, pi } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import type { Refusal } from '../qcd/index.js';
import { VERSION, ballText, compare, exactText, expand, growthStudy, indicative, termTable } from '../studies/index.js';
import type { CompareRow } from '../studies/index.js';
import type { BubbleAmbiguity, BubblePole, BubbleResult, BubbleSum, BubbleTerm, BubbleTrial } from './bubble-result.js';
import { chainSeries } from './bubble-series.js';
import { bitsFor, couplingError, couplingWords, pointOf, quantityWords } from './bubble-words.js';
import type { BubbleQuestion } from './bubble-words.js';

/** Orders whose closed forms are short enough to read. */
const EXACT_ORDERS = 8;
const EXACT_LENGTH = 70;
/** Order from which matched forms were not known before. */
const MATCHED_FROM = 2;
/** Poles that are listed, and those that enter the table of ambiguities. */
const REACH = 4;
/** Shares of the ambiguity below this part of the largest are left out of the table. */
const SMALLEST_SHARE = 1e-6;
/** Digits of errors, shares and deviations. */
const ESTIMATE_DIGITS = 4;
/** Below this part of the value an error of a prescription is rounding: in one-loop running a scale can be free of it. */
const NO_ERROR = 1e-15;
/** Certified digits that the prescriptions are asked for. */
const TRIAL_DIGITS = 15;

function terms(question: BubbleQuestion): BubbleTerm[] {
  const { quantity, ratio, order, digits } = question;
  const series = chainSeries(quantity, pointOf(question), order);
  const table = termTable(series, expand(series, question.at.value), digits);
  const forms = exactForms(quantity, ratio, Math.min(order, EXACT_ORDERS)) ?? [];
  return chainCoefficients(quantity, order, ratio).map((c, n) => {
    const text = forms[n] === undefined ? undefined : formText(forms[n]);
    const row = table.rows[n]!;
    return {
      n,
      coefficient: exactText(c, digits),
      ...(text === undefined || text.length > EXACT_LENGTH
        ? {}
        : {
            exact: text,
            ...(quantity.matched !== undefined && n >= MATCHED_FROM ? { exactBy: 'integer relation' as const } : {}),
          }),
      term: row.term,
      partialSum: row.partialSum,
      ...(row.least === true ? { least: true } : {}),
    };
  });
}

const overPi = (part: string, power: number): string =>
  power === 0 ? part : power === -1 ? `${part} /pi` : `${part} pi^${power}`;

const poleWords = (pole: BorelPole): BubblePole => ({
  u: pole.u.toString(),
  order: pole.order,
  side: pole.u.sign() > 0 ? 'infrared' : 'ultraviolet',
  residues: pole.parts.map((part) => (part.isZero() ? '0' : overPi(part.toString(), pole.pi))),
});

/** What every infrared pole contributes, the exponentially smaller ones too as long as they count. */
function byPole(question: BubbleQuestion): BubbleAmbiguity[] {
  const { quantity, scale, digits } = question;
  const point = pointOf(question);
  const bits = bitsFor(digits) + 16;
  const shares = borelPoles(quantity, REACH)
    .filter(({ u }) => u.sign() > 0)
    .map((pole) => ({ pole, share: imaginaryShare(quantity, point, pole, bits) }));
  const largest = Math.max(...shares.map(({ share }) => Math.abs(R.toNumber(share))), 0);
  return shares
    .filter(({ share }) => Math.abs(R.toNumber(share)) > SMALLEST_SHARE * largest)
    .map(({ pole, share }) => {
      const dimension = 2 * pole.u.toNumber();
      const size = Math.abs(R.toNumber(share));
      const unit = scale === undefined ? undefined : scale.toNumber() ** dimension;
      return {
        dimension: pole.u.mul(Rational.of(2)).toString(),
        im: ballText(share, digits),
        imOverPi: ballText(R.div(R.abs(share), pi(bits), bits), digits),
        perLambda: indicative(size / Math.PI / lambdaOverQ(point) ** dimension, ESTIMATE_DIGITS),
        ...(unit === undefined
          ? {}
          : {
              GeV: {
                im: indicative(size * unit, ESTIMATE_DIGITS),
                imOverPi: indicative((size / Math.PI) * unit, ESTIMATE_DIGITS),
              },
            }),
      };
    });
}

/** |PV(α+σ) − PV(α−σ)|/2, each side only where the chain can be summed. */
function inputError(question: BubbleQuestion): string | undefined {
  const error = couplingError(question.at);
  if (error === 0) return undefined;
  const at = (shift: number): number | undefined => {
    const alpha = exact(Rational.fromNumber(R.toNumber(question.at.value.ball(80)) + shift));
    const point = { ...pointOf(question), alpha };
    if (rangeObjection(question.quantity, point) !== undefined) return undefined;
    return R.toNumber(chainSum(question.quantity, point).pv.ball(64));
  };
  const [up, down] = [at(error), at(-error)];
  return up === undefined || down === undefined ? undefined : indicative(Math.abs(up - down) / 2, 3);
}

function sumWords(question: BubbleQuestion, pv: Ball, im: Ball): BubbleSum {
  const { digits } = question;
  const bits = bitsFor(digits) + 16;
  const input = inputError(question);
  return {
    pv: ballText(pv, digits),
    im: ballText(im, digits),
    standing: 'certified',
    ...(input === undefined ? {} : { inputError: input }),
    ambiguity: {
      im: ballText(R.abs(im), digits),
      imOverPi: ballText(R.div(R.abs(im), pi(bits), bits), digits),
      byPole: byPole(question),
    },
  };
}

function trial(row: CompareRow, pv: Ball, ambiguity: number): BubbleTrial {
  const { prescription, variant } = row;
  if (row.refused !== undefined) return { prescription, variant, refused: row.refused };
  const value = Rational.parse((row.value ?? '').replace('e+', 'e'));
  const own = { prescription, variant, ...(row.value === undefined ? {} : { value: row.value }) };
  if (value === undefined) return own;
  const deviation = R.toNumber(R.sub(R.fromRational(value, 200), pv, 200));
  const error = Number(row.truncationError ?? 'NaN');
  return {
    ...own,
    ...(row.truncationError === undefined ? {} : { truncationError: row.truncationError }),
    deviation: indicative(deviation, ESTIMATE_DIGITS),
    ...(ambiguity > 0 ? { overAmbiguity: indicative(Math.abs(deviation) / ambiguity, 3) } : {}),
    ...(error > NO_ERROR * Math.abs(R.toNumber(pv)) ? { overError: indicative(Math.abs(deviation) / error, 3) } : {}),
  };
}

/** Why the question has no answer. */
export const bubbleObjection = (quantity: Quantity, question: BubbleQuestion): Refusal | undefined =>
  rangeObjection(quantity, pointOf(question));

/** The principal value alone, or why there is none. */
export function bubbleValue(question: BubbleQuestion): { readonly pv: string } | Refusal {
  const { quantity, digits } = question;
  const point = pointOf(question);
  return (
    rangeObjection(quantity, point) ?? { pv: ballText(chainSum(quantity, point).pv.ball(bitsFor(digits)), digits) }
  );
}

/** The laboratory, or why there is none at this coupling. */
export function bubbleLaboratory(question: BubbleQuestion): BubbleResult | Refusal {
  const { quantity, at, order, digits, request } = question;
  const point = pointOf(question);
  const objection = rangeObjection(quantity, point);
  if (objection !== undefined) return objection;
  const bits = bitsFor(digits);
  const { pv, im } = chainSum(quantity, point);
  const [value, imaginary] = [pv.ball(bits), im.ball(bits)];
  const series = chainSeries(quantity, point, order, question.scale === undefined ? {} : { scale: question.scale });
  const ambiguity = Math.abs(R.toNumber(imaginary)) / Math.PI;
  const { rows } = compare(series, [{ value: at.value, text: at.text }], { digits: TRIAL_DIGITS, hide: 0, request });
  const { growth } = growthStudy(series, { digits, request });
  return {
    leastterm: VERSION,
    request,
    quantity: quantityWords(quantity),
    coupling: couplingWords(question),
    terms: terms(question),
    poles: borelPoles(quantity, REACH).map(poleWords),
    sum: sumWords(question, value, imaginary),
    trials: rows.map((row) => trial(row, value, ambiguity)),
    growth: { verdict: growth.verdict, statement: growth.statement },
    cautions: [],
  };
}
