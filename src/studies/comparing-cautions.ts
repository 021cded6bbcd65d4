/** @module Why a value is flagged in a comparison. */
import { R } from '../numerics/index.js';
import { leastTerm, terms } from '../prescriptions/index.js';
import type { Prescription, Sum } from '../prescriptions/index.js';
import type { Growth } from '../growth/index.js';
import type { Expansion } from '../series/index.js';
import type { Caution, ValueRecord } from './assessment.js';

/** What prescriptions say of their own values, by the beginning of the note. */
const NOTES: readonly (readonly [begins: string, code: string, text: string])[] = [
  ['large contributions cancel', 'cancellation', 'large contributions cancel in the model'],
  [
    'same-sign series: the coupling lies on the cut',
    'on the cut',
    'the coupling lies on the cut, where real approximants wander',
  ],
  ['a complex pair near the positive axis', 'pair near axis', 'a complex pair of poles lies near the positive axis'],
  ['the coupling at that scale is strong', 'strong coupling', 'the coupling at the scale chosen is strong'],
];

const CONVERGING = ['convergent', 'geometric', 'terminating'];

/** Do the terms that fixed order sums go beyond the least one? */
function pastLeast(e: Expansion, growth: Growth): boolean {
  if (CONVERGING.includes(growth.verdict)) return false;
  const t = terms(e, 128);
  const least = leastTerm(t);
  return least !== undefined && t.some((b, n) => n > least.index && !R.isExactZero(b));
}

/** The cautions of one value. */
export function valueCautions(
  e: Expansion,
  growth: Growth,
  prescription: Prescription,
  sum: Sum,
  record: ValueRecord | undefined,
): Caution[] {
  const list: Caution[] = NOTES.flatMap(([begins, code, text]) =>
    sum.notes.some((note) => note.startsWith(begins)) ? [{ code, text }] : [],
  );
  if (prescription.name === 'fixed-order' && pastLeast(e, growth))
    list.push({ code: 'past least term', text: 'the sum goes past its least term' });
  if (sum.truncation === undefined) list.push({ code: 'no error', text: 'no truncation error can be stated' });
  else if (sum.truncation > Math.abs(R.toNumber(sum.value)))
    list.push({ code: 'error above value', text: 'the truncation error exceeds the value' });
  if (record?.verdict === 'bad')
    list.push({
      code: 'bad record',
      text: 'with coefficients hidden it missed by more than three times its stated error, the target’s own error allowed for',
    });
  return list;
}
