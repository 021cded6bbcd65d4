/** @module Text in columns of a terminal: its width, its folding, and what must not reach the terminal at all. */

/** Control characters, and the marks that turn the direction of writing: a title from a file must not drive the terminal. */
const UNPRINTABLE = /[\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069\u2028\u2029\ufeff]+/gu;

const COMBINING = /\p{M}|\u200d|\ufe0f/u;

/** Scripts and signs that take two columns. Good to the main blocks, which is enough for titles and names. */
const WIDE =
  /[\u1100-\u115f\u2e80-\u303e\u3041-\u33ff\u3400-\u4dbf\u4e00-\u9fff\ua000-\ua4cf\uac00-\ud7a3\uf900-\ufaff\ufe30-\ufe6f\uff00-\uff60\uffe0-\uffe6\u{1f300}-\u{1faff}\u{20000}-\u{3fffd}]/u;

/** One line of printable text: control characters become a blank. */
export const printable = (text: string): string => text.replace(UNPRINTABLE, ' ');

/** Blanks that must not be torn open: "u = 2", "1.0 ± 0.1", "13 %". */
const HELD = / (?=[=±≈%])|(?<=[=±≈]) /g;
const HOLD = '\u00a0';

/** Columns that a text takes. */
export function width(text: string): number {
  let columns = 0;
  for (const sign of text) columns += COMBINING.test(sign) ? 0 : WIDE.test(sign) ? 2 : 1;
  return columns;
}

export const padEnd = (text: string, columns: number): string => text + ' '.repeat(Math.max(0, columns - width(text)));
export const padStart = (text: string, columns: number): string =>
  ' '.repeat(Math.max(0, columns - width(text))) + text;

/** Cuts a word that alone is wider than the line. */
function* pieces(word: string, columns: number): Generator<string> {
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
  const lines: string[] = [];
  let line = '';
  for (const word of printable(text).trim().replace(HELD, HOLD).split(/ +/)) {
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
