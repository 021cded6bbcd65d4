/** @module The tables of a series cut at a momentum: coefficients of both parts, and sums for cuts beside it. */
import type { SeriesCutResult } from '../../extraction/index.js';
import { measured, number, size } from '../table.js';
import type { PaperTable } from '../table.js';

/** A ratio that was given, without the zeros behind it. */
export const ratio = (text: string): string => String(Number(text));

export function seriesCutTables({ series, cut }: SeriesCutResult): PaperTable[] {
  const about = `${series.title}, momenta below ${ratio(cut.overHard)} of the hard scale taken out`;
  return [
    {
      name: 'coefficients',
      title: `Coefficients of ${about}`,
      columns: [
        number('order'),
        number('whole', '*c_{n}*'),
        number('low', 'below the cut'),
        number('high', 'above the cut'),
      ],
      rows: cut.terms.map((row) => [String(row.n), measured(row.whole), measured(row.low), measured(row.high)]),
      notes: [cut.growth.whole.statement, cut.growth.high.statement],
    },
    {
      name: 'sums',
      title: `Sums of ${about}, for cuts beside it`,
      columns: [
        number('cut', 'cut'),
        number('high', 'above the cut'),
        size('last_term', 'last term'),
        number('low', 'below the cut'),
        number('sum', 'sum'),
      ],
      rows: (cut.values?.rows ?? []).map((row) => [
        measured(row.cut),
        measured(row.high),
        row.lastTerm,
        measured(row.low),
        measured(row.sum),
      ]),
      notes: [],
    },
  ].filter(({ rows }) => rows.length > 0);
}
