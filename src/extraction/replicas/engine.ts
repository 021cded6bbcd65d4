/**
 * @module One replica after another: inputs drawn, the unknown solved for by every prescription.
 *
 * The start of each solution is the central one moved by the linear response to the deviates drawn, so that nothing depends on
 * which replica came before. Slopes and responses are made once, from the same functions.
 */
import { Draw, place } from './draw.js';
import { FitWork } from './fit.js';
import type { ReplicaProblem } from './problem.js';
import { quantitiesOf } from './problem.js';
import { rootNear } from './root.js';
import { Coupling, DatumInputs, DatumTheory, powerWeight } from './theory.js';

/** Why a prescription has no value in a replica. */
export const FAILURES = ['refused', 'no solution', 'out of range'] as const;
/** Codes in the results: 0 a value, else 1 + the place in FAILURES. */
export const [REFUSED, UNSOLVED, OUT_OF_RANGE] = [1, 2, 3] as const;

/** Deviates by which the responses are measured: small enough to be linear, large enough not to drown in rounding. */
const DEVIATE = 2 ** -8;
/** Relative step of the slope. */
const STEP = 2 ** -20;

export class Engine {
  readonly problem: ReplicaProblem;
  readonly quantities: number;
  /** Central quantities of each prescription; NaN where the fast version has none. */
  readonly central: readonly Float64Array[];
  /** responses[p][j]: change of the quantities by deviate j, for unit deviate. */
  readonly responses: readonly (readonly Float64Array[])[];
  private readonly state: Float64Array;
  private readonly draw: Draw;
  private readonly inputs: readonly DatumInputs[];
  private readonly theories: readonly (readonly DatumTheory[])[];
  private readonly slopes: number[];
  private readonly derived: Coupling | undefined;
  private readonly fits: readonly (FitWork | undefined)[];
  private readonly measured: Float64Array;
  private readonly parameters: Float64Array;
  private readonly start: Float64Array;
  private readonly out: Float64Array;
  private readonly ranges: { readonly from: readonly number[]; readonly to: readonly number[] };

  constructor(problem: ReplicaProblem, seed: number) {
    const count = problem.parameters.length;
    this.problem = problem;
    this.quantities = quantitiesOf(problem);
    this.state = new Float64Array(count + problem.inputs.central.length);
    this.draw = new Draw(problem.inputs, seed);
    this.inputs = problem.data.map((d) => new DatumInputs(d, count));
    this.theories = problem.prescriptions.map((p) =>
      this.inputs.map((shared, d) => new DatumTheory(shared, p.settings[d]!)),
    );
    const { derived } = problem;
    this.derived = derived && new Coupling({ kind: 'map', map: derived.map, variables: derived.variables });
    this.fits = problem.prescriptions.map(
      ({ whitening }) => whitening && new FitWork(problem.data.length, count, whitening),
    );
    this.measured = new Float64Array(problem.data.length);
    this.parameters = new Float64Array(count);
    this.start = new Float64Array(count);
    this.out = new Float64Array(this.quantities);
    this.ranges = { from: problem.parameters.map((p) => p.from), to: problem.parameters.map((p) => p.to) };
    this.slopes = problem.prescriptions.map(() => NaN);
    this.central = problem.prescriptions.map((_, p) => this.centralOf(p));
    this.responses = problem.prescriptions.map((_, p) => this.responsesOf(p));
  }

  /** Draws replica `index` and takes its inputs. */
  private take(index: number): void {
    this.draw.replica(index, this.state, this.problem.parameters.length);
    this.prepare();
  }

  private prepare(): void {
    const { state } = this;
    for (const shared of this.inputs) shared.prepare(state);
    this.derived?.prepare(state);
    this.problem.data.forEach((d, i) => {
      this.measured[i] = d.measured === undefined ? 0 : state[d.measured]!;
    });
  }

  /** Inputs for the given deviates. */
  private takeDeviates(z: ArrayLike<number>): void {
    place(this.problem.inputs, z, this.state, this.problem.parameters.length);
    this.prepare();
  }

  /** X of datum d at parameter 0 = value. */
  private at(p: number, d: number, value: number): number {
    this.state[0] = value;
    return this.theories[p]![d]!.value(this.state);
  }

  private ready(p: number): boolean {
    return this.theories[p]!.every((t) => t.prepare());
  }

