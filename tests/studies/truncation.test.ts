import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { loadSeries, parseUncertain, isNumberProblem, type Uncertain } from '../../src/series/index.js';
import { truncationStudy, type TruncationResult } from '../../src/studies/index.js';
import { scaledText } from '../../src/studies/truncation-answer.js';
import { USUAL_PRIORS, priorNames } from '../../src/truncation/index.js';

function coupling(text: string): Uncertain {
  const value = parseUncertain(text);
  if (isNumberProblem(value)) expect.fail(value.problem);
  return value;
}

const options = { digits: 15, request: { command: 'truncation' } };

const adler = await loadSeries('adler');
const result = truncationStudy(adler, coupling('0.32'), {
  ...options,
  byOrder: true,
  priors: { ...USUAL_PRIORS, 'scale.nodes': 5 },
});

describe('the Adler function order by order', () => {
  const row = (name: string): TruncationResult['estimates'][number] => {
    const found = result.estimates.find((e) => e.model === name);
    if (found === undefined) expect.fail(name);
    return found;
  };

  test('every model answers or is refused with reason and remedy, and says what kind it is', () => {
    for (const entry of result.estimates) {
      expect(['credible', 'conventional']).toContain(entry.nature);
      if (entry.refused === undefined) {
        expect(entry.band68, entry.model).toBeDefined();
        expect(entry.through).toBe(4);
        expect(entry.standing).toBe('indicative');
      } else expect(entry.refused.remedy).not.toBe('');
      if (entry.nature === 'credible') expect(entry.priors.length, entry.model).toBeGreaterThan(0);
    }
    expect(result.estimates.filter((e) => e.refused !== undefined).map((e) => e.model)).toEqual([
      'least-term',
      'remainder',
    ]);
  });

  test('bands are decimal strings about the sum with the additive part', () => {
    expect(row('last-term')).toMatchObject({
      sum: '1.13088862092208',
      band68: { low: '-0.0052828', high: '0.0052828' },
    });
    expect(row('scale-envelope').band68).toEqual({ low: '-0.010740', high: '0.022189' });
    expect(row('cacciari-houdeau').priors.map((p) => `${p.name}=${p.value}`)).toEqual([
      'ch.unit=1',
      'ch.slope=0',
      'ch.constant=0',
    ]);
    expect(result.sum).toEqual({ through: 4, value: '1.13088862092208', lastTerm: '0.00528283352816918' });
  });

  test('the next known term is inside or outside where it is', () => {
    expect(result.byOrder?.map((o) => [o.through, o.next.order, o.next.term])).toEqual([
      [1, 2, '0.017014'],
      [2, 3, '0.0067330'],
      [3, 4, '0.0052828'],
    ]);
    const fell = (through: number, model: string): string | undefined =>
      result.byOrder?.find((o) => o.through === through)?.rows.find((r) => r.model === model)?.fell;
    // 0.0170 lies within ± 0.1019; 0.00673 within neither ± 0.0028 nor twice that; 0.00528 within twice 0.00441.
    expect(fell(1, 'last-term')).toBe('68');
    expect(fell(2, 'last-ratio')).toBe('outside');
    expect(fell(3, 'geometric-tail')).toBe('95');
    expect(fell(1, 'geometric')).toBeUndefined();
    expect(result.record?.find((r) => r.model === 'last-ratio')).toEqual({
      model: 'last-ratio',
      asked: 3,
      refused: 1,
      inside68: 0,
      inside95: 1,
    });
  });

  test('the result survives JSON', () => {
    expect(JSON.parse(JSON.stringify(result))).toEqual(result);
    expect(JSON.stringify(result)).not.toMatch(/NaN|Infinity|null/);
  });

  test('without the option there is no table by order', () => {
    expect(truncationStudy(adler, coupling('0.32'), { ...options, order: 2 }).byOrder).toBeUndefined();
  });
});

async function* lines(list: readonly string[]): AsyncIterable<string> {
  yield `${list.join('\n')}\n`;
}

test('past the least term its band is compared with the sum cut there', async () => {
  // n!: at x = 0.3 the terms are 1, 0.3, 0.18, 0.162, 0.1944, 0.2916; the least is the fourth.
  const series = await loadSeries('-', { stdin: lines(['1', '1', '2', '6', '24', '120']) });
  const cut = truncationStudy(series, coupling('0.3'), { ...options, byOrder: true });
  const least = cut.estimates.find((e) => e.model === 'least-term');
  expect(least).toMatchObject({ through: 3, sum: '1.64200000000000', band68: { low: '-0.16200', high: '0.16200' } });
  const rows = cut.byOrder?.map((o) => o.rows.find((r) => r.model === 'least-term')?.fell);
  // With five terms known the sum of six lies 0.1944 + 0.2916 beyond the cut: outside 0.324.
  expect(rows).toEqual([undefined, undefined, undefined, undefined, 'outside']);
  expect(cut.estimates.find((e) => e.model === 'geometric')?.refused?.reason).toContain('do not fall');
});

test.each([
  [0, 5, 4, '0'],
  [0.75, 3, 5, '6.0000'],
  [-0.5, -3000, 5, '-4.0643e-904'],
  [0.99999999, 3323, 3, '2.10e1000'],
])('%d times two to the %i reads %s', (value, unit, digits, text) => {
  expect(scaledText(value, unit, digits)).toBe(text);
});

test('the manual lists every prior with its usual value', () => {
  const manual = readFileSync(new URL('../../docs/methods/truncation-error.md', import.meta.url), 'utf8');
  for (const name of priorNames()) expect(manual).toContain(`| \`${name}\` | ${USUAL_PRIORS[name]} |`);
});
