/** @module The coefficients c_0, c_1, … with their errors and their status. */
import type { Entry } from './entry.js';
import type { FieldReader, Group } from './field-reader.js';
import { LIMITS, grouped } from './limits.js';
import type { Coefficient } from './series.js';

export function readCoefficients(group: Group, reader: FieldReader): readonly Coefficient[] | undefined {
  const entry = group.get('coefficients');
  if (entry === undefined) return reader.complaints.add(group.at, 'coefficients', 'nothing', 'a list of coefficients');
  const items = reader.list(entry, 'coefficients', 'coefficients');
  if (items === undefined) return undefined;
  if (items.length === 0)
    return reader.complaints.add(entry.at, 'coefficients', 'an empty list', 'at least one coefficient');
  if (items.length > LIMITS.coefficients) {
    return reader.complaints.add(
      entry.at,
      'coefficients',
      `${grouped(items.length)} coefficients`,
      `at most ${grouped(LIMITS.coefficients)}`,
    );
  }
  const list = items.map((item, i) => coefficient(item, `coefficients[${i}]`, reader));
  return list.filter((c) => c !== undefined);
}

function coefficient(entry: Entry, field: string, reader: FieldReader): Coefficient | undefined {
  if (entry.kind === 'list')
    return reader.wrongKind(entry, field, 'a number, an expression, or the fields value, error, status');
  const read = reader.uncertain(entry, field, ['status']);
  if (read === undefined) return undefined;
  const { group, ...number } = read;
  const status =
    reader.choice(group?.get('status'), `${field}.status`, ['computed', 'estimated'] as const) ?? 'computed';
  return { ...number, status };
}