  private centralOf(p: number): Float64Array {
    const z = new Float64Array(this.problem.inputs.drawn.length);
    this.takeDeviates(z);
    this.start.set(this.problem.prescriptions[p]!.central);
    const result = new Float64Array(this.quantities).fill(NaN);
    if (!this.ready(p)) return result;
    if (this.problem.task.kind === 'root') {
      const at = this.start[0]!;
      const h = Math.abs(at) * STEP;
      this.slopes[p] = (this.at(p, 0, at + h) - this.at(p, 0, at - h)) / (2 * h);
    }
    if (this.solve(p) === 0) result.set(this.out);
    return result;
  }

  private responsesOf(p: number): Float64Array[] {
    const count = this.problem.inputs.drawn.length;
    const z = new Float64Array(count);
    const solved = (j: number, by: number): Float64Array | undefined => {
      z[j] = by;
      this.takeDeviates(z);
      z[j] = 0;
      this.start.set(this.central[p]!.subarray(0, this.start.length));
      return this.ready(p) && this.solve(p) === 0 ? this.out.slice() : undefined;
    };
    return Array.from({ length: count }, (_, j) => {
      const [up, down] = [solved(j, DEVIATE), solved(j, -DEVIATE)];
      return Float64Array.from(this.out, (_value, q) =>
        up === undefined || down === undefined ? NaN : (up[q]! - down[q]!) / (2 * DEVIATE),
      );
    });
  }

  /** Solves from `start` into `out`; 0, or the code of the failure. The inputs and coefficients have been taken. */
  private solve(p: number): number {
    const { parameters, state, out } = this;
    const code = this.parametersOf(p);
    if (code !== 0) return code;
    for (let k = 0; k < parameters.length; k++) {
      out[k] = parameters[k]!;
      state[k] = parameters[k]!;
      if (!Number.isFinite(parameters[k]!)) return UNSOLVED;
    }
    if (this.derived === undefined) return 0;
    out[parameters.length] = this.derived.at(state);
    return Number.isNaN(out[parameters.length]!) ? OUT_OF_RANGE : 0;
  }

  private parametersOf(p: number): number {
    const { task } = this.problem;
    const { parameters, state, start } = this;
    const theories = this.theories[p]!;
    const first = theories[0]!;
    switch (task.kind) {
      case 'root': {
        const goal = this.measured[0]!;
        const { from, to } = this.ranges;
        const f = (value: number): number => this.at(p, 0, value) - goal;
        parameters[0] = rootNear(f, start[0]!, this.slopes[p]!, from[0]!, to[0]!);
        return Number.isNaN(parameters[0]) ? UNSOLVED : 0;
      }
      case 'prediction':
        parameters[0] = first.value(state);
        return Number.isNaN(parameters[0]) ? OUT_OF_RANGE : 0;
      case 'condensate': {
        const { model, coupling } = first.shared;
        const Q = model.scale === undefined ? 1 : state[model.scale]!;
        const weight = powerWeight(task.term, coupling.at(state) / model.divisor, Q);
        parameters[0] = (this.measured[0]! - first.value(state)) / weight;
        return Number.isNaN(parameters[0]) ? OUT_OF_RANGE : 0;
      }
      case 'fit': {
        parameters.set(start);
        const vector = (values: Float64Array, into: Float64Array): boolean => {
          for (let k = 0; k < values.length; k++) state[k] = values[k]!;
          for (let d = 0; d < theories.length; d++) into[d] = theories[d]!.value(state);
          return into.every(Number.isFinite);
        };
        const { from, to } = this.ranges;
        return this.fits[p]!.minimise(vector, this.measured, parameters, from, to) ? 0 : UNSOLVED;
      }
    }
  }

  /**
   * Replicas first … first + count − 1: quantity q of prescription p in `values[(p·quantities + q)·count + i]`, NaN without one,
   * and the reason in `codes[p·count + i]`.
   */
  block(first: number, count: number, values: Float64Array, codes: Uint8Array): void {
    const { quantities, start, out } = this;
    const size = this.problem.prescriptions.length;
    for (let i = 0; i < count; i++) {
      this.take(first + i);
      for (let p = 0; p < size; p++) {
        for (let k = 0; k < start.length; k++) {
          let value = this.central[p]![k]!;
          const responses = this.responses[p]!;
          for (let j = 0; j < responses.length; j++) value += responses[j]![k]! * this.draw.z[j]!;
          start[k] = Number.isNaN(value) ? this.central[p]![k]! : value;
        }
        const code = this.ready(p) ? this.solve(p) : REFUSED;
        codes[p * count + i] = code;
        for (let q = 0; q < quantities; q++) values[(p * quantities + q) * count + i] = code === 0 ? out[q]! : NaN;
      }
    }
  }
}
