/** @module What a command is: its words for the help, the options it knows, and what it does. */
import type { ContourGiven } from './options-contour.js';
import type { OptionName, OptionWords } from './options.js';
import type { BubbleGiven } from './options-bubbles.js';
import type { ExtractGiven } from './options-extract.js';
import type { ReplicaGiven } from './options-replicas.js';
import type { MassGiven } from './options-mass.js';
import type { NewGiven } from './options-new.js';
import type { PaperGiven } from './options-papers.js';
import type { PictureGiven } from './options-pictures.js';
import type { Surroundings } from './surroundings.js';

/** Option values after checking. Absent means not given. */
export interface Given
  extends PictureGiven, PaperGiven, MassGiven, ContourGiven, NewGiven, BubbleGiven, ExtractGiven, ReplicaGiven {
  readonly at?: string;
  readonly alphaSMZ?: string;
  readonly alphaS?: string;
  readonly mass?: string;
  readonly from?: string;
  readonly fromFlavours?: number;
  readonly to?: string;
  readonly toFlavours?: number;
  readonly loops?: number;
  readonly threshold?: readonly string[];
  readonly scale?: string;
  readonly coupling?: string;
  readonly massPower?: string;
  readonly fromMass?: string;
  readonly massOfScale?: string;
  readonly heavyInCoupling?: boolean;
  readonly with?: readonly string[];
  readonly title?: string;
  readonly quantity?: string;
  readonly dimension?: string;
  readonly invented?: boolean;
  readonly published?: boolean;
  readonly grid?: string;
  readonly only?: readonly string[];
  readonly except?: readonly string[];
  readonly family?: readonly string[];
  readonly sort?: string;
  readonly hide?: number;
  readonly exact?: string;
  readonly strongCoupling?: string;
  readonly catalogue?: boolean;
  readonly csv?: boolean;
  readonly verdictRule?: string;
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
  /** Any number of them may follow; only the last operand. */
  readonly several?: boolean;
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
  /** Its own words for options that mean something else elsewhere. */
  readonly words?: Partial<Record<OptionName, OptionWords>>;
  /** Those of the options that the command cannot do without. */
  readonly needs?: readonly OptionName[];
  /** It asks questions on the terminal: no clock beside them. */
  readonly asks?: true;
  /** Command lines with what they do. */
  readonly examples: readonly (readonly [command: string, meaning: string])[];
  /** Carries the command out; the exit code comes back. */
  run(call: Call): Promise<number>;
}
