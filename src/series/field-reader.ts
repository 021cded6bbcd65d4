/** @module The kinds of field a series file has, each read with its own complaint. A wrong field yields undefined. */
import { Rational, signExact } from '../numerics/index.js';
import type { Complaints } from './complaints.js';
import { KIND_WORDS } from './entry.js';
import type { Entry, Place } from './entry.js';
import { LIMITS, grouped } from './limits.js';
import { suggestion } from './nearest.js';
import { isNumberProblem, parsePlain, plainSigns } from './number-text.js';
import type { Numbers } from './numbers.js';
import { quote } from './quote.js';
import type { Uncertain } from './series.js';
import type { ReadNumber } from './uncertain.js';
import { decimalText } from './written.js';
import type { Written } from './written.js';

/** A map whose field names were checked. */
export interface Group {
  readonly at: Place;
  get(name: string): Entry | undefined;
}

type Sign = 'any' | 'positive' | 'non-zero';
type Spread = NonNullable<Uncertain['error']>;

export class FieldReader {
  readonly complaints: Complaints;
  readonly numbers: Numbers;

  constructor(complaints: Complaints, numbers: Numbers) {
    this.complaints = complaints;
    this.numbers = numbers;
  }

  /** Fields of a map; names outside `known` are complained about, with the nearest known one. */
  group(entry: Entry, field: string, known: readonly string[]): Group | undefined {
    if (entry.kind !== 'map') return this.wrongKind(entry, field, `the fields ${known.join(', ')}`);
    for (const [name, { key }] of entry.fields) {
      if (known.includes(name)) continue;
      const path = field === '' ? name : `${field}.${name}`;
      const hint = this.complaints.full ? '' : suggestion(name, known);
      const wanted = hint !== '' && known.length > 10 ? 'a field of docs/series-file.md' : `one of ${known.join(', ')}`;
      this.complaints.add(key, path.slice(0, 80), `unknown field ${quote(name)}${hint}`, wanted);
    }
    return { at: entry.at, get: (name) => entry.fields.get(name)?.value };
  }

  list(entry: Entry, field: string, of: string): readonly Entry[] | undefined {
    return entry.kind === 'list' ? entry.items : this.wrongKind(entry, field, `a list of ${of}`);
  }

