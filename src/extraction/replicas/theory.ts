/**
 * @module X of one datum by one prescription in doubles, as a function of the state of a replica. See problem.ts for the formula.
 */
import { makeKernel, readsCircle } from '../../fast/index.js';
import type { FastSetting, Kernel } from '../../fast/index.js';
import { MapReader } from '../../numerics/index.js';
import type { CouplingSource, DatumModel, PowerTermModel } from './problem.js';

/** The coupling of a datum: a slot, or a map of which only the first variable moves within a replica. */
export class Coupling {
  private readonly reader: MapReader | undefined;
  private readonly source: CouplingSource;
  private readonly others: Float64Array;

  constructor(source: CouplingSource) {
    this.source = source;
    this.reader = source.kind === 'map' ? new MapReader(source.map) : undefined;
    this.others = new Float64Array(source.kind === 'map' ? source.variables.length - 1 : 0);
  }

  /** Takes the inputs of a replica. */
  prepare(state: Float64Array): void {
    if (this.source.kind !== 'map' || this.reader === undefined) return;
    const { variables } = this.source;
    for (let k = 1; k < variables.length; k++) this.others[k - 1] = state[variables[k]!]!;
    this.reader.fix(this.others);
  }

  /** α; NaN outside the range of its map. */
  at(state: Float64Array): number {
    if (this.source.kind === 'slot') return state[this.source.slot]!;
    return this.reader!.at(state[this.source.variables[0]!]!);
  }
}

/** C_d(x)/Q^d. */
export function powerWeight(term: Omit<PowerTermModel, 'value'>, x: number, Q: number): number {
  let series = 1;
  for (let k = 0; k < term.corrections.length; k++) series += term.corrections[k]! * x ** (k + 1);
  return (term.wilson * series) / Q ** term.dimension;
}

/** The part of a datum that prescriptions share. */
export class DatumInputs {
  readonly model: DatumModel;
  readonly coupling: Coupling;
  /** The coefficients of the expansion, and those of D behind it for a contour quantity (else the same). */
  readonly coefficients: Float64Array;
  readonly inCircle: Float64Array;
  /** Is a parameter among the further variables of the coupling's map? Then the map is fixed anew at every evaluation. */
  readonly restless: boolean;

  constructor(model: DatumModel, parameters: number) {
    this.model = model;
    this.coupling = new Coupling(model.coupling);
    this.inCircle = new Float64Array(model.coefficients.length);
    this.coefficients = model.circle === undefined ? this.inCircle : new Float64Array(model.circle.length);
    this.restless =
      model.coupling.kind === 'map' && model.coupling.variables.slice(1).some((slot) => slot < parameters);
  }

  prepare(state: Float64Array): void {
    this.coupling.prepare(state);
    const { coefficients, circle } = this.model;
    for (let n = 0; n < coefficients.length; n++) this.inCircle[n] = state[coefficients[n]!]!;
    if (circle === undefined) return;
    for (let n = 0; n < circle.length; n++) {
      const row = circle[n]!;
      let sum = 0;
      for (let k = 0; k < row.length; k++) sum += row[k]! * this.inCircle[k]!;
      this.coefficients[n] = sum;
    }
  }
}

export class DatumTheory {
  readonly shared: DatumInputs;
  private readonly kernel: Kernel;
  private readonly coefficients: Float64Array;
  /** Tables of what is added to the coefficients at a mass, and room for the sums. */
  private readonly drift: readonly MapReader[];
  private readonly moved: Float64Array;

  constructor(shared: DatumInputs, setting: FastSetting) {
    this.shared = shared;
    this.coefficients = readsCircle(setting) ? shared.inCircle : shared.coefficients;
    this.kernel = makeKernel(setting);
    this.drift = shared.model.drift?.maps.map((map) => new MapReader(map)) ?? [];
    this.moved = new Float64Array(this.coefficients.length);
  }

  /** Takes the coefficients of a replica; false where the prescription refuses them. Those that move are taken with the mass. */
  prepare(): boolean {
    return this.drift.length > 0 || this.kernel.prepare(this.coefficients);
  }

  private follow(m: number): boolean {
    for (let n = 0; n < this.moved.length; n++) this.moved[n] = this.coefficients[n]! + (this.drift[n]?.at(m) ?? 0);
    return this.kernel.prepare(this.moved);
  }

  /** R at the coupling of the state, with the power corrections; without norm and mass. NaN where there is none. */
  sum(state: Float64Array): number {
    const { model, coupling, restless } = this.shared;
    if (restless) coupling.prepare(state);
    const x = coupling.at(state) / model.divisor;
    if (!(x > 0)) return NaN;
    if (model.drift !== undefined && !this.follow(state[model.drift.variable]!)) return NaN;
    let value = model.additive + model.factor * (model.power === 0 ? 1 : x ** model.power) * this.kernel.value(x);
    for (let k = 0; k < model.terms.length; k++) {
      const term = model.terms[k]!;
      value += powerWeight(term, x, model.scale === undefined ? 1 : state[model.scale]!) * state[term.value]!;
    }
    return value;
  }

  /** norm · m^massPower. */
  front(state: Float64Array): number {
    const { norm, mass, massPower } = this.shared.model;
    const front = norm === undefined ? 1 : state[norm]!;
    return mass === undefined ? front : front * state[mass]! ** massPower;
  }

  /** X. */
  value(state: Float64Array): number {
    return this.front(state) * this.sum(state);
  }
}
