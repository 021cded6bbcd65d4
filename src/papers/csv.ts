/**
 * @module Tables as comma-separated values (RFC 4180), full numbers, every error in a column of its own. One head line a
 * table; several tables stand apart by an empty line.
 */
import { errorLabels, isMeasured } from './table.js';
import type { PaperTable } from './table.js';

const quoted = (cell: string): string => (/[",\r\n]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell);

function tableCsv(table: PaperTable): string {
  const labels = table.columns.map((_, i) => errorLabels(table, i));
  const head = table.columns.flatMap(({ key, unit }, i) => [
    unit === undefined ? key : `${key} [${unit}]`,
    ...labels[i]!.flatMap((label) => [`${key} +${label}`, `${key} -${label}`]),
  ]);
  const rows = table.rows.map((row) =>
    table.columns.flatMap((_, i) => {
      const cell = row[i] ?? '';
      const errors = labels[i]!.flatMap((label) => {
        const error = isMeasured(cell) ? cell.errors.find((e) => e.label === label) : undefined;
        return [error?.plus ?? '', error?.minus ?? ''];
      });
      return [isMeasured(cell) ? cell.value : cell, ...errors];
    }),
  );
  return [head, ...rows].map((cells) => `${cells.map(quoted).join(',')}\n`).join('');
}

export const csvOf = (tables: readonly PaperTable[]): string => tables.map(tableCsv).join('\n');
