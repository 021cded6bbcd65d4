/** @module Comma-separated values (RFC 4180): a head line, then one line a row; cells with commas, quotes or line ends in quotes. */

const cell = (text: string): string => (/[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);

/** The text of a table; an absent cell is empty. */
export function csv(head: readonly string[], rows: readonly (readonly (string | undefined)[])[]): string {
  return [head, ...rows].map((row) => `${row.map((text) => cell(text ?? '')).join(',')}\n`).join('');
}
