/** @module The tables of a contour quantity: both expansions order by order, and the Borel sums. */
import type { ContourReport } from '../../contour/index.js';
import { measured, number, size, symmetric, text } from '../table.js';
import type { PaperTable } from '../table.js';

export function contourTables(result: ContourReport): PaperTable[] {
  const borel = result.borel.filter((row) => row.value !== undefined);
  return [
    {
      name: 'orders',
      title: `Fixed order and contour improved, weight ${result.weight.text}`,
      columns: [
        number('order'),
        number('fo_term', 'fixed-order term'),
        number('fo_sum', 'sum'),
        number('ci_term', 'contour-improved term'),
        number('ci_sum', 'sum'),
      ],
      rows: result.orders.map((row) => [
        String(row.order),
        measured(row.fixedOrder.term),
        measured(row.fixedOrder.sum),
        measured(row.improved?.term),
        measured(row.improved?.sum),
      ]),
      notes: result.difference === undefined ? [] : [result.difference.statement],
    },
    {
      name: 'borel',
      title: 'Borel sums on the circle',
      columns: [text('method'), text('variant'), number('value'), size('ambiguity', '|Im|/π'), size('separation')],
      rows: borel.map((row) => [
        row.method,
        row.variant,
        measured(row.value, symmetric('truncation', row.truncation)),
        row.ambiguity ?? '',
        row.separation ?? '',
      ]),
      notes: [],
    },
  ].filter(({ rows }) => rows.length > 0);
}
