import { expect, test } from 'vitest';
import { outline, plain, typeset } from '../../src/pictures/vector/typeset.js';
import { terminalWords } from '../../src/pictures/terminal/words.js';

test('italics, subscripts and superscripts', () => {
  const { runs } = typeset('*c*_{n} = 10^{−2}', 10);
  expect(runs.map(({ text, face, size }) => [text, face, size])).toEqual([
    ['c', 'italic', 10],
    ['n', 'upright', 7.199999999999999],
    [' = 10', 'upright', 10],
    ['−2', 'upright', 7.199999999999999],
  ]);
  expect(runs[1]!.dy).toBeGreaterThan(0);
  expect(runs[3]!.dy).toBeLessThan(0);
});

test('a subscript right behind a superscript stands below it', () => {
  const { runs } = typeset('x^{2}_{i}y', 10);
  expect(runs[2]!.dx).toBe(runs[1]!.dx);
  expect(runs[3]!.dx).toBeGreaterThan(runs[2]!.dx);
});

test('plain text comes through as it is', () => {
  const odd = 'a_b * c^d \\ e';
  expect(
    typeset(plain(odd), 10)
      .runs.map(({ text }) => text)
      .join(''),
  ).toBe(odd);
  expect(terminalWords(plain(odd), true)).toBe(odd);
});

test('the width of a text is the sum of the advances: digits of DejaVu Sans are 0.636 em wide', () => {
  // DejaVu Sans 2.37: advance width of the digits 1303 of 2048 units.
  expect(typeset('123', 10).width).toBeCloseTo((3 * 13030) / 2048, 9);
});

test('outlines start where they are put and hold only commands of the path standard', () => {
  const { runs } = typeset('α_{s}', 20);
  const d = outline(runs[0]!, 100, 50);
  expect(d).toMatch(/^M[-\d. MLQCZ]+$/);
  const numbers = [...d.matchAll(/-?\d+(\.\d+)?/g)].map((match) => Number(match[0]));
  const xs = numbers.filter((_, i) => i % 2 === 0);
  expect(Math.min(...xs)).toBeGreaterThan(99);
  expect(Math.max(...xs)).toBeLessThan(115);
});

test('labels for the terminal, with Unicode and without', () => {
  expect(terminalWords('10^{−2}', true)).toBe('10⁻²');
  expect(terminalWords('10^{−2}', false)).toBe('10^-2');
  expect(terminalWords('*c*_{n} / (*n c*_{n−1})', true)).toBe('cₙ / (n cₙ₋₁)');
  expect(terminalWords('Padé, α ± 2σ', false)).toBe('Pade, alpha +- 2sigma');
});
