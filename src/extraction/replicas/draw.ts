/**
 * @module The inputs of replica i.
 *
 * u = L z with independent standard normal z of the replica's own substream; an input is its central value plus u times its upper
 * error for u > 0, its lower error for u < 0: the median stays the central value, and ±1σ are the quoted ends.
 */
import { Substreams } from '../../numerics/index.js';
import type { Inputs } from './problem.js';

export class Draw {
  /** Independent deviates of the last draw. */
  readonly z: Float64Array;
  private readonly inputs: Inputs;
  private readonly streams: Substreams;

  constructor(inputs: Inputs, seed: number) {
    this.inputs = inputs;
    this.z = new Float64Array(inputs.drawn.length);
    this.streams = new Substreams(seed);
  }

  /** Puts the inputs of replica `index` into `state`, from `offset` on. */
  replica(index: number, state: Float64Array, offset: number): void {
    this.streams.normals(index, this.z);
    place(this.inputs, this.z, state, offset);
  }
}

/** The inputs that the deviates z stand for. */
export function place(inputs: Inputs, z: ArrayLike<number>, state: Float64Array, offset: number): void {
  const { central, plus, minus, drawn, factor } = inputs;
  for (let i = 0; i < central.length; i++) state[offset + i] = central[i]!;
  for (let k = 0; k < drawn.length; k++) {
    const row = factor[k]!;
    let u = 0;
    for (let j = 0; j <= k; j++) u += row[j]! * z[j]!;
    const i = drawn[k]!;
    state[offset + i] = central[i]! + u * (u > 0 ? plus[i]! : minus[i]!);
  }
}
