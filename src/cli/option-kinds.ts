/** @module The kinds of value that options take. */

interface Flag {
  readonly kind: 'flag';
  readonly short?: string;
  readonly help: string;
}

interface Text {
  readonly kind: 'text';
  readonly short?: string;
  /** Stands for the value in help and messages. */
  readonly placeholder: string;
  readonly example: string;
  readonly help: string;
}

/** May be given several times; all values count. */
interface List {
  readonly kind: 'list';
  readonly short?: string;
  readonly placeholder: string;
  readonly example: string;
  readonly help: string;
}

interface Whole {
  readonly kind: 'whole';
  readonly short?: string;
  readonly placeholder: string;
  readonly example: string;
  readonly least: number;
  readonly most: number;
  readonly help: string;
}

export type OptionSpec = Flag | Text | List | Whole;

/** What a command calls an option of several commands: the rest of the specification stays. */
export type OptionWords = Partial<Pick<Text, 'placeholder' | 'example' | 'help'>>;
