/** @module The table of a comparison: a row a coupling and prescription. */
import type { CompareResult } from '../../studies/index.js';
import { measured, number, size, symmetric, text } from '../table.js';
import type { PaperTable } from '../table.js';

export function compareTables(result: CompareResult): PaperTable[] {
  const several = result.points.length > 1;
  const name = result.points[0]?.coupling.name ?? 'coupling';
  const rows = result.rows.filter((row) => row.value !== undefined);
  const refused = result.rows.filter((row) => row.refused !== undefined);
  return [
    {
      name: 'compare',
      title: `${result.series.title} by prescription${several ? '' : ` at ${name} = ${result.rows[0]?.at ?? ''}`}`,
      columns: [
        ...(several ? [number('at', name)] : []),
        text('prescription'),
        text('variant'),
        number('value'),
        size('ambiguity', '|Im|/π'),
        number('terms'),
        text('trust'),
        text('digits'),
        size('score'),
        text('cautions'),
      ],
      rows: rows.map((row) => [
        ...(several ? [row.at] : []),
        row.prescription,
        row.variant,
        measured(row.value, symmetric('truncation', row.truncationError), symmetric('input', row.inputError)),
        row.ambiguity ?? '',
        row.termsUsed === undefined ? '' : String(row.termsUsed),
        row.standing ?? '',
        row.digits ?? '',
        row.record?.score ?? '',
        row.cautions.map((caution) => caution.code).join(', '),
      ]),
      notes: [
        ...result.points.flatMap(({ coupling, spread }) =>
          spread.unflagged === undefined
            ? []
            : [
                `spread without cautions at ${coupling.name} = ${coupling.value}: ${spread.unflagged.low} to ${spread.unflagged.high}`,
              ],
        ),
        ...new Set(refused.map((row) => `${row.prescription} refused: ${row.refused?.reason ?? ''}`)),
      ],
    },
  ];
}
