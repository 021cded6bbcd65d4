import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { Rational } from '../../src/numerics/index.js';
import { loadSeries } from '../../src/series/index.js';
import { growthStudy } from '../../src/studies/index.js';
import { combineRefused, combined, errors, rationals, seriesOf, throughFile, values } from '../support/qcd-series.js';

const runs = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const fraction = fc
  .tuple(fc.integer({ min: -20, max: 20 }), fc.integer({ min: 1, max: 6 }))
  .map(([a, b]) => Rational.of(a, b).toString());
const nonZero = fraction.filter((text) => text !== '0');
const tail = (least: number) => fc.array(fraction, { minLength: least, maxLength: 4 });
const listText = (items: readonly string[]): string => `[${items.join(', ')}]`;

describe('identities, exactly in rationals', () => {
  test('(a b)/b = a, a + b - b = a, a/b b/a = 1, whatever the leading powers', async () => {
    await fc.assert(
      fc.asyncProperty(
        nonZero,
        tail(2),
        nonZero,
        tail(2),
        fc.integer({ min: -2, max: 2 }),
        async (a0, as, b0, bs, power) => {
          const a = await seriesOf(listText([a0, ...as]), `first power: ${power}`);
          const b = await seriesOf(listText([b0, ...bs]), 'first power: 1');
          const n = Math.min(as.length, bs.length) + 1;
          // A constant term in front is written as the additive part.
          const flat = async (expression: string): Promise<(string | undefined)[]> => {
            const s = await throughFile(await combined(expression, { a, b }));
            const front = s.additive.rational?.isZero() === true ? [] : [s.additive.rational?.toString()];
            const gap = s.firstPower - power - front.length;
            return [...front, ...Array.from({ length: front.length > 0 ? gap : 0 }, () => '0'), ...rationals(s)];
          };
          expect((await flat('a * b / b')).slice(0, n)).toEqual([a0, ...as].slice(0, n));
          const one = await combined('a / b * (b / a) - 1 + b', { a, b });
          expect(rationals(one)).toEqual([b0, ...bs].slice(0, one.coefficients.length));
        },
      ),
      { numRuns: 15 * runs },
    );
  });

  test('exp and log, roots and powers, undo each other', async () => {
    await fc.assert(
      fc.asyncProperty(tail(2), nonZero, async (items, first) => {
        const s = await seriesOf(listText([first, ...items]), 'first power: 1\nadditive: 1');
        const expected = [first, ...items];
        for (const expression of [
          'exp(log(s))',
          'sqrt(s)^2',
          '(s^(2/3))^(3/2)',
          '1/(1/s)',
          '(s^-3)^(-1/3)',
          's^5/s^4',
          '(4*s)^(1/2)/2*sqrt(s)',
        ]) {
          const back = await combined(expression, { s });
          expect(back.additive.rational?.toString(), expression).toBe('1');
          expect(rationals(back), expression).toEqual(expected);
        }
      }),
      { numRuns: 8 * runs },
    );
  });

  test('a composition and the inverse function', async () => {
    // y = x/(1 − x) and x = y/(1 + y): every coefficient 1, and alternating ones.
    const f = await seriesOf('[1, 1, 1, 1, 1]', 'first power: 1\nfactor: pi');
    const g = await seriesOf('[1, -1, 1, -1, 1]', 'first power: 1\nfactor: pi');
    const back = await combined('g(f)', { f, g });
    expect(back.firstPower).toBe(1);
    expect(back.coefficients[0]?.text).toBe('pi');
    expect(values(back).slice(1)).toEqual([0, 0, 0, 0]);
  });

  test('a number of divisors of the coupling, with factors of π in closed form', async () => {
    const a = await seriesOf('[1, 2, 3]', 'first power: 1');
    const { parseSeries } = await import('../../src/series/index.js');
    const text =
      'coupling: { name: alpha_s, divisor: 4*pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nfirst power: 1\ncoefficients: [1, 2, 3]\n';
    const b = await parseSeries(text, { name: 'b', form: 'yaml' });
    expect(rationals(await combined('a - 4*b', { a, b }))).toEqual(['3/2', '45/16']);
    const plain = await parseSeries(text.replace('4*pi', "'1'"), { name: 'c', form: 'yaml' });
    expect((await combined('a + c', { a, c: plain })).coefficients.map((c) => c.text)).toEqual([
      '1 + pi',
      '2 + 2*pi^2',
      '3 + 3*pi^3',
    ]);
  });
});

describe('orders', () => {
  test.each([
    ['a * b', 2, 4],
    ['a * (1 + b)', 1, 4],
    ['(1 + a) * (1 + b)', 1, 3],
    ['b / a', 1, 2],
    ['1/b + 0*a', -1, 1],
    ['b - a', 2, 3],
    ['a^3 + 0*b^9', 3, 6],
    ['exp(a + b)', 1, 3],
  ])('%s begins at %i and is known through %i', async (expression, first, through) => {
    // a through the fourth power, b through the third.
    const a = await seriesOf('[1, 2, 3, 4]', 'first power: 1');
    const b = await seriesOf('[1, 5, 6]', 'first power: 1');
    const s = await combined(expression, { a, b });
    expect(s.firstPower).toBe(first);
    expect(s.firstPower + s.coefficients.length - 1).toBe(through);
    expect(s.notes.join(' ')).toContain(`Known through power ${through} `);
  });
});

