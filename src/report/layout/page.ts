/** @module The page that the sections write on: numbered heads, paragraphs, labelled facts, tables. */
import type { Paint, Tone } from './paint.js';
import type { Column } from './column.js';
import type { TableNote, TableRow } from './table.js';
import { table } from './table.js';
import { asciiOf } from './letters.js';
import { fold, padEnd, width } from './text.js';

const INDENT = 3;

/** Narrowest and widest page. Beyond the widest, lines of prose get hard to follow. */
export const PAGE_WIDTH = { least: 80, most: 100 } as const;

/** From here on tables show all they have. */
const ROOMY = 96;

/** More digits than these do not fit side by side; `sum` and the JSON output show all. */
const MOST_DIGITS = 12;

export interface Fact {
  readonly label: string;
  readonly text: string;
  readonly tone?: Tone;
}

export class Page {
  readonly width: number;
  readonly paint: Paint;
  /** Significant digits that a table shows. */
  readonly digits: number;
  /** Tables have to save columns. */
  readonly narrow: boolean;
  /** What the terminal can show of a text. */
  private readonly shown: (text: string) => string;
  private readonly lines: string[] = [];
  private section = 0;

  constructor(columns: number, paint: Paint, digits: number | undefined) {
    this.width = Math.min(PAGE_WIDTH.most, Math.max(PAGE_WIDTH.least, columns));
    this.paint = paint;
    this.shown = paint.ascii === true ? asciiOf : (text) => text;
    this.narrow = this.width < ROOMY;
    this.digits = Math.min(digits ?? (this.narrow ? 6 : 8), MOST_DIGITS);
  }

  blank(): void {
    if (this.lines.length > 0 && this.lines.at(-1) !== '') this.lines.push('');
  }

  /** The name of the whole, above all sections. */
  title(text: string): void {
    for (const line of fold(this.shown(text), this.width)) this.lines.push(this.paint(line, 'strong'));
    this.lines.push(this.paint(this.shown('─').repeat(this.width), 'faint'));
  }

  /** A numbered section head. */
  head(text: string): void {
    this.blank();
    this.section += 1;
    this.lines.push(`${this.paint(String(this.section), 'faint')}  ${this.paint(this.shown(text), 'strong')}`, '');
  }

  /** A paragraph of plain words. */
  say(text: string, tone: Tone = 'plain', hang = 0): void {
    const lines = fold(this.shown(text), this.width - INDENT - hang);
    lines.forEach((line, i) => {
      this.lines.push(' '.repeat(INDENT + (i === 0 ? 0 : hang)) + this.paint(line, tone));
    });
  }

  /** Label and text side by side, the texts under each other. */
  facts(given: readonly Fact[], labelWidth = 0): void {
    const facts = given.map((f) => ({ ...f, label: this.shown(f.label), text: this.shown(f.text) }));
    const column = Math.max(labelWidth, ...facts.map((f) => width(f.label)));
    let above = '';
    for (const { label, text, tone = 'plain' } of facts) {
      // A label that repeats is said once.
      const shown = label === above ? '' : label;
      above = label;
      fold(text, this.width - INDENT - column - 3).forEach((line, i) => {
        const left = this.paint(padEnd(i === 0 ? shown : '', column), 'faint');
        this.lines.push(`${' '.repeat(INDENT)}${left}   ${this.paint(line, tone)}`);
      });
    }
  }

  table(columns: readonly Column[], rows: readonly (TableRow | TableNote)[]): void {
    const { shown } = this;
    const heads = columns.map((c) => ({ ...c, head: shown(c.head) }));
    const body = rows.map((row) =>
      'note' in row ? { ...row, note: shown(row.note) } : { ...row, cells: row.cells.map(shown) },
    );
    const frame = { width: this.width, indent: INDENT, paint: this.paint, rule: shown('─') };
    this.lines.push(...table(heads, body, frame));
  }

  /** Points of a list, each with a raised dot. */
  points(texts: readonly string[], tone: Tone = 'plain'): void {
    for (const text of texts) this.say(`· ${text}`, tone, 2);
  }

  text(): string {
    return `${this.lines.join('\n').replace(/\n+$/, '')}\n`;
  }
}
