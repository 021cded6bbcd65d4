/** @module What an error budget shifts: every uncertain input of a theory, with its shifts by one standard deviation. */
import type { ComponentName } from './budget.js';
import type { Shifts } from './place.js';
import type { PowerTerm } from './power-terms.js';
import type { Datum, Problem } from './problem.js';
import type { Stages } from './stage.js';

export interface Variation {
  readonly cause: string;
  readonly shifts: Shifts;
}

/** One source of error: independent of the others in its component unless said otherwise. */
export interface Cause {
  readonly component: ComponentName;
  readonly label: string;
  readonly variations: readonly Variation[];
}

interface Errors {
  readonly plus: number;
  readonly minus: number;
}

const rounded = (x: number): string => String(Number(x.toPrecision(6)));

function cause(component: ComponentName, label: string, errors: Errors, shifts: (by: number) => Shifts): Cause {
  const { plus, minus } = errors;
  return {
    component,
    label,
    variations: [
      ...(plus > 0 ? [{ cause: `${label} +${rounded(plus)}`, shifts: shifts(plus) }] : []),
      ...(minus > 0 ? [{ cause: `${label} -${rounded(minus)}`, shifts: shifts(-minus) }] : []),
    ],
  };
}

/** A list that is zero but for one place. */
const only = (length: number, place: number, by: number): number[] =>
  Array.from({ length }, (_, j) => (j === place ? by : 0));

/** α_s, masses of the thresholds that the path crosses, the norm, the mass behind a pole mass. */
export function inputCauses(
  problem: Problem,
  datum: Datum,
  crossed: ReadonlySet<string | undefined>,
): readonly Cause[] {
  const alphaS = problem.coupling ?? problem.alphaS;
  const list: Cause[] = [];
  if (problem.for !== 'alpha_s' && problem.freeAlphaS !== true && alphaS !== undefined) {
    const label = problem.coupling === undefined ? 'α_s(M_Z)' : 'coupling';
    list.push(cause('inputs', label, alphaS, (by) => ({ alphaS: by })));
  }
  problem.thresholds.forEach((t, i) => {
    if (!crossed.has(t.name) || t.error === undefined) return;
    const errors = { plus: t.error, minus: t.error };
    list.push(cause('inputs', `m_${t.name}`, errors, (by) => ({ thresholds: only(problem.thresholds.length, i, by) })));
  });
  if (datum.norm !== undefined) list.push(cause('inputs', 'norm', datum.norm, (by) => ({ norm: by })));
  if (problem.for === 'pole-mass' && problem.mass !== undefined)
    list.push(cause('inputs', 'm(m)', problem.mass, (by) => ({ mass: by })));
  return list;
}

/** Orders of the coefficients with an error, among those that are used. */
export function noisyOrders(stages: Stages): readonly number[] {
  const { expansion, leadingZeros } = stages.central.expanded;
  const used = expansion.contour?.coefficients.length ?? expansion.coefficients.length + leadingZeros;
  return stages.series.coefficients.slice(0, used).flatMap((c, n) => (c.error === undefined ? [] : [n]));
}

/** One cause a coefficient with an error. */
export function coefficientCauses(stages: Stages): readonly Cause[] {
  const { coefficients, firstPower } = stages.series;
  return noisyOrders(stages).map((n) => {
    const error = coefficients[n]?.error;
    const errors = { plus: error?.plus.toNumber() ?? 0, minus: error?.minus.toNumber() ?? 0 };
    const vector = (by: number): Shifts => ({ coefficients: only(coefficients.length, n, by) });
    return cause('coefficients', `coefficient of order ${n + firstPower}`, errors, vector);
  });
}

export const powerCauses = (terms: readonly PowerTerm[]): readonly Cause[] =>
  terms.map((term, i) =>
    cause('power corrections', term.name, term, (by) => ({ condensates: only(terms.length, i, by) })),
  );

/** Renormalisation scales that are tried, μ′/μ, and their words. */
const SCALES: readonly (readonly [factor: number, words: string])[] = [
  [0.5, '1/2'],
  [Math.SQRT1_2, '1/√2'],
  [Math.SQRT2, '√2'],
  [2, '2'],
];

/** The renormalisation scale at several values within a factor of two: extremes need not lie at the ends. */
export const scaleCause: Cause = {
  component: 'scale',
  label: 'renormalisation scale',
  variations: SCALES.map(([factor, words]) => ({
    cause: `μ times ${words}`,
    shifts: { logScale: 2 * Math.log(factor) },
  })),
};

/** Something between two ends that R may still be away from its sum. */
export function remainderCause(component: ComponentName, label: string, low: number, high: number): Cause {
  return {
    component,
    label,
    variations: [
      ...(high === 0 ? [] : [{ cause: 'R above its sum', shifts: { remainder: high } }]),
      ...(low === 0 ? [] : [{ cause: 'R below its sum', shifts: { remainder: low } }]),
    ],
  };
}