describe('errors', () => {
  test('of a product: independent inputs in quadrature, with their correlations in the result', async () => {
    const a = await seriesOf('[2.0(1), 3.0(4)]', 'first power: 0');
    const b = await seriesOf('[5.0(2), 7.0(3)]', 'first power: 0');
    const s = await combined('a * b', { a, b });
    // c_0 = a_0 b_0, c_1 = a_0 b_1 + a_1 b_0.
    const s0 = Math.hypot(5 * 0.1, 2 * 0.2);
    const s1 = Math.hypot(7 * 0.1, 5 * 0.4, 2 * 0.3, 3 * 0.2);
    expect(errors(s)[0]).toBeCloseTo(s0, 11);
    expect(errors(s)[1]).toBeCloseTo(s1, 11);
    const covariance = 5 * 7 * 0.1 ** 2 + 2 * 3 * 0.2 ** 2;
    expect(s.correlation?.[0]?.[1]?.toNumber()).toBeCloseTo(covariance / (s0 * s1), 11);
  });

  test('of one series under two names are the same errors', async () => {
    const series = await seriesOf('[1, 2.0(5)]', 'first power: 1');
    const operands = (['a', 'b'] as const).map((name) => ({ name, from: 'one.yaml', series }));
    const { combineStudy } = await import('../../src/studies/index.js');
    const difference = await combineStudy({ expression: 'a - b + 2*a', operands });
    if ('reason' in difference) throw new Error(difference.reason);
    expect(errors(difference)[1]).toBeCloseTo(1, 12);
    const others = operands.map((o, i) => ({ ...o, from: `${i}.yaml` }));
    const independent = await combineStudy({ expression: 'a - b + 2*a', operands: others });
    if ('reason' in independent) throw new Error(independent.reason);
    expect(errors(independent)[1]).toBeCloseTo(Math.hypot(1.5, 0.5), 10);
  });

  test('agree with differences of shifted inputs through powers, exp and log', async () => {
    const at = (shift: number) => seriesOf(`[1, ${2 + shift}, 3, ${-1 + shift}]`, 'first power: 1\nadditive: 1');
    const uncertain = await seriesOf(
      '[1, 2 +- 0.01, 3, -1 +- 0.01]',
      'first power: 1\nadditive: 1\ncorrelation: [[1,0,0,0],[0,1,0,1],[0,0,1,0],[0,1,0,1]]',
    );
    for (const expression of ['s^(1/3)', 'exp(s - 1)', 'log(s)/s^2']) {
      const s = await combined(expression, { s: uncertain });
      const up = values(await combined(expression, { s: await at(0.005) }));
      const down = values(await combined(expression, { s: await at(-0.005) }));
      errors(s).forEach((e, i) => expect(e ?? 0).toBeCloseTo(Math.abs((up[i] ?? NaN) - (down[i] ?? NaN)), 6));
    }
  });
});

describe('the heavy-quark width', () => {
  test('in the pole mass becomes the one in the MSbar mass', async () => {
    const s = await combined('width * ratio^5', { width: 'b-to-u-pole', ratio: 'pole-msbar-nl4' });
    const published = values(await loadSeries('b-to-u-msbar'));
    // 4.2536, 26.785: T. van Ritbergen, hep-ph/9903226 (memory, re-derived).
    expect(values(s)[0]).toBeCloseTo(published[0] ?? NaN, 5);
    expect(values(s)[1]).toBeCloseTo(26.785, 3);
    expect(values(s)[2]).toBeCloseTo(published[2] ?? NaN, 0);
    expect(errors(s)[2]).toBe(27);
    expect(s.additive.rational?.toString()).toBe('1');
    expect(s.notes.join(' ')).toContain('u = 1/2 is a singularity of width and ratio: it may cancel here');
    expect(s.singularities.some((x) => x.u?.rational?.toString() === '1/2')).toBe(false);
  });

  test('the cancellation at u = 1/2 shows in sixty coefficients of an invented pair', async () => {
    const given = { pair: 'marrowgate-pair', partner: 'marrowgate-partner' };
    const s = await throughFile(await combined('pair + partner', given));
    const [pair, partner] = await Promise.all([loadSeries(given.pair), loadSeries(given.partner)]);
    const sum = pair.coefficients.map((c, i) =>
      c.value.rational?.add(partner.coefficients[i]?.value.rational ?? Rational.ZERO).toString(),
    );
    expect(rationals(s)).toEqual(sum);
    const options = { digits: 15, request: {} };
    const before = growthStudy(pair, options).growth.nearest;
    const after = growthStudy(s, options).growth.nearest;
    expect(Number(before?.u)).toBeCloseTo(0.5, 6);
    expect(Number(after?.u)).toBeCloseTo(-1, 6);
    // Exponents that the files state stay in a sum.
    expect(s.singularities.map((x) => [x.u?.rational?.toString(), x.exponent?.rational?.toString()])).toEqual([['-1', '1'], ['2', '1']]); // prettier-ignore
    expect(s.invented).toBe(true);
  }, 30_000);

  test('the Crewther combination begins at the second power and carries a factor of beta', async () => {
    const s = await combined('d * c - 1', { d: 'adler', c: 'bjorken' });
    expect(s.firstPower).toBe(2);
    // β(a)/a times K_1: −b_0 K_1 with b_0 = 9/4 and K_1 = −21/6 + 4 ζ(3), of D. Broadhurst, A. Kataev 1993 (memory).
    expect(s.coefficients[0]?.text).toBe('63/8 - 9*zeta(3)');
  });
});

