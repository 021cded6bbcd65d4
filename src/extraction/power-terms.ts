/**
 * @module Power corrections: C_d (1 + C_1 x + C_2 x² + …) ⟨O_d⟩ / Q^d, with the definition that the condensate belongs to.
 *
 * A condensate has no value without the prescription of the sum that it is added to: the value moves by the ambiguity when the
 * prescription changes. A value of stated definition is therefore added only to sums of that definition.
 * References: F. David, Nucl. Phys. B 234 (1984) 237; M. Beneke, Phys. Rept. 317 (1999) 1 (both from memory).
 */
import { toNumberExact } from '../numerics/index.js';
import type { Prescription } from '../prescriptions/index.js';
import { refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Condensate, Series } from '../series/index.js';
import type { CondensateChoice, CondensateDefinition, Problem } from './problem.js';

export interface PowerTerm {
  readonly name: string;
  readonly dimension: number;
  /** C_d, and C_1, C_2, … in powers of x. */
  readonly wilson: number;
  readonly corrections: readonly number[];
  /** ⟨O_d⟩ in GeV^d (or in the units of the series, without a hard scale in GeV). */
  readonly value: number;
  readonly plus: number;
  readonly minus: number;
  readonly origin: string;
  /** The sum that the value belongs to. */
  readonly definition: CondensateDefinition;
}

/** C_d(x)/Q^d. */
export function powerFactor(
  term: Pick<PowerTerm, 'wilson' | 'corrections' | 'dimension'>,
  x: number,
  Q: number,
): number {
  const series = term.corrections.reduce((sum, c, k) => sum + c * x ** (k + 1), 1);
  return (term.wilson * series) / Q ** term.dimension;
}

const GEV_POWER = /^(GeV|MeV)(?:\^\S+)?$/;

/** C_1, C_2, … of the singularity of the same dimension. */
function corrections(series: Series, dimension: number): readonly number[] {
  const found = series.singularities.find((s) => {
    const d = s.dimension?.toNumber() ?? (s.u === undefined ? undefined : 2 * toNumberExact(s.u));
    return d === dimension && s.wilsonCorrections !== undefined;
  });
  return found?.wilsonCorrections?.map(toNumberExact) ?? [];
}

/** The operator's coefficient function, whatever its value. */
export function wilsonOf(series: Series, c: Condensate): Operator | Refusal {
  const dimension = c.dimension.toNumber();
  if (c.wilson === undefined) {
    return refuse(
      `the condensate ${c.name} of ${series.id} has no Wilson coefficient`,
      'write "wilson:" beside it in the series file',
    );
  }
  return { name: c.name, dimension, wilson: toNumberExact(c.wilson), corrections: corrections(series, dimension) };
}

/** The condensate of that name; names that occur several times need a value beside them. */
function named(series: Series, { name, value }: CondensateChoice): Condensate | Refusal {
  const all = series.condensates.filter((c) => c.name === name);
  const [first] = all;
  if (first === undefined) {
    const known = [...new Set(series.condensates.map((c) => c.name))];
    return refuse(
      `${series.id} has no condensate "${name}"`,
      known.length === 0 ? 'the file states none: write condensates: into it' : `one of ${known.join('; ')}`,
    );
  }
  if (value !== undefined || all.length === 1) return first;
  const values = all.map((c) => `${c.value?.text ?? 'no value'} ${c.unit ?? ''} (${c.source ?? 'no source'})`);
  return refuse(
    `${series.id} has ${all.length} values of ${name}: ${values.join('; ')}`,
    `say which: --condensate '${name}=${first.value?.text ?? '0.01'} ${first.unit ?? `GeV^${first.dimension.toString()}`}'`,
  );
}

/** A definition in the words of a series file. */
export function definitionOf(words: string | undefined): CondensateDefinition | undefined {
  if (words === 'principal value') return { kind: 'pv' };
  if (words === 'truncated sum') return { kind: 'truncated' };
  const cut = /^cut-off (\d+(?:\.\d+)?) ?([GM])eV$/.exec(words ?? '');
  return cut === null ? undefined : { kind: 'cutoff', mu: Number(cut[1]) * (cut[2] === 'M' ? 1e-3 : 1) };
}

const sameDefinition = (a: CondensateDefinition, b: CondensateDefinition): boolean =>
  a.kind === b.kind && (a.kind !== 'cutoff' || b.kind !== 'cutoff' || a.mu === b.mu);

