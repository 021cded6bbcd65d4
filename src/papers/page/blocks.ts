/** @module Pieces of the page: tables, figures, lists of facts. */
import { svgOf, pictureOf, formatNamed } from '../../pictures/index.js';
import type { Chart } from '../../pictures/index.js';
import { cellWords } from '../markdown.js';
import { plainHead } from '../notation.js';
import type { PaperTable } from '../table.js';
import { html } from './escape.js';

/** A table with its caption; it scrolls by itself where the page is narrow, also from the keyboard. */
export function tableHtml(table: PaperTable): string {
  const cls = (kind: string): string => (kind === 'text' ? '' : ' class="n"');
  const head = table.columns
    .map(({ head: text, kind, unit }) => {
      const label = plainHead(text) + (unit === undefined ? '' : ` [${unit}]`);
      // A column without a name is no head.
      return label === '' ? '<td></td>' : `<th scope="col"${cls(kind)}>${html(label)}</th>`;
    })
    .join('');
  const rows = table.rows.map((row) => {
    const cells = table.columns.map(({ kind }, i) => `<td${cls(kind)}>${html(cellWords(row[i] ?? '', kind))}</td>`);
    return `<tr>${cells.join('')}</tr>`;
  });
  const notes = table.notes.map((note) => `<p class="notes">${html(note)}</p>`).join('\n');
  return (
    `<div class="scroll" tabindex="0" role="region" aria-label="${html(table.title)}"><table><caption>${html(table.title)}</caption>` +
    `<thead><tr>${head}</tr></thead><tbody>${rows.join('')}</tbody></table></div>\n${notes}`
  );
}

/** A chart inline; its title and description stand in the SVG for those who do not see it. */
export function figureHtml(chart: Chart, mark = ''): string {
  const format = formatNamed('page');
  if (format === undefined) return '';
  return `<figure>${svgOf(pictureOf(chart, format), mark)}<figcaption>${html(chart.title)}. ${html(chart.description)}</figcaption></figure>`;
}

export const factsHtml = (facts: readonly (readonly [name: string, value: string | undefined])[]): string =>
  `<dl class="facts">${facts
    .flatMap(([name, value]) => (value === undefined ? [] : [`<dt>${html(name)}</dt><dd>${html(value)}</dd>`]))
    .join('')}</dl>`;

export const listHtml = (items: readonly string[], cls = ''): string =>
  items.length === 0
    ? ''
    : `<ul${cls === '' ? '' : ` class="${cls}"`}>${items.map((item) => `<li>${html(item)}</li>`).join('')}</ul>`;
