/** @module An evolution for people: the value with its errors, how it was reached, and Λ. */
import type { EvolveResult } from '../studies/index.js';
import { shorten } from '../numerics/index.js';
import { rough } from './layout/figures.js';
import { Page } from './layout/page.js';
import type { Fact } from './layout/page.js';
import { unpainted } from './layout/paint.js';
import type { TerminalOptions } from './terminal.js';

/** Digits of the path; the value itself has all. */
const PATH_DIGITS = 8;

const SYMBOL = { alpha_s: 'α_s', mass: 'm' } as const;

const signed = (text: string): string => (text.startsWith('-') ? text : `+${text}`);

function errorText(plus: string, minus: string): string {
  return rough(plus) === rough(minus) ? `± ${rough(plus)}` : `+${rough(plus)} -${rough(minus)}`;
}

function valueFacts(result: EvolveResult): Fact[] {
  const unit = result.unit === undefined ? '' : ` ${result.unit}`;
  const symbol = SYMBOL[result.quantity];
  const facts: Fact[] = [
    { label: `${symbol}(${result.to.scale} GeV)`, text: `${result.value}${unit}`, tone: 'mark' },
    { label: result.unit === undefined ? 'rounded' : `rounded, in ${result.unit}`, text: result.printed },
    { label: 'digits', text: `${result.digits}, for the truncated equations` },
    ...(result.digitsNote === undefined ? [] : [{ label: '', text: result.digitsNote }]),
    ...result.errors.map((e) => ({ label: `error from ${e.label}`, text: errorText(e.plus, e.minus) })),
  ];
  if (result.oneLoopLess !== undefined) {
    const { loops, value, shift } = result.oneLoopLess;
    facts.push({ label: 'one loop less', text: `${shorten(value, PATH_DIGITS)} with ${loops}: ${signed(shift)}` });
  }
  return facts;
}

function matchingFacts(result: EvolveResult): Fact[] {
  if (result.matching === undefined) return [];
  const { matching } = result;
  const rows = matching.crossings.map((c): Fact => {
    const where = `${c.threshold} crossed at ${c.factor} times its scale${c.limited === true ? ', 1 GeV' : ''}`;
    return {
      label: where,
      text: c.value === undefined ? `refused: ${c.refused?.reason ?? ''}` : shorten(c.value, PATH_DIGITS),
    };
  });
  const shares = matching.parts.map((p) => `${p.threshold} ± ${rough(p.spread)}`).join(', ');
  const most = matching.parts.length > 1 ? `; the ${matching.dominant} threshold dominates (${shares})` : '';
  const floor = matching.crossings.some((c) => c.limited === true)
    ? '; no threshold is crossed below 1 GeV, where the truncated running means little'
    : '';
  return [{ label: 'matching spread', text: `± ${rough(matching.spread)}${most}${floor}` }, ...rows];
}

const lambdaFacts = (result: EvolveResult): Fact[] =>
  result.lambda.map((l) => ({
    label: `Λ, n_f = ${l.flavours}`,
    text: `${shorten(l.GeV, 6)} GeV${l.error === undefined ? '' : ` ± ${rough(l.error)}`} (${l.definition})`,
  }));

function pathTable(page: Page, result: EvolveResult): void {
  const words = { start: 'start', run: 'run', match: 'threshold' } as const;
  page.table(
    [
      { head: 'step', align: 'left' },
      { head: 'scale/GeV', align: 'point' },
      { head: 'n_f', align: 'right' },
      { head: 'α_s', align: 'point' },
      { head: 'm/GeV', align: 'point' },
    ],
    result.path.map((step) => ({
      cells: [
        words[step.action],
        step.scale,
        String(step.flavours),
        shorten(step.alpha, PATH_DIGITS),
        step.mass === undefined ? '' : shorten(step.mass, PATH_DIGITS),
      ],
    })),
  );
}

export function evolveText(result: EvolveResult, options: TerminalOptions = {}): string {
  const page = new Page(options.columns ?? 100, options.paint ?? unpainted, options.digits);
  const { from, to } = result;
  page.title(
    `${SYMBOL[result.quantity]} from ${from.scale} GeV, n_f = ${from.flavours}, to ${to.scale} GeV, n_f = ${to.flavours}; ${result.loops}-loop running`,
  );
  page.head('Value');
  page.facts(valueFacts(result));
  const matching = matchingFacts(result);
  if (matching.length > 0) {
    page.blank();
    page.facts(matching);
  }
  page.head('Path');
  pathTable(page, result);
  const lambda = lambdaFacts(result);
  if (lambda.length > 0) {
    page.head('Λ_MSbar');
    page.facts(lambda);
  }
  return page.text();
}
