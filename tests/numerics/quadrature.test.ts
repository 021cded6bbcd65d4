/** Quadrature: rules against exact moments, certified integrals against closed forms and against each other, estimates that hold. */
import { describe, expect, it } from 'vitest';
import {
  atan,
  awayFromCut,
  branchCut,
  C,
  cexp,
  clog,
  cpow,
  csqrt,
  expRay,
  gauss,
  gaussPanels,
  integrateAnalytic,
  kummerU,
  legendreRule,
  log,
  pi,
  R,
  Rational,
  rayPoints,
  scaledE1,
  tanhSinh,
  upperGammaComplex,
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

describe('certificates across a cut are refused', () => {
  /** ∫ log and ∫ √ along a path that crosses (−∞, 0] at −1, from the primitives on both sides. */
  const [from, to] = [n(-1, -1), n(-1, 1)];
  const above = n(-1, 0);
  const cases = {
    log: {
      f: clog,
      // z log z − z
      primitive: (z: Complex): Complex => C.sub(C.mul(z, clog(z, P), P), z, P),
    },
    sqrt: {
      f: csqrt,
      // (2/3) z √z
      primitive: (z: Complex): Complex =>
        C.mulReal(C.mul(z, csqrt(z, P), P), R.fromRational(Rational.of(2n, 3n), P), P),
    },
    power: {
      f: (z: Complex, p: number): Complex => cpow(z, n(-0.5, 0), p),
      // 2 √z
      primitive: (z: Complex): Complex => C.mul2exp(csqrt(z, P), 1),
    },
  };

  it.each(Object.entries(cases))('%s', (_name, { f, primitive }) => {
    // the value at −1 from below is the conjugate of the one from above
    const truth = C.add(
      C.sub(C.conj(primitive(above)), primitive(from), P),
      C.sub(primitive(to), primitive(above), P),
      P,
    );
    const { value } = integrateAnalytic(f, from, to, 60, { mostPieces: 60 });
    expect(C.overlaps(value, truth)).toBe(true);
    expect(C.accuracyBits(value)).toBeLessThan(20);
    // a path beside the cut keeps its certificate, without help from the caller
    const beside = integrateAnalytic(f, n(-1, 0.01), to, 60).value;
    expect(C.overlaps(beside, C.sub(primitive(to), primitive(n(-1, 0.01)), P))).toBe(true);
    expect(C.accuracyBits(beside)).toBeGreaterThan(54);
  });

  it('a cut on which the path ends, and one that it only touches, are met by no rectangle in use', () => {
    // ∫ √z from 0 to 1 = 2/3: the branch point is enclosed as it stands
    const { value } = integrateAnalytic(csqrt, C.ZERO, C.ONE, 60, { mostPieces: 60 });
    expect(R.containsRational(value.re, Rational.of(2n, 3n))).toBe(true);
    // constants on the cut are constants
    const constant = integrateAnalytic((_z, p) => clog(n(-2, 0), p), C.ZERO, C.ONE, 60).value;
    expect(C.overlaps(constant, clog(n(-2, 0), P))).toBe(true);
    expect(C.accuracyBits(constant)).toBeGreaterThan(55);
  });

  it('the other functions with a cut have no value on a rectangle across it', () => {
    const across: Complex = { re: R.ball(-3n, 0, 0.25), im: R.ball(0n, 0, 0.25) };
    const [third, other] = [Rational.of(1n, 3n), Rational.of(2n, 5n)];
    for (const y of [
      scaledE1(across, 60),
      branchCut(third, across, 60),
      upperGammaComplex(third, across, 60),
      kummerU(third, other, across, 60),
      gauss(third, third, other, C.neg(across), 60),
    ])
      expect(C.upperBits(y)).toBe(Infinity);
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
