/** @module One prescription solved for the unknown: the row of the table, as numbers and as the plain result. */
import { Rational, exact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Prescription } from '../prescriptions/index.js';
import { isRefusal } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { indicative, valueCautions } from '../studies/index.js';
import type { Caution, Evaluated } from '../studies/index.js';
import { CONVENTION_WORDS, ambiguityAt } from './ambiguity-of.js';
import type { AmbiguityFound } from './ambiguity-of.js';
import { totals, withOverlaps } from './budget.js';
import type { Component } from './budget.js';
import { componentsOf } from './components.js';
import { leftOver, predict } from './direct.js';
import { componentEntry, errorText, totalsEntry } from './entries.js';
import { exactOf } from './place.js';
import type { PlaceOf } from './place.js';
import { DEFINITION_WORDS, definitionObjection } from './power-terms.js';
import type { Operator, PowerTerm } from './power-terms.js';
import { predictionOf } from './prediction.js';
import type { Datum, Problem } from './problem.js';
import type { AmbiguityEntry, ExtractRow } from './result.js';
import { FOLLOWED, solve } from './solve.js';
import type { Search, Solved } from './solve.js';
import type { Stages } from './stage.js';
import { theoryOf } from './theory.js';

/** The condensate that is extracted: its coefficient without a value. */
export type Extracted = Operator;

export interface Setting {
  readonly problem: Problem;
  readonly datum: Datum;
  readonly stages: Stages;
  readonly placeAt: PlaceOf;
  readonly terms: readonly PowerTerm[];
  /** The condensate that is extracted. */
  readonly extracted?: Extracted;
  readonly search?: Omit<Search, 'start'>;
}

/** The unknown by one prescription. */
export function solveRow(setting: Setting, prescription: Prescription, start?: number): Solved | Refusal {
  const { problem, datum, stages, placeAt, terms, search } = setting;
  for (const { definition } of terms) {
    const no = definitionObjection(definition, prescription);
    if (no !== undefined) return no;
  }
  const family = theoryOf(predictionOf(prescription, stages), placeAt, terms);
  if (problem.for === 'pole-mass') return predict(family, problem.digits);
  const target: Exact = datum.measured === undefined ? exact(Rational.ZERO) : exactOf(datum.measured);
  if (problem.for === 'condensate') {
    return setting.extracted === undefined
      ? { reason: 'no condensate is named', remedy: 'name it: --condensate' }
      : leftOver(family, target, setting.extracted, problem.digits);
  }
  const range = search ?? { from: 0.01, to: 1, weak: 'low' };
  return solve(family, target, { ...range, ...(start === undefined ? {} : { start }) }, problem.digits);
}

/** The solution as the studies' reports want it. */
export const evaluated = ({ theory, whole }: Solved): Evaluated => ({
  prescription: theory.prediction.prescription,
  outcome: { ...whole.sum, central: true },
});

export interface RowNumbers {
  readonly prescription: Prescription;
  readonly solved: Solved;
  readonly components: readonly Component[];
  readonly found: AmbiguityFound;
  readonly cautions: readonly Caution[];
}

/** Cautions of a value, and what its solution has to tell. */
export function cautionsOf(solved: Solved): Caution[] {
  const { theory, whole } = solved;
  const { prescription, stages } = theory.prediction;
  const list: Caution[] = [];
  const e = stages.central.at(whole.place.alpha);
  if (!isRefusal(e)) list.push(...valueCautions(e, stages.central.growth, prescription, whole.sum, undefined));
  if (solved.otherRoots.length > 0) {
    const others = solved.otherRoots.map((p) => indicative(p)).join(', ');
    list.push({ code: 'several roots', text: `the measurement is reproduced at ${others} as well` });
  }
  return [
    ...list,
    ...solved.notes.map((text) => ({ code: text.startsWith(FOLLOWED) ? 'followed' : 'solution', text })),
  ];
}

/** All numbers of a row; `others` lend their lateral sums to a prescription without any. */
export function rowNumbers(setting: Setting, solved: Solved, others: readonly Evaluated[]): RowNumbers {
  const { problem, datum } = setting;
  const found = ambiguityAt(solved, others, problem.ambiguityBy, setting.extracted);
  const components = withOverlaps(componentsOf(solved, problem, datum, found.ambiguity), found.leastTermReached);
  const { prescription } = solved.theory.prediction;
  return { prescription, solved, components, found, cautions: cautionsOf(solved) };
}

function ambiguityEntry({ found }: RowNumbers, problem: Problem): { ambiguity?: AmbiguityEntry } {
  const { ambiguity } = found;
  if (isRefusal(ambiguity)) return {};
  const { value, origin, dimension, GeV } = ambiguity;
  return {
    ambiguity: {
      convention: CONVENTION_WORDS[problem.ambiguityBy],
      origin,
      value: errorText(value),
      ...(dimension === undefined ? {} : { dimension: String(dimension) }),
      ...(GeV === undefined ? {} : { GeV: errorText(GeV) }),
    },
  };
}

/** Digits of the slope: from central differences at many digits. */
const SLOPE_DIGITS = 11;

export function rowEntry(row: RowNumbers, problem: Problem): ExtractRow {
  const { solved, components, cautions } = row;
  const { sum } = solved.whole;
  return {
    prescription: row.prescription.name,
    variant: sum.variant,
    value: solved.text,
    digits: solved.digits,
    trust: sum.trust,
    ...(problem.for === 'pole-mass' ? {} : { slope: indicative(solved.slope, SLOPE_DIGITS) }),
    ...(solved.otherRoots.length === 0 ? {} : { otherRoots: solved.otherRoots.map((p) => indicative(p, 8)) }),
    ...ambiguityEntry(row, problem),
    components: components.map(componentEntry),
    totals: totalsEntry(totals(components)),
    ...(problem.for === 'condensate' ? { belongsTo: belongsTo(row) } : {}),
    cautions,
  };
}

/** What a condensate that was extracted with this prescription belongs to. */
function belongsTo({ prescription, solved }: RowNumbers): string {
  const pv = definitionObjection({ kind: 'pv' }, prescription) === undefined;
  if (pv) return DEFINITION_WORDS.pv;
  return definitionObjection({ kind: 'truncated' }, prescription) === undefined
    ? `the truncated sum of ${solved.whole.sum.termsUsed} terms`
    : `the ${prescription.title} sum`;
}

export const refusedRow = (prescription: Prescription, refused: Refusal): ExtractRow => ({
  prescription: prescription.name,
  variant: '',
  cautions: [],
  refused,
});
