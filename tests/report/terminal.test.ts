import { describe, expect, test } from 'vitest';
import { asciiOf } from '../../src/report/layout/letters.js';
import { inAscii, painter, unpainted } from '../../src/report/layout/paint.js';
import { width } from '../../src/report/layout/text.js';
import { assessmentText, bareValues, growthText, planeLines, planeText, sumText } from '../../src/report/terminal.js';
import { fixture } from './fixture.js';

const bodyWidth = (text: string): number => Math.max(...text.split('\n').map(width));

describe('the assessment as text', () => {
  test.each([100, 80])('in %i columns', async (columns) => {
    const text = assessmentText(fixture, { columns });
    expect(bodyWidth(text)).toBe(columns);
    await expect(text).toMatchFileSnapshot(`golden/assessment-${columns}.txt`);
  });

  test('keeps to 80 columns on a narrower terminal and to 100 on a wider one', () => {
    expect(bodyWidth(assessmentText(fixture, { columns: 30 }))).toBe(80);
    expect(bodyWidth(assessmentText(fixture, { columns: 300 }))).toBe(100);
  });

  test('has its eight sections in order, and the verdict before the cautions', () => {
    const text = assessmentText(fixture);
    const heads = [...text.matchAll(/^(\d) {2}(.+)$/gm)].map((m) => `${m[1]} ${m[2]}`);
    expect(heads).toEqual([
      '1 What was read',
      '2 The terms',
      '3 The growth',
      '4 The Borel plane',
      '5 The values',
      '6 The ambiguity and the power correction',
      '7 Where to stop',
      '8 The verdict',
    ]);
    expect(text.indexOf(fixture.verdict.printed)).toBeGreaterThan(text.indexOf(fixture.verdict.rule));
    expect(text.indexOf('2 cautions:')).toBeGreaterThan(text.indexOf(fixture.verdict.printed));
  });

  test('says the standing of every value, and the reason and remedy of every refusal', () => {
    const text = assessmentText(fixture);
    for (const entry of fixture.values) {
      if (entry.refused === undefined) continue;
      const words = text.replaceAll(/\s+/g, ' ').toLowerCase();
      expect(words).toContain(entry.refused.reason.toLowerCase());
      expect(words).toContain(entry.refused.remedy.toLowerCase());
    }
    const rows = text.split('\n').filter((line) => /^ {5}(through|half|\[\d\/\d\] )/.test(line) && /\d\.\d/.test(line));
    expect(rows).toHaveLength(4);
    for (const row of rows) expect(row).toMatch(/(indicative|converged|certified) +certified$/);
  });

  test('marks the least term, and says when it is not reached', () => {
    expect(assessmentText(fixture)).toMatch(/^ +4 .*← least term$/m);
    const falling = {
      ...fixture,
      terms: fixture.terms.map(({ least: _, ...row }) => row),
      optimalTruncation: { ...fixture.optimalTruncation, status: 'not reached' as const },
    };
    expect(assessmentText(falling)).toContain('Least term: not reached.');
    expect(assessmentText(falling)).not.toContain('← least term');
  });

  test('without colour holds no escape sequence; with colour the same words', async () => {
    const plain = assessmentText(fixture);
    const coloured = assessmentText(fixture, { paint: await painter(1) });
    const escape = String.fromCodePoint(27);
    expect(plain).not.toContain(escape);
    expect(coloured).toContain(escape);
    expect(coloured.replaceAll(new RegExp(`${escape}\\[[0-9;]*m`, 'g'), '')).toBe(plain);
  });

  test('a file cannot send control characters to the terminal', () => {
    const hostile = {
      ...fixture,
      series: { ...fixture.series, title: 'A\u001b]0;owned\u0007', notes: ['x\u001b[2Jy'], id: 'a\nb' },
      cautions: [{ code: 'x', text: '\u001b[31m' }],
    };
    const codes = Array.from(assessmentText(hostile).replaceAll('\n', ''), (sign) => sign.codePointAt(0) ?? 0);
    expect(codes.filter((code) => code < 0x20 || (code >= 0x7f && code <= 0x9f))).toEqual([]);
  });

  test('a long series shows its two ends', () => {
    const terms = Array.from({ length: 200 }, (_, i) => ({
      order: i + 1,
      coefficient: String(i),
      term: '1',
      partialSum: '1',
    }));
    const text = assessmentText({ ...fixture, terms });
    expect(text).toContain('… 180 more of 200 rows; all in --json');
  });
});

