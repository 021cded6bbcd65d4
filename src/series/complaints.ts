/** @module Collects the problems of one file, so that they can all be told at once. */
import type { Place } from './entry.js';
import { InputError } from './input-error.js';
import type { Problem } from './input-error.js';
import { LIMITS, grouped } from './limits.js';

export class Complaints {
  readonly file: string;
  private readonly list: Problem[] = [];
  private omitted = 0;

  /** `earlier`: complaints about the same file from a stage before, which come along. */
  constructor(file: string, earlier?: Complaints) {
    this.file = file;
    if (earlier !== undefined) {
      this.list.push(...earlier.list);
      this.omitted = earlier.omitted;
    }
  }

  /** Notes a problem; always undefined, so that a reader can end with `return complaints.add(…)`. */
  add(at: Place | undefined, field: string, found: string, wanted: string): undefined {
    if (this.full) this.omitted++;
    else this.list.push({ file: this.file, ...(at && { line: at.line, column: at.column }), field, found, wanted });
  }

  get any(): boolean {
    return this.list.length > 0;
  }

  /** True when further problems are only counted. */
  get full(): boolean {
    return this.list.length >= LIMITS.problems;
  }

  /** The problems as an error, in the order of the file. */
  error(): InputError {
    const byPlace = this.list.toSorted((a, b) => (a.line ?? 0) - (b.line ?? 0) || (a.column ?? 0) - (b.column ?? 0));
    if (this.omitted > 0) {
      byPlace.push({
        file: this.file,
        found: `${grouped(this.omitted)} more problems like these`,
        wanted: 'the ones above mended first',
      });
    }
    return new InputError(byPlace);
  }

  throwIfAny(): void {
    if (this.any) throw this.error();
  }
}
