/** @module Published values that the coefficients of a file must reproduce. */
import type { Entry } from './entry.js';
import type { FieldReader } from './field-reader.js';
import type { SeriesCheck } from './series.js';

const DECIMAL = /^[+-]?\d+(?:\.\d*)?(?:[eE][+-]?\d{1,4})?$/;

export function readChecks(entry: Entry | undefined, reader: FieldReader): readonly SeriesCheck[] | undefined {
  if (entry === undefined) return undefined;
  const items = reader.list(entry, 'checks', 'checks') ?? [];
  const checks = items.map((item, i): SeriesCheck | undefined => {
    const field = `checks[${i}]`;
    const group = reader.group(item, field, ['flavours', 'values', 'source']);
    if (group === undefined) return undefined;
    const flavours = reader.integer(group.get('flavours'), `${field}.flavours`, 0, 16);
    const source = reader.text(group.get('source'), `${field}.source`);
    const entries = group.get('values');
    if (entries === undefined) return reader.complaints.add(group.at, field, 'no values', 'a field "values"');
    const values = (reader.list(entries, `${field}.values`, 'decimals') ?? []).map((value, j) => {
      const text = reader.text(value, `${field}.values[${j}]`, 'a decimal');
      if (text === undefined || DECIMAL.test(text)) return text;
      return reader.complaints.add(value.at, `${field}.values[${j}]`, `"${text.slice(0, 60)}"`, 'a decimal');
    });
    return {
      ...(flavours !== undefined && { flavours }),
      values: values.filter((value) => value !== undefined),
      ...(source !== undefined && { source }),
    };
  });
  return checks.filter((check) => check !== undefined);
}
