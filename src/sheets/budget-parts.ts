/** @module Parts that the pages of extractions share: sizes of errors, the table of a budget, grouped refusals. */
import { shorten } from '../numerics/index.js';
import type { BudgetEntry, ComponentEntry, SidesEntry } from '../extraction/index.js';
import { rough, type Fact, type Page, type TableNote, type TableRow } from '../report/index.js';

const zero = (text: string): boolean => Number(text) === 0;

/** "± 0.0042", "+0.026 -0.0062", "0"; empty for none. */
export function sidesText(sides: Partial<SidesEntry> | undefined): string {
  const { plus, minus } = sides ?? {};
  if (plus === undefined || minus === undefined) return '';
  if (zero(plus) && zero(minus)) return '0';
  if (rough(plus) === rough(minus)) return `± ${rough(plus)}`;
  return `+${zero(plus) ? '0' : rough(plus)} -${zero(minus) ? '0' : rough(minus)}`;
}

/** The same without blanks, for a table of many columns; in parentheses where it does not count. */
export function cellText(c: ComponentEntry | undefined): string {
  const text = sidesText(c).replace('± ', '±');
  return c?.counted === false && text !== '' ? `(${text})` : text;
}

export const componentOf = (budget: Partial<BudgetEntry>, name: ComponentEntry['name']): ComponentEntry | undefined =>
  budget.components?.find((c) => c.name === name);

const signed = (text: string): string => (text.startsWith('-') ? rough(text) : `+${rough(text)}`);

/** What each cause does, with its sign; `marked`: tell those that were solved for again. */
const causes = (c: ComponentEntry, marked: boolean): string[] =>
  c.sources.flatMap((s) =>
    s.shifts.map((one) => `${one.cause}: ${signed(one.shift)}${marked && one.how === 'refit' ? ', solved again' : ''}`),
  );

/** Does the component say anything? */
const speaks = (c: ComponentEntry): boolean =>
  c.missing !== undefined ||
  c.note !== undefined ||
  c.sources.length > 0 ||
  !zero(c.plus ?? '0') ||
  !zero(c.minus ?? '0');

/** Budget and, beside it, the same where the coupling is wanted. */
export function budgetTable(
  page: Page,
  own: BudgetEntry,
  there?: BudgetEntry,
  heads: readonly [string, string] = ['', ''],
): void {
  const names = [...own.components, ...(there?.components ?? [])].map((c) => c.name);
  const linear = own.components.some((c) => c.sources.some((s) => s.shifts.some((one) => one.how === 'slope')));
  const rows: (TableRow | TableNote)[] = [];
  for (const name of new Set(names)) {
    const [c, d] = [componentOf(own, name), there === undefined ? undefined : componentOf(there, name)];
    const main = c ?? d;
    if (main === undefined || ![c, d].some((one) => one !== undefined && speaks(one))) continue;
    const counts = main.missing !== undefined ? 'none' : main.counted ? 'yes' : 'no';
    const cells = [name, sidesText(c), sidesText(d), main.nature, counts];
    rows.push(main.counted ? { cells } : { cells, tone: 'faint' });
    const words = main.missing ?? main.note;
    if (words !== undefined) rows.push({ note: `· ${words}`, indent: 4, tone: 'faint' });
    const list = causes(c ?? main, linear && c !== undefined);
    if (list.length > 0) rows.push({ note: `· ${list.join('; ')}`, indent: 4, tone: 'faint' });
  }
  for (const name of ['quadrature', 'linear', 'mixed'] as const) {
    rows.push({
      cells: [`total, ${name}`, sidesText(own.totals[name]), sidesText(there?.totals[name])],
      tone: 'strong',
    });
  }
  page.table(
    [
      { head: '', align: 'left' },
      { head: heads[0], align: 'left' },
      { head: heads[1], align: 'left' },
      { head: 'kind', align: 'left' },
      { head: 'counts', align: 'left' },
    ],
    rows,
  );
  page.blank();
  page.say(
    'Mixed: what is stochastic in quadrature, ranges added. Of truncation and scale the larger counts; where the least term is reached, of that and the ambiguity.',
    'faint',
  );
}

interface Refusable {
  readonly prescription: string;
  readonly refused?: { readonly reason: string };
}

/** One line a reason. */
export function refusedFacts(rows: readonly Refusable[]): Fact[] {
  const grouped = new Map<string, string[]>();
  for (const { prescription, refused } of rows) {
    if (refused !== undefined) grouped.set(refused.reason, [...(grouped.get(refused.reason) ?? []), prescription]);
  }
  return [...grouped].map(([reason, names]) => ({
    label: 'refused',
    text: `${names.join(', ')}: ${reason}`,
    tone: 'faint',
  }));
}

/** Why rows are flagged, each reason once. */
export function legend(
  rows: readonly { readonly cautions: readonly { readonly code: string; readonly text: string }[] }[],
): string[] {
  const known = new Map(
    rows.flatMap((row) => row.cautions.flatMap((c) => (c.code === 'several roots' ? [] : [[c.code, c.text] as const]))),
  );
  return [...known].map(([code, text]) => `${code}: ${text}`);
}

export const cut = (text: string | undefined, digits: number): string =>
  text === undefined ? '' : shorten(text, digits);
