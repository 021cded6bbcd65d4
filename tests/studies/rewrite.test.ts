import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { R, Rational, exact, subExact } from '../../src/numerics/index.js';
import { betaNumbers } from '../../src/qcd/index.js';
import { loadSeries, writeSeries } from '../../src/series/index.js';
import { rationals, rewriteRefused, rewritten, seriesOf, throughFile, errors, values } from '../support/qcd-series.js';

const runs = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? 1);
const q = (text: string) => exact(Rational.parse(text) ?? Rational.ZERO);
const C = (text: string) => ({ kind: 'C', c: Rational.parse(text) ?? Rational.ZERO }) as const;

const fraction = fc
  .tuple(fc.integer({ min: -40, max: 40 }), fc.integer({ min: 1, max: 9 }))
  .map(([a, b]) => `${a}/${b}`);
const list = fc.array(fraction, { minLength: 1, maxLength: 5 });
const listText = (items: readonly string[]): string => `[${items.join(', ')}]`;
const reduced = (items: readonly string[]): string[] =>
  items.map((text) => (Rational.parse(text) ?? Rational.ZERO).toString());

describe('there and back, written to a file in between, gives the same rational numbers', () => {
  test('scale, for any ratio, first power and number of flavours', async () => {
    await fc.assert(
      fc.asyncProperty(
        list,
        fc.constantFrom('2', '1/2', '3/7', '22/13', '1.37'),
        fc.integer({ min: -1, max: 3 }),
        async (items, ratio, firstPower) => {
          const start = await seriesOf(listText(items), `first power: ${firstPower}`);
          const there = await throughFile(await rewritten(start, { scale: q(ratio) }));
          const back = await throughFile(await rewritten(there, { scale: q('1') }));
          expect(rationals(back)).toEqual(reduced(items));
        },
      ),
      { numRuns: 12 * runs },
    );
  });

  test('C-scheme, for any parameter, and from one C to another', async () => {
    await fc.assert(
      fc.asyncProperty(list, fraction, fraction, async (items, one, other) => {
        const start = await seriesOf(listText(items), 'first power: 1');
        const there = await throughFile(await rewritten(start, { coupling: C(one) }));
        const further = await throughFile(await rewritten(there, { coupling: C(other) }));
        expect(further.scheme).toBe(`C-scheme, C = ${(Rational.parse(other) ?? Rational.ZERO).toString()}`);
        const back = await throughFile(await rewritten(further, { coupling: { kind: 'MSbar' } }));
        expect(rationals(back)).toEqual(reduced(items));
      }),
      { numRuns: 8 * runs },
    );
  });

  test('flavours, V scheme, mini-MOM, the mass in front', async () => {
    const items = ['1', '-3/7', '22', '5/3'];
    const start = await seriesOf(listText(items), 'first power: 1\nadditive: 1');
    const four = await rewritten(start, { flavours: 4 });
    expect(four.flavours).toBe(4);
    expect(rationals(await rewritten(await throughFile(four), { flavours: 3 }))).toEqual(items);
    for (const kind of ['V', 'mini-MOM'] as const) {
      const there = await throughFile(await rewritten(start, { coupling: { kind } }));
      expect(rationals(await rewritten(there, { coupling: { kind: 'MSbar' } }))).toEqual(items);
    }
    const pole = await seriesOf(listText(items), 'first power: 1\nadditive: 1');
    const power = Rational.of(5, 2);
    const there = await rewritten(pole, { mass: { to: 'msbar', from: 'pole', power } });
    expect(there.scheme).toBe('MSbar coupling; MSbar mass m(m)');
    const back = await rewritten(await throughFile(there), { mass: { to: 'pole', power } });
    expect(rationals(back)).toEqual(items);
  });

  test('a long series to sixty digits, where no closed form is written', async () => {
    const items = Array.from({ length: 14 }, (_, n) => `${n * n + 1}/${n + 2}`);
    const start = await seriesOf(listText(items), 'first power: 1');
    const there = await throughFile(await rewritten(start, { scale: q('2') }));
    const back = await rewritten(there, { scale: q('1') });
    back.coefficients.forEach((c, i) => {
      const gap = R.abs(subExact(c.value, q(items[i] ?? '0')).ball(256));
      expect(R.upperBits(gap)).toBeLessThan(-140);
    });
    expect(back.notes.join(' ')).toContain('higher loops count as zero');
  });
});

