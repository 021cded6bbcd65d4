/**
 * ALPHA collaboration: arXiv:1706.03821; Eur. Phys. J. C82 (2022) 12; arXiv:1611.05750, 1701.03075 (abstracts read):
 * α_s(M_Z) from Λ_MSbar with three flavours by four- and five-loop running and decoupling at the charm and bottom masses.
 */
import { describe, expect, it } from 'vitest';
import { alphaOfLambda, evolvePath, isRefusal } from '../../src/qcd/index.js';

const thresholds = [
  { name: 'c', flavours: 4, mass: 1.275 },
  { name: 'b', flavours: 5, mass: 4.18 },
];

function alphaMZ(lambdaMeV: number, loops: number): number {
  const alpha = alphaOfLambda(lambdaMeV / 1000, 1.275, { flavours: 3, loops });
  if (typeof alpha !== 'number') throw new Error(alpha.reason);
  const path = evolvePath({
    alpha,
    from: { scale: 1.275, flavours: 3 },
    to: { scale: 91.1876, flavours: 5 },
    options: { loops, thresholds },
  });
  if (isRefusal(path)) throw new Error(path.reason);
  return path.alpha;
}

describe('ALPHA collaboration', () => {
  // Λ(3) in MeV → α_s(M_Z), published; own value by four- and five-loop running (mpmath 1.3.0).
  it.each([
    [341, 0.11852, 0.118469, 0.118529],
    [336, 0.11823, 0.118136, 0.118193],
    [332, 0.1179, 0.117867, 0.117923],
  ])('Λ(3) = %i MeV', (lambda, published, four, five) => {
    expect(Math.abs(alphaMZ(lambda, 5) - published)).toBeLessThan(5e-5);
    expect(Math.abs(alphaMZ(lambda, 4) - four)).toBeLessThan(1e-6);
    expect(Math.abs(alphaMZ(lambda, 5) - five)).toBeLessThan(1e-6);
  });
});
