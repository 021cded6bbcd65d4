/**
 * Incomplete Γ, hypergeometric and related functions against stored values on which mpmath and PARI/GP agree to 63 digits; the versions
 * stand in the file, tests/outside/generate_special_complex.py wrote it.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  C,
  cosh,
  digammaComplex,
  gammaComplex,
  gauss,
  kummerM,
  kummerU,
  polylogHalf,
  R,
  Rational,
  sinh,
  tanh,
  upperGamma,
  upperGammaComplex,
  zetaReal,
} from '../../src/numerics/index.js';
import type { Ball, Complex } from '../../src/numerics/index.js';

type Row = Readonly<Record<string, string>>;
interface Reference {
  readonly versions: Readonly<Record<string, string>>;
  readonly digits: number;
  readonly functions: Readonly<Record<string, readonly Row[]>>;
}
const file = new URL('./data/special-functions-complex.json', import.meta.url);
const reference = JSON.parse(readFileSync(file, 'utf8')) as Reference;

const PREC = 230;
/** Bits of arguments beyond those asked of the result. */
const MORE = 120;
const rational = (text: string): Rational => Rational.parse(text)!;
const ball = (text: string): Ball => R.fromRational(rational(text), PREC + MORE);
const point = (text: string): Complex => {
  const [re, im] = text.split(',');
  return { re: ball(re!), im: im === undefined ? R.ZERO : ball(im) };
};
const given = (text: string): Rational | Complex => (text.includes(',') ? point(text) : rational(text));

const EVALUATE: Readonly<Record<string, (r: Row) => Complex>> = {
  sinh: (r) => C.fromReal(sinh(ball(r['x']!), PREC)),
  cosh: (r) => C.fromReal(cosh(ball(r['x']!), PREC)),
  tanh: (r) => C.fromReal(tanh(ball(r['x']!), PREC)),
  zetaReal: (r) => C.fromReal(zetaReal(ball(r['s']!), PREC)),
  upperGamma: (r) => C.fromReal(upperGamma(rational(r['s']!), ball(r['x']!), PREC)),
  upperGammaComplex: (r) => upperGammaComplex(rational(r['s']!), point(r['z']!), PREC),
  upperGammaOrder: (r) => upperGammaComplex(point(r['s']!), point(r['z']!), PREC),
  gammaComplex: (r) => gammaComplex(point(r['z']!), PREC),
  digammaComplex: (r) => digammaComplex(point(r['z']!), PREC),
  kummerM: (r) => kummerM(given(r['a']!), given(r['b']!), given(r['z']!), PREC),
  kummerU: (r) => kummerU(given(r['a']!), given(r['b']!), given(r['z']!), PREC),
  gauss: (r) => gauss(given(r['a']!), given(r['b']!), given(r['c']!), given(r['z']!), PREC),
};

/** Bits lost against PREC on these points, arguments with a radius of 2^-MORE of their own. */
const ALLOWED_LOSS = 3;

describe(`mpmath ${reference.versions['mpmath']}, PARI/GP ${reference.versions['pari-gp']}`, () => {
  it.each(Object.keys(EVALUATE))('%s: at least 100 points to 63 digits', (name) => {
    const rows = reference.functions[name]!;
    expect(rows.length).toBeGreaterThanOrEqual(100);
    for (const row of rows) {
      const value = EVALUATE[name]!(row);
      const what = `${name} ${JSON.stringify(row)}`;
      expect(C.accuracyBits(value), what).toBeGreaterThan(PREC - ALLOWED_LOSS);
      const slack = 10 ** (3 - reference.digits);
      const size = C.upperBits(value);
      for (const key of ['re', 'im'] as const) {
        expect(R.containsRational(R.addError(value[key], slack, size), rational(row[key]!)), `${what}: ${key}`).toBe(
          true,
        );
      }
    }
  });
});

describe('polylogarithms at one half', () => {
  // mpmath 1.3.0 and PARI/GP 2.15.2, 60 digits.
  it.each([
    [1, '0.69314718055994530941723212145817656807550013436025525412068'],
    [4, '0.517479061673899386330758161898862945622377475141379258244319'],
    [5, '0.508400579242268707459108849258589941319541125664821648724498'],
  ] as const)('Li_%i(1/2)', (n, text) => {
    expect(R.containsRational(R.addError(polylogHalf(n, PREC), 2e-60), rational(text))).toBe(true);
  });
});
