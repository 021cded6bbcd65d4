/** @module The table of replicas: percentiles by prescription, one table a quantity. */
import type { ReplicaResult } from '../../extraction/index.js';
import { measured, number, size, text } from '../table.js';
import type { PaperTable } from '../table.js';

type Distribution = NonNullable<ReplicaResult['rows'][number]['values'][number]['distribution']>;

const cells = ({ median, low68, high68, low95, high95 }: Distribution) => [
  measured(median.value, [{ label: 'Monte Carlo', plus: median.error, minus: median.error }]),
  low68.value,
  high68.value,
  low95.value,
  high95.value,
];

export function replicaTables(replicas: ReplicaResult | undefined): PaperTable[] {
  if (replicas === undefined) return [];
  const { mixture, rows } = replicas;
  return replicas.quantities
    .map(({ symbol, unit }, i): PaperTable => ({
      name: `replicas${i + 1}`,
      title: `Replicas of ${symbol}: ${replicas.done}, seed ${replicas.seed}`,
      columns: [
        text('prescription'),
        number('median', 'median', unit),
        number('low68', '16 %', unit),
        number('high68', '84 %', unit),
        number('low95', '2.5 %', unit),
        number('high95', '97.5 %', unit),
        size('failed'),
      ],
      rows: [
        ...rows.map((row) => ({ ...row, name: row.prescription })),
        ...(mixture === undefined ? [] : [{ ...mixture, name: 'mixture' }]),
      ].flatMap(({ name, values, failed }) => {
        const distribution = values[i]?.distribution;
        return distribution === undefined ? [] : [[name, ...cells(distribution), String(failed)]];
      }),
      notes: [
        'errors of the medians are those of the Monte Carlo; the mixture draws a prescription for each replica, which is a convention',
        ...replicas.leftOut.map(({ prescription, reason }) => `${prescription} left out: ${reason}`),
        ...replicas.notes,
      ],
    }))
    .filter((table) => table.rows.length > 0);
}
