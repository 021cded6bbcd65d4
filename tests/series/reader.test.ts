/** Reading: the forms of a file, defaults, options, and that nothing is lost on the way in. */
import { Readable } from 'node:stream';
import { describe, expect, test } from 'vitest';
import { InputError, loadSeries, nearest, parseSeries } from '../../src/series/index.js';
import type { Series } from '../../src/series/index.js';

const parse = (text: string, name = 'test'): Promise<Series> => parseSeries(text, { name });
const values = (series: Series): string[] => series.coefficients.map((c) => c.value.rational?.toString() ?? '?');
const problem = async (work: Promise<unknown>): Promise<string> =>
  work.then(
    () => 'no problem',
    (error: unknown) => (error instanceof InputError ? error.message : `not an input error: ${String(error)}`),
  );

describe('forms of a file', () => {
  const wanted = ['1', '-1', '2'];
  test.each([
    ['JSON list', '["1", "-1", "2"]'],
    ['JSON list of numbers', '[1.0, -1e0, 2]'],
    ['fractions', '["1/1", "-2/2", "4/2"]'],
    ['YAML list', '- 1\n- -1\n- +2\n'],
    ['JSON object', '{"coefficients": [1, -1, 2]}'],
    ['YAML map', 'coefficients:\n  - 1\n  - -1\n  - 2\n'],
    ['one number a line', '# a comment\n1\n-1   # another\n\n2'],
    ['lines that end in commas', '1,\r\n-1,\r\n2\r\n'],
    ['CSV', 'order,value,error\n0,1,\n1,-1,\n2,2,\n'],
    ['CSV with quotes', '"order","value"\n0,"1"\n1,"-1"\n2," 2"\n'],
    ['CSV without orders', 'value\n1\n-1\n2\n'],
    ['byte order mark', '\uFEFF1\n-1\n2\n'],
  ])('%s', async (_, text) => {
    const bytes = Readable.from([Buffer.from(text)]);
    const series = await loadSeries('-', { stdin: bytes });
    expect(values(series)).toEqual(wanted);
    expect(series.firstPower).toBe(0);
  });

  test('the first order of a CSV is the first power', async () => {
    const series = await parse('order,value,error\n2,1.5,0.1\n3,2(1),\n');
    expect(series.firstPower).toBe(2);
    expect(series.coefficients.map((c) => c.error?.plus.toString())).toEqual(['1/10', '1']);
  });

  test('defaults', async () => {
    const series = await parse('[1]', 'some/folder/name.yaml');
    expect(series).toMatchObject({
      id: 'name',
      title: 'name',
      sources: [],
      notes: [],
      invented: false,
      coupling: { name: 'x', divisor: '1', plain: true },
      firstPower: 0,
      singularities: [],
      condensates: [],
    });
    expect(series.factor.rational?.toString()).toBe('1');
    expect(series.additive.rational?.toString()).toBe('0');
    expect(Object.keys(series)).not.toContain('flavours');
  });
});

describe('nothing is lost', () => {
  test('a long decimal in YAML and in JSON', async () => {
    const digits = '0.11800000000000000000000000001';
    const exactly = '11800000000000000000000000001/100000000000000000000000000000';
    for (const text of [`[${digits}]`, `coefficients:\n  - ${digits}\n`, `value\n${digits}\n`, digits]) {
      expect(values(await parse(text))).toEqual([exactly]);
    }
  });

  test('sizes beyond doubles, octal look-alikes and yes-words', async () => {
    const series = await parse('title: no\ncoefficients: [010, 1e-400, 1e400, 0123.50]\n');
    expect(series.title).toBe('no');
    expect(values(series)).toEqual(['10', `1/1${'0'.repeat(400)}`, `1${'0'.repeat(400)}`, '247/2']);
    expect(series.coefficients.map((c) => c.significantDigits)).toEqual([undefined, undefined, undefined, 5]);
  });

  test('what the file says is kept as text', async () => {
    const series = await parse('coefficients: [1.000, 0.25(3), {value: 1.50, error: 0.1}]');
    expect(series.coefficients.map((c) => c.text)).toEqual(['1.000', '0.25(3)', '1.50 +- 0.1']);
  });
});