/** The power correction of one condensate of the file, with a value of one's own or the file's. */
function termOf(
  series: Series,
  c: Condensate,
  choice: CondensateChoice,
  by: CondensateDefinition | undefined,
): PowerTerm | Refusal {
  const wilson = wilsonOf(series, c);
  if ('reason' in wilson) return wilson;
  const { value } = choice;
  const stated = value === undefined ? definitionOf(c.definedBy) : undefined;
  const definition = by ?? stated;
  if (definition === undefined) {
    return refuse(
      `the value of ${c.name} belongs to one prescription of the sum, and it is not said to which`,
      'say it: --condensate-by pv, truncated or cutoff:1GeV; or any, to mix them knowingly',
    );
  }
  if (stated !== undefined && by !== undefined && by.kind !== 'any' && !sameDefinition(stated, by)) {
    return refuse(
      `the file says that the value of ${c.name} is defined by the ${c.definedBy ?? ''}, not by what --condensate-by says`,
      'leave --condensate-by out, or give a value of your own',
    );
  }
  if (value === undefined) {
    const own = fromFile(series, c);
    return 'reason' in own ? own : { ...wilson, ...own, definition };
  }
  if (value.dimension !== undefined && value.dimension !== wilson.dimension) {
    return refuse(
      `${value.text} has the unit GeV^${value.dimension}, but ${c.name} has dimension ${wilson.dimension}`,
      `give its value in GeV^${wilson.dimension}`,
    );
  }
  const { plus, minus } = value;
  return { ...wilson, value: Number(value.value), plus, minus, origin: value.text, definition };
}

/** Condensates that enter without being asked for: those of which the file says to what their value belongs. */
const defined = (series: Series): readonly Condensate[] =>
  series.condensates.filter((c) => c.value !== undefined && c.wilson !== undefined && c.definedBy !== undefined);

/** The power corrections of a series: those chosen, and those that the file defines; `except` is the one to be extracted. */
export function powerTerms(
  series: Series,
  { condensates, condensateBy, fileCondensates }: Pick<Problem, 'condensates' | 'condensateBy' | 'fileCondensates'>,
  except?: string,
): readonly PowerTerm[] | Refusal {
  const terms: PowerTerm[] = [];
  const own = fileCondensates === false ? [] : defined(series).map((c) => c.name);
  const names = [...new Set(own)].filter((name) => name !== except && condensates.every((c) => c.name !== name));
  for (const choice of [...condensates, ...names.map((name): CondensateChoice => ({ name }))]) {
    const c = named(series, choice);
    if ('reason' in c) return c;
    const term = termOf(series, c, choice, names.includes(choice.name) ? undefined : condensateBy);
    if ('reason' in term) return term;
    terms.push(term);
  }
  return terms;
}

function fromFile(series: Series, c: Condensate): Pick<PowerTerm, 'value' | 'plus' | 'minus' | 'origin'> | Refusal {
  if (c.value === undefined) {
    return refuse(`${series.id} states no value of ${c.name}`, `give one: --condensate '${c.name}=0.01 GeV^4'`);
  }
  const unit = GEV_POWER.exec(c.unit ?? '')?.[1];
  if (unit === undefined) {
    return refuse(
      `the value of ${c.name} is in ${c.unit ?? 'no unit'}, and the hard scale is in GeV`,
      `give it in GeV: --condensate '${c.name}=0.01 GeV^${c.dimension.toString()}'`,
    );
  }
  const scale = unit === 'MeV' ? 1e-3 ** c.dimension.toNumber() : 1;
  return {
    value: toNumberExact(c.value.value) * scale,
    plus: (c.value.error?.plus.toNumber() ?? 0) * scale,
    minus: (c.value.error?.minus.toNumber() ?? 0) * scale,
    origin: `${c.value.text} ${c.unit ?? ''}${c.source === undefined ? '' : `, ${c.source}`}`,
  };
}

/** Sums of lateral sums: their mean is the principal value. */
const PRINCIPAL = [
  'terminant', 'hyperasymptotic', 'borel-pade', 'borel-leroy-pade', 'borel-dlog', 'borel-partial-pade', 'borel-quadratic',
  'borel-conformal', 'borel-hypergeometric', 'singularity-model',
]; // prettier-ignore
const TRUNCATED = ['fixed-order', 'least-term', 'fac', 'pms', 'blm'];

/** The operator's coefficient without a value. */
export type Operator = Omit<PowerTerm, 'value' | 'plus' | 'minus' | 'origin' | 'definition'>;

export const DEFINITION_WORDS: Readonly<Record<CondensateDefinition['kind'], string>> = {
  pv: 'the principal value of the Borel sum',
  truncated: 'the truncated sum at the orders used',
  cutoff: 'a factorisation scale',
  any: 'no particular prescription',
};

export const definitionWords = (d: CondensateDefinition): string =>
  d.kind === 'cutoff' ? `a factorisation scale of ${d.mu} GeV` : DEFINITION_WORDS[d.kind];

/** Why a condensate of that definition may not be added to the sums of a prescription; undefined when it may. */
export function definitionObjection(definition: CondensateDefinition, prescription: Prescription): Refusal | undefined {
  const { name } = prescription;
  if (definition.kind === 'any' || definition.kind === 'cutoff') return undefined;
  const fits = (definition.kind === 'pv' ? PRINCIPAL : TRUNCATED).includes(name);
  if (fits) return undefined;
  return refuse(
    `the condensate value belongs to ${DEFINITION_WORDS[definition.kind]}, which ${name} is not`,
    `leave ${name} out, or give a value that belongs to it`,
  );
}
