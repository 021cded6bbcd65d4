import { describe, expect, it } from 'vitest';
import { toNumberExact, type Exact } from '../../src/numerics/index.js';
import {
  DECOUPLING_ALPHA,
  DECOUPLING_MASS,
  addFormal,
  equalsFormal,
  formalRing,
  formalSymbol,
  mulFormal,
  powFormal,
  formalOf,
  numberOfFormal,
  powersOfSymbol,
  substituteFormal,
  type Formal,
} from '../../src/qcd/constants/index.js';
import { parseFormal } from '../../src/qcd/constants/formal-parse.js';
import { formalTable, exactTable, doubleTable } from '../../src/qcd/matching/tables.js';
import type { HeavyMass } from '../../src/qcd/matching/logs.js';

const c4 = formalOf(DECOUPLING_ALPHA[3] ?? { formula: '0' });
const m30 = formalOf(DECOUPLING_MASS[2] ?? { formula: '0' });
const m40 = formalOf(DECOUPLING_MASS[3] ?? { formula: '0' });
const published = (text: string): Formal => substituteFormal(parseFormal(text), { c40: c4, m30, m40 });
const euler: Record<string, Formal> = {
  z2: parseFormal('pi^2/6'),
  z4: parseFormal('pi^4/90'),
  B4: parseFormal('16*a4 - 13/180*pi^4 - 2/3*pi^2*ln2^2 + 2/3*ln2^4'),
};
const exactly = (own: Formal | undefined, text: string): void =>
  expect(equalsFormal(substituteFormal(own ?? parseFormal('0'), euler), substituteFormal(published(text), euler))).toBe(
    true,
  );

/** The table of symbols with the powers of l joined again. */
const decouplingSeries = (quantity: 'coupling' | 'mass', mass: HeavyMass): Formal[] =>
  formalTable(quantity, mass).map((row) =>
    row.reduce((sum, c, j) => addFormal(sum, mulFormal(c, powFormal(formalSymbol('l'), j))), formalRing.zero),
  );

