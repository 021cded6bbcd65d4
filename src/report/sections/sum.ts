/** @module The answer of one prescription: every digit that was asked for, and what stands beside it. */
import type { ValueEntry } from '../../studies/index.js';
import { plusMinus } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import { prescriptionTitle } from '../words.js';

function facts(entry: ValueEntry): Fact[] {
  const { refused } = entry;
  if (refused !== undefined) {
    return [
      { label: 'refused', text: refused.reason, tone: 'warn' },
      { label: 'remedy', text: refused.remedy },
    ];
  }
  const list: Fact[] = [
    {
      label: entry.imaginary === undefined ? 'value' : 'principal value',
      text: entry.value ?? '',
      tone: entry.central === true ? 'mark' : 'plain',
    },
    { label: 'lateral sums', text: entry.imaginary === undefined ? '' : `value ± i times ${entry.imaginary}` },
    { label: 'truncation', text: plusMinus(entry.truncationError) },
    { label: 'ambiguity', text: entry.ambiguity === undefined ? '' : `${plusMinus(entry.ambiguity)}, |Im|/π` },
    { label: 'input', text: plusMinus(entry.inputError) },
    { label: 'terms used', text: entry.termsUsed === undefined ? '' : String(entry.termsUsed) },
    { label: 'trust', text: entry.standing ?? '' },
    { label: 'digits', text: entry.digits ?? '' },
    ...(entry.notes ?? []).map((text) => ({ label: 'note', text })),
  ];
  return list.filter((fact) => fact.text !== '');
}

/** Wide enough for the longest label, so that blocks stand under each other. */
const LABELS = 15;

export function sumSection(page: Page, values: readonly ValueEntry[]): void {
  for (const entry of values) {
    const central = entry.central === true && values.length > 1 ? ' (the family’s own choice)' : '';
    page.blank();
    page.say(`${prescriptionTitle(entry.prescription)}, ${entry.variant}${central}`, 'strong');
    page.facts(facts(entry), LABELS);
  }
}
