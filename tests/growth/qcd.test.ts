/**
 * Short QCD series, in α_s/π unless said: Adler function and R (P. A. Baikov, K. G. Chetyrkin, J. H. Kühn,
 * arXiv:0801.1821, 1206.1288), Bjorken sum rule (P. A. Baikov, K. G. Chetyrkin, J. H. Kühn, arXiv:1001.3606), pole mass
 * (P. Marquard et al., arXiv:1606.06754); values from memory, consistency-checked. Model continuation of the Adler
 * function: M. Beneke and M. Jamin, arXiv:0806.3156 (numbers reproduced). Static self-energy on the lattice: C. Bauer,
 * G. S. Bali, A. Pineda, arXiv:1111.3946 (from memory, digits unconfirmed).
 */
import { describe, expect, it } from 'vitest';
import { diagnoseGrowth, type Growth } from '../../src/growth/index.js';
import { fromTexts, type Options } from './terms.js';

const diagnose = (texts: readonly string[], options: Options = {}): Growth => diagnoseGrowth(fromTexts(texts, options));

const ADLER = ['1', '1.6398', '6.371', '49.0757'];
const ADLER_EXPECTED = [
  { t: -4 / 9, exponent: 1.2099, kind: 'ultraviolet' },
  { t: 8 / 9, exponent: 2.5802, kind: 'infrared' },
];
const BENEKE_JAMIN = [
  [
    '1',
    '1.6398212',
    '6.37101448',
    '49.0757',
    '283',
    '3275.4332',
    '18758.3729',
    '388442.38',
    '919121.307',
    '83670085.8',
  ],
  ['-519468484', '3.37862711e10', '-6.03824489e11', '2.34364127e13'],
].flat();

describe('four coefficients', () => {
  it('Adler function: undecided, with the evidence and the competition said', () => {
    const g = diagnose(ADLER, { expected: ADLER_EXPECTED });
    expect(g.verdict).toBe('undecided');
    expect(g.statement).toContain('12 from 4 coefficients');
    expect(g.statement).toContain('still change by 41 %');
    expect(g.comparison?.bayesFactor).toBeCloseTo(11.79314, 4);
    expect(g.competition.some((l) => l.includes('expected positions'))).toBe(true);
    expect(g.ratios.map((r) => Number(r.ratio.toFixed(4)))).toEqual([1.6398, 1.9426, 2.5677]);
    expect(g.ratios[2]?.linear).toBeCloseTo(3.8175, 3);
  });

  it('an estimated fifth coefficient is shown but decides nothing', () => {
    const texts = [...ADLER, '283'];
    const g = diagnose(texts, { estimated: [4] });
    expect(g.verdict).toBe('undecided');
    expect(g.comparison?.bayesFactor).toBeCloseTo(44.8976, 3);
    expect(g.flags.map((f) => f.code)).toContain('estimated-input');
    expect(g.ratios.length).toBe(4);
  });

  it.each([
    [3, ['1.333333333', '10.31929552', '116.5037769', '1702.694'], 1.3951],
    [4, ['1.333333333', '9.277928612', '94.41748046', '1235.656'], 1.3696],
    [5, ['1.333333333', '8.236561701', '73.63656551', '839.135'], 1.3289],
  ])(
    'pole mass, n_l = %i: factorial at positive evidence with the exponent of the leading singularity',
    (nl, texts, exponent) => {
      const t = 1 / ((11 - (2 * nl) / 3) / 2);
      const g = diagnose(texts, { expected: [{ t, exponent, kind: 'infrared' }] });
      expect(g.verdict, g.statement).toBe('factorial');
      expect(g.standing).toBe('indicative');
      expect(g.comparison?.wording).toBe('positive evidence for factorial growth');
      if (g.nearest !== undefined) expect(Math.abs(g.nearest.t.value - t)).toBeLessThan(g.nearest.t.error);
      // Without that exponent the evidence is not worth mentioning, and nothing is claimed.
      expect(diagnose(texts).verdict).toBe('undecided');
    },
  );

  it.each([
    ['R, n_f = 5', ['1', '1.409230409', '-12.76706474', '-79.98063122']],
    ['Bjorken, n_f = 3', ['-1', '-3.58333333', '-20.2152664', '-175.7499']],
    ['Bjorken, n_f = 5', ['-1', '-2.91666667', '-7.84019334', '-41.9608']],
    ['tau width', ['1', '5.202321205', '26.36592897', '127.0786209']],
  ])('%s: undecided', (_, texts) => {
    const g = diagnose(texts);
    expect(g.verdict, g.statement).toBe('undecided');
    expect(g.nearest).toBeUndefined();
  });
});

