/**
 * @module Text with italics, subscripts and superscripts, set in the DejaVu fonts.
 *
 * Notation: *x* is italic; _{…} and ^{…} set lower and upper, as do _ and ^ before a single character; a backslash takes
 * the next character as it is. Text from outside goes through `plain`.
 */
import { create } from 'fontkit';
import type { Font } from 'fontkit';
import { asset } from './assets.js';

export type Face = 'upright' | 'italic';

/** A piece of text in one face at one size; dx, dy from the start of the base line, y downward. */
export interface Run {
  readonly text: string;
  readonly face: Face;
  readonly size: number;
  readonly dx: number;
  readonly dy: number;
}

export interface Typeset {
  readonly runs: readonly Run[];
  readonly width: number;
}

/** Sub- and superscripts: their size, and how far they are shifted, in sizes of the text around (common practice). */
const SCRIPT = { size: 0.72, down: 0.2, up: 0.36 };

const fonts = new Map<Face, Font>();

export function fontOf(face: Face): Font {
  let font = fonts.get(face);
  if (font === undefined) {
    const made = create(Buffer.from(asset(face === 'upright' ? 'DejaVuSans.ttf' : 'DejaVuSans-Oblique.ttf')));
    if (!('layout' in made)) throw new Error('a collection of fonts where one font was wanted');
    font = made;
    fonts.set(face, font);
  }
  return font;
}

/** The text such that the notation leaves it as it is. */
export const plain = (text: string): string => text.replace(/[\\*_^]/g, '\\$&');

const widthOf = (text: string, face: Face, size: number): number => {
  const font = fontOf(face);
  return (font.layout(text).advanceWidth * size) / font.unitsPerEm;
};

interface Piece {
  readonly text: string;
  readonly face: Face;
  readonly level: -1 | 0 | 1;
}

/** The notation taken apart. Unbalanced marks are taken as they stand. */
function pieces(source: string): Piece[] {
  const found: Piece[] = [];
  let face: Face = 'upright';
  let buffer = '';
  const flush = (level: Piece['level'] = 0): void => {
    if (buffer !== '') found.push({ text: buffer, face, level });
    buffer = '';
  };
  for (let i = 0; i < source.length; i++) {
    const c = source[i]!;
    if (c === '\\' && i + 1 < source.length) buffer += source[++i]!;
    else if (c === '*') {
      flush();
      face = face === 'upright' ? 'italic' : 'upright';
    } else if ((c === '_' || c === '^') && i + 1 < source.length) {
      flush();
      const level = c === '_' ? -1 : 1;
      const end = source[i + 1] === '{' ? source.indexOf('}', i) : -1;
      const inner = end < 0 ? source[i + 1]! : source.slice(i + 2, end);
      for (const part of pieces(inner)) found.push({ text: part.text, face: part.face, level });
      i = end < 0 ? i + 1 : end;
    } else buffer += c;
  }
  flush();
  return found;
}

/** Sets a text on one line. A subscript right behind a superscript (or the reverse) stands below (above) it. */
export function typeset(source: string, size: number): Typeset {
  const runs: Run[] = [];
  let x = 0;
  let scriptStart = 0;
  let before: Piece['level'] = 0;
  let width = 0;
  for (const { text, face, level } of pieces(source)) {
    const stacked = level !== 0 && before === -level;
    if (level === 0) x = width;
    else if (stacked) x = scriptStart;
    else {
      x = width;
      if (before === 0) scriptStart = x;
    }
    const own = level === 0 ? size : size * SCRIPT.size;
    const dy = level === 0 ? 0 : level < 0 ? size * SCRIPT.down : -size * SCRIPT.up;
    runs.push({ text, face, size: own, dx: x, dy });
    width = Math.max(width, x + widthOf(text, face, own));
    before = level;
  }
  return { runs, width };
}

/** Outline of a run as path data, its start at (x, y). */
export function outline(run: Run, x: number, y: number): string {
  const font = fontOf(run.face);
  const scale = run.size / font.unitsPerEm;
  const { glyphs, positions } = font.layout(run.text);
  let pen = x;
  let d = '';
  glyphs.forEach((glyph, i) => {
    const place = positions[i]!;
    const at = pen + place.xOffset * scale;
    for (const { command, args } of glyph.path.commands) {
      const letter = LETTERS[command];
      d += letter ?? '';
      for (let k = 0; k + 1 < args.length; k += 2)
        d += `${k === 0 ? '' : ' '}${round(at + args[k]! * scale)} ${round(y - args[k + 1]! * scale)}`;
    }
    pen += place.xAdvance * scale;
  });
  return d;
}

const LETTERS: Readonly<Record<string, string>> = {
  moveTo: 'M',
  lineTo: 'L',
  quadraticCurveTo: 'Q',
  bezierCurveTo: 'C',
  closePath: 'Z',
};

/** Outlines need thousandths of a point to keep the shape of small letters. */
const round = (value: number): string => String(Math.round(value * 1000) / 1000);
