/** @module The inputs of a Monte Carlo as they are collected: each once, with its errors and its correlations. */
import { cholesky } from '../../numerics/index.js';
import { refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import type { Inputs, Slot } from './problem.js';

export interface Errors {
  readonly plus: number;
  readonly minus: number;
}

export class SlotList {
  private readonly names: string[] = [];
  private readonly central: number[] = [];
  private readonly plus: number[] = [];
  private readonly minus: number[] = [];
  private readonly rho: { readonly a: Slot; readonly b: Slot; readonly value: number }[] = [];
  private readonly parameters: number;

  constructor(parameters: number) {
    this.parameters = parameters;
  }

  /** The slot of the input of that name; the first to name it sets its value. */
  add(name: string, central: number, errors: Errors = { plus: 0, minus: 0 }): Slot {
    const known = this.names.indexOf(name);
    if (known >= 0) return this.parameters + known;
    this.names.push(name);
    this.central.push(central);
    this.plus.push(errors.plus);
    this.minus.push(errors.minus);
    return this.parameters + this.names.length - 1;
  }

  correlate(a: Slot, b: Slot, value: number): void {
    if (a !== b && value !== 0) this.rho.push({ a, b, value });
  }

  /** Central value and errors of a slot. */
  at(slot: Slot): { readonly central: number } & Errors {
    const i = slot - this.parameters;
    return { central: this.central[i] ?? NaN, plus: this.plus[i] ?? 0, minus: this.minus[i] ?? 0 };
  }

  /** The list, with the factor of the correlation matrix of what is drawn. */
  inputs(): Inputs | Refusal {
    const { names, central, plus, minus } = this;
    const drawn = names.flatMap((_, i) => (plus[i]! > 0 || minus[i]! > 0 ? [i] : []));
    const matrix = drawn.map((_, k) => drawn.map((_other, l): number => (k === l ? 1 : 0)));
    for (const { a, b, value } of this.rho) {
      const [k, l] = [drawn.indexOf(a - this.parameters), drawn.indexOf(b - this.parameters)];
      if (k < 0 || l < 0) continue;
      matrix[k]![l] = value;
      matrix[l]![k] = value;
    }
    const factor = cholesky(matrix);
    if (!Array.isArray(factor)) {
      return refuse(
        `the correlations of ${names[drawn[factor.row]!] ?? 'an input'} with those before it exclude each other: the matrix is not positive`,
        'check the correlation matrix: no entry beyond 1 in size, and such as can occur together',
      );
    }
    return { names, central, plus, minus, drawn, factor };
  }
}
