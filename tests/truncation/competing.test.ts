/** Competing growth: the bracket of orders holds the principal value where min |term| does not; and the remainder of one singularity. */
import { describe, expect, test } from 'vitest';
import { quantityNamed } from '../../src/bubbles/index.js';
import { chainSeries } from '../../src/extraction/index.js';
import { R, branchAlternating, branchSame, exact } from '../../src/numerics/index.js';
import type { Series } from '../../src/series/index.js';
import { truncationStudy } from '../../src/studies/index.js';
import type { TruncationResult } from '../../src/studies/index.js';
import { TRUNCATION_MODELS, remainderFactor } from '../../src/truncation/index.js';
import type { TruncationModel } from '../../src/truncation/index.js';
import type { StatedSingularity } from '../../src/series/index.js';
import { benchFile, benchSeries } from '../support/bench.js';
import { rational } from '../support/check-value.js';
import { answer, ask, refusal } from './support.js';

const model = (name: string): TruncationModel => {
  const found = TRUNCATION_MODELS.find((m) => m.name === name);
  if (found === undefined) expect.fail(name);
  return found;
};
const options = { digits: 15, request: { command: 'truncation' } };
const at = (text: string): { value: ReturnType<typeof exact>; text: string } => ({
  value: exact(rational(text)),
  text,
});

describe('the bracket on bubble chains', () => {
  const study = (name: string, alpha: string, count: number): TruncationResult => {
    const quantity = quantityNamed(name)!;
    const point = { alpha: at(alpha).value, flavours: quantity.flavours, ratio: exact(1) };
    return truncationStudy(chainSeries(quantity, point, count), at(alpha), options);
  };

  // PV and smallest terms: mpmath 1.2.1, 40 digits, and PARI/GP 2.15. Orders are powers of α_s.
  test.each([
    ['adler', '0.32', 0.1511684860703326, 6, [3, 9]],
    ['r-ratio', '0.32', 0.1048932281053577, 7, [4, 14]],
    ['tau-width', '0.32', 0.22772058684667901, 10, [4, 13]],
    ['b-to-u-msbar', '0.22', 0.5927182921931733, 15, [6, 10]],
  ])('%s: the sums in it bracket the principal value', (name, alpha, pv, least, orders) => {
    const found = study(name, alpha, 16).competing!;
    expect(found.orders).toEqual(orders);
    expect(found.least!.order).toBe(least);
    expect(Number(found.sums!.low)).toBeLessThan(pv);
    expect(Number(found.sums!.high)).toBeGreaterThan(pv);
  });

  test('the smallest term of b → u is an accident, and the result says so', () => {
    const { competing, estimates } = study('b-to-u-msbar', '0.22', 16);
    expect(competing!.least).toEqual({ order: 15, inside: false });
    expect(competing!.statement).toMatch(/not trusted.*order 15, lies outside/);
    // The sum through order 15 is off by 0.035, its term is 0.0022; the band about that sum reaches the principal value.
    const row = estimates.find((e) => e.model === 'least-term')!;
    expect(Number(row.sum) + Number(row.band68!.low)).toBeLessThan(0.5927182921931733);
    expect(row.notes!.join()).toMatch(/reaches to all sums through orders 6 to 10/);
  });

  test.each([
    ['pole-mass', '0.22'],
    ['static-potential', '0.25'],
  ])('%s: the infrared singularity leads, nothing competes', (name, alpha) => {
    expect(study(name, alpha, 10).competing).toBeUndefined();
  });

  test('few terms: the orders, but no sums', () => {
    const found = study('adler', '0.24', 4).competing!;
    expect(found.sums).toBeUndefined();
    expect(found.statement).toMatch(/4 known terms reach fewer than two/);
    // Far before the least terms there is nothing to say.
    expect(study('adler', '0.1', 4).competing).toBeUndefined();
  });
});

