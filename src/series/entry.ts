/**
 * @module What a file says before anybody asks what it means: texts, lists and maps, each with its place.
 * YAML, JSON, CSV and bare lists are all turned into this, so that one reader understands them all.
 */

export interface Place {
  /** From 1. */
  readonly line: number;
  readonly column: number;
}

export interface TextEntry {
  readonly kind: 'text';
  /** The scalar as written: no digit lost, nothing converted. */
  readonly text: string;
  readonly at: Place;
}

export interface ListEntry {
  readonly kind: 'list';
  readonly items: readonly Entry[];
  readonly at: Place;
}

export interface MapEntry {
  readonly kind: 'map';
  readonly fields: ReadonlyMap<string, { readonly key: Place; readonly value: Entry }>;
  readonly at: Place;
}

export type Entry = TextEntry | ListEntry | MapEntry;

/** The words for each kind that the messages use. */
export const KIND_WORDS = { text: 'a single value', list: 'a list', map: 'a group of fields' } as const;
