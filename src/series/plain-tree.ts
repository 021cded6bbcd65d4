/**
 * @module A YAML or JSON file as plain texts, lists and maps, for files that are no series: every scalar as it was written,
 * the same refusals as for a series file.
 */
import { readTextFile } from './bytes.js';
import { Complaints } from './complaints.js';
import type { Entry } from './entry.js';

export type PlainTree = string | readonly PlainTree[] | { readonly [field: string]: PlainTree };

function plain(entry: Entry): PlainTree {
  switch (entry.kind) {
    case 'text':
      return entry.text.trim();
    case 'list':
      return entry.items.map(plain);
    case 'map':
      return Object.fromEntries([...entry.fields].map(([name, { value }]) => [name, plain(value)]));
  }
}

/** Reads a file; throws InputError when it cannot be read or is no YAML. */
export async function loadPlainTree(path: string): Promise<PlainTree> {
  const complaints = new Complaints(path);
  const text = await readTextFile(path);
  const { yamlEntries } = await import('./yaml-entries.js');
  const entry = yamlEntries(text, complaints);
  if (entry === undefined || complaints.any) throw complaints.error();
  return plain(entry);
}
