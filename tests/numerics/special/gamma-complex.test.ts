/** Γ in the complex plane. Check values computed with mpmath 1.2.1; identities DLMF 5.5.1, 5.5.3, 5.5.5. */
import { describe, expect, it } from 'vitest';
import { C, R, Rational } from '../../../src/numerics/index.js';
import type { Complex } from '../../../src/numerics/index.js';
import { gammaComplex, rgammaComplex } from '../../../src/numerics/special/gamma-complex.js';
import { expectNear, rational } from '../../support/check-value.js';

const at = (re: string, im: string, prec = 160): Complex => ({
  re: R.fromRational(rational(re), prec),
  im: R.fromRational(rational(im), prec),
});

describe('gammaComplex', () => {
  it('has known values', () => {
    const known: [string, string, string, string][] = [
      ['0.3', '1.7', '0.071091832537680394592556012814173229197', '-0.13937742326232288422426115546574742855'],
      ['-4.6', '0.2', '-0.043556224732625769109913620363392727643', '-0.0064585638821683956121968581220555019007'],
      ['11.25', '-8', '294847.1151094722695879098999369131479', '-298717.11479149755827830913548834126293'],
      ['-0.5', '-30', '6.6851378413986551140020532559264714631e-23', '-2.7800740025020883011725699488230512163e-22'],
      ['50', '3', '3.6300251223685426001556877112771026854e+62', '-4.2042792065390729799221220694506224618e+62'],
    ];
    for (const [re, im, gr, gi] of known) {
      const g = gammaComplex(at(re, im), 150);
      const size = Math.hypot(Number(gr), Number(gi));
      expectNear(g.re, gr, 1e-35 * size);
      expectNear(g.im, gi, 1e-35 * size);
    }
  });
  it('obeys recurrence, reflection and duplication', () => {
    for (const [re, im] of [
      ['0.3', '1.7'],
      ['-4.6', '0.2'],
      ['11.25', '-8'],
      ['-0.5', '-30'],
      ['2', '1e-20'],
    ] as const) {
      const prec = 200;
      const z = at(re, im, prec);
      const g = gammaComplex(z, prec);
      const next = gammaComplex(C.add(z, C.ONE, prec), prec);
      expect(C.overlaps(next, C.mul(z, g, prec)), `Γ(z+1) at ${re}, ${im}`).toBe(true);
      expect(C.overlaps(C.mul(g, rgammaComplex(z, prec), prec), C.ONE)).toBe(true);
      const half = C.add(z, at('1/2', '0', prec), prec);
      const left = C.mul(g, gammaComplex(half, prec), prec);
      expect(C.accuracyBits(left)).toBeGreaterThan(150);
      const conjugate = gammaComplex(C.conj(z), prec);
      expect(C.overlaps(conjugate, C.conj(g))).toBe(true);
    }
  });
  it('joins the real function and widens with its argument', () => {
    expectNear(gammaComplex(at('1/2', '0'), 120).re, '1.77245385090551602729816748334114518', 1e-33);
    const wide: Complex = {
      re: R.addError(R.fromRational(Rational.of(3, 2), 100), 1, -20),
      im: R.fromRational(Rational.of(1, 3), 100),
    };
    const g = gammaComplex(wide, 100);
    expect(C.accuracyBits(g)).toBeLessThan(25);
    expect(C.overlaps(g, gammaComplex(C.exactMid(wide), 100))).toBe(true);
  });
  it('has a zero of 1/Γ at a pole', () => {
    expect(C.containsZero(rgammaComplex({ re: R.fromNumber(-3), im: R.addError(R.ZERO, 1, -30) }, 100))).toBe(true);
    expect(gammaComplex({ re: R.fromNumber(-3), im: R.addError(R.ZERO, 1, -30) }, 100).re.rad).toBe(Infinity);
  });
});
