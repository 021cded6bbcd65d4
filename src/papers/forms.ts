/** @module The forms for papers: each turns the tables of a result into text. */
import { bibtexOf } from './bibtex.js';
import { csvOf } from './csv.js';
import { hepdataOf } from './hepdata.js';
import { latexOf } from './latex.js';
import { markdownOf } from './markdown.js';
import { tablesOf } from './of-result.js';
import type { CommandResult } from './of-result.js';

export const PAPER_FORMS = ['latex', 'bibtex', 'markdown', 'csv', 'hepdata'] as const;
export type PaperForm = (typeof PAPER_FORMS)[number];

/** A result in one of the forms; an empty text where it has no table. */
export function paperText(result: CommandResult, form: PaperForm): string {
  if (form !== 'bibtex' && tablesOf(result).length === 0) return '';
  switch (form) {
    case 'latex':
      return latexOf(tablesOf(result));
    case 'bibtex':
      return bibtexOf(result, result.request.command);
    case 'markdown':
      return markdownOf(tablesOf(result));
    case 'csv':
      return csvOf(tablesOf(result));
    case 'hepdata':
      return hepdataOf(tablesOf(result), keywords(result));
  }
}

function keywords(result: CommandResult): string[] {
  const series = 'series' in result ? result.series : undefined;
  const id = typeof series === 'object' && series !== null && 'id' in series ? String(series.id) : undefined;
  return [result.request.command, ...(id === undefined ? [] : [id])];
}
