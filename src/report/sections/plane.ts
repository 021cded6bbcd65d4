/** @module Section 4: what the Padé approximants see in the Borel plane. */
import type { BorelPlaneReport, PadeEntry, PoleReport } from '../../studies/index.js';
import { parseDecimal } from '../../numerics/index.js';
import { conjugates, plusMinus } from '../layout/figures.js';
import type { Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';
import { sentence } from '../words.js';

const DIGITS = { wide: 5, narrow: 4 } as const;

/** Poles of one entry shown, nearest first; the JSON output has all. */
const POLES_SHOWN = 6;

const REMARKS = { doublet: 'doublet, set aside', 'near-axis': 'near the axis' } as const;

/** The lower member of a conjugate pair; it is drawn together with the upper one. */
function isLowerTwin(pole: PoleReport, all: readonly PoleReport[]): boolean {
  const { im } = pole;
  if (im?.startsWith('-') !== true) return false;
  return all.some((other) => other.re === pole.re && other.im === im.slice(1));
}

function modulus({ re, im = '0' }: PoleReport): number {
  return Math.hypot(Number(re), Number(im));
}

/** "± 0.0012" of a real pole, "± 0.002 ± 0.004i" of the two parts of a complex one. */
function errorText(error: PoleReport['error']): string {
  if (error === undefined) return '';
  return error.im === undefined ? plusMinus(error.re) : `${plusMinus(error.re)} and ${plusMinus(error.im)}i`;
}

function poleRow(pole: PoleReport, name: string, digits: number): TableRow {
  const remarks = [
    pole.multiplicity > 1 ? `multiplicity ${pole.multiplicity}` : '',
    pole.note === undefined ? '' : REMARKS[pole.note],
  ].filter((text) => text !== '');
  const cells = [
    name,
    conjugates(pole.re, pole.im, digits),
    pole.u === undefined ? '' : conjugates(pole.u.re, pole.u.im, digits),
    pole.amplitude === undefined ? '' : conjugates(pole.amplitude.re, pole.amplitude.im, digits),
    remarks.join(', '),
  ];
  return pole.note === 'doublet' ? { cells, tone: 'faint' } : { cells };
}

/** "[2/1]", and "[2/1] b = 17/81" of the Leroy transform. */
export const entryName = (entry: PadeEntry): string =>
  isZero(entry.leroy) ? entry.label : `${entry.label} b = ${entry.leroy}`;
const isZero = (text: string): boolean => parseDecimal(text)?.coefficient === 0n;

function countWords(count: number | undefined): string {
  if (count === undefined) return '';
  if (count === 0) return 'no positive real pole';
  return count === 1 ? 'one positive real pole' : `${count} positive real poles`;
}

function entryRows(entry: PadeEntry, digits: number): (TableRow | TableNote)[] {
  if (!entry.exists) {
    return [{ note: `${entryName(entry)}  does not exist: ${entry.reason ?? 'degenerate block'}`, tone: 'warn' }];
  }
  const block = (entry.deficiency ?? 0) > 0 ? 'in a degenerate block, equal to a smaller entry' : '';
  const facts = [countWords(entry.positiveRealPoles), block].filter((text) => text !== '').join('; ');
  const drawn = entry.poles.filter((pole) => !isLowerTwin(pole, entry.poles)).sort((a, b) => modulus(a) - modulus(b));
  const rows: (TableRow | TableNote)[] = drawn
    .slice(0, POLES_SHOWN)
    .map((pole, i) => poleRow(pole, i === 0 ? entryName(entry) : '', digits));
  const rest = drawn.length - POLES_SHOWN;
  const moved = drawn.slice(0, POLES_SHOWN).map((pole) => errorText(pole.error));
  const errors = moved.some((text) => text !== '')
    ? `errors in t: ${moved.map((text) => (text === '' ? 'none' : text)).join(', ')}`
    : '';
  const tail = [facts, rest > 0 ? `${rest} more, farther out` : '', errors].filter((text) => text !== '').join('; ');
  if (rows.length === 0) rows.push({ cells: [entryName(entry), 'no poles', '', '', ''] });
  if (tail !== '') rows.push({ note: tail, indent: 3, tone: 'faint' });
  return rows;
}

export function planeSection(page: Page, plane: BorelPlaneReport): void {
  page.head('The Borel plane');
  const digits = page.narrow ? DIGITS.narrow : DIGITS.wide;
  if (plane.entries.length > 0) {
    page.table(
      [
        { head: 'Padé', align: 'left' },
        { head: `pole in ${plane.variable.replace(/ \(.*/, '')}`, align: 'point' },
        { head: 'in u', align: 'point' },
        { head: 'amplitude', align: 'point' },
        { head: '', align: 'left' },
      ],
      plane.entries.flatMap((entry) => entryRows(entry, digits)),
    );
    page.blank();
    page.say('An amplitude A stands for A/(1 − t/pole). Positive real poles are counted exactly.', 'faint');
  }
  const doublets =
    plane.doublets === 0
      ? 'No Froissart doublet.'
      : `${plane.doublets} Froissart doublet${plane.doublets === 1 ? '' : 's'} named and set aside.`;
  page.say(
    `${doublets} Trust: ${plane.standing} for ${plane.central === true ? 'the central' : 'these'} coefficients.`,
  );
  if (plane.central === true)
    page.say(
      plane.entries.some((entry) => entry.poles.some((pole) => pole.error !== undefined))
        ? 'Errors of poles: from the quoted errors of the coefficients, to first order; none where a pole does not move smoothly. Indicative.'
        : 'The quoted errors of the coefficients move no pole smoothly: positions have no first-order error.',
      'faint',
    );
  page.points(plane.notes.map((note) => sentence(note)));
}
