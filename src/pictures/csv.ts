/** @module The plotted numbers as comma-separated values: a table after the other, an empty line between. */
import type { Chart } from './chart.js';

const quoted = (cell: string): string => (/[",\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);

export const chartCsv = (chart: Chart): string =>
  chart.data
    .map(({ columns, rows }) => [columns, ...rows].map((row) => row.map(quoted).join(',')).join('\n'))
    .join('\n\n')
    .concat('\n');
