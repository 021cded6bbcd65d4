/**
 * @module The budget of a fit: every cause shifts all predictions at once, δp = −C Jᵀ V⁻¹ δX; where that is more than a few
 * per cent, the data are fitted again.
 */
import { component } from '../budget.js';
import type { Component, ComponentName, Shift } from '../budget.js';
import type { FitCause } from './fit-causes.js';
import { correlationOf } from './matrix.js';
import type { Matrix } from './matrix.js';
import { minimise, response } from './minimise.js';
import type { Minimum } from './minimise.js';
import type { FitModel, ShiftsOf } from './model.js';

export interface Fitted {
  readonly model: FitModel;
  readonly minimum: Minimum;
  readonly data: readonly number[];
  /** L of the covariance of the data. */
  readonly factor: Matrix;
  /** Covariance of the measurements alone. */
  readonly measured: Matrix;
}

/** What one variation does. */
export interface Effect {
  readonly component: ComponentName;
  readonly label: string;
  readonly cause: string;
  /** Shift of each prediction. */
  readonly delta: readonly number[];
  /** Shift of each parameter. */
  readonly shift: readonly number[];
  readonly how: Shift['how'];
}

/** Relative shifts beyond this are fitted again, as for one measurement. */
const LINEAR = 0.05;

function effectOf(fitted: Fitted, shifts: ShiftsOf): Pick<Effect, 'delta' | 'shift' | 'how'> | undefined {
  const { model, minimum, data, factor } = fitted;
  const there = model.vector(shifts)(minimum.parameters);
  if (there === undefined) return undefined;
  const delta = there.map((x, i) => x - (minimum.theory[i] ?? NaN));
  const linear = response(minimum, factor, delta);
  const small = linear.every((d, k) => Math.abs(d) <= LINEAR * Math.abs(minimum.parameters[k] ?? 0));
  if (small) return { delta, shift: linear, how: 'slope' };
  const again = minimise(model.vector(shifts), data, factor, minimum.parameters);
  if (again === undefined) return undefined;
  const shift = again.parameters.map((p, k) => p - (minimum.parameters[k] ?? NaN));
  return { delta, shift, how: 'refit' };
}

/** Every variation of every cause, and those that have no answer. */
export function effectsOf(fitted: Fitted, causes: readonly FitCause[]): { effects: Effect[]; silent: string[] } {
  const effects: Effect[] = [];
  const silent: string[] = [];
  for (const { component: name, label, variations } of causes) {
    for (const { cause, shifts } of variations) {
      const found = effectOf(fitted, shifts);
      if (found === undefined) silent.push(cause);
      else effects.push({ component: name, label, cause, ...found });
    }
  }
  return { effects, silent };
}

const NAMES: readonly ComponentName[] = [
  'inputs',
  'coefficients',
  'power corrections',
  'truncation',
  'scale',
  'ambiguity',
];

/** The components of one parameter. */
export function fitComponents(
  fitted: Fitted,
  effects: readonly Effect[],
  silent: readonly string[],
  k: number,
): readonly Component[] {
  const { minimum, factor } = fitted;
  const sigma = Math.sqrt(varianceFrom(minimum, factor, fitted.measured, k));
  const measurement = component('measurement', [], { sides: { plus: sigma, minus: sigma } });
  const others = NAMES.map((name) => {
    const own = effects.filter((e) => e.component === name);
    const labels = [...new Set(own.map((e) => e.label))];
    const sources = labels.map((label) => ({
      label,
      shifts: own
        .filter((e) => e.label === label)
        .map((e): Shift => ({ cause: e.cause, shift: e.shift[k] ?? NaN, how: e.how })),
    }));
    const whole = component(name, sources);
    // Ambiguities of several series are ranges: they add up.
    const sides = { plus: 0, minus: 0 };
    for (const s of sources) {
      sides.plus += Math.max(0, ...s.shifts.map((x) => x.shift));
      sides.minus += Math.max(0, ...s.shifts.map((x) => -x.shift));
    }
    return name === 'ambiguity' ? { ...whole, ...sides } : whole;
  });
  const note = silent.length === 0 ? undefined : `left out, without a value: ${silent.join(', ')}`;
  return [measurement, ...others.map((c) => (c.name === 'scale' && note !== undefined ? { ...c, note } : c))];
}

/** Variance of parameter k from the covariance of the measurements: R V_m Rᵀ with R = C Jᵀ V⁻¹. */
function varianceFrom(minimum: Minimum, factor: Matrix, measured: Matrix, k: number): number {
  const n = measured.length;
  const weights = Array.from({ length: n }, (_, i) => {
    const unit = Array.from({ length: n }, (__, j) => (i === j ? 1 : 0));
    return response(minimum, factor, unit)[k] ?? 0;
  });
  return measured.reduce(
    (sum, row, i) => sum + row.reduce((s, v, j) => s + v * (weights[i] ?? 0) * (weights[j] ?? 0), 0),
    0,
  );
}

/** Covariance of the predictions under one component: half differences of opposite variations, independent labels added. */
export function componentCovariance(effects: readonly Effect[], name: ComponentName, n: number): Matrix {
  const own = effects.filter((e) => e.component === name);
  const vectors = [...new Set(own.map((e) => e.label))].map((label) => {
    const list = own.filter((e) => e.label === label).map((e) => e.delta);
    const [first = [], last = []] = [list[0], list.length > 1 ? list.at(-1) : []];
    return Array.from({ length: n }, (_, i) => ((first[i] ?? 0) - (last[i] ?? 0)) / (list.length > 1 ? 2 : 1));
  });
  return Array.from({ length: n }, (_, i) =>
    Array.from({ length: n }, (__, j) => vectors.reduce((sum, v) => sum + (v[i] ?? 0) * (v[j] ?? 0), 0)),
  );
}

export const componentCorrelation = (effects: readonly Effect[], name: ComponentName, n: number): Matrix =>
  correlationOf(componentCovariance(effects, name, n));
