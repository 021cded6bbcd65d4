/** @module Monte Carlos with a known answer. */
import type { DatumModel, Inputs, ReplicaProblem } from '../../../src/extraction/replicas/problem.js';

/** Inputs behind one parameter: [name, central, error]. */
export function inputsOf(list: readonly (readonly [string, number, number])[], factor?: Inputs['factor']): Inputs {
  const drawn = list.flatMap(([, , error], i) => (error > 0 ? [i] : []));
  return {
    names: list.map(([name]) => name),
    central: list.map(([, central]) => central),
    plus: list.map(([, , error]) => error),
    minus: list.map(([, , error]) => error),
    drawn,
    factor: factor ?? drawn.map((_, k) => drawn.map((_other, l) => (k === l ? 1 : 0)).slice(0, k + 1)),
  };
}

export const datum = (more: Partial<DatumModel>): DatumModel => ({
  series: 'toy',
  coupling: { kind: 'slot', slot: 0 },
  divisor: 1,
  additive: 0,
  factor: 1,
  power: 1,
  coefficients: [],
  massPower: 0,
  terms: [],
  ...more,
});

const fixedOrder = (terms: number, central: readonly number[]): ReplicaProblem['prescriptions'][number] => ({
  name: 'fixed-order',
  variants: ['all'],
  settings: [{ kind: 'fixed-order', terms }],
  central,
});

/** R = α: the unknown is the measurement itself, 0.3 ± 0.01. */
export const identity: ReplicaProblem = {
  task: { kind: 'root' },
  parameters: [{ symbol: 'alpha', from: 0.01, to: 1 }],
  inputs: inputsOf([
    ['measurement', 0.3, 0.01],
    ['c0', 1, 0],
  ]),
  data: [datum({ coefficients: [2], measured: 1 })],
  prescriptions: [fixedOrder(1, [0.3])],
};

/** R = α + c α², c = 2 ± 0.5, measured 0.4 ± 0.02: α = (√(1 + 4 c X) − 1)/(2 c). */
export const quadratic: ReplicaProblem = {
  task: { kind: 'root' },
  parameters: [{ symbol: 'alpha', from: 0.01, to: 1 }],
  inputs: inputsOf([
    ['measurement', 0.4, 0.02],
    ['c0', 1, 0],
    ['c1', 2, 0.5],
  ]),
  data: [datum({ coefficients: [2, 3], measured: 1 })],
  prescriptions: [fixedOrder(2, [(Math.sqrt(1 + 4 * 2 * 0.4) - 1) / 4])],
};

/** X = 1.5 (a + (0.7/1.5) b) with variances 0.04, 0.09 and covariance −0.015: as J = (1.5, −0.7) with +0.015. */
export const correlated: ReplicaProblem = {
  task: { kind: 'prediction' },
  parameters: [{ symbol: 'X', from: -Infinity, to: Infinity }],
  inputs: inputsOf(
    [
      ['a', 1, 0.2],
      ['b', 2, 0.3],
      ['alpha', 0.7 / 1.5, 0],
    ],
    [[1], [-0.25, Math.sqrt(1 - 0.0625)]],
  ),
  data: [datum({ coupling: { kind: 'slot', slot: 3 }, factor: 1.5, power: 0, coefficients: [1, 2] })],
  prescriptions: [fixedOrder(2, [1.5 + 1.4])],
};
