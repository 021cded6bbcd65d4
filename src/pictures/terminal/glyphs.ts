/** @module The characters of a drawing in the terminal, with Unicode and without. */
import type { LineStyle, MarkerShape } from '../chart.js';

export interface Glyphs {
  readonly marker: Readonly<Record<MarkerShape, string>>;
  readonly line: Readonly<Record<LineStyle, string>>;
  /** Lines without markers, by ink. */
  readonly curves: readonly string[];
  readonly band: Readonly<Record<'first' | 'second', string>>;
  readonly rule: { readonly x: string; readonly y: string };
  readonly interval: { readonly thin: string; readonly thick: string; readonly upright: string };
  readonly column: string;
  readonly bar: string;
  readonly frame: {
    readonly across: string;
    readonly up: string;
    readonly corner: string;
    readonly tickAcross: string;
    readonly tickUp: string;
  };
}

export const UNICODE: Glyphs = {
  marker: { disc: '●', ring: '○', square: '■', diamond: '◆', triangle: '▲', cross: '×', bar: '┃' },
  line: { full: '·', dashed: '-', dotted: '·' },
  curves: ['•', '+', '×', '∘', '~'],
  band: { first: '░', second: '▒' },
  rule: { x: '┊', y: '┄' },
  interval: { thin: '─', thick: '━', upright: '│' },
  column: '█',
  bar: '█',
  frame: { across: '─', up: '│', corner: '└', tickAcross: '┬', tickUp: '┤' },
};

export const ASCII: Glyphs = {
  marker: { disc: 'o', ring: 'O', square: '#', diamond: '@', triangle: '^', cross: 'x', bar: '!' },
  line: { full: '.', dashed: '-', dotted: '.' },
  curves: ['*', '+', 'x', 'o', '~'],
  band: { first: ':', second: '%' },
  rule: { x: ':', y: '-' },
  interval: { thin: '-', thick: '=', upright: '|' },
  column: '#',
  bar: '#',
  frame: { across: '-', up: '|', corner: '+', tickAcross: '+', tickUp: '+' },
};