describe('longer ones', () => {
  it('the Adler model to 14 orders: two singularities in competition, the ultraviolet one nearest', () => {
    const g = diagnose(BENEKE_JAMIN);
    expect(g.verdict).toBe('factorial');
    expect(g.flags.map((f) => f.code)).toContain('competing-singularities');
    expect(Math.abs(g.nearest!.t.value + 4 / 9)).toBeLessThan(g.nearest!.t.error);
    expect(Math.abs(g.second!.t.value - 8 / 9)).toBeLessThan(g.second!.t.error);
  });

  it('static self-energy, 20 orders with errors: 1/t* = 11/(2π)', () => {
    const c = [
      ['2.117274357', '11.136', '86.10', '794.5', '8.215e3', '9.322e4', '1.153e6', '1.558e7', '2.304e8', '3.747e9'],
      [
        '6.70e10',
        '1.316e12',
        '2.81e13',
        '6.51e14',
        '1.628e16',
        '4.36e17',
        '1.247e19',
        '3.78e20',
        '1.215e22',
        '4.12e23',
      ],
    ].flat();
    const e = [
      0, 0.011, 0.13, 1.6, 34, 5.9e2, 1.1e4, 2.1e5, 4.3e6, 9.5e7, 2.2e9, 5.2e10, 1.3e12, 3.5e13, 9.6e14, 2.8e16,
    ];
    const errors = [...e, 8.6e17, 2.8e19, 9.3e20, 3.3e22].map((v, n) => v / Number(c[n]));
    const g = diagnose(c, { errors });
    expect(g.verdict).toBe('factorial');
    expect(Math.abs(g.nearest!.t.value - (2 * Math.PI) / 11)).toBeLessThan(g.nearest!.t.error);
    expect(g.nearest!.t.error).toBeLessThan(0.2);
    expect(g.flags.map((f) => f.code)).toContain('noisy');
  });
});

describe('prediction of hidden coefficients', () => {
  it('factorial series: the factorial line and Borel–Padé predict, the geometric line does not', () => {
    const g = diagnose(['1', '1.5', '3.75', '13.125', '59.0625', '324.84375', '2111.484375']);
    const miss = (method: string): number => Math.abs(g.predictions.find((p) => p.method === method)!.relativeMiss);
    // The line has b = 0, the series b = 1/2: it misses, but far less than geometric growth does.
    expect(miss('factorial fit')).toBeLessThan(0.4 * miss('geometric fit'));
    expect(miss('factorial fit, two hidden')).toBeLessThan(0.5 * miss('geometric fit, two hidden'));
    const pade = g.predictions.find((p) => p.method.startsWith('Borel–Padé') && !p.method.includes('hidden'))!;
    expect(Math.abs(pade.relativeMiss)).toBeLessThan(0.02);
    expect(g.predictions.every((p) => p.n === 6)).toBe(true);
  });

  it('geometric series: the other way round', () => {
    const g = diagnose(['1', '2', '4', '8', '16', '32', '64', '128']);
    expect(Math.abs(g.predictions.find((p) => p.method === 'geometric fit')!.relativeMiss)).toBeLessThan(1e-9);
    expect(g.verdict).toBe('geometric');
  });

  it('a simple pole is predicted exactly by the smallest approximant', () => {
    const g = diagnose(['1', '-1', '2', '-6', '24', '-120']);
    const pade = g.predictions.find((p) => p.method.startsWith('Borel–Padé'))!;
    expect(Math.abs(pade.relativeMiss)).toBeLessThan(1e-9);
  });
});
