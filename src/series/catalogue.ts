/**
 * @module The catalogue of published (or, marked so, invented) series: the files of the package's `series/` folder.
 * An id is a file name without its ending. Where nf is symbolic, `id-nf4` (or `id-nl4`) is the same series at 4 flavours.
 */
import { readFile, readdir, access } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Rational } from '../numerics/index.js';
import { Complaints } from './complaints.js';
import type { Entry } from './entry.js';
import { nearest } from './nearest.js';

export interface CatalogueEntry {
  readonly id: string;
  readonly title: string;
  readonly quantity?: string;
  /** Number of coefficients in the file. */
  readonly coefficients: number;
  readonly flavours?: number;
  /** Numbers of flavours the file names as its range. */
  readonly flavourChoices: readonly number[];
  /** Ids of the same series at those numbers: `pole-msbar-nl3`, … */
  readonly variants: readonly string[];
  readonly invented: boolean;
  /** nf stands in the coefficients: the file serves other numbers of flavours too. */
  readonly anyFlavours: boolean;
  /** Operator dimensions d of the singularities u = d/2 and the condensates that the file states; negative ultraviolet. */
  readonly dimensions: readonly number[];
}

const ENDING = '.yaml';
const ID = /^[a-z0-9]+(?:-[a-z0-9]+)*$/;
const WITH_FLAVOURS = /^(.+)-n[fl](\d{1,2})$/;

/** Could `name` be a catalogue id (rather than a path)? */
export const isCatalogueName = (name: string): boolean => name.length <= 64 && ID.test(name);

const exists = (path: string): Promise<boolean> =>
  access(path).then(
    () => true,
    () => false,
  );

let folder: Promise<string> | undefined;

/** The `series/` folder beside the nearest package.json above this file: in the source tree, a bundle, or an installed package. */
export function catalogueFolder(): Promise<string> {
  folder ??= find(dirname(fileURLToPath(import.meta.url)));
  return folder;
}

async function find(start: string): Promise<string> {
  for (let here = start; ; here = dirname(here)) {
    const candidate = join(here, 'series');
    if ((await exists(join(here, 'package.json'))) && (await exists(candidate))) return candidate;
    if (dirname(here) === here) throw new Error(`the catalogue folder "series" was not found above ${start}`);
  }
}

/** Ids of all files, sorted. */
export async function catalogueIds(): Promise<readonly string[]> {
  const names = await readdir(await catalogueFolder());
  return names
    .filter((name) => name.endsWith(ENDING))
    .map((name) => name.slice(0, -ENDING.length))
    .toSorted();
}

/** Text of a catalogue series, with the number of flavours that its id asks for; undefined for an unknown id. */
export async function catalogueText(
  id: string,
): Promise<{ readonly text: string; readonly flavours?: number } | undefined> {
  const ids = await catalogueIds();
  const path = async (name: string): Promise<string> => readFile(join(await catalogueFolder(), name + ENDING), 'utf8');
  if (ids.includes(id)) return { text: await path(id) };
  const m = WITH_FLAVOURS.exec(id);
  return m !== null && ids.includes(m[1]!) ? { text: await path(m[1]!), flavours: Number(m[2]) } : undefined;
}

/** The id nearest to a mistyped one. */
export async function nearestCatalogueId(id: string): Promise<string | undefined> {
  return nearest(id, await catalogueIds());
}

/** All files with what a list shows of them; no coefficient is evaluated. */
export async function listCatalogue(): Promise<readonly CatalogueEntry[]> {
  const { yamlEntries } = await import('./yaml-entries.js');
  const ids = await catalogueIds();
  return Promise.all(
    ids.map(async (id) => {
      const found = await catalogueText(id);
      const complaints = new Complaints(id);
      const entry = yamlEntries(found?.text ?? '', complaints);
      complaints.throwIfAny();
      return summary(id, entry);
    }),
  );
}

function summary(id: string, entry: Entry | undefined): CatalogueEntry {
  const field = (name: string): Entry | undefined =>
    entry?.kind === 'map' ? entry.fields.get(name)?.value : undefined;
  const text = (e: Entry | undefined): string | undefined => (e?.kind === 'text' ? e.text.trim() : undefined);
  const items = (name: string): readonly Entry[] => {
    const list = field(name);
    return list?.kind === 'list' ? list.items : [];
  };
  const quantity = text(field('quantity'));
  const flavours = text(field('flavours'));
  const flavourChoices = items('flavour choices').map((item) => Number(text(item)));
  return {
    id,
    title: text(field('title')) ?? id,
    ...(quantity !== undefined && { quantity }),
    coefficients: items('coefficients').length,
    ...(flavours !== undefined && { flavours: Number(flavours) }),
    flavourChoices,
    variants: flavourChoices.length > 1 ? flavourChoices.map((n) => `${id}-nl${n}`) : [],
    invented: text(field('invented')) === 'true',
    anyFlavours: [field('coefficients'), field('constants')].some(mentionsFlavours),
    dimensions: dimensionsOf([...items('singularities'), ...items('condensates')]),
  };
}

/** Dimensions of singularities and condensates, each once, rising. */
function dimensionsOf(entries: readonly Entry[]): readonly number[] {
  const found = entries.flatMap((entry) => {
    const number = (name: string): number | undefined => {
      const value = entry.kind === 'map' ? entry.fields.get(name)?.value : undefined;
      return value?.kind === 'text' ? Rational.parse(value.text)?.toNumber() : undefined;
    };
    const u = number('u');
    const d = number('dimension') ?? (u === undefined ? undefined : 2 * u);
    return d === undefined ? [] : [d];
  });
  return [...new Set(found)].toSorted((a, b) => a - b);
}

/** Does nf stand in one of the texts below? */
function mentionsFlavours(entry: Entry | undefined): boolean {
  if (entry === undefined) return false;
  if (entry.kind === 'text') return /\bnf\b/.test(entry.text);
  if (entry.kind === 'list') return entry.items.some(mentionsFlavours);
  return [...entry.fields.values()].some(({ value }) => mentionsFlavours(value));
}
