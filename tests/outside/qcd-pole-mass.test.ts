/**
 * Marquard, Smirnov, Smirnov, Steinhauser arXiv:1502.01030 (numbers recalled): top and bottom pole masses term by term,
 * with the four-loop coefficient of 2015; the coefficient of arXiv:1606.06754 raises the last term by one per cent.
 * Beneke, Marquard, Nason, Steinhauser arXiv:1605.03609 (recalled): terms for m_t(m_t) = 163.508 GeV.
 */
import { describe, expect, it } from 'vitest';
import { isRefusal, msbarMass, poleMass, type Refusal } from '../../src/qcd/index.js';

function granted<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}

describe('pole masses', () => {
  it.each([
    ['top', 163.643, 0.1088, 5, [7.557, 1.617, 0.501], 0.195],
    ['bottom', 4.163, 0.2268, 4, [0.401, 0.201, 0.148], 0.138],
  ])('%s', (_quark, mass, alpha, light, published, last) => {
    const own = granted(poleMass({ mass, alpha, light }));
    published.forEach((term, k) => expect(Math.abs((own.terms[k + 1] ?? NaN) - term)).toBeLessThan(1e-3));
    // 827.37 and 1224.0 in 2015, 839.14 and 1235.7 in 2016.
    const ratio = light === 5 ? 839.138 / 827.37 : 1235.659 / 1224;
    expect(Math.abs((own.terms[4] ?? NaN) / ratio - last)).toBeLessThan(1e-3);
    expect(own.coefficientError).toBeGreaterThan(0);
    expect(own.coefficientError).toBeLessThan(0.01 * own.value);
  });

  it('arXiv:1605.03609, in the coupling of six flavours', () => {
    const own = granted(poleMass({ mass: 163.508, alpha: 0.108531, light: 5 }));
    [7.5315, 1.6073, 0.495, 0.1947].forEach((term, k) =>
      expect(Math.abs((own.terms[k + 1] ?? NaN) - term)).toBeLessThan(2e-3),
    );
  });

  // PDG 2018 quark-mass review (recalled): m_b(m_b) = 4.18 → 4.78(6) GeV at two loops, α_s(m_b) = 0.224996.
  it('PDG two-loop bottom pole mass', () => {
    const own = granted(poleMass({ mass: 4.18, alpha: 0.224996, light: 4, loops: 2 }));
    expect(own.value).toBeCloseTo(4.778, 3);
    expect(own.coefficientError).toBe(0);
  });

  it('the inverse is exact at every order', () => {
    for (const loops of [1, 2, 3, 4]) {
      const m = granted(msbarMass({ pole: 172.1, alpha: 0.1085, scale: 163, light: 5, loops }));
      const back = granted(poleMass({ mass: m.mass, alpha: m.alpha, light: 5, loops }));
      expect(Math.abs(back.value / 172.1 - 1)).toBeLessThan(1e-14);
    }
  });

  it('refuses what it does not know', () => {
    expect(isRefusal(poleMass({ mass: 163, alpha: 0.1, light: 5, loops: 5 }))).toBe(true);
    expect(isRefusal(poleMass({ mass: -163, alpha: 0.1, light: 5 }))).toBe(true);
    expect(isRefusal(poleMass({ mass: 163, alpha: 0, light: 5 }))).toBe(true);
    expect(isRefusal(poleMass({ mass: 163, alpha: 0.1, light: 16 }))).toBe(true);
    expect(isRefusal(msbarMass({ pole: 0.5, alpha: 0.5, scale: 1, light: 3 }))).toBe(true);
  });
});
