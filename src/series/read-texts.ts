/** @module Texts for people: sources with their status words, and notes. */
import type { Entry } from './entry.js';
import type { FieldReader } from './field-reader.js';

/** A list of texts; a single text stands for a list of one. */
export function readTexts(entry: Entry | undefined, field: string, reader: FieldReader): readonly string[] {
  if (entry === undefined) return [];
  const items = entry.kind === 'text' ? [entry] : (reader.list(entry, field, 'texts') ?? []);
  const texts = items.map((item, i) => reader.text(item, items.length === 1 ? field : `${field}[${i}]`));
  return texts.filter((text) => text !== undefined);
}

/** Sources: texts, or groups with a text and a status, which become `text [status]`. */
export function readSources(entry: Entry | undefined, reader: FieldReader): readonly string[] {
  if (entry === undefined) return [];
  const items = entry.kind === 'list' ? entry.items : [entry];
  const sources = items.map((item, i) => {
    const field = `sources[${i}]`;
    if (item.kind === 'text') return reader.text(item, field);
    const group = reader.group(item, field, ['text', 'status']);
    if (group === undefined) return undefined;
    if (group.get('text') === undefined) return reader.complaints.add(group.at, field, 'no text', 'a field "text"');
    const text = reader.text(group.get('text'), `${field}.text`);
    const status = reader.text(group.get('status'), `${field}.status`);
    return text === undefined || status === undefined ? text : `${text} [${status}]`;
  });
  return sources.filter((source) => source !== undefined);
}
