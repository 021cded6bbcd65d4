/** @module Section 7: where to stop, seen and predicted, and what stopping there costs. */
import type { OptimalTruncationReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { plusMinus } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import { sentence } from '../words.js';

function seen({ observed, status }: OptimalTruncationReport, digits: number): string {
  if (observed === undefined) return status;
  const tied = observed.tiedWith === undefined ? '' : ` (as small as order ${observed.tiedWith})`;
  return `least term at order ${observed.power}${tied}, ${shorten(observed.term, digits)}; the sum before it is ${shorten(observed.sumBefore, digits)}, through it ${shorten(observed.sumThrough, digits)}`;
}

export function truncationSection(page: Page, report: OptimalTruncationReport): void {
  page.head('Where to stop');
  const facts: Fact[] = [{ label: 'seen', text: seen(report, page.digits) }];
  const { predicted } = report;
  if (predicted !== undefined) {
    facts.push({
      label: 'predicted',
      text: `x − b = ${shorten(predicted.leastTermAt, 4)} terms to the least one; ${predicted.principalValueAt === undefined ? '' : `x − b − 1/3 = ${shorten(predicted.principalValueAt, 4)} terms to the principal value `}(x = ${shorten(predicted.x, 5)}, b = ${shorten(predicted.b, 5)}; ${predicted.origin})`,
    });
  }
  if (report.errorOfStopping !== undefined) {
    facts.push({ label: 'error of stopping', text: plusMinus(report.errorOfStopping) });
  }
  facts.push({ label: 'trust', text: report.standing });
  page.facts(facts);
  page.blank();
  page.say(sentence(report.statement));
}