describe('refused, with the remedy', () => {
  test('another scheme, other flavours, another scale, another variable', async () => {
    const a = await seriesOf('[1, 2]', 'first power: 1');
    const change = (from: string, to: string) =>
      import('../../src/series/index.js').then(({ parseSeries }) =>
        parseSeries(
          'coupling: { name: alpha_s, divisor: pi }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV\nfirst power: 1\ncoefficients: [1, 2]\n'.replace(
            from,
            to,
          ),
          { name: 'b', form: 'yaml' },
        ),
      );
    const cases = [
      ['scheme: MSbar', 'scheme: "C-scheme, C = -1"', /a is in MSbar, b in C-scheme, C = -1/, /leastterm rewrite b --coupling MSbar/],
      ['scheme: MSbar', 'scheme: toy, one-loop running only', /toy/, /one world/],
      ['scheme: MSbar\n', '', /does not say its scheme/, /write scheme:/],
      ['flavours: 3', 'flavours: 4', /a has nf = 3, b nf = 4/, /leastterm rewrite b --flavours 3/],
      ['flavours: 3\n', '', /b \(b\) does not say its number of flavours/, /"flavours: 3"/],
      ['scale ratio: 1', 'scale ratio: 2', /mu = 2 GeV, b mu = 4 GeV/, /leastterm rewrite b --scale 2GeV/],
      ['hard scale: 2 GeV', 'hard scale: 3 GeV', /mu = 2 GeV, b mu = 3 GeV/, /leastterm rewrite b --scale 2GeV/],
      ['scale ratio: 1\n', '', /renormalisation scale/, /"scale ratio: 1"/],
      ['coupling: { name: alpha_s, divisor: pi }', 'variable: x', /a is a series in alpha_s, b in x/, /plain variable/],
    ] as const; // prettier-ignore
    for (const [from, to, reason, remedy] of cases) {
      const refused = await combineRefused('a * b', { a, b: await change(from, to) });
      expect(refused.reason).toMatch(reason);
      expect(refused.remedy).toMatch(remedy);
    }
    // Twice Q at half the ratio is the same μ.
    const same = await change('scale ratio: 1\nhard scale: 2 GeV', 'scale ratio: 1/2\nhard scale: 4 GeV');
    expect((await combined('a * b', { a, b: same })).firstPower).toBe(2);
  });

  test('what has no exact meaning in the expression', async () => {
    const a = await seriesOf('[2, 3]', 'first power: 0');
    const s = await seriesOf('[1, 2]', 'first power: 1');
    const cases: readonly (readonly [string, RegExp])[] = [
      ['exp(a)', /constant term/],
      ['log(a)', /begin with 1/],
      ['sqrt(a)', /no exact positive root/],
      ['sqrt(s)', /no integer powers/],
      ['a(a)', /positive power/],
      ['1/(s - s)', /cannot be told from zero/],
      ['s - s', /every known order/],
      ['0*s', /every known order/],
      ['a^s', /power that is not a plain number/],
      ['a^200', /the power 200/],
      ['sin(s)', /"sin" is not defined/],
      ['s % 2', /not part of an expression/],
      ['s b', /not part of an expression|not defined/],
      ['s; s', /not part of an expression/],
      ['f = s', /not part of an expression/],
      ['s *', /breaks off/],
      ['(((s', /breaks off/],
      ['s.constructor', /not part of an expression/],
      ['zeta(1) * s', /zeta of something else/],
      ['t * s', /"t" is not defined/],
      ['3.5', /does not occur/],
    ]; // prettier-ignore
    for (const [expression, reason] of cases) {
      const used = {
        ...(/\ba\b/.test(expression) && { a }),
        ...(/\bs\b/.test(expression) || expression === '3.5' ? { s } : {}),
      };
      expect((await combineRefused(expression, used)).reason, expression).toMatch(reason);
    }
    expect((await combineRefused('(('.repeat(40) + 's' + '))'.repeat(40), { s })).reason).toMatch(/nested parentheses/);
    expect((await combineRefused(`s${' + s'.repeat(2000)}`, { s })).reason).toMatch(/characters/);
    expect((await combineRefused('pi * s', { pi: s, s })).reason).toMatch(/has a meaning already/);
  });
});
