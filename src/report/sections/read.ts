/** @module Section 1: what was read. */
import type { Assessment, CouplingSummary, SeriesSummary } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { plusMinus } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import { over } from '../words.js';

const plural = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

function coefficientsFact(series: SeriesSummary): string {
  const { coefficientsUsed: used, coefficientsInFile: all } = series;
  const count = used === all ? plural(used, 'coefficient') : `the first ${used} of ${plural(all, 'coefficient')}`;
  return `${count}, ${used === 0 ? 'no order' : `orders ${series.firstPower} to ${series.order}`} in ${over(series.coupling.name, series.coupling.divisor)}`;
}

function couplingFact(series: SeriesSummary, coupling: CouplingSummary): string {
  const value = `${coupling.name} = ${shorten(coupling.value, 12)} ${plusMinus(coupling.error)}`.trim();
  if (coupling.divisor === '1') return value;
  return `${value}; the series runs in x = ${over(series.coupling.name, series.coupling.divisor)} = ${shorten(coupling.x, 10)}`;
}

function frameFact(series: SeriesSummary): string {
  if (series.factor === '1' && series.additive === '0') return '';
  const sum =
    series.factor === '1' ? 'the sum of the terms' : `${shorten(series.factor, 12)} times the sum of the terms`;
  return series.additive === '0' ? sum : `${shorten(series.additive, 12)} plus ${sum}`;
}

/** "1.77693 GeV", also where the value as written already names its unit. */
const inUnit = ({ value, unit }: { readonly value: string; readonly unit: string }): string =>
  value.endsWith(unit) ? value : `${shorten(value, 10)} ${unit}`;

/** Facts about the file, without those that it does not state; in brief, without where they come from. */
function seriesFacts(series: SeriesSummary, brief: boolean): Fact[] {
  const scheme = [series.scheme, series.flavours === undefined ? '' : plural(series.flavours, 'active flavour')]
    .filter((part) => part !== undefined && part !== '')
    .join(', ');
  const scales = [
    series.scaleRatio === undefined ? '' : `μ/Q = ${shorten(series.scaleRatio, 10)}`,
    series.hardScale === undefined ? '' : `Q = ${inUnit(series.hardScale)}`,
  ]
    .filter((part) => part !== '')
    .join(', ');
  const facts: Fact[] = [
    { label: 'quantity', text: series.quantity ?? '' },
    { label: 'read from', text: series.id },
    { label: 'known', text: coefficientsFact(series) },
    { label: 'meaning', text: frameFact(series) },
    { label: 'scheme', text: scheme },
    { label: 'scales', text: scales },
    ...(brief ? [] : series.sources.map((text) => ({ label: 'source', text }))),
    ...(brief ? [] : series.notes.map((text) => ({ label: 'note', text }))),
  ];
  if (series.invented) {
    facts.push({
      label: 'invented',
      text: 'this series is made up for demonstration; no physics follows from it',
      tone: 'warn',
    });
  }
  return facts.filter((fact) => fact.text !== '');
}

/** The coupling, Λ and the Borel variable. */
export function couplingFacts(series: SeriesSummary, coupling: CouplingSummary): Fact[] {
  const facts: Fact[] = [{ label: 'coupling', text: couplingFact(series, coupling) }];
  if (coupling.lambda !== undefined) {
    const inGeV = coupling.lambda.GeV === undefined ? '' : ` = ${shorten(coupling.lambda.GeV, 4)} GeV`;
    facts.push({
      label: 'Λ',
      text: `${shorten(coupling.lambda.overMu, 4)} μ${inGeV} (${coupling.lambda.definition})`,
    });
  }
  if (coupling.uPerT !== undefined) {
    facts.push({ label: 'Borel u', text: `u = ${shorten(coupling.uPerT, 8)} t, with t conjugate to x` });
  }
  if (coupling.path !== undefined && coupling.path.length > 0) {
    facts.push({ label: 'evolution', text: coupling.path.join('; ') });
  }
  return facts;
}

export function readSection(
  page: Page,
  { series, coupling }: Pick<Assessment, 'series'> & Partial<Pick<Assessment, 'coupling'>>,
): void {
  page.head('What was read');
  const facts = seriesFacts(series, coupling === undefined);
  if (coupling !== undefined) {
    const place = facts.findIndex((fact) => fact.label === 'known') + 1;
    facts.splice(place, 0, ...couplingFacts(series, coupling));
  }
  page.facts(facts);
}