  text(entry: Entry | undefined, field: string, wanted = 'a text'): string | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind !== 'text') return this.wrongKind(entry, field, wanted);
    const text = entry.text.trim();
    if (text === '') return this.complaints.add(entry.at, field, 'nothing', wanted);
    if (text.length > LIMITS.text) {
      return this.complaints.add(
        entry.at,
        field,
        `a text of ${grouped(text.length)} characters`,
        `at most ${grouped(LIMITS.text)}`,
      );
    }
    return text;
  }

  flag(entry: Entry | undefined, field: string): boolean | undefined {
    return this.choice(entry, field, ['true', 'false'])?.startsWith('t');
  }

  choice<T extends string>(entry: Entry | undefined, field: string, words: readonly T[]): T | undefined {
    const wanted = words.length > 1 ? `${words.slice(0, -1).join(', ')} or ${words.at(-1)!}` : words.join('');
    const text = this.text(entry, field, wanted);
    if (entry === undefined || text === undefined) return undefined;
    const word = words.find((w) => w === text);
    return word ?? this.complaints.add(entry.at, field, `${quote(text)}${suggestion(text, words)}`, wanted);
  }

  integer(entry: Entry | undefined, field: string, least: number, most: number): number | undefined {
    const wanted = least === most ? `${least}` : `an integer from ${least} to ${most}`;
    if (entry === undefined) return undefined;
    if (entry.kind !== 'text') return this.wrongKind(entry, field, wanted);
    const text = plainSigns(entry.text);
    const n = /^[+-]?\d{1,9}$/.test(text) ? Number(text) : NaN;
    if (n >= least && n <= most) return n;
    return this.complaints.add(entry.at, field, text === '' ? 'nothing' : quote(text), wanted);
  }

  /** A plain decimal or fraction. */
  rational(
    entry: Entry | undefined,
    field: string,
    wanted: string,
    accept: (q: Rational) => boolean,
  ): Rational | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind !== 'text') return this.wrongKind(entry, field, wanted);
    const q = entry.text.length > LIMITS.numberLength ? undefined : parsePlain(plainSigns(entry.text));
    if (q instanceof Rational && accept(q)) return q;
    const problem = q !== undefined && !(q instanceof Rational) ? q : undefined;
    const found = problem?.problem ?? (entry.text.trim() === '' ? 'nothing' : quote(entry.text.trim()));
    return this.complaints.add(entry.at, field, found, problem?.wanted ?? wanted);
  }

  /** A number or expression without an error. */
  exact(entry: Entry | undefined, field: string, sign: Sign = 'any'): Written | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind !== 'text') return this.wrongKind(entry, field, 'a number or an expression');
    const value = this.numbers.exact(entry.text);
    if (isNumberProblem(value)) return this.complaints.add(entry.at, field, value.problem, value.wanted);
    const s = sign === 'any' ? 1 : signExact(value);
    if (s > 0 || (s < 0 && sign === 'non-zero')) return value;
    return this.complaints.add(
      entry.at,
      field,
      quote(entry.text.trim()),
      sign === 'positive' ? 'a positive number' : 'a number other than 0',
    );
  }

  /** A number with an optional error: one text, or a group with the fields value and error (and others of the caller's). */
  uncertain(
    entry: Entry | undefined,
    field: string,
    others: readonly string[] = [],
  ): (ReadNumber & { readonly group?: Group }) | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind === 'text') return this.uncertainText(entry, field);
    const group = this.group(entry, field, ['value', 'error', ...others]);
    if (group === undefined) return undefined;
    const valueEntry = group.get('value');
    if (valueEntry === undefined) return this.complaints.add(group.at, field, 'no value', 'a field "value"');
    const errorEntry = group.get('error');
    const error = this.spread(errorEntry, `${field}.error`);
    const value = this.uncertainText(valueEntry, `${field}.value`);
    if (value === undefined || (errorEntry !== undefined && error === undefined)) return undefined;
    if (error === undefined) return { ...value, group };
    if (value.error !== undefined)
      return this.complaints.add(errorEntry!.at, `${field}.error`, 'a second error', 'the error in one place only');
    return { value: value.value, error, text: `${value.text} ${spreadText(error)}`, group };
  }

  private uncertainText(entry: Entry, field: string): ReadNumber | undefined {
    if (entry.kind !== 'text') return this.wrongKind(entry, field, 'a number or an expression');
    const value = this.numbers.uncertain(entry.text);
    return isNumberProblem(value) ? this.complaints.add(entry.at, field, value.problem, value.wanted) : value;
  }

  /** An error: `0.03`, `+0.03 -0.02`, or a group with plus and minus. */
  private spread(entry: Entry | undefined, field: string): Spread | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind === 'map') {
      const group = this.group(entry, field, ['plus', 'minus']);
      const plus = this.size(group?.get('plus'), `${field}.plus`);
      const minus = this.size(group?.get('minus'), `${field}.minus`);
      if (plus !== undefined && minus !== undefined) return { plus, minus };
      if (group?.get('plus') !== undefined && group.get('minus') !== undefined) return undefined;
      return this.complaints.add(entry.at, field, 'half an error', 'both plus and minus');
    }
    if (entry.kind === 'text') {
      const pair = /^([+-])(\S+)\s+([+-])(\S+)$/.exec(plainSigns(entry.text));
      if (pair !== null && pair[1] !== pair[3]) {
        const [a, b] = [parsePlain(pair[2]!), parsePlain(pair[4]!)];
        if (a instanceof Rational && b instanceof Rational && a.sign() >= 0 && b.sign() >= 0) {
          return pair[1] === '+' ? { plus: a, minus: b } : { plus: b, minus: a };
        }
      }
    }
    const size = this.size(entry, field);
    return size && { plus: size, minus: size };
  }

  private size(entry: Entry | undefined, field: string): Rational | undefined {
    if (entry === undefined) return undefined;
    if (entry.kind !== 'text') return this.wrongKind(entry, field, 'an error of 0 or more');
    const size = this.numbers.error(entry.text);
    return isNumberProblem(size) ? this.complaints.add(entry.at, field, size.problem, size.wanted) : size;
  }

  wrongKind(entry: Entry, field: string, wanted: string): undefined {
    const found = entry.kind === 'text' ? quote(entry.text.trim()) : KIND_WORDS[entry.kind];
    return this.complaints.add(
      entry.at,
      field,
      entry.kind === 'text' && entry.text.trim() === '' ? 'nothing' : found,
      wanted,
    );
  }
}

/** `+- 0.1` or `+0.1 -1/30`, in a form that reads back after a value. */
export function spreadText(error: Spread): string {
  const [plus, minus] = [error.plus, error.minus].map((q) => decimalText(q) ?? q.toString());
  return plus === minus ? `+- ${plus}` : `+${plus} -${minus}`;
}
