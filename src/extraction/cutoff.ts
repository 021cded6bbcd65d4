/**
 * @module A series without the infrared region that a condensate with a factorisation scale μ_f holds.
 *
 * Method     the leading form N (1 − t/t*)^(−γ) [1 + c_1 (1 − t/t*) + …] of the singularity of dimension d has the series
 *            Σ N t*^(−n) Σ_k c_k (γ − k)_n x^(n+p). Taken with (μ_f/Q)^d in x(μ_f), it is what momenta below μ_f contribute to
 *            the factorial growth; re-expanded in x(μ) it is subtracted term by term, and the singularity is gone. The condensate
 *            added to what is left is the one with the cut-off μ_f: its perturbative part has moved into it.
 * Bound      coefficients to 1e-14 of the larger of the two that are subtracted.
 * Refused    without a stated strength N (nothing fixes how much is subtracted), without running, on a circle.
 * Reference  the subtraction of the leading renormalon at a scale of its own: A. Pineda, hep-ph/0105008, for masses;
 *            M. A. Benitez-Rathgeb, D. Boito, A. H. Hoang, M. Jamin, arXiv:2202.10957, for the gluon condensate (abstracts read).
 */
import { Rational, exact, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import { betaCoefficients, changeScale, isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Coefficient, Series, StatedSingularity } from '../series/index.js';
import { couplingScheme, expand, knownLoops } from '../studies/index.js';

const fromDouble = (x: number): Exact => exact(Rational.fromNumber(x));

/** (a)_n = a (a+1) … (a+n−1). */
const rising = (a: number, n: number): number => Array.from({ length: n }, (_, k) => a + k).reduce((p, x) => p * x, 1);

/** Coefficients of the singular form, per unit strength. */
export function singularCoefficients(s: StatedSingularity, count: number): readonly number[] {
  const t = toNumberExact(s.t);
  const gamma = s.exponent === undefined ? NaN : toNumberExact(s.exponent);
  const c = [1, ...s.corrections.map(toNumberExact)];
  return Array.from(
    { length: count },
    (_, n) => t ** -n * c.reduce((sum, ck, k) => sum + ck * rising(gamma - k, n), 0),
  );
}

/** The singularity that belongs to the operator, with all that the subtraction needs. */
function singularityOf(series: Series, dimension: number): StatedSingularity | Refusal {
  const { expansion } = expand(series, exact(1));
  const found = expansion.stated.find(
    (s) => s.dimension !== undefined && toNumberExact(s.dimension) === dimension && toNumberExact(s.t) > 0,
  );
  const what = `the singularity of dimension ${dimension} of ${series.id}`;
  if (found?.exponent === undefined) {
    return refuse(
      `${what} is not stated with an exponent: a factorisation scale needs to know what lies below it`,
      'state it in the series file (singularities)',
    );
  }
  if (found.strength === undefined) {
    return refuse(
      `${what} has no strength: nothing fixes how much lies below the factorisation scale`,
      'write "strength:" beside it in the series file, or use a value that belongs to the principal value: --condensate-by pv',
    );
  }
  return found;
}

/** The series with what lies below μ_f taken out. @param Q hard scale in GeV. */
export function cutSeries(series: Series, dimension: number, mu: number, Q: number): Series | Refusal {
  if (series.contour !== undefined)
    return refuse(
      'a factorisation scale is not made for contour quantities',
      'use the prescription condensate-subtracted',
    );
  const scheme = couplingScheme(series);
  if (isRefusal(scheme)) return scheme;
  if (series.flavours === undefined || (scheme.kind !== 'MSbar' && scheme.kind !== 'toy'))
    return refuse(`${series.id} does not say how its coupling runs`, 'write scheme: and flavours: into its file');
  const s = singularityOf(series, dimension);
  if (isRefusal(s)) return s;
  const beta = betaCoefficients(series.flavours, series.coupling.divisor).slice(0, knownLoops(scheme));
  const { leadingZeros } = expand(series, exact(1));
  const count = series.coefficients.length - leadingZeros;
  const strength = s.strength === undefined ? NaN : toNumberExact(s.strength);
  const below = singularCoefficients(s, count).map((c) => fromDouble(c * strength * (mu / Q) ** dimension));
  const ratio = series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio);
  const log = fromDouble(2 * Math.log((Q * ratio) / mu));
  const taken = changeScale({ coefficients: below, firstPower: series.firstPower + leadingZeros }, beta, log);
  const coefficients = series.coefficients.map((c, n): Coefficient => {
    const out = n < leadingZeros ? 0 : toNumberExact(taken[n - leadingZeros] ?? exact(0));
    const value = toNumberExact(c.value) - out;
    const { significantDigits: _digits, ...rest } = c;
    return { ...rest, value: fromDouble(value), text: String(value) };
  });
  return {
    ...series,
    title: `${series.title}, without momenta below ${mu} GeV`,
    coefficients,
    singularities: series.singularities.filter(
      (one) => (one.dimension?.toNumber() ?? 2 * (one.u === undefined ? 0 : toNumberExact(one.u))) !== dimension,
    ),
    // The operator's own singularity would come back with its condensate.
    condensates: series.condensates.filter((c) => c.dimension.toNumber() !== dimension),
  };
}
