/**
 * Values of expressions to 50 digits. Check values computed with mpmath 1.3.0 at 60 digits (400 for zeta(1000) - 1).
 */
import { describe, expect, test } from 'vitest';
import { R, Rational } from '../../src/numerics/index.js';
import { loadSeries, parseSeries } from '../../src/series/index.js';

const VALUES: readonly (readonly [expression: string, value: string])[] = [
  ['pi', '3.1415926535897932384626433832795028841971693993751'],
  ['zeta(4)', '1.0823232337111381915160036965411679027747509519187'],
  ['zeta(3)', '1.2020569031595942853997381615114499907649862923405'],
  ['zeta(1000) - 1', '9.3326361850321887899008954472381716961709144637171e-302'],
  ['log(2)', '0.69314718055994530941723212145817656807550013436026'],
  ['log(1000001/1000000)', '0.00000099999950000033333308333353333316666680952368452392'],
  ['sqrt(2)', '1.4142135623730950488016887242096980785696718753769'],
  ['sqrt(10) - 3', '0.16227766016837933199889354443271853371955513932522'],
  ['gamma_euler', '0.57721566490153286060651209008240243104215933593992'],
  ['li4_half', '0.51747906167389938633075816189886294562237747514138'],
  ['365/24 - 11*zeta(3)', '1.9857073985777961939362135567073834349184841175878'],
  ['(zeta(5)*log(3/2) - sqrt(7)/pi)^3', '-0.075007705404517755730880214078905185022580309899539'],
  ['pi^-5', '0.0032677636430533854726282496226525095450824642583164'],
  ['355/113 - pi', '0.00000026676418906242231236893288649633380405195232780734'],
  ['sqrt(log(3) + pi)', '2.0591757919754939975171600298330283668326900246636'],
];

/** Does the enclosure hold the decimal, up to one unit of its last digit, and is it as sharp? */
function agrees(ball: ReturnType<typeof R.sub>, decimal: string): boolean {
  const [mantissa = '', exponent = '0'] = decimal.split('e');
  const places = mantissa.length - mantissa.indexOf('.') - 1;
  const miss = R.abs(R.sub(ball, R.fromRational(Rational.parse(decimal)!, 400), 400));
  return R.compare(miss, R.fromRational(Rational.ofDecimal(1n, Number(exponent) - places), 400), 400) < 0;
}

describe('mpmath', () => {
  test.each(VALUES)('%s', async (expression, value) => {
    const series = await parseSeries(JSON.stringify([expression]), { name: 'test' });
    expect(agrees(series.coefficients[0]!.value.ball(200), value)).toBe(true);
  });

  test.each([
    ['adler-nf0', 3, '135.79162363984509152284217344881432691076047171417'],
    ['adler', 3, '49.075700002947985132207696829818687763887075222622'],
    ['pole-msbar-nl3', 2, '116.30007320550392047818979254141382153346731828781'],
    ['pole-msbar-nl4', 2, '94.213776756969465651399296080392783661559528215658'],
    ['pole-msbar-nl5', 2, '73.432861806598098340579126417750921221298423773925'],
  ])('%s, coefficient %i', async (id, n, value) => {
    const series = await loadSeries(id);
    expect(agrees(series.coefficients[n]!.value.ball(200), value)).toBe(true);
  });
});
