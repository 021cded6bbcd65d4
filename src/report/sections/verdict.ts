/** @module Section 8: the verdict, the rule that made it, and the cautions that go with it. */
import type { Caution, VerdictReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { plusMinus } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import { prescriptionTitle, sentence, withPi } from '../words.js';

/** "borel-pade: [2/2]" in words. */
function origin(prescription: string): string {
  const [name = '', ...variant] = prescription.split(': ');
  return [prescriptionTitle(name), ...variant].join(', ');
}

function parts(verdict: VerdictReport, digits: number): Fact[] {
  const facts: Fact[] = [];
  if (verdict.prescription !== undefined) facts.push({ label: 'from', text: origin(verdict.prescription) });
  if (verdict.value !== undefined) facts.push({ label: 'value', text: shorten(verdict.value, digits) });
  if (verdict.truncation !== undefined) facts.push({ label: 'truncation', text: plusMinus(verdict.truncation) });
  if (verdict.ambiguity !== undefined) {
    const whose = verdict.ambiguityOf === undefined ? '' : `  (${withPi(verdict.ambiguityOf)})`;
    facts.push({ label: 'ambiguity', text: `${plusMinus(verdict.ambiguity)}${whose}` });
  }
  if (verdict.input !== undefined) facts.push({ label: 'input', text: plusMinus(verdict.input) });
  if (verdict.assumption !== undefined)
    facts.push({ label: 'assumes', text: `that ${verdict.assumption}`, tone: 'warn' });
  facts.push({ label: 'rule', text: verdict.rule }, { label: 'trust', text: verdict.standing });
  return facts;
}

export function verdictSection(page: Page, verdict: VerdictReport, cautions: readonly Caution[]): void {
  page.head('The verdict');
  page.facts(parts(verdict, page.digits));
  page.blank();
  page.say(verdict.printed, 'mark');
  if (verdict.inUnit !== undefined) page.say(`= ${verdict.inUnit.printed}`, 'mark');
  cautionPoints(page, cautions);
}

export function cautionPoints(page: Page, cautions: readonly Caution[]): void {
  if (cautions.length === 0) return;
  page.blank();
  page.say(cautions.length === 1 ? 'One caution:' : `${cautions.length} cautions:`, 'warn');
  page.points(
    cautions.map((caution) => sentence(caution.text)),
    'warn',
  );
}
