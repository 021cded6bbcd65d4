/** @module The tables of an assessment: terms, values by prescription, ambiguity by convention, verdict. */
import type { Assessment } from '../../studies/index.js';
import { measured, number, size, symmetric, text } from '../table.js';
import type { PaperTable } from '../table.js';

const RANGE = 'ambiguity is |Im|/pi of the lateral sums unless another convention is named';

export const atCoupling = ({ coupling }: Pick<Assessment, 'coupling'>): string =>
  `${coupling.name} = ${coupling.value}`;

export function termTable(result: Pick<Assessment, 'series' | 'coupling' | 'terms'>): PaperTable {
  return {
    name: 'terms',
    title: `Terms of ${result.series.title} at ${atCoupling(result)}`,
    columns: [
      number('order'),
      number('coefficient', '*c_{n}*'),
      number('term'),
      number('partial_sum', 'partial sum'),
      text('mark', ''),
    ],
    rows: result.terms.map((row) => [
      String(row.order),
      measured(row.coefficient, symmetric('quoted', row.coefficientError)),
      measured(row.term),
      measured(row.partialSum),
      [row.least === true ? 'least term' : '', row.estimated === true ? 'estimated' : ''].filter(Boolean).join(', '),
    ]),
    notes: [],
  };
}

export function valueTable(result: Pick<Assessment, 'series' | 'coupling' | 'values'>): PaperTable {
  const accepted = result.values.filter((entry) => entry.value !== undefined);
  const refused = result.values.filter((entry) => entry.refused !== undefined && entry.variant === '');
  return {
    name: 'values',
    title: `Values of ${result.series.title} at ${atCoupling(result)}`,
    columns: [
      text('prescription'),
      text('variant'),
      number('value'),
      size('ambiguity', '|Im|/π'),
      text('trust'),
      text('digits'),
    ],
    rows: accepted.map((entry) => [
      entry.prescription,
      entry.variant,
      measured(entry.value, symmetric('truncation', entry.truncationError), symmetric('input', entry.inputError)),
      entry.ambiguity ?? '',
      entry.standing ?? '',
      entry.digits ?? '',
    ]),
    notes: [RANGE, ...refused.map(({ prescription, refused: why }) => `${prescription} refused: ${why?.reason ?? ''}`)],
  };
}

export function assessmentTables(result: Assessment): PaperTable[] {
  const { verdict, ambiguity } = result;
  return [
    termTable(result),
    valueTable(result),
    {
      name: 'ambiguity',
      title: `Renormalon ambiguity of ${result.series.title} by convention`,
      columns: [text('convention'), size('value'), size('GeV'), text('trust'), text('origin')],
      rows: ambiguity.conventions.map((row) => [row.name, row.value, row.GeV ?? '', row.standing, row.origin]),
      notes: [ambiguity.statement],
    },
    {
      name: 'verdict',
      title: `Verdict on ${result.series.title} at ${atCoupling(result)}`,
      columns: [number('value'), text('prescription'), text('trust')],
      rows:
        verdict.value === undefined
          ? []
          : [
              [
                measured(
                  verdict.value,
                  symmetric('truncation', verdict.truncation),
                  symmetric('ambiguity', verdict.ambiguity),
                  symmetric('input', verdict.input),
                ),
                verdict.prescription ?? '',
                verdict.standing,
              ],
            ],
      notes: [
        verdict.printed,
        `rule: ${verdict.rule}`,
        ...result.cautions.map((caution) => `caution: ${caution.text}`),
      ],
    },
  ].filter(({ rows }) => rows.length > 0);
}
