/** @module Section 7: where to stop, seen and predicted, and what stopping there costs. */
import type { OptimalTruncationReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { plusMinus, rough } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import { sentence } from '../words.js';
import { competingFacts } from './competing.js';

function seen({ observed, status }: OptimalTruncationReport, digits: number): string {
  if (observed === undefined) return status;
  const tied = observed.tiedWith === undefined ? '' : ` (as small as order ${observed.tiedWith})`;
  return `least term at order ${observed.power}${tied}, ${shorten(observed.term, digits)}; the sum before it is ${shorten(observed.sumBefore, digits)}, through it ${shorten(observed.sumThrough, digits)}`;
}

/** "0.50 at Q/2: 1.1305; Q: 1.1287; 2Q: 1.1268", and how far they lie apart. */
function scaleFacts({ scales }: OptimalTruncationReport, name: string, digits: number): Fact[] {
  if (scales === undefined) return [];
  const words: Readonly<Record<string, string>> = { '0.5': 'Q/2', '1': 'Q', '2': '2Q' };
  const list = scales.points.map(
    (p) => `${shorten(p.value, digits)} at μ = ${words[p.ratio] ?? p.ratio} (${name} = ${shorten(p.coupling, 4)})`,
  );
  const spread = scales.spread === undefined || list.length < 2 ? '' : `; largest shift ${rough(scales.spread)}`;
  return [
    ...(list.length === 0 ? [] : [{ label: 'other scales', text: `all known terms: ${list.join(', ')}${spread}` }]),
    ...(scales.refused === undefined ? [] : [{ label: 'other scales', text: `not moved: ${scales.refused.reason}` }]),
  ];
}

type Model = NonNullable<OptimalTruncationReport['models']>[number];

const MODEL_WORDS: Readonly<Record<Model['nature'], string>> = { conventional: 'customs', credible: '68 % credible' };

function modelText({ title, low, high }: Model): string {
  const down = low.replace(/^-/, '');
  return down === high ? `${title} ${plusMinus(high)}` : `${title} ${signed(low)} ${signed(high)}`;
}

const signed = (text: string): string => (text.startsWith('-') ? `-${rough(text.slice(1))}` : `+${rough(text)}`);

/** What other models say of all known terms, one line a kind. */
function modelFacts({ models = [] }: OptimalTruncationReport): Fact[] {
  return (['conventional', 'credible'] as const).flatMap((nature) => {
    const list = models.filter((m) => m.nature === nature).map(modelText);
    return list.length === 0 ? [] : [{ label: 'other models', text: `${MODEL_WORDS[nature]}: ${list.join(', ')}` }];
  });
}

export function truncationSection(page: Page, report: OptimalTruncationReport, coupling = 'x'): void {
  page.head('Where to stop');
  const facts: Fact[] = [{ label: 'seen', text: seen(report, page.digits) }];
  const { predicted } = report;
  if (predicted !== undefined) {
    facts.push({
      label: 'predicted',
      text: `x − b = ${shorten(predicted.leastTermAt, 4)} terms to the least one; ${predicted.principalValueAt === undefined ? '' : `x − b − 1/3 = ${shorten(predicted.principalValueAt, 4)} terms to the principal value `}(x = ${shorten(predicted.x, 5)}, b = ${shorten(predicted.b, 5)}; ${predicted.origin})`,
    });
  }
  if (report.competing !== undefined) facts.push(...competingFacts(report.competing, page.digits));
  if (report.errorOfStopping !== undefined) {
    facts.push({ label: 'error of stopping', text: plusMinus(report.errorOfStopping) });
  }
  facts.push(...scaleFacts(report, coupling, page.digits), ...modelFacts(report));
  facts.push({ label: 'trust', text: report.standing });
  page.facts(facts);
  page.blank();
  page.say(sentence(report.statement));
}
