import { Ajv } from 'ajv';
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { resultJson } from '../../src/report/json.js';
import { fixture } from './fixture.js';

const SCHEMA = new URL('../../docs/assessment.schema.json', import.meta.url);

interface Generator {
  schemaText(): string;
}

const isGenerator = (module: object): module is Generator => 'schemaText' in module;

async function generated(): Promise<string> {
  const path = new URL('../../docs/assessment.schema.mjs', import.meta.url).href;
  const module: unknown = await import(path);
  if (typeof module !== 'object' || module === null || !isGenerator(module)) throw new Error('no generator');
  return module.schemaText();
}

const validator = new Ajv({ strict: true, allErrors: true }).compile(JSON.parse(readFileSync(SCHEMA, 'utf8')));

describe('the JSON output', () => {
  test('has the documented keys in their order', () => {
    expect(Object.keys(JSON.parse(resultJson(fixture)))).toEqual([
      'leastterm',
      'request',
      'series',
      'coupling',
      'terms',
      'growth',
      'borelPlane',
      'values',
      'ambiguity',
      'powerCorrection',
      'optimalTruncation',
      'verdict',
      'cautions',
    ]);
  });

  test('loses nothing', () => {
    expect(JSON.parse(resultJson(fixture))).toEqual(fixture);
  });

  test('a part keeps version, request and series in front', () => {
    expect(
      Object.keys(
        JSON.parse(
          resultJson({
            cautions: fixture.cautions,
            growth: fixture.growth,
            series: fixture.series,
            request: {},
            leastterm: '0',
          }),
        ),
      ),
    ).toEqual(['leastterm', 'request', 'series', 'growth', 'cautions']);
  });

  test('is the same text for the same result', () => {
    expect(resultJson({ ...fixture })).toBe(resultJson(fixture));
  });
});

describe('the schema', () => {
  test('is what the types say (npm run schema writes it anew)', async () => {
    expect(readFileSync(SCHEMA, 'utf8')).toBe(await generated());
  });

  test('accepts an assessment', () => {
    expect(validator(JSON.parse(resultJson(fixture))), JSON.stringify(validator.errors)).toBe(true);
  });

  test.each([
    ['an unknown key', { ...fixture, more: 1 }],
    ['an unknown key deep inside', { ...fixture, verdict: { ...fixture.verdict, grade: 'A' } }],
    ['a number that is no string', { ...fixture, coupling: { ...fixture.coupling, value: 0.3156 } }],
    ['an unknown standing', { ...fixture, verdict: { ...fixture.verdict, standing: 'sure' } }],
    ['a missing section', { ...fixture, growth: undefined }],
  ])('rejects %s', (_, wrong) => {
    expect(validator(JSON.parse(JSON.stringify(wrong)))).toBe(false);
  });
});
