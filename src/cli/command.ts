/** @module What a command is: its words for the help, the options it knows, and what it does. */
import type { OptionName } from './options.js';
import type { Surroundings } from './surroundings.js';

/** Option values after checking. Absent means not given. */
export interface Given {
  readonly at?: string;
  readonly by?: string;
  readonly variant?: string;
  readonly byOrder?: boolean;
  readonly prior?: string;
  readonly order?: number;
  readonly flavours?: number;
  readonly digits?: number;
  readonly json: boolean;
  readonly output?: string;
  readonly quiet: boolean;
  readonly noColor: boolean;
}

export interface Operand {
  readonly name: string;
  readonly help: string;
  readonly optional?: boolean;
}

export interface Call {
  readonly operands: readonly string[];
  readonly given: Given;
  readonly surroundings: Surroundings;
}

export interface Command {
  readonly name: string;
  /** One line for the list of commands. */
  readonly summary: string;
  /** Paragraphs for the command's own help. */
  readonly about: readonly string[];
  readonly operands: readonly Operand[];
  readonly options: readonly OptionName[];
  /** Those of the options that the command cannot do without. */
  readonly needs?: readonly OptionName[];
  /** Command lines with what they do. */
  readonly examples: readonly (readonly [command: string, meaning: string])[];
  /** Carries the command out; the exit code comes back. */
  run(call: Call): Promise<number>;
}