describe('scale', () => {
  test('two steps are one', async () => {
    const start = await seriesOf('[1, 2, 3, 4]', 'first power: 1');
    const once = await rewritten(start, { scale: q('6') });
    const twice = await rewritten(await rewritten(start, { scale: q('2') }), { scale: q('6') });
    expect(twice.coefficients.map((c) => c.text)).toEqual(once.coefficients.map((c) => c.text));
  });

  test('the first logarithm is b_0 ln(mu^2/Q^2), in closed form', async () => {
    const there = await rewritten(await seriesOf('[1, 5]', 'first power: 1'), { scale: q('2') });
    expect(there.coefficients[1]?.text).toBe('5 + 9/2*log(2)');
    expect(there.scaleRatio?.rational?.toString()).toBe('2');
    expect(there.notes.at(-1)).toContain('mu/Q from 1 to 2 at nf = 3');
  });

  test('a toy world with one-loop running keeps its own beta function, and strengths move with the scale', async () => {
    const pair = await loadSeries('marrowgate-pair');
    const there = await rewritten(pair, { scale: q('2') });
    expect(there.singularities.map((s) => s.strength?.value.rational?.toString())).toEqual(['8/3', '1/24']);
    // c_n/(n! u_s^(−n) b_0^n) tends to the strength: 4/3 before, 8/3 now.
    const b0 = betaNumbers(4, 1, 'pi')[0] ?? NaN;
    const strength = (c: number, n: number): number => {
      let scale = 1;
      for (let k = 1; k <= n; k++) scale *= 2 * b0 * k;
      return c / scale;
    };
    expect(strength(values(pair)[40] ?? NaN, 40)).toBeCloseTo(4 / 3, 6);
    expect(strength(values(there)[40] ?? NaN, 40)).toBeCloseTo(8 / 3, 6);
  });
});

describe('errors and correlations', () => {
  const COVARIED = `correlation: [[1, 0, 0, 0], [0, 1, 0.5, 0], [0, 0.5, 1, -0.25], [0, 0, -0.25, 1]]\nfirst power: 1`;

  test('are M C M^T of the linear map, correlations among the inputs included', async () => {
    const start = await seriesOf('[1, 2(3), 5.0(7), -8(2)]', COVARIED);
    const there = await rewritten(start, { scale: q('2') });
    // Columns of the map from unit series.
    const columns = await Promise.all(
      [0, 1, 2, 3].map(async (j) => {
        const unit = [0, 1, 2, 3].map((i) => (i === j ? '1' : '0'));
        return values(await rewritten(await seriesOf(listText(unit), 'first power: 1'), { scale: q('2') }));
      }),
    );
    const sigma = [0, 3, 0.7, 2];
    const rho = [[1, 0, 0, 0], [0, 1, 0.5, 0], [0, 0.5, 1, -0.25], [0, 0, -0.25, 1]]; // prettier-ignore
    const entry = (i: number, j: number): number => {
      let sum = 0;
      for (let k = 0; k < 4; k++)
        for (let l = 0; l < 4; l++)
          sum +=
            (columns[k]?.[i] ?? 0) * (sigma[k] ?? 0) * (rho[k]?.[l] ?? 0) * (sigma[l] ?? 0) * (columns[l]?.[j] ?? 0);
      return sum;
    };
    errors(there).forEach((e, i) => expect(e ?? 0).toBeCloseTo(Math.sqrt(entry(i, i)), 9));
    expect(errors(there)[0]).toBeUndefined();
    for (const [i, j] of [
      [1, 2],
      [1, 3],
      [2, 3],
    ] as const) {
      // prettier-ignore
      const expected = entry(i, j) / Math.sqrt(entry(i, i) * entry(j, j));
      expect(there.correlation?.[i]?.[j]?.toNumber()).toBeCloseTo(expected, 10);
      expect(there.correlation?.[j]?.[i]?.toNumber()).toBe(there.correlation?.[i]?.[j]?.toNumber());
    }
    // Back again: the errors and correlations of the file.
    const back = await rewritten(await throughFile(there), { scale: q('1') });
    errors(back).forEach((e, i) => expect(e ?? 0).toBeCloseTo(sigma[i] ?? 0, 8));
    expect(back.correlation?.[2]?.[3]?.toNumber()).toBeCloseTo(-0.25, 8);
    expect(back.correlation?.[1]?.[3]?.toNumber() ?? NaN).toBeCloseTo(0, 8);
  });

  test('one source of error makes correlations of 1, and an untouched error stays as written', async () => {
    const there = await rewritten(await seriesOf('[1, 2(1), 3]', 'first power: 1'), { scale: q('2') });
    expect(there.correlation?.map((row) => row.map(Number))).toEqual([[1, 0, 0], [0, 1, 1], [0, 1, 1]]); // prettier-ignore
    const asymmetric = await seriesOf('[1, { value: 2, error: { plus: 0.3, minus: 0.1 } }]', 'first power: 1');
    const [, c] = (await rewritten(asymmetric, { scale: q('3') })).coefficients;
    expect([c?.error?.plus.toString(), c?.error?.minus.toString()]).toEqual(['3/10', '1/10']);
  });

  test('what rests on an estimate is an estimate', async () => {
    const start = await seriesOf('[1, 2, { value: 3, status: estimated }, 4]', 'first power: 1');
    const there = await rewritten(start, { scale: q('2') });
    expect(there.coefficients.map((c) => c.status)).toEqual(['computed', 'computed', 'estimated', 'estimated']);
  });

  test('the errors of a relation come in: the three-loop constant of the potential, the four-loop one of the pole mass', async () => {
    const start = await seriesOf('[1, 2, 3, 4]', 'first power: 1');
    const inV = await rewritten(start, { coupling: { kind: 'V' } });
    // 0.01·27 + 0.12·15/16 + 0.01·5/96·3 of arXiv:0911.4742 in units of (α_s/4π)³: over 4³.
    expect(errors(inV).at(-1)).toBeCloseTo((0.27 + 0.1125 + 0.0015625) / 64, 12);
    const inMass = await rewritten(start, { mass: { to: 'msbar', from: 'pole', power: Rational.of(1) } });
    // The factor in front begins with x here: the four-loop error belongs to the fifth order.
    expect(errors(inMass)).toEqual([undefined, undefined, undefined, undefined]);
    const withOne = await seriesOf('[1, 2, 3, 4]', 'first power: 1\nadditive: 1');
    // 1.64 + 0.040·3 of arXiv:1606.06754, added linearly.
    expect(
      errors(await rewritten(withOne, { mass: { to: 'msbar', from: 'pole', power: Rational.of(2) } })).at(-1),
    ).toBeCloseTo(2 * 1.76, 10);
  });
});

