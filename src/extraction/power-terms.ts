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
import type { CondensateDefinition, Problem } from './problem.js';

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
export function wilsonOf(
  series: Series,
  c: Condensate,
): Omit<PowerTerm, 'value' | 'plus' | 'minus' | 'origin'> | Refusal {
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
function named(series: Series, name: string, hasValue: boolean): Condensate | Refusal {
  const all = series.condensates.filter((c) => c.name === name);
  const [first] = all;
  if (first === undefined) {
    const known = [...new Set(series.condensates.map((c) => c.name))];
    return refuse(
      `${series.id} has no condensate "${name}"`,
      known.length === 0 ? 'the file states none: write condensates: into it' : `one of ${known.join('; ')}`,
    );
  }
  if (hasValue || all.length === 1) return first;
  const values = all.map((c) => `${c.value?.text ?? 'no value'} ${c.unit ?? ''} (${c.source ?? 'no source'})`);
  return refuse(
    `${series.id} has ${all.length} values of ${name}: ${values.join('; ')}`,
    `say which: --condensate '${name}=${first.value?.text ?? '0.01'} ${first.unit ?? `GeV^${first.dimension.toString()}`}'`,
  );
}

/** The chosen power corrections of a series. */
export function powerTerms(series: Series, problem: Pick<Problem, 'condensates'>): readonly PowerTerm[] | Refusal {
  const terms: PowerTerm[] = [];
  for (const choice of problem.condensates) {
    const c = named(series, choice.name, choice.value !== undefined);
    if ('reason' in c) return c;
    const wilson = wilsonOf(series, c);
    if ('reason' in wilson) return wilson;
    const { value } = choice;
    if (value !== undefined) {
      if (value.dimension !== undefined && value.dimension !== wilson.dimension) {
        return refuse(
          `${value.text} has the unit GeV^${value.dimension}, but ${c.name} has dimension ${wilson.dimension}`,
          `give its value in GeV^${wilson.dimension}`,
        );
      }
      const { plus, minus } = value;
      terms.push({ ...wilson, value: Number(value.value), plus, minus, origin: value.text });
      continue;
    }
    const own = fromFile(series, c);
    if ('reason' in own) return own;
    terms.push({ ...wilson, ...own });
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

export const DEFINITION_WORDS: Readonly<Record<CondensateDefinition['kind'], string>> = {
  pv: 'the principal value of the Borel sum',
  truncated: 'the truncated sum at the orders used',
  cutoff: 'a factorisation scale',
  any: 'no particular prescription',
};

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
