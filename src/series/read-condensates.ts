/** @module Condensates: the power corrections that the ambiguity of the series is compared with. */
import type { Entry } from './entry.js';
import type { FieldReader } from './field-reader.js';
import { quote } from './quote.js';
import type { Condensate } from './series.js';

const FIELDS = ['dimension', 'name', 'wilson', 'value', 'unit', 'source', 'defined by'];

/** What a condensate's value may belong to. */
const DEFINITION = /^(?:principal value|truncated sum|cut-off \d+(?:\.\d+)? ?[GM]eV)$/;

export function readCondensates(entry: Entry | undefined, reader: FieldReader): readonly Condensate[] {
  if (entry === undefined) return [];
  const items = reader.list(entry, 'condensates', 'condensates') ?? [];
  return items.map((item, i) => condensate(item, `condensates[${i}]`, reader)).filter((c) => c !== undefined);
}

function condensate(entry: Entry, field: string, reader: FieldReader): Condensate | undefined {
  const group = reader.group(entry, field, FIELDS);
  if (group === undefined) return undefined;
  const { complaints } = reader;
  for (const name of ['dimension', 'name']) {
    if (group.get(name) === undefined) complaints.add(group.at, field, `no ${name}`, `a field "${name}"`);
  }
  const dimension = reader.rational(
    group.get('dimension'),
    `${field}.dimension`,
    'a positive number',
    (q) => q.sign() > 0,
  );
  const name = reader.text(group.get('name'), `${field}.name`);
  const wilson = reader.exact(group.get('wilson'), `${field}.wilson`, 'non-zero');
  const value = reader.uncertain(group.get('value'), `${field}.value`);
  const unit = reader.text(group.get('unit'), `${field}.unit`);
  const source = reader.text(group.get('source'), `${field}.source`);
  const definition = group.get('defined by');
  const definedBy = reader.text(definition, `${field}.defined by`);
  if (definedBy !== undefined && !DEFINITION.test(definedBy)) {
    complaints.add(
      definition?.at,
      `${field}.defined by`,
      quote(definedBy),
      '"principal value", "truncated sum" or a cut-off with its scale, "cut-off 1 GeV"',
    );
  }
  if (dimension === undefined || name === undefined) return undefined;
  if (value !== undefined && group.get('unit') === undefined) {
    const power = dimension.toString() === '1' ? '' : `^${dimension.toString()}`;
    complaints.add(group.get('value')!.at, `${field}.unit`, 'a value without a unit', `a unit such as GeV${power}`);
  }
  const energy = /^[GM]eV(?:\^(.+))?$/.exec(unit ?? '');
  if (energy !== null && (energy[1] ?? '1') !== dimension.toString()) {
    complaints.add(
      group.get('unit')!.at,
      `${field}.unit`,
      `${quote(unit!)} for dimension ${dimension.toString()}`,
      'a unit of that dimension',
    );
  }
  return {
    dimension,
    name,
    ...(wilson && { wilson }),
    ...(value && { value: { value: value.value, ...(value.error && { error: value.error }), text: value.text } }),
    ...(unit !== undefined && { unit }),
    ...(source !== undefined && { source }),
    ...(definedBy !== undefined && { definedBy }),
  };
}
