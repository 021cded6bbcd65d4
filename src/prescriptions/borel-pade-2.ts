/**
 * @module Borel–Padé of order 2, for series that grow like (2n)!.
 *
 *   B(s) = Σ c_n s^n/(2n)!,   F(x) = ∫_0^∞ dσ e^{−σ} B(x σ²).
 * Each pole z of the approximant splits: 1/(1 − xσ²/z) = ½ [1/(1 − σ/ρ) + 1/(1 + σ/ρ)], ρ = √(z/x); each half is an
 * order-1 pole, summed by the same closed form. A pole z > 0 puts ρ on the contour: principal value and imaginary part.
 * Reference: the substitution is elementary; J. Zinn-Justin's order-k Borel transforms (memory).
 */
import { C, csqrt, R, Rational } from '../numerics/index.js';
import type { Ball, Complex } from '../numerics/index.js';
import type { LaplaceSum, PolePart } from '../borel/index.js';
import { approximateTransformed, borelTransformOrder2, laplace, nearDiagonal } from '../borel/index.js';
import type { Expansion } from '../series/index.js';
import { climb, placeOf } from './climb.js';
import { combineErrors, countBefore, withTrust } from './neighbours.js';
import type { Outcome, Prescription, Sum } from './prescription.js';
import { dressed, refusal, scaled, toDigits } from './prescription.js';

/** Most coefficients used at ordinary digits. Heuristic: cost. */
const MOST = 80;

/** The two order-1 poles of one simple pole of the order-2 approximant, in the variable σ. */
function split(z: Complex, real: boolean, amplitude: Complex, x: Ball, prec: number): PolePart[] {
  const half = C.mulReal(amplitude, R.mul2exp(R.ONE, -1), prec);
  const scaledZ = C.mulReal(z, R.div(R.ONE, x, prec), prec);
  if (real && R.isNegative(scaledZ.re)) {
    // ρ = ±i√|z|: a conjugate pair, listed by its upper member.
    return [{ z: { re: R.ZERO, im: R.sqrt(R.neg(scaledZ.re), prec) }, real: false, amplitudes: [half] }];
  }
  if (real) {
    const root = R.sqrt(scaledZ.re, prec);
    return [
      { z: C.fromReal(root), real: true, amplitudes: [half] },
      { z: C.fromReal(R.neg(root)), real: true, amplitudes: [half] },
    ];
  }
  const root = csqrt(scaledZ, prec);
  // z and its conjugate give ±ρ and ±ρ̄; the upper members of those pairs are ρ and −ρ̄.
  return [
    { z: root, real: false, amplitudes: [half] },
    { z: C.neg(C.conj(root)), real: false, amplitudes: [C.conj(half)] },
  ];
}

function sumAt(e: Expansion, L: number, M: number, digits: number): LaplaceSum | string {
  let failure: string | undefined;
  const transformed = borelTransformOrder2(e.coefficients);
  const result = toDigits(
    digits,
    (prec): LaplaceSum | undefined => {
      const a = approximateTransformed(transformed, L, M, prec, Math.max(0, ...e.relativeErrors));
      if (a.exists !== true) {
        failure = a.reason ?? 'the entry does not exist';
        return undefined;
      }
      if (a.poles.some((p) => p.multiplicity > 1)) {
        failure = 'a multiple pole of the order-2 transform';
        return undefined;
      }
      const x = e.x.ball(prec);
      const poles = a.poles
        .filter((p) => p.role !== 'noise doublet')
        .flatMap((p) => split(p.z, p.real, p.amplitudes[0]!, x, prec));
      // ∫ e^{−σ} σ^{2k} dσ = (2k)!: the polynomial part in σ² at x.
      const polynomial: Ball[] = [];
      let power: Ball = R.ONE;
      a.polynomialPart.forEach((c, k) => {
        if (k > 0) power = R.mul(power, x, prec);
        polynomial[2 * k] = R.mul(c, power, prec);
        if (k > 0) polynomial[2 * k - 1] = R.ZERO;
      });
      return laplace(polynomial, poles, R.ONE, Rational.ZERO, prec);
    },
    (r) => r?.pv ?? R.ZERO,
  );
  if (result === undefined) return failure ?? 'the entry does not exist';
  return result.pv.rad < Infinity ? result : 'the closed-form sum could not be enclosed';
}

export const borelPade2: Prescription = {
  name: 'borel-pade-2',
  title: 'Borel–Padé of order 2',
  summary: 'rational approximants of Σ c_n s^n/(2n)!, for series that grow like (2n)!',
  family: 'borel',
  apply(e, growth, request): readonly Outcome[] {
    if (growth.verdict !== 'superfactorial' || growth.order !== 2)
      return [refusal('near-diagonal', 'the growth is not (2n)!', 'the order-1 transform is the right one')];
    const usable = Math.min(e.coefficients.length, growth.usableCoefficients ?? MOST, MOST);
    if (usable < 3) return [refusal('near-diagonal', 'fewer than three usable coefficients', 'give more coefficients')];
    if (request.only !== undefined) {
      const place = placeOf(request.only);
      const s = place === undefined ? 'not an entry of the table' : sumAt(e, place[0], place[1], request.digits);
      return [
        typeof s === 'string'
          ? refusal(request.only, s, 'choose another entry')
          : toSum(e, request.only, s, place![0] + place![1] + 1, request.digits),
      ];
    }
    return climb(usable, request.digits, (count) =>
      tableOf({ ...e, coefficients: e.coefficients.slice(0, count) }, request.digits),
    );
  },
};

function toSum(e: Expansion, variant: string, s: LaplaceSum, termsUsed: number, digits: number): Sum {
  const prec = Math.max(128, digits * 4 + 64);
  return {
    kind: 'sum',
    variant,
    value: dressed(e, s.pv, prec),
    imaginary: scaled(e, s.im, prec),
    termsUsed,
    trust: 'indicative',
    notes: [],
  };
}

function tableOf(e: Expansion, digits: number): Outcome[] {
  const count = e.coefficients.length;
  const entries = nearDiagonal(count - 1, 1).map(([L, M]) => ({ label: `[${L}/${M}]`, s: sumAt(e, L, M, digits) }));
  const before = nearDiagonal(countBefore(e.coefficients) - 1, 1)
    .map(([L, M]) => sumAt(e, L, M, digits))
    .find((s): s is LaplaceSum => typeof s !== 'string');
  const errors = combineErrors(
    e,
    entries.map(({ s }) => (typeof s === 'string' ? undefined : s.pv)),
    before?.pv,
  );
  return entries.map(({ label, s }, i): Outcome =>
    typeof s === 'string'
      ? refusal(label, s, 'read the neighbouring entries')
      : withTrust({ ...toSum(e, label, s, count, digits), ...errors(i) }),
  );
}
