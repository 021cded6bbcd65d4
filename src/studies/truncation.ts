/**
 * @module truncation: what every truncation-error model says of the terms that are missing, as one plain object.
 */
import { diagnoseGrowth } from '../growth/index.js';
import type { Growth } from '../growth/index.js';
import { R } from '../numerics/index.js';
import { partialSums } from '../prescriptions/index.js';
import type { Expansion, Series, Uncertain } from '../series/index.js';
import {
  PRIORS,
  TRUNCATION_MODELS,
  USUAL_PRIORS,
  questionOf,
  type Priors,
  type Question,
  type TruncationModel,
} from '../truncation/index.js';
import type { AssessOptions } from './assess.js';
import type { Assessment, Caution, CompetingReport, Refused, Standing } from './assessment.js';
import { cautions } from './cautions.js';
import { competingReport, foundLeading } from './competing-report.js';
import { fixedOrderSeries } from './contour/moment.js';
import { expand, type Expanded } from './expand.js';
import { ballText, indicative } from './figures.js';
import { ask, bandText, scaledText, type BandText } from './truncation-answer.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { termTable } from './terms.js';
import { byOrder, type TruncationOrder, type TruncationRecord } from './truncation-by-order.js';
import { VERSION } from './version.js';

export interface TruncationEstimate {
  readonly model: string;
  readonly title: string;
  /** credible: a posterior probability under the priors below; conventional: a custom. */
  readonly nature: 'credible' | 'conventional';
  readonly about: 'next term' | 'remainder';
  readonly reference: string;
  readonly priors: readonly { readonly name: string; readonly value: string; readonly meaning: string }[];
  /** The sum that the bands belong to, and the order that it goes through. */
  readonly through?: number;
  readonly sum?: string;
  readonly band68?: BandText;
  readonly band95?: BandText;
  /** The model's own guess of the next term. */
  readonly next?: string;
  readonly facts?: readonly { readonly name: string; readonly value: string }[];
  readonly notes?: readonly string[];
  /** Trust in the model's answer, and how the digits of its numbers are known. */
  readonly standing?: Standing;
  readonly digits?: Standing;
  readonly refused?: Refused;
}

export interface TruncationResult {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly series: Assessment['series'];
  readonly coupling: Assessment['coupling'];
  /** The sum of all known terms and its order. */
  readonly sum: { readonly through: number; readonly value: string; readonly lastTerm: string };
  readonly estimates: readonly TruncationEstimate[];
  /** Where ultraviolet and infrared growth compete: the bracket of orders and sums, in place of min |term|. */
  readonly competing?: CompetingReport;
  /** With the first 1, 2, … terms alone: what each model said of the next one. */
  readonly byOrder?: readonly TruncationOrder[];
  readonly record?: readonly TruncationRecord[];
  readonly cautions: readonly Caution[];
}

export interface TruncationOptions extends Omit<AssessOptions, 'by'> {
  readonly priors?: Priors;
  /** Also let every model predict each known term from the ones before it. */
  readonly byOrder?: boolean;
}

function estimateEntry(
  model: TruncationModel,
  question: Question,
  sums: (terms: number) => string,
): TruncationEstimate {
  const head = {
    model: model.name,
    title: model.title,
    nature: model.nature,
    about: model.about,
    reference: model.reference,
    priors: model.priors.map((name) => ({
      name,
      value: String(question.priors[name]),
      meaning: PRIORS[name].meaning,
    })),
  };
  const answer = ask(model, question);
  if ('reason' in answer) return { ...head, refused: answer };
  const { unit, orders } = question.known;
  const { digits } = model;
  return {
    ...head,
    through: orders[answer.terms - 1] ?? 0,
    sum: sums(answer.terms),
    band68: bandText(answer.bands[68], unit, digits),
    band95: bandText(answer.bands[95], unit, digits),
    ...(answer.next === undefined ? {} : { next: scaledText(answer.next, unit, digits) }),
    facts: answer.facts.map((f) => ({
      name: f.name,
      value: f.scaled === true ? scaledText(f.value, unit, digits) : indicative(f.value, digits),
    })),
    notes: answer.notes,
    standing: 'indicative',
    digits: 'converged',
  };
}

/** Decimal text of the partial sums by number of known terms. */
function sumTexts(e: Expansion, question: Question, digits: number): (terms: number) => string {
  const all = partialSums(e, digits * 4 + 96);
  return (terms) => {
    const order = question.known.orders[terms - 1] ?? e.power - 1;
    return ballText(all[order - e.power + 1] ?? R.INDETERMINATE, digits);
  };
}

function ownCautions(growth: Growth, expanded: Expanded): Caution[] {
  const list: Caution[] = [];
  if (growth.verdict === 'factorial' || growth.verdict === 'superfactorial')
    list.push({
      code: 'models-without-factorials',
      text: 'the coefficients grow factorially: of the credible models only the two modified Cacciari–Houdeau ones know of it; the others are a cross-check',
    });
  if (growth.verdict === 'terminating')
    list.push({
      code: 'terminates',
      text: 'the series seems to terminate: the sum of its terms would then have no truncation error',
    });
  if (expanded.leadingZeros > 0)
    list.push({
      code: 'zeros-not-counted',
      text: 'the zero coefficients in front are not counted among the known ones',
    });
  return list;
}

const NO_TERMS: Refused = {
  reason: 'every term is zero: there is no size to go by',
  remedy: 'give a coefficient and a coupling that do not vanish',
};

/** All truncation-error models on a series at the coupling value `at`. */
export function truncationStudy(given: Series, at: Uncertain, options: TruncationOptions): TruncationResult {
  const series = fixedOrderSeries(given);
  const expanded = expand(series, at.value, options.order);
  const e = expanded.expansion;
  const growth = diagnoseGrowth(expanded.growthInput);
  const table = termTable(series, expanded, options.digits);
  const priors = options.priors ?? USUAL_PRIORS;
  const { name, divisor, plain } = series.coupling;
  const question = questionOf(e, {
    coupling: { name, divisor, plain },
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
    priors,
    found: foundLeading(growth),
  });
  const competing = competingReport(question, e, expanded.uPerT);
  const last = table.rows.at(-1);
  const sums = question === undefined ? () => '' : sumTexts(e, question, options.digits);
  return {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    sum: { through: last?.order ?? e.power - 1, value: last?.partialSum ?? '0', lastTerm: last?.term ?? '0' },
    estimates: TRUNCATION_MODELS.map((model) =>
      question === undefined ? refusedEntry(model, priors) : estimateEntry(model, question, sums),
    ),
    ...(competing === undefined ? {} : { competing }),
    ...(options.byOrder === true && question !== undefined ? byOrder(question) : {}),
    cautions: [...cautions(series, expanded, growth, table, []), ...ownCautions(growth, expanded)],
  };
}

function refusedEntry(model: TruncationModel, priors: Priors): TruncationEstimate {
  return {
    model: model.name,
    title: model.title,
    nature: model.nature,
    about: model.about,
    reference: model.reference,
    priors: model.priors.map((name) => ({ name, value: String(priors[name]), meaning: PRIORS[name].meaning })),
    refused: NO_TERMS,
  };
}