describe('the bracket on series with known answers', () => {
  const stated = (series: Series, list: readonly [number, string][]): Series => ({
    ...series,
    singularities: list.map(([t, p]) => ({
      t: exact(t),
      exponent: exact(rational(p)),
      kind: t < 0 ? ('ultraviolet' as const) : ('infrared' as const),
    })),
  });
  test.each([
    [
      's09_uv1_ir2_poles',
      [
        [-1, '1'],
        [2, '1'],
      ],
      ['1/10', '1/5', '1/2'],
    ],
    [
      's10_uv1_ir2_branch',
      [
        [-1, '1019/625'],
        [2, '1087/625'],
      ],
      ['1/10', '1/5'],
    ],
    [
      's87_large_b0_adler',
      [
        [-1, '2'],
        [2, '1'],
      ],
      ['1/10', '1/5'],
    ],
  ] as [string, [number, string][], string[]][])('%s', (id, list, points) => {
    const file = benchFile(id);
    for (const x of points) {
      const pv = Number(file.references.find((r) => r.x === x)!.pv);
      const { competing } = truncationStudy(stated(benchSeries(file, 40), list), at(x), options);
      expect(Number(competing!.sums!.low), x).toBeLessThan(pv);
      expect(Number(competing!.sums!.high), x).toBeGreaterThan(pv);
    }
  });

  test('found in the terms where the file states nothing', () => {
    const { competing } = truncationStudy(benchSeries(benchFile('s09_uv1_ir2_poles'), 40), at('1/5'), options);
    expect(competing?.ultraviolet.origin).toBe('the terms');
    expect(Number(competing?.infrared.t)).toBeCloseTo(2, 1);
  });

  test('one side alone never competes', () => {
    for (const id of ['s01_euler_alternating', 's02_euler_nonalternating', 's152_demo_tessel_uv']) {
      const { competing } = truncationStudy(benchSeries(benchFile(id), 30), at('1/10'), options);
      expect(competing, id).toBeUndefined();
    }
  });
});