describe('what the reader is told', () => {
  test('a coefficient stands as the file writes it, never rounded to its error', () => {
    const [first, ...rest] = fixture.terms;
    const written = { ...fixture, terms: [{ ...first!, written: '827.37(21.5)', coefficientError: '21.5' }, ...rest] };
    const text = assessmentText(written);
    expect(text).toContain(' 827.37(21.5) ');
    expect(text).toMatch(/ 583 ± 142 /);
  });

  test('a table of ratios shows its two ends', () => {
    const ratios = Array.from({ length: 40 }, (_, n) => ({ n: n + 1, ratio: String(2 + n / 100) }));
    const growth = { ...fixture.growth, evidence: { ...fixture.growth.evidence, ratios } };
    const text = growthText({ ...fixture, growth });
    expect(text).toContain('… 28 more of 40 rows; all in --json');
    expect(text).toMatch(/^ +40 +2\.39/m);
    expect(text).not.toMatch(/^ +20 +2\.19/m);
  });

  test('the Leroy parameter stands beside the entry in the bare list of poles', () => {
    expect(planeLines(fixture.borelPlane)).toContain('[1/3] b = 1/2\t0.0512345\t0\n');
  });

  test('a number that a condensate lacks is said to be missing, and why', () => {
    const text = assessmentText(fixture);
    expect(text).toMatch(/four-quark condensate +6 +– +– +– +– +–/);
    expect(text).toContain('four-quark condensate: no Wilson coefficient in the file.');
  });

  test('in ASCII: no other letter, the same columns, aligned tables', () => {
    const text = assessmentText(fixture, { columns: 80, paint: inAscii(unpainted) });
    expect(text.search(/[^\n -~]/)).toBe(-1);
    expect(bodyWidth(text)).toBe(80);
    expect(text).toMatch(/[(]0\.13153|0\.13153 \+- 0\.00210/);
    expect(text).toContain('|Im|/pi from N');
    expect(text).toContain('Lambda/Q');
  });
});

test('signs, Greek, raised digits and accents have their ASCII', () => {
  expect(asciiOf('α_s² ± √2 × β₀ − Λ ≤ 10⁻³ → “Gómez”, Ł')).toBe(
    'alpha_s^2 +- sqrt2 x beta_0 - Lambda <= 10^-3 -> "Gomez", L',
  );
  expect(asciiOf('級')).toBe('?');
  expect(asciiOf('plain\ttext\n')).toBe('plain\ttext\n');
});

describe('the shorter texts', () => {
  test('growth', async () => {
    await expect(growthText(fixture)).toMatchFileSnapshot('golden/growth.txt');
  });
  test('plane', async () => {
    await expect(planeText(fixture)).toMatchFileSnapshot('golden/plane.txt');
  });
  test('sum, with every digit', async () => {
    const text = sumText(fixture);
    expect(text).toContain('0.131533210948123');
    await expect(text).toMatchFileSnapshot('golden/sum.txt');
  });
  test('bare values are those that the families choose, or all', () => {
    expect(bareValues(fixture.values).split('\n')).toHaveLength(5);
    const chosen = fixture.values.map((entry) => (entry.variant === '[2/2]' ? { ...entry, central: true } : entry));
    expect(bareValues(chosen)).toBe('0.131533210948123\n');
  });
  test('bare poles', () => {
    expect(planeLines(fixture.borelPlane).split('\n')[0]).toBe('[1/2]\t0.61230984123\t0');
  });
});
