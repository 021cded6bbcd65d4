/** @module Text in columns of a terminal: its width, its folding, and what must not reach the terminal at all. */

type Ranges = readonly (readonly [from: number, to: number])[];

const within = (ranges: Ranges, code: number): boolean => ranges.some(([from, to]) => code >= from && code <= to);

/** Control characters, and the marks that turn the direction of writing: a title from a file must not drive the terminal. */
const UNPRINTABLE: Ranges = [
  [0x00, 0x1f],
  [0x7f, 0x9f],
  [0x200e, 0x200f],
  [0x2028, 0x202e],
  [0x2066, 0x2069],
  [0xfeff, 0xfeff],
];

/** Accents set on the letter before, joiners, variation selectors: the main blocks of Unicode's marks. */
const COMBINING: Ranges = [
  [0x300, 0x36f],
  [0x483, 0x489],
  [0x591, 0x5bd],
  [0x64b, 0x65f],
  [0x1ab0, 0x1aff],
  [0x1dc0, 0x1dff],
  [0x200b, 0x200d],
  [0x20d0, 0x20ff],
  [0xfe00, 0xfe0f],
  [0xfe20, 0xfe2f],
];

/** Scripts and signs that take two columns: the main blocks, which is enough for titles and names. */
const WIDE: Ranges = [
  [0x1100, 0x115f],
  [0x2e80, 0x303e],
  [0x3041, 0xa4cf],
  [0xac00, 0xd7a3],
  [0xf900, 0xfaff],
  [0xfe30, 0xfe6f],
  [0xff00, 0xff60],
  [0xffe0, 0xffe6],
  [0x1f300, 0x1faff],
  [0x20000, 0x3fffd],
];

const ASCII = /^[ -~]*$/;

const codeOf = (sign: string): number => sign.codePointAt(0) ?? 0;

/** One line of printable text: control characters become a blank. */
export function printable(text: string): string {
  if (ASCII.test(text)) return text;
  return Array.from(text, (sign) => (within(UNPRINTABLE, codeOf(sign)) ? ' ' : sign)).join('');
}

/** Blanks that must not be torn open: "u = 2", "1.0 ± 0.1", "13 %". */
const HELD = / (?=[=±≈%])|(?<=[=±≈]) /g;
const HOLD = '\u00a0';

/** From here on a sign may combine with the one before or take two columns. */
const FIRST_UNUSUAL = 0x300;

function signWidth(sign: string): number {
  const code = codeOf(sign);
  if (code < FIRST_UNUSUAL) return 1;
  return within(COMBINING, code) ? 0 : within(WIDE, code) ? 2 : 1;
}

/** Columns that a text takes. */
export function width(text: string): number {
  if (ASCII.test(text)) return text.length;
  let columns = 0;
  for (const sign of text) columns += signWidth(sign);
  return columns;
}

export const padEnd = (text: string, columns: number): string => text + ' '.repeat(Math.max(0, columns - width(text)));
export const padStart = (text: string, columns: number): string =>
  ' '.repeat(Math.max(0, columns - width(text))) + text;

/** Cuts a word that alone is wider than the line. */
function* pieces(word: string, columns: number): Generator<string> {
  if (width(word) <= columns) {
    yield word;
    return;
  }
  let piece = '';
  for (const sign of word) {
    if (piece !== '' && width(piece) + width(sign) > columns) {
      yield piece;
      piece = '';
    }
    piece += sign;
  }
  yield piece;
}

/** Folds a text at blanks into lines of at most `columns`; a no-break blank holds. At least one line comes back. */
export function fold(text: string, columns: number): string[] {
  // Most texts fit as they are.
  if (text.length <= columns && ASCII.test(text) && !text.includes('  ')) return [text.trim()];
  const lines: string[] = [];
  let line = '';
  const words = printable(text).trim().replace(HELD, HOLD).split(/ +/);
  // What is held together is let go before a word is torn.
  for (const word of words.flatMap((held) => (width(held) > columns ? held.split(HOLD) : [held]))) {
    for (const piece of pieces(word, Math.max(1, columns))) {
      if (line === '') line = piece;
      else if (width(line) + 1 + width(piece) <= columns) line += ` ${piece}`;
      else {
        lines.push(line);
        line = piece;
      }
    }
  }
  lines.push(line);
  return lines.map((folded) => folded.replaceAll(HOLD, ' '));
}
