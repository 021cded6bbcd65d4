/** @module Section 5: one value a prescription, or the reason why there is none. */
import type { Standing, ValueEntry } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { plusMinus, rough } from '../layout/figures.js';
import type { Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';
import { prescriptionTitle } from '../words.js';

function valueRow(entry: ValueEntry, digits: number, sayDigits: boolean): TableRow {
  return {
    cells: [
      `  ${entry.variant}`,
      shorten(entry.value ?? '', digits),
      plusMinus(entry.truncationError),
      plusMinus(entry.ambiguity),
      plusMinus(entry.inputError),
      entry.standing ?? '',
      sayDigits ? (entry.digits ?? '') : '',
    ],
  };
}

/** Refusals of one family for one reason stand on one line. */
function refusalNotes(entries: readonly ValueEntry[]): TableNote[] {
  const grouped = new Map<string, string[]>();
  for (const { variant, refused } of entries) {
    if (refused === undefined) continue;
    const words = `${refused.reason}. Remedy: ${refused.remedy}.`;
    grouped.set(words, [...(grouped.get(words) ?? []), variant]);
  }
  return [...grouped].map(([words, variants]) => ({
    note: `${variants.join(', ')}: refused. ${capital(words)}`,
    indent: 2,
    tone: 'warn',
  }));
}

const capital = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);

/** The notes of a family, each once. */
function familyNotes(entries: readonly ValueEntry[]): TableNote[] {
  const notes = new Set(entries.flatMap((entry) => entry.notes ?? []));
  return [...notes].map((note) => ({ note: `· ${note}`, indent: 4, tone: 'faint' }));
}

/** Value − i·imaginary and value + i·imaginary, where a family has lateral sums. */
function lateralNotes(entries: readonly ValueEntry[]): TableNote[] {
  const lateral = entries.filter((entry) => entry.imaginary !== undefined && entry.value !== undefined);
  if (lateral.length === 0) return [];
  const [only] = lateral;
  if (lateral.length === 1 && only !== undefined) {
    return [
      {
        note: `principal value; lateral sums: value ± i times ${shorten(only.imaginary ?? '', 4)}`,
        indent: 4,
        tone: 'faint',
      },
    ];
  }
  const list = lateral.map((entry) => `${entry.variant} ${shorten(entry.imaginary ?? '', 4)}`).join(', ');
  return [{ note: `principal value; lateral sums: value ± i times ${list}`, indent: 4, tone: 'faint' }];
}

/** How the family's own best member did one step back. */
function recordNotes(entries: readonly ValueEntry[]): TableNote[] {
  return entries.flatMap(({ record }) => {
    if (record === undefined) return [];
    const { against, inside, tested, sharpness, score, verdict, seen } = record;
    const from = seen === undefined ? 'one step back' : `from the first ${seen} coefficients`;
    const target = against === 'own value' ? 'its own value with all terms' : `the ${against}`;
    const stated = sharpness === undefined ? '' : `, stated error ${rough(sharpness)}`;
    return [
      {
        note: `record ${from}: ${verdict}; ${inside} of ${tested} inside against ${target}${stated}, score ${rough(score)}`,
        indent: 4,
        tone: verdict === 'bad' ? ('warn' as const) : ('faint' as const),
      },
    ];
  });
}

function families(values: readonly ValueEntry[]): Map<string, ValueEntry[]> {
  const map = new Map<string, ValueEntry[]>();
  for (const entry of values) map.set(entry.prescription, [...(map.get(entry.prescription) ?? []), entry]);
  return map;
}

/** The one word that describes the digits of all values, if there is one. */
function commonDigits(values: readonly ValueEntry[]): Standing | undefined {
  const words = new Set(values.flatMap((entry) => (entry.digits === undefined ? [] : [entry.digits])));
  return words.size === 1 ? [...words][0] : undefined;
}

export function valuesSection(page: Page, values: readonly ValueEntry[]): void {
  page.head('The values');
  const common = page.narrow ? commonDigits(values) : undefined;
  const rows: (TableRow | TableNote)[] = [];
  for (const [name, entries] of families(values)) {
    const done = entries.filter((entry) => entry.refused === undefined);
    rows.push(
      { note: prescriptionTitle(name), tone: 'strong' },
      ...done.map((entry) => valueRow(entry, page.digits, common === undefined)),
      ...lateralNotes(done),
      ...familyNotes(done),
      ...recordNotes(done),
      ...refusalNotes(entries),
    );
  }
  page.table(
    [
      { head: '', align: 'left' },
      { head: 'value', align: 'point' },
      { head: 'truncation', align: 'point' },
      { head: 'ambiguity', align: 'point' },
      { head: 'input', align: 'point' },
      { head: 'trust', align: 'left' },
      { head: 'digits', align: 'left', tone: 'faint' },
    ],
    rows,
  );
  page.blank();
  if (common !== undefined) page.say(`Digits of all values: ${common}.`);
  page.say(
    'Trust is in the number, digits in its decimals. certified: proved by an enclosure; converged: two independent evaluations agree; indicative: a model or a rule of thumb. Ambiguity is |Im|/π.',
    'faint',
  );
}
