/**
 * @module Tables in the open YAML of the HEPData submission system: one stream of documents, each with its name,
 * description, keywords, independent and dependent variables. Columns of text and the columns before the first measured one
 * are independent; zero errors are left out, since the system rejects them.
 * Reference  E. Maguire, L. Heinrich, G. Watt, J. Phys. Conf. Ser. 898 (2017) 102006 (memory), and its public documentation.
 */
import { stringify } from 'yaml';
import { plainHead } from './notation.js';
import { isMeasured, knownErrors } from './table.js';
import type { Cell, Column, NamedError, PaperTable } from './table.js';

/** Names may not be longer. */
const NAME = 64;

interface Entry {
  readonly value: string | number;
  readonly errors?: readonly object[];
}

const NUMBER = /^[-+]?\d+(\.\d+)?(e[-+]?\d+)?$/i;

function errorEntry({ label, plus, minus }: NamedError): object {
  return plus === minus
    ? { symerror: Number(plus), label }
    : { asymerror: { plus: Number(plus), minus: -Number(minus) }, label };
}

function entry(cell: Cell): Entry {
  if (!isMeasured(cell)) return { value: NUMBER.test(cell) ? Number(cell) : cell === '' ? '-' : cell };
  const errors = knownErrors(cell).map(errorEntry);
  return {
    value: NUMBER.test(cell.value) ? Number(cell.value) : cell.value,
    ...(errors.length === 0 ? {} : { errors }),
  };
}

function variable({ head, unit }: Column, cells: readonly Cell[]): object {
  return {
    header: { name: plainHead(head), ...(unit === undefined ? {} : { units: unit }) },
    values: cells.map(entry),
  };
}

function tableDocument(table: PaperTable, keywords: readonly string[]): object {
  const isDependent = table.columns.map(
    ({ kind }, i) => kind !== 'text' && table.rows.some((row) => isMeasured(row[i] ?? '')),
  );
  const first = isDependent.indexOf(true);
  const columns = table.columns.map((column, i) => ({ column, i }));
  const independent = columns.filter(({ column, i }) => (first < 0 ? i === 0 : i < first || column.kind === 'text'));
  const dependent = columns.filter(({ i }) => !independent.some((other) => other.i === i));
  const variables = (list: typeof columns): object[] =>
    list.map(({ column, i }) =>
      variable(
        column,
        table.rows.map((row) => row[i] ?? ''),
      ),
    );
  return {
    name: nameOf(table.title),
    description: [table.title, ...table.notes].join('. '),
    keywords: [{ name: 'observables', values: keywords }],
    independent_variables: variables(independent),
    dependent_variables: variables(dependent),
  };
}

/** The title, cut between words where it is too long. */
function nameOf(title: string): string {
  return title.length <= NAME ? title : title.slice(0, NAME + 1).replace(/\s+\S*$/, '');
}

/** One YAML stream with a document a table. */
export const hepdataOf = (tables: readonly PaperTable[], keywords: readonly string[]): string =>
  tables.map((table) => `---\n${stringify(tableDocument(table, keywords), { lineWidth: 110 })}`).join('');
