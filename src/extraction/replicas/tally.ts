/** @module What the replicas gave: one column a prescription and quantity, filled block by block, in any order. */
import type { ReplicaProblem } from './problem.js';
import { quantitiesOf } from './problem.js';

/** Replicas of one block: enough work to be worth a message, little enough to be interrupted. Part of no result. */
export const BLOCK = 500;

export interface Block {
  readonly index: number;
  readonly first: number;
  readonly count: number;
}

/** The results of a block, as engine.ts lays them out. */
export interface BlockResult extends Block {
  readonly values: Float64Array;
  readonly codes: Uint8Array;
}

export function blocksOf(count: number): Block[] {
  return Array.from({ length: Math.ceil(count / BLOCK) }, (_, index) => ({
    index,
    first: index * BLOCK,
    count: Math.min(BLOCK, count - index * BLOCK),
  }));
}

export class Tally {
  readonly count: number;
  private readonly prescriptions: number;
  private readonly quantities: number;
  private readonly columns: readonly Float64Array[];
  private readonly codes: readonly Uint8Array[];
  private readonly finished: Uint8Array;

  constructor(problem: ReplicaProblem, count: number) {
    this.count = count;
    this.prescriptions = problem.prescriptions.length;
    this.quantities = quantitiesOf(problem);
    this.columns = Array.from({ length: this.prescriptions * this.quantities }, () => new Float64Array(count));
    this.codes = Array.from({ length: this.prescriptions }, () => new Uint8Array(count));
    this.finished = new Uint8Array(Math.ceil(count / BLOCK));
  }

  add({ index, first, count, values, codes }: BlockResult): void {
    this.columns.forEach((column, k) => column.set(values.subarray(k * count, (k + 1) * count), first));
    this.codes.forEach((list, p) => list.set(codes.subarray(p * count, (p + 1) * count), first));
    this.finished[index] = 1;
  }

  /** Places of the replicas that are done, ascending. */
  private done(): { readonly first: number; readonly end: number }[] {
    return blocksOf(this.count)
      .filter(({ index }) => this.finished[index] === 1)
      .map(({ first, count }) => ({ first, end: first + count }));
  }

  /** Everything that is known, without gaps: all of it, or the blocks that were finished when it was interrupted. */
  known(): Known {
    const ranges = this.done();
    const total = ranges.reduce((sum, r) => sum + r.end - r.first, 0);
    const all = total === this.count;
    const joined = <T extends Float64Array | Uint8Array>(list: T, empty: (length: number) => T): T => {
      if (all) return list;
      const into = empty(total);
      let at = 0;
      for (const { first, end } of ranges) {
        into.set(list.subarray(first, end), at);
        at += end - first;
      }
      return into;
    };
    const index = new Float64Array(total);
    let at = 0;
    for (const { first, end } of ranges) for (let i = first; i < end; i++) index[at++] = i;
    return {
      asked: this.count,
      index,
      columns: this.columns.map((c) => joined(c, (n) => new Float64Array(n))),
      codes: this.codes.map((c) => joined(c, (n) => new Uint8Array(n))),
    };
  }
}

/** Finished replicas: their numbers, and what they gave. */
export interface Known {
  readonly asked: number;
  readonly index: Float64Array;
  /** Column p·quantities + q. */
  readonly columns: readonly Float64Array[];
  readonly codes: readonly Uint8Array[];
}
