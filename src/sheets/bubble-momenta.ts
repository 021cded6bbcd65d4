/** @module Momenta and cuts of bubble chains for people, and as comma-separated values. */
import { shorten } from '../numerics/index.js';
import type { BubbleCutResult, BubbleViewResult } from '../extraction/index.js';
import { rough, type Page, type TerminalOptions } from '../report/index.js';
import { couplingFacts, pageOf } from './bubbles.js';

/** A view of the momenta. */
export function bubbleViewText(result: BubbleViewResult, options: TerminalOptions = {}): string {
  const page = pageOf(options);
  const { quantity } = result;
  page.title(`${quantity.title} in the large-β₀ limit: ${result.view}`);
  page.blank();
  page.facts(couplingFacts(quantity, result.coupling));
  page.blank();
  page.table(
    result.columns.map((c) => ({ head: c.name, align: 'point' as const })),
    result.rows.map((row) => ({ cells: row.map((cell) => shorten(cell, page.digits)) })),
  );
  page.blank();
  page.facts(result.columns.map((c) => ({ label: c.name, text: c.meaning, tone: 'faint' as const })));
  if (result.integrals.length > 0) {
    page.blank();
    page.facts(result.integrals.map((i) => ({ label: i.name, text: `${i.value} (${i.standing})` })));
  }
  page.blank();
  page.points(result.notes, 'faint');
  return page.text();
}

const cell = (text: string): string => (/[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);
const line = (cells: readonly string[]): string => `${cells.map(cell).join(',')}\n`;

/** A view, or the rows of a cut, as comma-separated values. */
export const bubbleViewCsv = (result: BubbleViewResult): string =>
  line(result.columns.map((c) => c.name)) + result.rows.map(line).join('');

export function bubbleCutCsv({ cut }: BubbleCutResult): string {
  const head = ['n', 'whole', 'k_below', 'window', 'k_above_Q', 'k_above'];
  return (
    line(head) + cut.terms.map((t) => line([String(t.n), t.whole, t.low, t.window, t.ultraviolet, t.high])).join('')
  );
}

function cutTerms(page: Page, { cut, quantity }: BubbleCutResult): void {
  page.head('Coefficients by momentum');
  page.table(
    [
      { head: 'n', align: 'right' },
      { head: 'all', align: 'point' },
      { head: 'k < μ_f', align: 'point' },
      { head: `μ_f < k < ${quantity.hard}`, align: 'point' },
      { head: `k > ${quantity.hard}`, align: 'point' },
      { head: 'k > μ_f', align: 'point' },
    ],
    cut.terms.map((t) => ({
      cells: [String(t.n), ...[t.whole, t.low, t.window, t.ultraviolet, t.high].map((x) => shorten(x, 6))],
    })),
  );
  page.blank();
  page.facts([
    { label: 'all', text: cut.growth.whole.statement },
    { label: 'k > μ_f', text: cut.growth.high.statement },
    { label: 'window alone', text: cut.growth.window.statement },
  ]);
}

function cutPowers(page: Page, { cut }: BubbleCutResult): void {
  page.head('What the momenta below μ_f contribute');
  page.table(
    [
      { head: 'd', align: 'right' },
      { head: 'part (Λ/Q)^d', align: 'point' },
      { head: 'sum up to here', align: 'point' },
      { head: 'left over', align: 'point' },
    ],
    cut.powers.map((p) => ({ cells: [p.dimension, shorten(p.value, 8), p.upToHere, rough(p.left)] })),
  );
  page.blank();
  page.facts([
    { label: 'Im, k < μ_f', text: shorten(cut.imaginary.low, 8) },
    { label: 'Im, k > μ_f', text: cut.imaginary.high },
    ...(cut.condensate === undefined
      ? []
      : [{ label: cut.condensate.name, text: `${cut.condensate.value} ${cut.condensate.unit}` }]),
  ]);
}

function cutRows(page: Page, { cut, quantity }: BubbleCutResult): void {
  page.head('The sum does not depend on μ_f');
  page.table(
    [
      { head: `μ_f/${quantity.hard}`, align: 'point' },
      { head: 'k > μ_f', align: 'point' },
      { head: 'k < μ_f', align: 'point' },
      { head: 'sum', align: 'point' },
      { head: 'first power', align: 'point' },
      { head: 'not in it', align: 'point' },
      { head: 'k > μ_f, direct', align: 'point', tone: 'faint' },
    ],
    cut.rows.map((r) => ({
      cells: [
        r.cut,
        ...[r.high, r.low, r.sum, r.leading].map((x) => shorten(x, 8)),
        rough(r.remainder),
        shorten(r.direct, 8),
      ],
      ...(r.cut === cut.overHard ? { tone: 'mark' as const } : {}),
    })),
  );
  page.blank();
  page.say(
    'With the first power alone in place of k < μ_f, the sum moves with μ_f by what the column "not in it" says: higher powers of μ_f/Q.',
    'faint',
  );
}

/** A chain with a cut. */
export function bubbleCutText(result: BubbleCutResult, options: TerminalOptions = {}): string {
  const page = pageOf(options);
  const { quantity, cut } = result;
  const where = `${shorten(cut.overHard, 6)} ${quantity.hard}${cut.GeV === undefined ? '' : ` = ${shorten(cut.GeV, 6)} GeV`}`;
  page.title(`${quantity.title} in the large-β₀ limit, cut at μ_f = ${where}`);
  page.blank();
  page.facts([...couplingFacts(quantity, result.coupling), { label: 'α_eff(μ_f)', text: cut.coupling }]);
  cutTerms(page, result);
  cutPowers(page, result);
  cutRows(page, result);
  return page.text();
}
