/**
 * @module YAML and JSON (which is YAML) into entries. Scalars stay as written; anchors, aliases and tags are refused, so
 * that a short text can neither unfold into a long one nor call for a conversion.
 */
import { LineCounter, isAlias, isMap, isScalar, isSeq, parseDocument } from 'yaml';
import type { Complaints } from './complaints.js';
import type { Entry, Place } from './entry.js';
import { quote } from './quote.js';

const SYNTAX = 'valid YAML or JSON';

/** The shape of a parsed node that is needed here. */
interface Located {
  readonly range?: readonly [number, number, number] | null | undefined;
  readonly anchor?: string | undefined;
  readonly tag?: string | undefined;
}

/** Stands for what was refused, so that the rest can be read and its problems told too. */
const REFUSED = '0';

/** The failsafe schema makes every scalar a string, and an empty one undefined or null. */
const scalarText = (value: unknown): string => (typeof value === 'string' ? value : '');

/** The entries of a text, with complaints about what is refused in it; undefined when it is no valid document. */
export function yamlEntries(text: string, complaints: Complaints): Entry | undefined {
  const lineCounter = new LineCounter();
  // The uniqueness of keys is checked below in one pass; the library compares all pairs.
  const options = { schema: 'failsafe', lineCounter, prettyErrors: false, strict: true, uniqueKeys: false } as const;
  const doc = parseDocument(text, options);
  const place = (offset: number): Place => {
    const { line, col } = lineCounter.linePos(offset);
    return { line: Math.max(1, line), column: Math.max(1, col) };
  };
  for (const trouble of [...doc.errors, ...doc.warnings]) {
    if (trouble.code === 'TAG_RESOLVE_FAILED') continue;
    const found = trouble.code === 'MULTIPLE_DOCS' ? 'a second document' : `not readable: ${trouble.message}`;
    complaints.add(place(trouble.pos[0]), '', found, trouble.code === 'MULTIPLE_DOCS' ? 'one document a file' : SYNTAX);
  }
  if (complaints.any) return undefined;
  if (doc.contents === null) return complaints.add({ line: 1, column: 1 }, '', 'an empty file', 'a series file');
  return convert(doc.contents, '', { line: 1, column: 1 });

  function convert(node: unknown, field: string, fallback: Place): Entry {
    const located = node as Located;
    const at = located.range ? place(located.range[0]) : fallback;
    if (isAlias(node)) {
      complaints.add(at, field, `a reference *${node.source.slice(0, 40)}`, 'the value written out');
      return { kind: 'text', text: REFUSED, at };
    }
    if (located.anchor !== undefined)
      complaints.add(at, field, `an anchor &${located.anchor.slice(0, 40)}`, 'no anchors or references');
    if (located.tag !== undefined && !/^tag:yaml.org,2002:(?:str|seq|map)$/.test(located.tag)) {
      complaints.add(at, field, `a tag ${quote(located.tag)}`, 'no tags');
      if (isScalar(node)) return { kind: 'text', text: REFUSED, at };
    }
    if (isScalar(node)) return { kind: 'text', text: scalarText(node.value), at };
    if (isSeq(node))
      return { kind: 'list', items: node.items.map((item, i) => convert(item, `${field}[${i}]`, at)), at };
    if (!isMap(node)) return { kind: 'text', text: '', at };
    const fields = new Map<string, { key: Place; value: Entry }>();
    for (const { key, value } of node.items) {
      if (!isScalar(key)) {
        complaints.add(at, field, 'a field name that is not a word', 'plain field names');
        continue;
      }
      const name = scalarText(key.value);
      const keyAt = key.range ? place(key.range[0]) : at;
      const path = field === '' ? name.slice(0, 80) : `${field}.${name.slice(0, 80)}`;
      if (fields.has(name))
        complaints.add(keyAt, path, `the field ${quote(name)} for a second time`, 'each field once');
      fields.set(name, { key: keyAt, value: convert(value, path, keyAt) });
    }
    return { kind: 'map', fields, at };
  }
}
