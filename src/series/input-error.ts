/** @module Everything that is wrong with an input, told at once: where, what was found, what is wanted. */

export interface Problem {
  /** File name as the user gave it, a catalogue id, or "standard input". */
  readonly file: string;
  /** From 1; absent when the problem is the file itself. */
  readonly line?: number;
  readonly column?: number;
  /** Dotted path such as `coefficients[2].error`; list items count from 0, as in c_0. */
  readonly field?: string;
  readonly found: string;
  readonly wanted: string;
}

/** `file:line:column: field: what was found; wanted what`. */
export function describeProblem(p: Problem): string {
  const place = p.line === undefined ? p.file : `${p.file}:${p.line}:${p.column ?? 1}`;
  const field = p.field === undefined || p.field === '' ? '' : `${p.field}: `;
  return `${place}: ${field}${p.found}; wanted ${p.wanted}`;
}

/** Wrong input (never a fault of the program). The message holds one line for each problem. */
export class InputError extends Error {
  override readonly name = 'InputError';
  readonly problems: readonly Problem[];

  constructor(problems: readonly Problem[]) {
    super(problems.map(describeProblem).join('\n'));
    this.problems = problems;
  }
}
