/** @module Tables of series themselves: the coefficients of one, and the list of the catalogue. */
import type { PlainSeries } from '../../report/index.js';
import type { CatalogueEntry } from '../../series/index.js';
import type { CheckedSeries } from '../../studies/index.js';
import { longText, measured, number, text } from '../table.js';
import type { PaperTable } from '../table.js';

export function seriesTables(series: PlainSeries): PaperTable[] {
  const { name, divisor } = series.coupling;
  const variable = divisor === '1' ? name : `${name}/${divisor}`;
  const marked = <T>(cell: T): T[] => (series.coefficients.some(({ status }) => status !== 'computed') ? [cell] : []);
  return [
    {
      name: 'coefficients',
      title: `Coefficients of ${series.title} in ${variable}`,
      columns: [
        number('order'),
        number('coefficient', '*c_{n}*'),
        longText('exact', 'as written'),
        ...marked(text('status')),
      ],
      rows: series.coefficients.map(({ order, text: written, status, decimal: { value, plus, minus } }) => [
        String(order),
        measured(value, plus === undefined || minus === undefined ? [] : [{ label: 'quoted', plus, minus }]),
        written === value ? '' : written,
        ...marked(status),
      ]),
      notes: [...series.sources.map((source) => `source: ${source}`), ...series.notes],
    },
  ];
}

/** What catalogue list and catalogue check print: which of the two, the entries say. */
export type CatalogueList = readonly CatalogueEntry[] | readonly CheckedSeries[];

const isChecked = (entries: CatalogueList): entries is readonly CheckedSeries[] =>
  entries[0] !== undefined && 'problems' in entries[0];

export function catalogueTables(entries: CatalogueList): PaperTable[] {
  if (isChecked(entries))
    return [
      {
        name: 'check',
        title: 'Series of the catalogue, checked',
        columns: [text('id'), text('flavours'), number('values', 'values held against'), text('problems')],
        rows: entries.map(({ id, flavours, values, problems }) => [
          id,
          flavours.join(', '),
          String(values),
          problems.join('; '),
        ]),
        notes: [],
      },
    ];
  return [
    {
      name: 'catalogue',
      title: 'Series of the catalogue',
      columns: [text('id'), text('title'), number('coefficients'), number('flavours'), text('invented')],
      rows: entries.map((entry) => [
        entry.id,
        entry.title,
        String(entry.coefficients),
        entry.flavours === undefined ? '' : String(entry.flavours),
        entry.invented ? 'yes' : '',
      ]),
      notes: [],
    },
  ];
}
