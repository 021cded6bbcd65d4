/**
 * @module Tables in LaTeX: booktabs rules, numbers as \num{0.1180(9)} of siunitx, so that the document decides how
 * uncertainties look. Compiles with \usepackage{booktabs,siunitx}.
 */
import { roundPdg, shorten, writeParentheses, writePlusMinus } from '../numerics/index.js';
import { texHead, texText } from './notation.js';
import { isMeasured, knownErrors } from './table.js';
import type { Cell, Column, Measured, PaperTable } from './table.js';

/** Numbers without an error show at most so many digits. */
const DIGITS = 8;
const SIZE_DIGITS = 2;

/** A number as siunitx reads it; asymmetric errors, which it reads only in later versions, are set by hand. */
export function texNumber(cell: Measured): string {
  const { value } = cell;
  const known = knownErrors(cell);
  if (known.length === 0) return `\\num{${shorten(value, DIGITS)}}`;
  const rounded = roundPdg(
    value,
    known.map(({ plus, minus }) => (plus === minus ? plus : { plus, minus })),
  );
  if (rounded === undefined) return texText(value);
  const short = writeParentheses(rounded);
  if (short !== undefined && known.length === 1) return `\\num{${short}}`;
  if (short !== undefined) {
    // Several errors: \num takes one; the others follow in the same units of the last place.
    const [head = '', ...rest] = short.split(/(?<=\))(?=\()/);
    const tail = rest.map((part) => part.replace(/e-?\d+$/, '')).join('');
    const power = /e(-?\d+)$/.exec(short)?.[1];
    return `$\\num{${head}}${tail}${power === undefined ? '' : `\\times 10^{${power}}`}$`;
  }
  const tex = writePlusMinus(rounded)
    .replace(/ ± /g, '\\pm ')
    .replace(/ \+(\S+) −([^\s)]+)/g, '\\,^{+$1}_{-$2}')
    .replace(/^\((.*)\)e(-?\d+)$/, '($1)\\times 10^{$2}');
  return `$${tex}$`;
}

const NUMBER = /^[-+]?\d+(\.\d+)?(e[-+]?\d+)?$/;

/** Behind the \\\\ of the row above, a bracket would read as its argument and a star as its variant. */
const atRowStart = (tex: string): string => tex.replace(/^[[*]/, (c) => `{${c}}`);

function cellTex(cell: Cell, kind: Column['kind']): string {
  if (isMeasured(cell)) return texNumber(cell);
  if (cell === '') return kind === 'text' ? '' : '{---}';
  if (kind === 'text' || !NUMBER.test(cell)) return texText(cell);
  return `\\num{${shorten(cell, kind === 'size' ? SIZE_DIGITS : DIGITS)}}`;
}

/** The columns that a page has room for, with their cells. */
function withoutLong(table: PaperTable): PaperTable {
  const kept = table.columns.map(({ long }) => long !== true);
  const keep = <T>(list: readonly T[]): T[] => list.filter((_, i) => kept[i]);
  return { ...table, columns: keep(table.columns), rows: table.rows.map(keep) };
}

function tableTex(whole: PaperTable): string {
  const table = withoutLong(whole);
  const align = table.columns.map(({ kind }) => (kind === 'text' ? 'l' : 'r')).join('');
  const heads = table.columns.map(
    ({ head, unit }) => texHead(head) + (unit === undefined ? '' : ` [${texText(unit)}]`),
  );
  const errors = [
    ...new Set(table.rows.flat().flatMap((cell) => (isMeasured(cell) ? cell.errors.map(({ label }) => label) : []))),
  ];
  const named =
    errors.length === 0 ? '' : ` Errors in parentheses, in this order where present: ${texText(errors.join(', '))}.`;
  return [
    '\\begin{table}',
    '  \\centering',
    `  \\caption{${texText(table.title)}.${named}}`,
    `  \\label{tab:${table.name}}`,
    `  \\begin{tabular}{${align}}`,
    '    \\toprule',
    `    ${heads.join(' & ')} \\\\`,
    '    \\midrule',
    ...table.rows.map(
      (row) => `    ${atRowStart(table.columns.map(({ kind }, i) => cellTex(row[i] ?? '', kind)).join(' & '))} \\\\`,
    ),
    '    \\bottomrule',
    '  \\end{tabular}',
    ...table.notes.map((note) => `  % ${note.replace(/\n/g, ' ')}`),
    '\\end{table}',
  ].join('\n');
}

/** All tables of a result, one table environment each. */
export const latexOf = (tables: readonly PaperTable[]): string =>
  `% needs \\usepackage{booktabs,siunitx}\n${tables.map(tableTex).join('\n\n')}\n`;
