/** @module Strong-coupling behaviour of a model quantity: the exponents of F ~ x^power [1 + O(x^−spacing)]. */
import { Rational } from '../numerics/index.js';
import type { Entry } from './entry.js';
import type { FieldReader } from './field-reader.js';
import { plainSigns } from './number-text.js';
import type { StrongCoupling } from './series.js';

const FIELD = 'strong coupling';

export function readStrongCoupling(entry: Entry | undefined, reader: FieldReader): StrongCoupling | undefined {
  const group = entry && reader.group(entry, FIELD, ['power', 'spacing']);
  if (group === undefined) return undefined;
  for (const name of ['power', 'spacing'])
    if (group.get(name) === undefined) reader.complaints.add(group.at, FIELD, `no ${name}`, `a field "${name}"`);
  const power = reader.rational(group.get('power'), `${FIELD}.power`, 'a number such as 1/3', () => true);
  const spacing = reader.rational(group.get('spacing'), `${FIELD}.spacing`, 'a positive number', (q) => q.sign() > 0);
  return power === undefined || spacing === undefined ? undefined : { power, spacing };
}

/** "1/3,2/3" as power and spacing; undefined when it is not two numbers, the second one positive. */
export function parseStrongCoupling(text: string): StrongCoupling | undefined {
  const parts = text.split(',').map((part) => Rational.parse(plainSigns(part)));
  const [power, spacing] = parts;
  if (parts.length !== 2 || power === undefined || spacing === undefined || spacing.sign() <= 0) return undefined;
  return { power, spacing };
}
