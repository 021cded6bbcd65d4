/** @module The file's own named constants, for use in its expressions. */
import type { Entry } from './entry.js';
import { CONSTANTS, FUNCTIONS } from './expression/syntax.js';
import type { FieldReader } from './field-reader.js';
import { LIMITS, grouped } from './limits.js';
import { isNumberProblem } from './number-text.js';
import { quote } from './quote.js';

const NAME = /^[A-Za-z][A-Za-z0-9_]{0,31}$/;

/** Defines the constants for the expressions that follow, and works each of them out, so that a wrong one is told once. */
export function readConstants(
  entry: Entry | undefined,
  reader: FieldReader,
): readonly { name: string; text: string }[] {
  if (entry === undefined) return [];
  if (entry.kind !== 'map') {
    reader.wrongKind(entry, 'constants', 'names with their values');
    return [];
  }
  if (entry.fields.size > LIMITS.constants) {
    reader.complaints.add(
      entry.at,
      'constants',
      `${grouped(entry.fields.size)} constants`,
      `at most ${LIMITS.constants}`,
    );
    return [];
  }
  const list: { name: string; text: string }[] = [];
  for (const [name, { key, value }] of entry.fields) {
    const field = `constants.${name.slice(0, 40)}`;
    if (CONSTANTS.includes(name) || FUNCTIONS.includes(name)) {
      reader.complaints.add(key, field, `the name ${quote(name)}, which has a meaning already`, 'another name');
    } else if (!NAME.test(name)) {
      reader.complaints.add(key, field, `the name ${quote(name)}`, 'a letter, then letters, digits and _, 32 at most');
    } else {
      const text = reader.text(value, field, 'a number or an expression');
      if (text === undefined) continue;
      reader.numbers.define(name, text);
      list.push({ name, text });
    }
  }
  for (const { name } of list) {
    const value = reader.numbers.constant(name);
    if (isNumberProblem(value))
      reader.complaints.add(entry.fields.get(name)!.value.at, `constants.${name}`, value.problem, value.wanted);
  }
  return list;
}
