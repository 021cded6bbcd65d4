/** @module From a name or a text to a Series: what kind of text it is, one reading, and a second one when it holds expressions. */
import { NO_SUCH_FILE, STANDARD_INPUT, readTextFile, readTextStream } from './bytes.js';
import { catalogueText, isCatalogueName, nearestCatalogueId } from './catalogue.js';
import { Complaints } from './complaints.js';
import type { Entry } from './entry.js';
import type { ParseExpression } from './expression/syntax.js';
import { FieldReader } from './field-reader.js';
import { InputError } from './input-error.js';
import { Numbers } from './numbers.js';
import { weighed } from './precheck.js';
import { rememberFlavours } from './other-flavours.js';
import { readOnlyCoefficients, readSeries } from './read-series.js';
import type { Series } from './series.js';
import { csvEntries, listEntries } from './table.js';

export type SeriesForm = 'yaml' | 'csv' | 'list';

export interface LoadOptions {
  /** Number of flavours to use in place of the file's own; refused where the coefficients are fixed numbers. */
  readonly flavours?: number;
  /** Read in place of standard input for the name `-`. */
  readonly stdin?: AsyncIterable<Uint8Array | string>;
}

export interface ParseOptions {
  /** Name in messages, and the id of the series. */
  readonly name: string;
  readonly form?: SeriesForm;
  readonly flavours?: number;
}

/** What a text is, by its first telling line: JSON and YAML have brackets, dashes or `name:`, CSV has a header. */
export function formOf(text: string, name: string): SeriesForm {
  if (/\.csv$/i.test(name)) return 'csv';
  if (/\.(?:ya?ml|json)$/i.test(name)) return 'yaml';
  const first = /^[ \t]*(?!#)(\S.*)$/m.exec(text.slice(0, 65_536))?.[1] ?? '';
  if (/^"?(?:order|value)"?\s*(?:,|$)/i.test(first)) return 'csv';
  // "-" alone opens a YAML list; "-1" does not. A colon belongs to "name:".
  return /^(?:[[{"'%&!|>]|-\s|-$|---)/.test(first) || /:(?:\s|$)/.test(first) ? 'yaml' : 'list';
}

/** Reads a series from its text; throws InputError with every problem in it. */
export async function parseSeries(text: string, options: ParseOptions): Promise<Series> {
  const { name } = options;
  const complaints = new Complaints(name);
  if (!weighed(text, complaints)) throw complaints.error();
  const entry = await entries(text, options.form ?? formOf(text, name), complaints);
  if (entry === undefined) throw complaints.error();

  const first = reading(entry, options, complaints, undefined);
  if (!first.parserWanted) return first.result();
  const { parseExpression } = await import('./expression/mathjs-parser.js');
  return reading(entry, options, complaints, parseExpression).result();
}

async function entries(text: string, form: SeriesForm, complaints: Complaints): Promise<Entry | undefined> {
  if (form === 'csv') return csvEntries(text, complaints);
  if (form === 'list') return listEntries(text, complaints);
  const { yamlEntries } = await import('./yaml-entries.js');
  return yamlEntries(text, complaints);
}

function reading(entry: Entry, options: ParseOptions, earlier: Complaints, parse: ParseExpression | undefined) {
  const complaints = new Complaints(options.name, earlier);
  const numbers = new Numbers(parse);
  const id = options.name.replace(/^.*[\\/]/, '').replace(/\.(?:ya?ml|json|csv|txt|dat)$/i, '');
  const series = readSeries(entry, id, new FieldReader(complaints, numbers), options.flavours);
  if (series?.anyFlavours === true && parse !== undefined) {
    rememberFlavours(series.coefficients, (flavours) =>
      readOnlyCoefficients(entry, new FieldReader(new Complaints(options.name), new Numbers(parse)), flavours),
    );
  }
  return {
    parserWanted: numbers.parserWanted,
    result(): Series {
      if (series === undefined) throw complaints.error();
      return series;
    },
  };
}

/**
 * Loads a series by catalogue id, path, or `-` for standard input; throws InputError with every problem in it.
 * A name without a dot or slash is a catalogue id first and a file second; `./name` is always a file.
 */
export async function loadSeries(name: string, options: LoadOptions = {}): Promise<Series> {
  const flavours = options.flavours === undefined ? {} : { flavours: options.flavours };
  if (name === '-') {
    const text = await readTextStream(options.stdin ?? process.stdin);
    return parseSeries(text, { name: STANDARD_INPUT, ...flavours });
  }
  if (!isCatalogueName(name)) return parseSeries(await readTextFile(name), { name, ...flavours });
  const found = await catalogueText(name);
  if (found === undefined) return parseSeries(await fileOrUnknownId(name), { name, ...flavours });
  return parseSeries(found.text, {
    name,
    form: 'yaml',
    ...(found.flavours !== undefined && { flavours: found.flavours }),
    ...flavours,
  });
}

/** A file without dot or slash in its name; when there is none, the catalogue id was probably mistyped. */
async function fileOrUnknownId(name: string): Promise<string> {
  try {
    return await readTextFile(name);
  } catch (error) {
    if (!(error instanceof InputError) || error.problems[0]?.found !== NO_SUCH_FILE) throw error;
    const near = await nearestCatalogueId(name);
    const found = `neither a catalogue id nor a file${near === undefined ? '' : ` (did you mean "${near}"?)`}`;
    throw new InputError([{ file: name, found, wanted: 'an id of the catalogue, a path, or - for standard input' }]);
  }
}
