/**
 * Chetyrkin et al. arXiv:0907.2110 (abstract read; m_c(m_c), m_b(M_Z), m_b(161.8 GeV) recalled), with α_s(M_Z) = 0.1189:
 * m_c(3 GeV) = 0.986 → m_c(m_c) = 1.279; m_b(10 GeV) = 3.610 → m_b(m_b) = 4.163, m_b(M_Z) = 2.835, m_b(161.8) = 2.703 GeV.
 * HPQCD with Karlsruhe arXiv:0805.2999 (abstract read): α_s(4)(3 GeV) = 0.251 → α_s(M_Z) = 0.1174.
 */
import { describe, expect, it } from 'vitest';
import { evolveMass, evolvePath, isRefusal, massAtItself, type Refusal } from '../../src/qcd/index.js';

const thresholds = [
  { name: 'c', flavours: 4, mass: 1.275 },
  { name: 'b', flavours: 5, mass: 4.18 },
];
function granted<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(x.reason);
  return x;
}
const alphaAt = (scale: number, flavours: number, loops: number): number =>
  granted(
    evolvePath({
      alpha: 0.1189,
      from: { scale: 91.1876, flavours: 5 },
      to: { scale, flavours },
      options: { loops, thresholds },
    }),
  ).alpha;

describe('arXiv:0907.2110', () => {
  it('charm', () => {
    const own = granted(massAtItself({ mass: 0.986, alpha: alphaAt(3, 4, 4), from: 3, flavours: 4, loops: 4 }));
    expect(Math.abs(own.mass - 1.279)).toBeLessThan(1e-3);
  });

  it.each([4, 5])('bottom at %i loops', (loops) => {
    const question = { mass: 3.61, alpha: alphaAt(10, 5, loops), from: 10, flavours: 5, loops };
    expect(Math.abs(granted(massAtItself(question)).mass - 4.163)).toBeLessThan(5e-4);
    expect(Math.abs(granted(evolveMass({ ...question, to: 91.1876 })).mass - 2.835)).toBeLessThan(5e-4);
    expect(Math.abs(granted(evolveMass({ ...question, to: 161.8 })).mass - 2.703)).toBeLessThan(1.1e-3);
  });
});

describe('arXiv:0805.2999', () => {
  it('α_s(3 GeV) = 0.251', () => {
    const path = granted(
      evolvePath({
        alpha: 0.251,
        from: { scale: 3, flavours: 4 },
        to: { scale: 91.1876, flavours: 5 },
        options: { loops: 4, thresholds },
      }),
    );
    expect(Math.abs(path.alpha - 0.1174)).toBeLessThan(1.5e-4);
  });
});
