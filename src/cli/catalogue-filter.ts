/** @module Which series of the catalogue the filters keep. */
import type { Given } from './command.js';
import { UsageError } from './faults.js';
import type { CatalogueEntry } from '../series/index.js';

/** Does the file serve this number of flavours? */
function hasFlavours(entry: CatalogueEntry, n: number): boolean {
  if (entry.flavourChoices.length > 0) return entry.flavourChoices.includes(n);
  return entry.flavours === n || entry.anyFlavours;
}

/** The word itself or its plural: "mass" is not in "massless". */
function hasWord(entry: CatalogueEntry, word: string): boolean {
  const text = [entry.id, entry.title, entry.quantity ?? ''].join(' ');
  const literal = word.replaceAll(/[.*+?^${}()|[\]\\]/g, String.raw`\$&`);
  return new RegExp(String.raw`(?<![\p{L}\d])${literal}(?:s|es)?(?![\p{L}\d])`, 'iu').test(text);
}

/** The filters of the command line as one test. */
export async function catalogueFilter(given: Given, command: string): Promise<(entry: CatalogueEntry) => boolean> {
  const { quantity, dimension, flavours, invented, published } = given;
  if (invented === true && published === true) {
    throw new UsageError('--invented and --published exclude each other: give one of them', command);
  }
  const { numerics } = await import('./rooms.js');
  const d = dimension === undefined ? undefined : numerics.Rational.parse(dimension)?.toNumber();
  if (dimension !== undefined && d === undefined) {
    throw new UsageError(`--dimension: "${dimension}" is no number; wanted an operator dimension such as 4`, command);
  }
  return (entry) =>
    (quantity === undefined || hasWord(entry, quantity)) &&
    (d === undefined || entry.dimensions.includes(d)) &&
    (flavours === undefined || hasFlavours(entry, flavours)) &&
    (invented === undefined || entry.invented) &&
    (published === undefined || !entry.invented);
}