describe('what the new file says', () => {
  test('reads back whole, and keeps sources, measurement and condensates', async () => {
    const adler = await loadSeries('r-ratio-nf5');
    const there = await throughFile(await rewritten(adler, { scale: q('1/2'), coupling: C('-1') }));
    expect(there.title).toBe(`${adler.title} [C-scheme, C = -1, mu/Q = 1/2]`);
    expect(there.sources).toEqual(adler.sources);
    expect(there.notes).toEqual(expect.arrayContaining([...adler.notes]));
    expect(there.notes.join(' ')).toMatch(
      /Rewritten by leastterm \d+\.\d+\.\d+ from r-ratio-nf5\. Scale: .* Coupling: from MSbar to C-scheme/,
    );
    expect(there.condensates.length).toBe(adler.condensates.length);
    // The exponent was written with names of the file's own constants; now it is free of them.
    expect(there.constants).toBeUndefined();
    expect(there.singularities[0]?.exponent?.rational?.toString()).toBe(
      adler.singularities[0]?.exponent?.rational?.toString(),
    );
  });

  test('another mass is another quantity: the measurement goes, the singularity at u = 1/2 comes and goes with the pole', async () => {
    const more = 'first power: 1\nadditive: 1\nmeasurement: 0.3(1)\nsingularities: [{ dimension: 1 }, { u: -1 }]';
    const pole = await seriesOf('[1, 2, 3]', more);
    const there = await rewritten(pole, { mass: { to: 'msbar', from: 'pole', power: Rational.of(5) } });
    expect(there.measurement).toBeUndefined();
    expect(there.singularities.map((s) => s.kind)).toEqual(['ultraviolet']);
    const back = await rewritten(there, { mass: { to: 'pole', power: Rational.of(5) } });
    expect(back.singularities[0]?.dimension?.toString()).toBe('1');
  });

  test('says when decimals were taken as exact, and which coefficients a relation does not reach', async () => {
    const start = await seriesOf('[1.64, 2.345, 3, 4, 5, 6]', 'first power: 1');
    const there = await rewritten(start, { coupling: { kind: 'V' } });
    expect(there.coefficients).toHaveLength(4);
    expect(there.notes.join(' ')).toContain('The relation fixes 4 coefficients; the last 2 are left out.');
    expect(there.notes.at(-1)).toContain('taken as exact');
    expect(writeSeries(there)).toContain('scheme: V scheme');
  });

  test('a coupling defined by another series, and back', async () => {
    const adler = await loadSeries('adler');
    const there = await throughFile(await rewritten(adler, { coupling: { kind: 'series', name: 'bjorken' } }));
    expect(there.scheme).toBe('coupling defined by bjorken');
    // c_2 of both in α_s/π at n_f = 3: 1.6398 of the Adler function minus 43/12 of the sum rule over its −1.
    expect(values(there)[1]).toBeCloseTo(1.63982120489698 - 3.58333333333333, 12);
    const back = await rewritten(there, { coupling: { kind: 'MSbar' } });
    values(back).forEach((c, i) => expect(c).toBeCloseTo(values(adler)[i] ?? NaN, 11));
  });
});

