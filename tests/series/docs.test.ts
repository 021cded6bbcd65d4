/** The reference page: every example on it is read. */
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { LIMITS, parseSeries } from '../../src/series/index.js';
import { DIVISORS, FIELDS } from '../../src/series/read-series.js';

const PAGE = readFileSync(new URL('../../docs/series-file.md', import.meta.url), 'utf8');
const EXAMPLES = [...PAGE.matchAll(/^```(yaml|json|csv|text)\n([\s\S]*?)^```$/gm)].map((m) => ({
  form: m[1]!,
  text: m[2]!,
}));

describe('docs/series-file.md', () => {
  test('has examples of every form', () => {
    expect(new Set(EXAMPLES.map((e) => e.form))).toEqual(new Set(['yaml', 'csv', 'text']));
  });

  test.each(EXAMPLES)('example $#: $form', async ({ text }) => {
    const series = await parseSeries(text, { name: 'example' });
    expect(series.coefficients.length).toBeGreaterThan(1);
  });

  test('names every field, divisor and limit', () => {
    for (const field of FIELDS) expect(PAGE).toContain(`| \`${field}\` |`);
    for (const divisor of DIVISORS) expect(PAGE).toContain(`\`${divisor}\``);
    expect(PAGE).toContain(
      `${LIMITS.bytes / 2 ** 20} MiB a file, ${(LIMITS.coefficients / 1000).toFixed(0)},000 coefficients`,
    );
    expect(PAGE).toContain(`${LIMITS.constants} constants, ${LIMITS.correlation} rows`);
  });

  test('the complete example says what the page says', async () => {
    const series = await parseSeries(EXAMPLES[1]!.text, { name: 'example' });
    expect(series.coupling).toEqual({ name: 'alpha_s', divisor: 'pi', plain: false });
    expect(series.sources).toEqual(['A. Author, Some Journal 1 (2001) 1 [published]']);
    expect(series.hardScale?.value.rational?.toString()).toBe('1777/1000');
    expect(series.anyFlavours).toBe(true);
    expect(series.coefficients.map((c) => c.status)).toEqual([
      'computed',
      'computed',
      'computed',
      'computed',
      'estimated',
    ]);
    expect(series.coefficients[2]!.error?.plus.toString()).toBe('1/250');
    expect(series.condensates[0]!.value?.error?.minus.toString()).toBe('1/250');
  });
});
