/** Expressions: rational when they can be, enclosures otherwise; algebra, names, and what the walk refuses. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { R, Rational } from '../../src/numerics/index.js';
import type { Exact } from '../../src/numerics/index.js';
import { ExpressionProblem } from '../../src/series/expression/syntax.js';
import { parseExpression } from '../../src/series/expression/mathjs-parser.js';
import { parseSeries } from '../../src/series/index.js';

const CASES = 100 * Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);

const file = (text: string, head = ''): string => `${head}coefficients: [${JSON.stringify(text)}]\n`;
async function value(text: string, head = ''): Promise<Exact> {
  const series = await parseSeries(file(text, head), { name: 'test' });
  return series.coefficients[0]!.value;
}
const rational = async (text: string, head = ''): Promise<string | undefined> =>
  (await value(text, head)).rational?.toString();

describe('rational values', () => {
  test.each([
    ['11 - 2*3/3', '9'],
    ['-2^2', '-4'],
    ['(-2)^2', '4'],
    ['2^3^2', '512'],
    ['2^-1', '1/2'],
    ['2^(-3)', '1/8'],
    ['1/2/3*6', '1'],
    ['1 - 2 - 3*4', '-13'],
    ['+3*(1/3 + 1/6)', '3/2'],
    ['2*-3', '-6'],
    ['sqrt(49/4)', '7/2'],
    ['sqrt(0)', '0'],
    ['log(1)', '0'],
    ['0*pi + 0/zeta(3)', '0'],
    ['0.1*3 - 0.3', '0'],
    ['0.11800000000000000000000000001*10^29', '11800000000000000000000000001'],
    ['1e-400*10^400', '1'],
    [`0.${'1234567890'.repeat(12)}*1`, `${'1234567890'.repeat(12).slice(0, -1)}/1${'0'.repeat(119)}`],
    ['(365/24)^2 - (133225/576)', '0'],
  ])('%s = %s', async (text, wanted) => {
    expect(await rational(text)).toBe(Rational.parse(wanted)!.toString());
  });

  test('four operations agree with the same sum in rationals', async () => {
    const digit = fc.integer({ min: -50, max: 50 });
    await fc.assert(
      fc.asyncProperty(
        digit,
        digit,
        digit,
        fc.integer({ min: 1, max: 60 }),
        fc.integer({ min: -5, max: 5 }),
        async (a, b, c, d, n) => {
          fc.pre(!(n < 0 && a === b * d));
          const text = `((${a})/${d} - (${b}))^${n === 0 ? 0 : `(${n})`} + (${c})*(${b})/${d}`;
          const [A, B, C, D] = [a, b, c, d].map((k) => Rational.of(k)) as [Rational, Rational, Rational, Rational];
          expect(await rational(text)).toBe(A.div(D).sub(B).pow(n).add(C.mul(B).div(D)).toString());
        },
      ),
      { numRuns: CASES },
    );
  });
});

describe('enclosures', () => {
  test.each([
    ['zeta(2) - pi^2/6'],
    ['sqrt(2)^2 - 2'],
    ['log(6) - log(2) - log(3)'],
    ['zeta(4)*90 - pi^4'],
    ['pi*(1/pi) - 1'],
    ['1/(1/gamma_euler) - gamma_euler'],
  ])('%s encloses zero', async (text) => {
    for (const prec of [64, 300]) {
      const ball = (await value(text)).ball(prec);
      expect(R.containsZero(ball)).toBe(true);
      expect(R.upperBits(ball)).toBeLessThan(-prec);
    }
  });

  test('a cancellation costs no accuracy', async () => {
    // 355/113 − π loses 23 bits, ζ(1000) − 1 loses 1,000.
    for (const text of ['355/113 - pi', 'zeta(1000) - 1']) {
      for (const prec of [64, 200, 1000])
        expect(R.accuracyBits((await value(text)).ball(prec))).toBeGreaterThanOrEqual(prec);
    }
  });
});

describe('names', () => {
  test('constants in any order, nf, and their use in each other', async () => {
    const head = 'flavours: 4\nconstants: {q: b0/2, b0: 11 - 2*nf/3, _unused: 1}\n';
    await expect(value('q', head)).rejects.toThrow('constants._unused');
    expect(await rational('3*q', head.replace('_unused', 'unused'))).toBe('25/2');
  });
  test('the factor, the additive part and the scale take expressions too', async () => {
    const series = await parseSeries(
      'coupling: {name: a}\nfactor: 4*pi\nadditive: 1 - 2/3\nscale ratio: sqrt(4)\ncoefficients: [1]',
      { name: 't' },
    );
    expect(series.factor.rational).toBeUndefined();
    expect(series.additive.rational?.toString()).toBe('1/3');
    expect(series.scaleRatio?.rational?.toString()).toBe('2');
  });
  test('an expression with an error', async () => {
    const series = await parseSeries('coefficients: ["2*pi +- 0.1", {value: pi, error: sqrt(2)/10}]', { name: 't' });
    expect(series.coefficients[0]!.error!.minus.toString()).toBe('1/10');
    // Just above sqrt(2)/10: an error is never made smaller.
    const error = series.coefficients[1]!.error!.plus;
    expect(error.mul(error).cmp(Rational.of(1n, 50n))).toBe(1);
    expect(error.toNumber()).toBeCloseTo(Math.SQRT2 / 10, 15);
  });
});

describe('the parser beyond the first look', () => {
  // These never reach it through a file; the walk refuses them all the same.
  test.each([
    '0.1180(9)',
    '1_000',
    '2 pi',
    '10%',
    '2 cm',
    'a/b c',
    "A'",
    'a=3',
    'f(x)=x^2',
    '[1,2]',
    '{a:1}',
    '"str"',
    '1:3',
    '3!',
    'a.b',
    'true',
    'i ? 1 : 2',
    'f(1,2)',
    'null',
    '1;2',
    '',
  ])('%s is refused', (text) => expect(() => parseExpression(text)).toThrow(ExpressionProblem));
  test.each(['sqrt 2', '1/0 +', '(1', '**2', '1//2'])('%s is refused', (text) => {
    expect(() => parseExpression(text)).toThrow(ExpressionProblem);
  });
});
