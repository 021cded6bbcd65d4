/** @module Kind and weight of a series file: a plain series, or the Adler coefficients of a quantity on a circle. */
import type { Rational } from '../numerics/index.js';
import type { Entry } from './entry.js';
import type { FieldReader, Group } from './field-reader.js';
import { LIMITS } from './limits.js';
import { isNumberProblem } from './number-text.js';
import { quote } from './quote.js';
import type { ContourWeight, Series } from './series.js';
import { namedWeight, weightOf, WEIGHT_FORMS } from './weights.js';

export const KINDS = ['plain', 'contour'] as const;

/** The weight of a contour quantity; undefined for a plain series, and after a complaint. */
export function readContour(
  group: Group,
  series: Pick<Series, 'coupling' | 'firstPower' | 'coefficients'>,
  reader: FieldReader,
): ContourWeight | undefined {
  const { complaints } = reader;
  const entry = group.get('kind');
  const kind = reader.choice(entry, 'kind', KINDS);
  const weight = group.get('weight');
  if (entry === undefined || kind !== 'contour') {
    if (weight !== undefined && (entry === undefined || kind === 'plain'))
      complaints.add(weight.at, 'weight', 'a weight of a plain series', '"kind: contour" beside it');
    return undefined;
  }
  needs(series.coupling.plain, 'a plain variable, which does not run', 'a coupling, with scheme and flavours');
  if (!series.coupling.plain) {
    needs(group.get('scheme') === undefined, 'no scheme, so that the coupling does not run', 'scheme: MSbar');
    needs(reader.numbers.flavours === undefined, 'no number of flavours', 'a field "flavours"');
  }
  needs(series.firstPower < 0, `the first power ${series.firstPower}`, 'a first power of 0 or more');
  const count = series.coefficients.length;
  needs(count > LIMITS.contour, `${count} coefficients`, `at most ${LIMITS.contour} for a contour quantity`);
  needs(weight === undefined, 'no weight', `weight: ${WEIGHT_FORMS}`);
  return weight === undefined ? undefined : readWeight(weight, reader);

  function needs(missing: boolean, found: string, wanted: string): void {
    if (missing) complaints.add(entry?.at, 'kind: contour', found, wanted);
  }
}

function readWeight(entry: Entry, reader: FieldReader): ContourWeight | undefined {
  const { complaints } = reader;
  if (entry.kind === 'text') {
    const name = entry.text.trim();
    const known = namedWeight(name);
    if (known === undefined)
      return complaints.add(entry.at, 'weight', name === '' ? 'nothing' : quote(name), WEIGHT_FORMS);
    return { name, coefficients: known };
  }
  if (entry.kind !== 'list') return reader.wrongKind(entry, 'weight', WEIGHT_FORMS);
  const numbers: Rational[] = [];
  for (const [i, item] of entry.items.entries()) {
    const q = reader.rational(item, `weight[${i}]`, 'a decimal or a fraction', () => true);
    if (q !== undefined) numbers.push(q);
  }
  if (numbers.length < entry.items.length) return undefined;
  const weight = weightOf(numbers);
  return isNumberProblem(weight) ? complaints.add(entry.at, 'weight', weight.problem, weight.wanted) : weight;
}
