import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { unpainted } from '../../src/report/layout/paint.js';
import { table } from '../../src/report/layout/table.js';
import { fold, printable, width } from '../../src/report/layout/text.js';

const frame = { width: 80, indent: 0, paint: unpainted };

describe('folding', () => {
  test('no line is wider than the page, and nothing is lost but blanks', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 200 }), fc.integer({ min: 2, max: 60 }), (text, columns) => {
        const lines = fold(text, columns);
        for (const line of lines) expect(width(line)).toBeLessThanOrEqual(columns);
        const letters = (s: string): string => s.replaceAll(/\s/g, '');
        expect(letters(lines.join(''))).toBe(letters(printable(text)));
      }),
      { numRuns: 500 },
    );
  });

  test('an equation and a value with its error stay on one line', () => {
    expect(fold('the pole at u = 2 is 1.0 ± 0.1', 13)).toEqual(['the pole at', 'u = 2 is', '1.0 ± 0.1']);
  });
});

test('combining marks take no column, wide letters two', () => {
  expect(width('e\u0301')).toBe(1);
  expect(width('級数')).toBe(4);
  expect(width('α_s/π')).toBe(5);
});

test('a title cannot drive the terminal', () => {
  expect(printable('\u001b[31mred\u0007 \u202etxet')).toBe(' [31mred   txet');
});

describe('a table', () => {
  test('puts decimal points under each other, with heads over one rule', () => {
    const lines = table(
      [
        { head: 'n', align: 'right' },
        { head: 'value', align: 'point' },
        { head: 'remark', align: 'left' },
      ],
      [
        { cells: ['9', '-12.5', 'low'] },
        { cells: ['10', '0.125', ''] },
        { note: 'a note across', indent: 2 },
        { cells: ['11', '7', '277(51) is no point'] },
        { cells: ['12', '277(51)', ''] },
      ],
      frame,
    );
    expect(lines).toEqual([
      ' n     value   remark',
      '──────────────────────────────────',
      ' 9   -12.5     low',
      '10     0.125',
      '  a note across',
      '11     7       277(51) is no point',
      '12   277(51)',
    ]);
  });

  test('leaves out a column without content', () => {
    const lines = table(
      [
        { head: 'a', align: 'left' },
        { head: 'b', align: 'left' },
      ],
      [{ cells: ['x', ''] }],
      frame,
    );
    expect(lines).toEqual(['a', '─', 'x']);
  });

  test('folds heads, then words, to fit a narrow page', () => {
    const lines = table(
      [
        { head: 'quantity', align: 'left' },
        { head: 'shift of the condensate', align: 'point' },
      ],
      [{ cells: ['a rather long name of a quantity', '0.125'] }],
      { ...frame, width: 40 },
    );
    for (const line of lines) expect(width(line)).toBeLessThanOrEqual(40);
    expect(lines.length).toBeGreaterThan(3);
  });
});