describe('singularities', () => {
  test('kind follows the side of the axis', async () => {
    const series = await parse(
      'coupling: {name: a}\ncoefficients: [1]\nsingularities: [{u: 2}, {u: -1}, {dimension: 1/2}, {t: -3, kind: other}]',
    );
    expect(series.singularities.map((s) => s.kind)).toEqual(['infrared', 'ultraviolet', 'infrared', 'other']);
  });
  test('a plain variable has neither side', async () => {
    const series = await parse('coefficients: [1]\nsingularities: [{t: 2, exponent: 1/2, strength: 0.5(1)}]');
    expect(series.singularities[0]).toMatchObject({ kind: 'other' });
    expect(series.singularities[0]!.strength!.error!.plus.toString()).toBe('1/10');
  });
});

describe('correlation', () => {
  test('a singular matrix is a correlation matrix', async () => {
    const ones = '[[1, 1, 1], [1, 1, 1], [1, 1, 1]]';
    const series = await parse(`coefficients: [1(1), 2(1), 3(1)]\ncorrelation: ${ones}`);
    expect(series.correlation).toHaveLength(3);
  });
  test('rounded to two digits it still is', async () => {
    await parse(
      'coefficients: [1(1), 2(1), 3(1)]\ncorrelation: [[1, 0.71, 0.71], [0.71, 1, 0.0082], [0.71, 0.0082, 1]]',
    );
  });
});

describe('flavours', () => {
  const file = (extra: string): string => `flavours: 3\n${extra}coefficients: [1, "11 - 2*nf/3"]\n`;
  test('nf takes the file value, or the one asked for', async () => {
    expect(values(await parse(file('')))[1]).toBe('9');
    const four = await parseSeries(file(''), { name: 'test', flavours: 4 });
    expect(values(four)[1]).toBe('25/3');
    expect(four.flavours).toBe(4);
    expect(four.anyFlavours).toBe(true);
  });
  test('refused outside the choices, for fixed coefficients, and out of range', async () => {
    const ask = (text: string, flavours: number): Promise<string> =>
      problem(parseSeries(text, { name: 'f', flavours }));
    expect(await ask(file('flavour choices: [3, 4]\n'), 5)).toBe(
      'f: flavours: 5 asked for; wanted one of 3, 4, for which the series is meant',
    );
    expect(await ask('flavours: 3\ncoefficients: [1]', 4)).toBe(
      'f: flavours: 4 asked for, but the coefficients are fixed numbers; wanted 3',
    );
    expect(await ask(file(''), 17)).toBe('f: flavours: 17 asked for; wanted an integer from 0 to 16');
    expect(await ask('flavours: 3\ncoefficients: [1]', 3)).toBe('no problem');
  });
  test('a hard scale by flavours', async () => {
    const text = file('hard scale: {3: 1.5 GeV, 4: 4180 MeV}\n');
    expect((await parse(text)).hardScale).toMatchObject({ unit: 'GeV', text: '1.5 GeV' });
    expect((await parseSeries(text, { name: 't', flavours: 4 })).hardScale).toMatchObject({ unit: 'MeV' });
    expect((await parseSeries(text, { name: 't', flavours: 5 })).hardScale).toBeUndefined();
  });
});

describe('all problems at once', () => {
  test('from every part of the file, in its order', async () => {
    const message = await problem(
      parse('title: ""\ncoupling: {divisor: 3}\nfirst power: x\ncoefficients: [a, NaN]\ninvented: 1\n'),
    );
    expect(message.split('\n').map((line) => line.split(': ')[1])).toEqual([
      'title', 'coupling.divisor', 'first power', 'coefficients[0]', 'coefficients[1]', 'invented',
    ]); // prettier-ignore
  });
  test('but no more than forty', async () => {
    const message = await problem(parse(`[${'x, '.repeat(100)}1]`));
    const lines = message.split('\n');
    expect(lines).toHaveLength(41);
    expect(lines.at(-1)).toBe('test: 60 more problems like these; wanted the ones above mended first');
  });
});

describe('names', () => {
  test('neither file nor id', async () => {
    expect(await problem(loadSeries('adlr'))).toBe(
      'adlr: neither a catalogue id nor a file (did you mean "adler"?); wanted an id of the catalogue, a path, or - for standard input',
    );
    expect(await problem(loadSeries('./adler'))).toBe('./adler: no such file; wanted a series file');
  });
  test('nearest', () => {
    const words = ['coefficients', 'condensates', 'correlation', 'title'];
    expect(nearest('titel', words)).toBe('title');
    expect(nearest('Coeficients', words)).toBe('coefficients');
    expect(nearest('coeffs', words)).toBe('coefficients');
    expect(nearest('zzzzzz', words)).toBeUndefined();
    expect(nearest('t', words)).toBeUndefined();
  });
});
