/**
 * @module A table of a result as plain data: what LaTeX, Markdown, CSV and the data-submission YAML all write.
 *
 * Numbers stay decimal texts; a measured cell keeps its errors apart by their names, so that a form can print 0.1180(9)
 * or give each error a column of its own.
 */

export interface NamedError {
  /** truncation, ambiguity, input, … */
  readonly label: string;
  /** Sizes, both without sign. */
  readonly plus: string;
  readonly minus: string;
}

export interface Measured {
  readonly value: string;
  readonly errors: readonly NamedError[];
}

/** An empty text is a cell with nothing to say. */
export type Cell = string | Measured;

export interface Column {
  /** Head in the notation of `notation.ts`: plain words, x_{i}, x^{n}, and *x* for a quantity. */
  readonly head: string;
  /** One word for machines. */
  readonly key: string;
  /** size: a number that is read for its magnitude, such as an ambiguity; shown to two digits. */
  readonly kind: 'text' | 'number' | 'size';
  readonly unit?: string;
  /** Texts that no printed page has room for: left out of LaTeX. */
  readonly long?: true;
}

export interface PaperTable {
  /** One word for machines and file names. */
  readonly name: string;
  readonly title: string;
  readonly columns: readonly Column[];
  readonly rows: readonly (readonly Cell[])[];
  /** What the reader of the table has to know: definitions, cautions, who refused. */
  readonly notes: readonly string[];
}

export const isMeasured = (cell: Cell): cell is Measured => typeof cell !== 'string';

export const text = (key: string, head = key): Column => ({ key, head, kind: 'text' });

export const number = (key: string, head = key, unit?: string): Column => ({
  key,
  head,
  kind: 'number',
  ...(unit === undefined ? {} : { unit }),
});

export const size = (key: string, head = key, unit?: string): Column => ({ ...number(key, head, unit), kind: 'size' });

/** A column of texts that may be as long as they like. */
export const longText = (key: string, head = key): Column => ({ ...text(key, head), long: true });

/** A symmetric error, or none where the text is absent. */
export const symmetric = (label: string, error: string | undefined): NamedError[] =>
  error === undefined ? [] : [{ label, plus: error.replace(/^[-+]/, ''), minus: error.replace(/^[-+]/, '') }];

/** A value with its errors; an empty cell where there is no value. */
export const measured = (value: string | undefined, ...errors: readonly (readonly NamedError[])[]): Cell =>
  value === undefined ? '' : { value, errors: errors.flat() };

/** A value with so many digits was worked out, not quoted. */
const WORKED_OUT = 8;

/**
 * The errors that say something. A zero does not, and neither does one below the last digit of a value that was worked out:
 * it is the rounding of the calculation, and printing it would make up digits between.
 */
export function knownErrors({ value, errors }: Measured): readonly NamedError[] {
  const [, digits = '', power = '0'] = /^[-+]?([\d.]+)(?:e([-+]?\d+))?$/i.exec(value) ?? [];
  const count = digits.replace('.', '').replace(/^0+/, '').length;
  const decimals = digits.includes('.') ? digits.length - digits.indexOf('.') - 1 : 0;
  const least = count < WORKED_OUT ? 0 : 10 ** (Number(power) - decimals);
  return errors.filter(({ plus, minus }) => {
    const largest = Math.max(Math.abs(Number(plus)), Math.abs(Number(minus)));
    return largest > 0 && largest >= least;
  });
}

/** Labels of the errors in a column, in the order in which they first come. */
export function errorLabels(table: PaperTable, column: number): string[] {
  const labels = table.rows.flatMap((row) => {
    const cell = row[column] ?? '';
    return isMeasured(cell) ? cell.errors.map(({ label }) => label) : [];
  });
  return [...new Set(labels)];
}
