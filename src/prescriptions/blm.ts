/**
 * @module The Brodsky–Lepage–Mackenzie scale, with naive non-abelianisation beside it.
 *
 * c_1(n_f)/c_0 = A + B n_f: the part B n_f = −(3/2) B β_0 + 33 B/2 that belongs to the running is absorbed in the scale,
 *   ln(μ*²/μ²) = 3B/(2 p b), b = b_0/β_0,  and A + 33B/2 stays as next-to-leading coefficient.
 * Higher coefficients are re-expanded at that scale. The notes compare the coefficients with their naive non-abelianisation.
 * A second member carries the scale one order further (blm-sequential.ts). Truncation error: the last term at the new scale.
 * Reference: S. J. Brodsky, G. P. Lepage, P. B. Mackenzie, Phys. Rev. D 28 (1983) 228.
 */
import { divExact, exact, isZeroExact, mulExact, R, Rational, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { Expansion, Running } from '../series/index.js';
import { sequentialMember } from './blm-sequential.js';
import { inputObjection, trustOf } from './eligibility.js';
import { betaUnit, nonAbelianised } from './flavour-polynomials.js';
import type { Outcome, Prescription } from './prescription.js';
import { refusal, toDigits } from './prescription.js';
import { atScale, ratioAt, scaleObjection } from './scale-choice.js';
import type { AtScale } from './scale-choice.js';

/** ln(μ*²/μ²); undefined when the series is not known for other numbers of flavours, or c_0 depends on n_f. */
export function blmShift(e: Expansion, running: Running): Exact | undefined {
  const polynomials = running.flavourPolynomials?.();
  const unit = betaUnit(running);
  const slope = polynomials?.[1]?.[1];
  if (polynomials === undefined || unit === undefined || slope === undefined) return undefined;
  if (polynomials[0]!.slice(1).some((c) => !isZeroExact(c))) return undefined;
  const B = divExact(slope, e.coefficients[0]!);
  return divExact(mulExact(exact(Rational.of(3, 2)), B), mulExact(exact(e.power), unit));
}

/** "naive non-abelianisation gives 13.02 (9.278), 102.0 (94.42)": predicted and known, from c_1 on. */
function comparison(e: Expansion, running: Running): string[] {
  const polynomials = running.flavourPolynomials?.()?.slice(0, e.coefficients.length);
  if (polynomials === undefined || running.flavours === undefined) return [];
  const guessed = nonAbelianised(polynomials, running.flavours);
  const pairs = guessed
    .slice(1)
    .map((c, i) => `${toNumberExact(c).toPrecision(4)} (${toNumberExact(e.coefficients[i + 1]!).toPrecision(4)})`);
  return pairs.length === 0 ? [] : [`naive non-abelianisation of c₁, c₂, … (known): ${pairs.join(', ')}`];
}

export const blm: Prescription = {
  name: 'blm',
  title: 'Brodsky–Lepage–Mackenzie scale',
  summary: 'the scale that absorbs the n_f term of the next-to-leading coefficient',
  family: 'scale',
  apply(e, growth, request): readonly Outcome[] {
    const N = e.coefficients.length;
    const variant = `scale of the n_f term, ${N} terms`;
    const no = scaleObjection(e, variant, 2) ?? inputObjection(e, growth, variant, 2);
    if (no !== undefined) return [no];
    const running = e.running!;
    const shift = blmShift(e, running);
    if (shift === undefined)
      return [
        refusal(
          variant,
          'the n_f dependence of the coefficients is not known',
          'write the coefficients with nf in the series file',
        ),
      ];
    const found = toDigits(
      request.digits,
      (prec): AtScale | undefined => atScale(e, running, shift, prec),
      (v) => v?.value ?? R.ZERO,
    );
    const ratio = ratioAt(running, shift);
    if (found === undefined)
      return [
        refusal(
          variant,
          `the scale μ/Q = ${ratio.toPrecision(3)} lies below the Landau pole`,
          'use fac, or another scale',
        ),
      ];
    const further = sequentialMember(e, running, request);
    if (request.only !== undefined && request.only !== variant)
      return [further ?? refusal(request.only, 'not a member of the family', 'choose another')];
    const truncation =
      request.only === undefined ? Math.abs(R.toNumber(R.sub(found.value, found.shorter, 160))) : undefined;
    return [
      {
        kind: 'sum',
        variant,
        value: found.value,
        ...(truncation === undefined ? {} : { truncation }),
        termsUsed: N,
        trust: trustOf(found.value, truncation),
        notes: [
          `μ/Q = ${ratio.toPrecision(6)}`,
          `next-to-leading coefficient there: ${toNumberExact(found.coefficients[1]!).toPrecision(5)}`,
          ...comparison(e, running),
        ],
        central: true,
      },
      ...(further === undefined || request.central === true || request.only !== undefined ? [] : [further]),
    ];
  },
};
