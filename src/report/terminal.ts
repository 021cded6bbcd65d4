/** @module The report for people: sections of plain text, in 80 to 100 columns. */
import type { Assessment, ValueEntry } from '../studies/index.js';
import { Page } from './layout/page.js';
import type { Paint } from './layout/paint.js';
import { unpainted } from './layout/paint.js';
import { ambiguitySection } from './sections/ambiguity.js';
import { growthSection } from './sections/growth.js';
import { entryName, planeSection } from './sections/plane.js';
import { couplingFacts, readSection } from './sections/read.js';
import { sumSection } from './sections/sum.js';
import { termsSection } from './sections/terms.js';
import { truncationSection } from './sections/truncation.js';
import { valuesSection } from './sections/values.js';
import { cautionPoints, verdictSection } from './sections/verdict.js';

export interface TerminalOptions {
  /** Columns of the terminal; the page uses 80 to 100 of them. Default 100. */
  readonly columns?: number;
  /** Default: no colour. */
  readonly paint?: Paint;
  /** Significant digits in the tables; default 8, or 6 on a narrow page. */
  readonly digits?: number;
}

function open(assessment: Pick<Assessment, 'series'>, options: TerminalOptions): Page {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  page.title(assessment.series.title);
  return page;
}

/** The whole assessment, eight sections. */
export function assessmentText(assessment: Assessment, options: TerminalOptions = {}): string {
  const page = open(assessment, options);
  readSection(page, assessment);
  termsSection(page, assessment);
  growthSection(page, assessment.growth);
  planeSection(page, assessment.borelPlane);
  valuesSection(page, assessment.values);
  ambiguitySection(page, assessment);
  truncationSection(page, assessment.optimalTruncation, assessment.coupling.name);
  verdictSection(page, assessment.verdict, assessment.cautions);
  return page.text();
}

/** What was read, and how the coefficients grow. */
export function growthText(assessment: Pick<Assessment, 'series' | 'growth'>, options: TerminalOptions = {}): string {
  const page = open(assessment, options);
  readSection(page, { series: assessment.series });
  growthSection(page, assessment.growth);
  return page.text();
}

/** What was read, and the Borel plane. */
export function planeText(
  assessment: Pick<Assessment, 'series' | 'borelPlane'>,
  options: TerminalOptions = {},
): string {
  const page = open(assessment, options);
  readSection(page, { series: assessment.series });
  planeSection(page, assessment.borelPlane);
  return page.text();
}

/** The values of one prescription, all digits. */
export function sumText(
  assessment: Pick<Assessment, 'series' | 'coupling' | 'values' | 'cautions'>,
  options: TerminalOptions = {},
): string {
  const page = open(assessment, options);
  page.blank();
  page.facts(couplingFacts(assessment.series, assessment.coupling));
  sumSection(page, assessment.values);
  cautionPoints(page, assessment.cautions);
  return page.text();
}

/** The bare values, one a line, for scripts: those that the families choose themselves, or all where none does. */
export function bareValues(values: readonly ValueEntry[]): string {
  const chosen = values.filter((entry) => entry.central === true);
  return (chosen.length > 0 ? chosen : values)
    .flatMap((entry) => (entry.value === undefined ? [] : [`${entry.value}\n`]))
    .join('');
}

/** The bare poles, one a line: entry with its Leroy parameter, real part, imaginary part, set off by tabs. */
export function planeLines(plane: Assessment['borelPlane']): string {
  return plane.entries
    .flatMap((entry) => entry.poles.map((pole) => `${entryName(entry)}\t${pole.re}\t${pole.im ?? '0'}\n`))
    .join('');
}
