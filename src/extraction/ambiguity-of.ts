/** @module The renormalon ambiguity of R at a solution, under one named convention. */
import { toNumberExact } from '../numerics/index.js';
import { imaginaryPieces } from '../prescriptions/index.js';
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { ambiguityReport, fixedOrderSeries, termTable } from '../studies/index.js';
import type { Evaluated } from '../studies/index.js';
import type { Expansion } from '../series/index.js';
import type { Operator } from './power-terms.js';
import type { AmbiguityName } from './problem.js';
import type { Solved } from './solve.js';

export interface Ambiguity {
  /** Size in units of R. */
  readonly value: number;
  readonly origin: string;
  /** d of the leading power correction, when it is known. */
  readonly dimension?: number;
  /** In GeV^d, when the hard scale is known as well. */
  readonly GeV?: number;
}

const CONVENTION = {
  im: '|Im|',
  'im/pi': '|Im|/pi',
  'least-term': 'least term',
  'near-least': 'near-least partial sums',
} as const;

export const CONVENTION_WORDS: Readonly<Record<AmbiguityName, string>> = {
  im: '|Im|, half the difference of the lateral sums',
  'im/pi': '|Im|/π',
  'least-term': 'the least term',
  'near-least': 'half the range of the partial sums near the least term',
  none: 'none',
};

export interface AmbiguityFound {
  readonly ambiguity: Ambiguity | Refusal;
  /** Do the known orders reach the least term at this coupling? */
  readonly leastTermReached: boolean;
}

/** Two positions are one within this relative distance. */
const SAME = 1e-9;
/** Digits of the terms that a convention looks at. */
const DIGITS = 12;

/**
 * The ambiguity at a solution: from the prescription's own lateral sums, or for a prescription without any from those of the
 * others, most structured first. For a condensate: that of its own singularity, where a model tells the singularities apart.
 */
export function ambiguityAt(
  solved: Solved,
  others: readonly Evaluated[],
  name: AmbiguityName,
  operator?: Operator,
): AmbiguityFound {
  const { theory, whole } = solved;
  const { stages, prescription } = theory.prediction;
  const stage = stages.central;
  const expansion = stage.at(whole.place.alpha);
  if (isRefusal(expansion)) return { ambiguity: expansion, leastTermReached: false };
  const expanded = { ...stage.expanded, expansion };
  const table = termTable(fixedOrderSeries(stages.series), expanded, DIGITS);
  const leastTermReached = table.least?.reached === true;
  const own: Evaluated = { prescription, outcome: { ...whole.sum, central: true } };
  const values = whole.sum.imaginary === undefined ? others : [own];
  const found = ambiguityReport(stages.series, expanded, stage.growth, table, values);
  if (name === 'none') return { ambiguity: refuse('left out as asked', 'choose a convention'), leastTermReached };
  const piece = operator === undefined ? undefined : ownPiece(expansion, operator, name);
  if (piece !== undefined) return { ambiguity: inGeV(piece, operator?.dimension, whole.place.Q), leastTermReached };
  const convention = found.list.find((c) => c.name === CONVENTION[name]);
  if (convention === undefined) {
    const reason = found.list.length === 0 ? found.report.statement : `${CONVENTION[name]} cannot be stated here`;
    return { ambiguity: refuse(reason, 'choose another convention: --ambiguity-by'), leastTermReached };
  }
  // |Im|/π names its source only beside |Im|.
  const lateral = found.list.find((c) => c.name === CONVENTION.im);
  const origin = name === 'im/pi' ? `${lateral?.origin ?? convention.origin}, divided by π` : convention.origin;
  return { ambiguity: inGeV({ value: convention.value, origin }, found.dimension, whole.place.Q), leastTermReached };
}

const inGeV = (a: Ambiguity, dimension: number | undefined, Q: number | undefined): Ambiguity => ({
  ...a,
  ...(dimension === undefined ? {} : { dimension }),
  ...(dimension === undefined || Q === undefined ? {} : { GeV: a.value * Q ** dimension }),
});

/** What the operator's own singularity contributes to the imaginary part, where a model tells the singularities apart. */
function ownPiece(e: Expansion, { dimension }: Operator, name: AmbiguityName): Ambiguity | undefined {
  if (name !== 'im' && name !== 'im/pi') return undefined;
  const s = e.stated.find((one) => one.dimension !== undefined && toNumberExact(one.dimension) === dimension);
  const t = s === undefined ? undefined : toNumberExact(s.t);
  const piece = t === undefined ? undefined : imaginaryPieces(e).find((p) => Math.abs(p.t - t) < SAME * Math.abs(t));
  if (piece === undefined) return undefined;
  const origin = `|Im| of the singularity of dimension ${dimension} alone, in the singularity model`;
  return name === 'im'
    ? { value: Math.abs(piece.im), origin }
    : { value: Math.abs(piece.im) / Math.PI, origin: `${origin}, divided by π` };
}
