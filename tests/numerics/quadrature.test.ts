/** Quadrature: rules against exact moments, certified integrals against closed forms and against each other, estimates that hold. */
import { describe, expect, it } from 'vitest';
import {
  atan,
  awayFromCut,
  C,
  cexp,
  clog,
  csqrt,
  expRay,
  gaussPanels,
  integrateAnalytic,
  legendreRule,
  log,
  pi,
  R,
  Rational,
  rayPoints,
  scaledE1,
  tanhSinh,
} from '../../src/numerics/index.js';
import type { Complex } from '../../src/numerics/index.js';

const P = 160;
const n = C.fromNumbers;
const inverse = (z: Complex, p: number): Complex => C.inv(C.add(C.ONE, z, p), p);

describe('Gauss–Legendre rules', () => {
  it.each([1, 2, 5, 16, 33])('%i points integrate x^k exactly below degree 2n, and not x^2n', (count) => {
    const { nodes, weights, middle } = legendreRule(count, P);
    for (let k = 0; k <= 2 * count; k += 2) {
      let sum = k === 0 && middle !== undefined ? middle : R.ZERO;
      nodes.forEach((x, i) => (sum = R.add(sum, R.mul2exp(R.mul(weights[i]!, R.powInt(x, k, P + 20), P), 1), P)));
      expect(R.containsRational(sum, Rational.of(2n, BigInt(k + 1))), `degree ${k}`).toBe(k < 2 * count);
    }
  });

  it('nodes and weights carry the bits asked for', () => {
    for (const prec of [53, 400]) {
      const { nodes, weights } = legendreRule(40, prec);
      for (const x of [...nodes, ...weights]) expect(R.accuracyBits(x)).toBeGreaterThan(prec);
    }
    expect(() => legendreRule(0, P)).toThrow(RangeError);
  });
});

describe('certified integrals', () => {
  it('∫ 1/(1+x²) from 0 to 10 is artan 10, although poles are near', () => {
    const { value, standing } = integrateAnalytic(
      (z, p) => C.inv(C.add(C.ONE, C.sqr(z, p), p), p),
      n(0, 0),
      n(10, 0),
      P,
    );
    expect(standing).toBe('certified');
    expect(R.overlaps(value.re, atan(R.fromNumber(10), P))).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(P - 4);
  });

  it('∫ e^−z along a slanted segment', () => {
    const end = n(30, -20);
    const { value } = integrateAnalytic((z, p) => cexp(C.neg(z), p), C.ZERO, end, P);
    expect(C.overlaps(value, C.sub(C.ONE, cexp(C.neg(end), P), P))).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(P - 4);
  });

  it('a singularity on the path is not overlooked', () => {
    const { value } = integrateAnalytic((z, p) => C.inv(z, p), n(-1, 0), n(1, 0), 60, { mostPieces: 40 });
    expect(value.re.rad).toBe(Infinity);
  });

  it('cuts next to the path: ∫ √(x² + ε²) from −1 to 1 with ε = 2^−10', () => {
    const square = n(2 ** -20, 0);
    const f = (z: Complex, p: number): Complex => csqrt(awayFromCut(C.add(C.sqr(z, p), square, p)), p);
    const { value } = integrateAnalytic(f, n(-1, 0), n(1, 0), 60);
    // √(1+ε²) + ε² arsinh(1/ε)
    const root = R.sqrt(R.add(R.ONE, square.re, P), P);
    const arsinh = log(R.mul2exp(R.add(R.ONE, root, P), 10), P);
    expect(R.overlaps(value.re, R.add(root, R.mul(square.re, arsinh, P), P))).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(55);
  });
});

describe('estimated integrals: the estimate holds', () => {
  it('panels on a rotated ray: ∫ e^−z/(1+z) is e E₁(1)', () => {
    const f = (z: Complex, p: number): Complex => C.mul(cexp(C.neg(z), p), inverse(z, p), p);
    const { value, standing } = gaussPanels(f, rayPoints(n(1, 1), 0.5, 200, 2, P), 24, P);
    expect(standing).toBe('converged');
    expect(R.overlaps(value.re, scaledE1(C.ONE, P).re)).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(90);
  });

  it('double exponential on a ray', () => {
    const f = (z: Complex, p: number): Complex => C.mul(cexp(C.neg(z), p), inverse(z, p), p);
    const { value } = expRay(f, n(1, 0.25), P);
    expect(C.overlaps(value, scaledE1(C.ONE, P))).toBe(true);
    expect(C.accuracyBits(value)).toBeGreaterThan(P - 4);
  });

  it('double exponential with singular ends: ∫ log = −1, ∫ 1/√(x(1−x)) = π', () => {
    const logarithm = tanhSinh((_z, p, left) => clog(left, p), C.ZERO, C.ONE, P).value;
    expect(R.overlaps(logarithm.re, R.neg(R.ONE))).toBe(true);
    const root = tanhSinh((_z, p, left, right) => C.inv(csqrt(C.mul(left, right, p), p), p), C.ZERO, C.ONE, P);
    expect(R.overlaps(root.value.re, pi(P))).toBe(true);
    expect(C.accuracyBits(root.value)).toBeGreaterThan(P - 4);
    expect(root.evaluations).toBeLessThan(600);
  });

  it('an integrand without a value gives none', () => {
    expect(tanhSinh(() => C.INDETERMINATE, C.ZERO, C.ONE, P).value).toBe(C.INDETERMINATE);
  });
});