describe('the remainder through 1/ω', () => {
  const PREC = 120;
  const exactFactor = (side: 1 | -1, s: number, omega: number): number => {
    const [b, w] = [R.fromNumber(s), R.fromNumber(omega)];
    const kernel = side > 0 ? branchSame(b, w, PREC).pv : branchAlternating(b, w, PREC);
    return R.toNumber(R.mul(w, kernel, PREC));
  };

  test.each([1, -1] as const)('side %d: what is left falls like 1/ω² and is what it says', (side) => {
    for (const eta of [-0.75, -0.25, 0.5]) {
      const off = [16, 32, 64].map((omega) => {
        const { value, left } = remainderFactor(side, eta, omega);
        const error = exactFactor(side, omega + eta, omega) - value;
        expect(Math.abs(error) / left, `${eta} ${omega}`).toBeGreaterThan(0.5);
        expect(Math.abs(error) / left, `${eta} ${omega}`).toBeLessThan(2);
        return error * omega ** 2;
      });
      expect(Math.abs(off[2]! / off[1]! - 1)).toBeLessThan(0.1);
    }
  });

  test.each([1, -1] as const)('side %d: a correction (1 − t/t*) of the singularity enters at 1/ω', (side) => {
    // B = (1 ∓ v)^(−1−b) [1 + c (1 ∓ v)]: T carries the first alone, e_1 = c b.
    const [b, c, eta] = [0.4, 0.7, 0.25];
    const off = [20, 40, 80].map((omega) => {
      const s = omega + eta;
      // After N terms the second singularity has the remainder T b/(N + b) times its own factor.
      const whole = exactFactor(side, s, omega) + ((c * b) / s) * exactFactor(side, s - 1, omega);
      return (whole - remainderFactor(side, eta, omega, c * b).value) * omega ** 2;
    });
    expect(Math.abs(off[1]! / off[0]! - 1)).toBeLessThan(0.2);
    expect(Math.abs(off[2]! / off[1]! - 1)).toBeLessThan(0.1);
  });

  const singularity = (t: number, exponent: string): StatedSingularity => ({
    t: exact(t),
    exponent: exact(rational(exponent)),
    corrections: [],
    kind: t > 0 ? 'infrared' : 'ultraviolet',
    origin: 'file',
  });
  const bench = (id: string, x: string, count: number, stated: readonly StatedSingularity[]): [number, number] => {
    const file = benchFile(id);
    const coefficients = file.coefficients.values.slice(0, count).map((v) => exact(rational(v)));
    const question = ask(coefficients, { at: x, plain: true, power: 0, stated });
    const found = answer(model('remainder'), question);
    const known =
      question.known.values.slice(0, found.estimate.terms).reduce((a, v) => a + v, 0) * 2 ** question.known.unit;
    const pv = Number(file.references.find((r) => r.x === x)!.pv);
    return [
      (pv - known) / ((found.low68 + found.high68) / 2) - 1,
      (found.high68 - found.low68) / 2 / Math.abs(pv - known),
    ];
  };

  // Σ n! (±x)ⁿ and Γ(n+3/2)/Γ(3/2): exact sums from mpmath and PARI/GP.
  test.each([
    ['s01_euler_alternating', '1/10', -1, '1'],
    ['s02_euler_nonalternating', '1/10', 1, '1'],
    ['s03_shift_alt_b1_2', '1/10', -1, '3/2'],
    ['s04_shift_nonalt_b1_2', '1/10', 1, '3/2'],
  ] as const)('%s at x = %s', (id, x, t, exponent) => {
    const [off, error] = bench(id, x, 40, [singularity(t, exponent)]);
    expect(Math.abs(off)).toBeLessThan(0.02);
    expect(Math.abs(off)).toBeLessThan(1.5 * error);
  });

  test('scales with an overall factor of any size, and turns with its sign', () => {
    const c = benchFile('s02_euler_nonalternating')
      .coefficients.values.slice(0, 12)
      .map((v) => exact(rational(v)));
    const given = { at: '1/10', plain: true, power: 0, stated: [singularity(1, '1')] };
    const usual = answer(model('remainder'), ask(c, given));
    const turned = answer(model('remainder'), ask(c, { ...given, factor: '-1' }));
    expect(turned.high95).toBeCloseTo(-usual.low95, 12);
    const far = ask(c, { ...given, factor: '1e-5000' });
    const estimate = model('remainder').estimate(far);
    if (estimate.kind === 'refusal') expect.fail(estimate.reason);
    expect(estimate.bands[68].high / far.known.values.at(-1)!).toBeCloseTo(
      usual.estimate.bands[68].high / ask(c, given).known.values.at(-1)!,
      8,
    );
  });

  test('refused with reason and remedy', () => {
    const factorials = ['1', '1', '2', '6', '24', '120', '720', '5040'].map((v) => exact(rational(v)));
    const given = { at: '0.2', plain: true, power: 0 };
    const why = (list: readonly StatedSingularity[], more = {}): string =>
      refusal(model('remainder'), ask(factorials, { ...given, stated: list, ...more })).reason;
    expect(why([])).toMatch(/no Borel singularity/);
    expect(why([singularity(-1, '1'), singularity(2, '1')])).toMatch(/compete/);
    expect(why([singularity(1, '1')], { at: '0.01' })).toMatch(/end \d+\.\d orders before/);
    expect(why([singularity(1, '4')], { at: '0.9' })).toMatch(/before the first one/);
    expect(why([singularity(-1, '1')])).toMatch(/moves by more than itself/);
  });

  test('the error holds on a pole mass of four terms, whose strength still moves', () => {
    const quantity = quantityNamed('pole-mass')!;
    const point = { alpha: at('0.22').value, flavours: 4, ratio: exact(1) };
    const { estimates } = truncationStudy(chainSeries(quantity, point, 4), at('0.22'), options);
    const row = estimates.find((e) => e.model === 'remainder')!;
    expect(row.refused).toBeUndefined();
    // Principal value: mpmath 1.2.1.
    const distance = 0.1942613489234478 - Number(row.sum);
    expect(distance).toBeGreaterThan(Number(row.band95!.low));
    expect(distance).toBeLessThan(Number(row.band95!.high));
    expect(Math.abs(Number(row.band68!.low))).toBeLessThan(0.05);
  });
});
