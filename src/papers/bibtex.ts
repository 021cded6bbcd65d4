/**
 * @module The literature of a result in BibTeX: the program, the methods whose numbers it holds, and the sources that the
 * series file names.
 */
import { referencesFor } from './references.js';
import type { Reference } from './references.js';
import { texText } from './notation.js';

const ACCENTS: Readonly<Record<string, string>> = { é: "{\\'e}", ü: '{\\"u}', ö: '{\\"o}', ć: "{\\'c}", ä: '{\\"a}' };

const accented = (text: string): string => [...text].map((c) => ACCENTS[c] ?? c).join('');

function entryText(type: string, key: string, fields: readonly (readonly [string, string | undefined])[]): string {
  const lines = fields.flatMap(([name, value]) => (value === undefined ? [] : [`  ${name} = {${value}},`]));
  return [`@${type}{${key},`, ...lines, '}'].join('\n');
}

const archive = (eprint: string | undefined): readonly (readonly [string, string | undefined])[] => [
  ['eprint', eprint],
  ['archivePrefix', eprint === undefined ? undefined : 'arXiv'],
];

const referenceText = (reference: Reference): string =>
  entryText(reference.book === undefined ? 'article' : 'book', reference.key, [
    ['author', accented(reference.authors.join(' and '))],
    ['title', reference.book === undefined ? undefined : accented(reference.book)],
    ['journal', reference.journal],
    ['volume', reference.volume],
    ['pages', reference.pages],
    ['year', reference.year],
    ...archive(reference.eprint),
  ]);

const ARXIV = /(?:arXiv:)?\b(\d{4}\.\d{4,5}|(?:hep-(?:ph|th|lat|ex)|math|cond-mat)\/\d{7})\b/;

/** A source of a series file, whose text is its author's: the identifier is found in it where there is one. */
function sourceText(source: string, i: number, id: string): string {
  const eprint = ARXIV.exec(source)?.[1];
  return entryText('misc', `${id.replace(/[^a-z0-9-]/gi, '')}:source${i + 1}`, [
    ['note', accented(texText(source))],
    ...archive(eprint),
  ]);
}

/** Names of prescriptions and models anywhere in a result. */
export function methodsIn(value: unknown, found = new Set<string>()): Set<string> {
  if (Array.isArray(value)) for (const entry of value) methodsIn(entry, found);
  else if (typeof value === 'object' && value !== null) {
    const refused = 'refused' in value && value.refused !== undefined;
    for (const [key, inner] of Object.entries(value)) {
      if (!refused && (key === 'prescription' || key === 'model') && typeof inner === 'string')
        found.add(inner.split(':')[0]!);
      else methodsIn(inner, found);
    }
  }
  return found;
}

interface Sourced {
  readonly id?: unknown;
  readonly name?: unknown;
  readonly sources?: unknown;
}

/** A series stands in a result, or is the result; a bubble chain has a quantity. */
interface WithSources extends Sourced {
  readonly leastterm?: unknown;
  readonly series?: Sourced;
  readonly quantity?: Sourced;
}

/** BibTeX entries for a result of `command`. */
export function bibtexOf(result: object, command: string): string {
  const { leastterm, series, quantity, ...itself } = result as WithSources;
  const of: Sourced = [series, quantity].find((entry) => typeof entry === 'object') ?? itself;
  const own = entryText('software', 'leastterm', [
    ['author', '{Leastterm contributors}'],
    ['title', 'Leastterm: what a truncated, divergent QCD series is worth'],
    ['version', typeof leastterm === 'string' ? leastterm : undefined],
  ]);
  const sources = Array.isArray(of.sources) ? of.sources.map(String) : [];
  const id = [of.id, of.name].find((name) => typeof name === 'string') ?? 'series';
  return `${[
    own,
    ...referencesFor(command, [...methodsIn(result)]).map(referenceText),
    ...sources.map((source, i) => sourceText(source, i, id)),
  ].join('\n\n')}\n`;
}