describe('refused, with the remedy', () => {
  test('the scale of a series in the running mass, unless the mass goes first', async () => {
    const start = await seriesOf('[1, 2]', 'first power: 1\nadditive: 1');
    const running = { ...start, scheme: 'MSbar coupling; running mass m(mu)' };
    const refused = await rewriteRefused(running, { scale: q('2') });
    expect(refused.reason).toContain('running mass m(mu)');
    const both = await rewritten(running, { scale: q('2'), mass: { to: 'msbar', power: Rational.of(2) } });
    // At μ = m(m) the running mass is m(m) itself: only the coupling moves.
    const other = await rewritten({ ...start, scheme: 'MSbar coupling; MSbar mass m(m)' }, { scale: q('2') });
    expect(both.coefficients.map((c) => c.text)).toEqual(other.coefficients.map((c) => c.text));
  });

  const cases: readonly (readonly [string, string, Parameters<typeof rewriteRefused>[1], RegExp, RegExp])[] = [
    ['a plain variable', 'variable: x', { scale: q('2') }, /plain variable x/, /coupling: \{ name/],
    ['no scheme', 'coupling: { name: alpha_s }\nflavours: 3\nscale ratio: 1', { scale: q('2') }, /does not say its scheme/, /write scheme:/],
    ['an unknown scheme', 'coupling: { name: alpha_s }\nscheme: lattice\nflavours: 0\nscale ratio: 1', { scale: q('2') }, /"lattice" of test is not known/, /"MSbar"/],
    ['no flavours', 'coupling: { name: alpha_s }\nscheme: MSbar\nscale ratio: 1', { scale: q('2') }, /does not say its number of flavours/, /flavours: 3/],
    ['no scale ratio', 'coupling: { name: alpha_s }\nscheme: MSbar\nflavours: 3', { scale: q('2') }, /renormalisation scale/, /scale ratio: 1/],
    ['no hard scale', 'coupling: { name: alpha_s }\nscheme: MSbar\nflavours: 3\nscale ratio: 1', { flavours: 4 }, /no hard scale/, /hard scale: 1.777 GeV/],
    ['two flavours', 'coupling: { name: alpha_s }\nscheme: MSbar\nflavours: 3\nscale ratio: 1\nhard scale: 2 GeV', { flavours: 2 }, /between 2 and 3 flavours/, /can be crossed/],
    ['no mass', 'coupling: { name: alpha_s }\nscheme: MSbar\nflavours: 3\nscale ratio: 1', { mass: { to: 'msbar', power: Rational.of(5) } }, /which mass/, /--from-mass/],
    ['a toy world in another coupling', 'coupling: { name: alpha_s }\nscheme: toy, one-loop running only\nflavours: 3\nscale ratio: 1', { coupling: C('0') }, /toy/, /scale/],
  ]; // prettier-ignore
  test.each(cases)('%s', async (_name, head, change, reason, remedy) => {
    const { parseSeries } = await import('../../src/series/index.js');
    const series = await parseSeries(`${head}\nfirst power: 1\ncoefficients: [1, 2]\n`, { name: 'test', form: 'yaml' });
    const refused = await rewriteRefused(series, change);
    expect(refused.reason).toMatch(reason);
    expect(refused.remedy).toMatch(remedy);
  });
});