// Published forms: Chetyrkin, Kniehl, Steinhauser hep-ph/9708255; Schröder, Steinhauser hep-ph/0512058; Chetyrkin, Kühn,
// Sturm hep-ph/0512060; Liu, Steinhauser arXiv:1502.04719. Constants read in FLAG 2024; logarithms recalled and re-derived.
describe('logarithms of the decoupling relations', () => {
  it('α_s, running mass', () => {
    const z = decouplingSeries('coupling', 'running');
    exactly(z[1], '-l/6');
    exactly(z[2], '11/72 - 11/24*l + l^2/36');
    exactly(
      z[3],
      '564731/124416 - 82043/27648*z3 - 2633/31104*nl + l*(-955/576 + 67/576*nl) + l^2*(53/576 - 1/36*nl) - l^3/216',
    );
    exactly(
      z[4],
      'c40 + l*(7391699/746496 - 2529743/165888*z3 + nl*(-110341/373248 + 110779/82944*z3) + 6865/186624*nl^2)' +
        ' + l^2*(2177/3456 - 1483/10368*nl - 77/20736*nl^2) + l^3*(-1883/10368 - 127/5184*nl + 1/324*nl^2) + l^4/1296',
    );
  });

  it('α_s, scale-invariant mass', () => {
    const z = decouplingSeries('coupling', 'scale-invariant');
    exactly(z[2], '11/72 - 19/24*l + l^2/36');
    exactly(
      z[3],
      '564731/124416 - 82043/27648*z3 - 2633/31104*nl + l*(-6793/1728 + 281/1728*nl) - 131/576*l^2 - l^3/216',
    );
    exactly(
      z[4],
      'c40 + l*(-2398621/746496 - 2483663/165888*z3 + nl*(190283/373248 + 133819/82944*z3) + 8545/186624*nl^2)' +
        ' + l^2*(-14023/3456 + 983/3456*nl - 79/6912*nl^2) + l^3*(-8371/10368 + 107/1728*nl) + l^4/1296',
    );
  });

  it('α_s, pole mass', () => {
    const z = decouplingSeries('coupling', 'pole');
    exactly(z[2], '-7/24 - 19/24*l + l^2/36');
    exactly(
      z[3],
      '-58933/124416 - 2/3*z2*(1 + ln2/3) - 80507/27648*z3 + nl*(2479/31104 + z2/9)' +
        ' + l*(-8521/1728 + 409/1728*nl) - 131/576*l^2 - l^3/216',
    );
    const expected = [
      [-85.8750286835, 9.69228641673, -0.239541957896],
      [-50.5851358, 6.22556721, -0.0699201832],
      [-6.67795139, 0.642457562, -0.0237750772],
      [-0.807388117, 0.0619212963],
      [1 / 1296],
    ];
    expected.forEach((row, j) => {
      const inL = powersOfSymbol(powersOfSymbol(z[4] ?? parseFormal('0'), 'l')[j] ?? parseFormal('0'), 'nl');
      row.forEach((value, i) =>
        expect(Math.abs(numberOfFormal(inL[i] ?? parseFormal('0')) / value - 1)).toBeLessThan(1e-8),
      );
    });
  });

  it('light masses, running mass', () => {
    const z = decouplingSeries('mass', 'running');
    exactly(z[1], '0');
    exactly(z[2], '89/432 - 5/36*l + l^2/12');
    exactly(z[3], 'm30 + l*(-311/2592 - 5/6*z3 - 53/432*nl) + 175/432*l^2 + l^3*(29/216 - nl/108)');
    exactly(
      z[4],
      'm40 + l*(-637583/41472 - 90775/9216*z3 + 155/48*z4 + 575/72*z5 + 31/4*m30 + nl*(1661/10368 + 13/18*z3' +
        ' - 5/12*z4 - m30/2) + nl^2*(-83/5184 + z3/36)) + l^2*(51163/10368 - 155/48*z3 - 7825/10368*nl' +
        ' + 31/1296*nl^2) + l^3*(301/324 - 23/288*nl) + l^4*(305/1152 - 5/144*nl + nl^2/864)',
    );
  });

  it('light masses, scale-invariant and pole mass', () => {
    const z = decouplingSeries('mass', 'scale-invariant');
    exactly(z[3], 'm30 + l*(-1031/2592 - 5/6*z3 - 53/432*nl) + 319/432*l^2 + l^3*(29/216 - nl/108)');
    exactly(
      z[4],
      'm40 + l*(-694415/41472 - 106135/9216*z3 + 155/48*z4 + 575/72*z5 + 31/4*m30 + nl*(-161/3456 + 13/18*z3' +
        ' - 5/12*z4 - m30/2) + nl^2*(-83/5184 + z3/36)) + l^2*(81763/10368 - 155/48*z3 - 8065/10368*nl' +
        ' + 31/1296*nl^2) + l^3*(1403/648 - 47/288*nl) + l^4*(305/1152 - 5/144*nl + nl^2/864)',
    );
    const pole = decouplingSeries('mass', 'pole');
    exactly(pole[2], '89/432 - 5/36*l + l^2/12');
    exactly(
      pole[3],
      '1871/2916 - 407/864*z3 + 5/4*z4 - B4/36 + nl*(1327/11664 - 2/27*z3)' +
        ' + l*(121/2592 - 5/6*z3 - 53/432*nl) + 319/432*l^2 + l^3*(29/216 - nl/108)',
    );
    // arXiv:1502.04719, on-shell: 0.2233 − 1.5039 nl + 0.05616 nl² (recalled, the digits of the constant at μ = m).
    const constant = powersOfSymbol(powersOfSymbol(pole[4] ?? parseFormal('0'), 'l')[0] ?? parseFormal('0'), 'nl').map(
      numberOfFormal,
    );
    expect(constant[0]).toBeCloseTo(0.2233, 3);
    expect(constant[1]).toBeCloseTo(-1.5039, 3);
    expect(constant[2]).toBeCloseTo(0.05616, 5);
  });

  it('tables in doubles and exact numbers are the same as those of the symbols', () => {
    const last = (x: Exact | undefined): number => (x === undefined ? NaN : toNumberExact(x));
    for (const mass of ['scale-invariant', 'running', 'pole'] as const) {
      for (const quantity of ['coupling', 'mass'] as const) {
        const symbols = formalTable(quantity, mass);
        const exact = exactTable(4, quantity, mass);
        const doubles = doubleTable(4, quantity, mass);
        symbols.forEach((row, k) =>
          row.forEach((c, j) => {
            const value = numberOfFormal(substituteFormal(c, { nl: parseFormal('4') }));
            expect(Math.abs(last(exact[k]?.[j]) - value)).toBeLessThan(1e-12 * Math.max(1, Math.abs(value)));
            expect(Math.abs((doubles[k]?.[j] ?? NaN) - value)).toBeLessThan(1e-12 * Math.max(1, Math.abs(value)));
          }),
        );
        expect(exact[2]?.[2]?.rational).toBeDefined();
      }
    }
    expect(exactTable(4, 'coupling', 'running')[4]?.[4]?.rational?.toString()).toBe('1/1296');
  });
});
