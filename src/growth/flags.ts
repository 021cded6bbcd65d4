/** @module The flags: what a reader must know beside the verdict, in words with numbers. */
import type { GrowthFlag, GrowthInput } from './growth.js';
import type { Located } from './locate.js';
import { settling, type Classified } from './classify.js';
import { usableCoefficients } from './noise.js';
import type { Prepared } from './prepare.js';
import type { RatioRow } from './growth.js';
import { plural, plusMinus, short } from './words.js';

/** Quoted errors that stay within this factor of each other, on most coefficients, come from a number of digits. */
const UNIFORM = 40;
/** … but not all equal: an error in per cent is an error, not a number of digits. */
const EQUAL = 1.01;
const MOST = 0.6;
/** Decimal coefficients with at most this many digits count as rounded, when scatter is seen too. */
const FEW_DIGITS = 8;
/** Ratio test moving by more than this at the last order: pre-asymptotic. */
const MOVING = 0.1;
/** D_n and λ_n differing by more than this: pre-asymptotic. */
const APART = 0.25;

/** Number of leading coefficients that a rational approximant may use; undefined when that is all of them. */
export function usableOf(p: Prepared): number | undefined {
  const known = p.points.filter((x) => x.sign !== 0);
  let errors = known.map((x) => (x.repaired === true ? Infinity : x.quoted));
  if (p.sequence.unknownFrom !== undefined) errors = errors.slice(0, known.filter((x) => x.n < p.sequence.unknownFrom!).length);
  const usable = usableCoefficients(errors);
  return usable < known.length || p.sequence.unknownFrom !== undefined ? usable : undefined;
}

/** Largest number of significant decimal digits among the coefficients; undefined when one is not a decimal number. */
function decimalDigits(input: GrowthInput): number | undefined {
  let most = 0;
  for (const e of input.exact ?? []) {
    const q = e.rational;
    if (q === undefined) return undefined;
    let den = q.den;
    while (den % 10n === 0n) den /= 10n;
    while (den % 2n === 0n) den /= 2n;
    while (den % 5n === 0n) den /= 5n;
    if (den !== 1n) return undefined;
    const digits = (q.num < 0n ? -q.num : q.num) * 5n ** BigInt(Math.max(0, q.den.toString(2).length - 1));
    most = Math.max(most, digits.toString().replace(/0+$/, '').length);
    if (most > FEW_DIGITS) return most;
  }
  return input.exact === undefined ? undefined : most;
}

function noiseFlags(p: Prepared, input: GrowthInput, usable: number | undefined): GrowthFlag[] {
  const flags: GrowthFlag[] = [];
  const advice = usable === undefined ? '' : `; a rational approximant may use the first ${usable}`;
  if (p.noise !== undefined) {
    const digits = decimalDigits(input);
    if (digits !== undefined && digits <= FEW_DIGITS) {
      flags.push({ code: 'few-digits', text: `the coefficients are rounded to ${digits} significant digits${advice}` });
    }
    flags.push({ code: 'noisy', text: `the coefficients scatter by a relative ${short(p.noise, 2)} about a smooth law${advice}` });
    return flags;
  }
  const quoted = p.nonZero.filter((x) => x.repaired !== true && x.quoted > 0).map((x) => x.quoted);
  if (quoted.length === 0) return flags;
  const largest = Math.max(...quoted);
  const spread = largest / Math.min(...quoted);
  const digitLike = quoted.length >= MOST * p.nonZero.length && spread < UNIFORM && spread > EQUAL && largest < 0.01;
  if (digitLike) {
    const digits = Math.max(1, Math.round(-Math.log10(largest)));
    flags.push({ code: 'few-digits', text: `the coefficients are known to about ${digits} significant digits${advice}` });
  } else if (usable !== undefined && p.outliers.length === 0) {
    flags.push({ code: 'noisy', text: `the coefficients have relative errors up to ${short(largest, 2)}${advice}` });
  }
  return flags;
}

function inputFlags(p: Prepared): GrowthFlag[] {
  const flags: GrowthFlag[] = [];
  const { sequence } = p;
  if (sequence.leadingZeros > 0) {
    const k = sequence.leadingZeros;
    flags.push({
      code: 'leading-zeros',
      text: `${plural(k, 'leading zero')}: exponents refer to the series from its first non-zero coefficient on; counted from the first zero they are smaller by ${k}`,
    });
  }
  if (sequence.stride > 1) {
    flags.push({
      code: 'lacunary',
      text: `only every ${sequence.stride === 2 ? 'second' : `${sequence.stride}th`} coefficient is non-zero: ratios are taken over ${sequence.stride} orders`,
    });
  }
  if (sequence.unknownFrom !== undefined) {
    flags.push({
      code: 'errors-exceed-values',
      text: `the quoted errors exceed the coefficients from n = ${sequence.unknownFrom} on: no statement about growth beyond n = ${sequence.unknownFrom - sequence.stride}`,
    });
  }
  for (const o of p.outliers) {
    const n = o.k * sequence.stride;
    flags.push({
      code: 'outlier',
      text:
        o.what === 'sign'
          ? `outlier at n = ${n}: its sign alone breaks the pattern`
          : `outlier at n = ${n}: its size is off the law of its neighbours by a factor ${short(Math.exp(o.offset))}`,
    });
  }
  if (p.estimated.length > 0) {
    const k = p.comparisonAll?.bayesFactor;
    flags.push({
      code: 'estimated-input',
      text:
        `${plural(p.estimated.length, 'coefficient')} only estimated: left out of the verdict` +
        (k === undefined ? '' : ` (with ${p.estimated.length === 1 ? 'it' : 'them'} the Bayes factor is ${short(k)})`),
    });
  }
  return flags;
}

function verdictFlags(p: Prepared, c: Classified, located: Located | undefined, rows: readonly RatioRow[]): GrowthFlag[] {
  const order = c.order === undefined ? '' : ` (fitted power of n!: ${plusMinus(c.order)})`;
  switch (c.verdict) {
    case 'geometric':
      return [{ code: 'geometric', text: `geometric growth: the series converges, its Borel transform is entire${order}` }];
    case 'convergent':
      return [{ code: 'convergent', text: `the coefficients fall faster than geometrically: infinite radius of convergence${order}` }];
    case 'subfactorial':
      return [{ code: 'subfactorial', text: `divergent, but slower than n!: the Borel transform is entire${order}` }];
    case 'superfactorial':
      return c.beyond
        ? [
            { code: 'superfactorial', text: 'faster than n!: the order-1 Borel transform diverges everywhere' },
            {
              code: 'faster-than-any-factorial',
              text: 'the fitted order itself grows with n, faster than any (kn)!: the sum need not be unique and no Borel method of finite order applies',
            },
          ]
        : [{ code: 'superfactorial', text: `faster than n!: the order-1 Borel transform diverges everywhere${order}` }];
    case 'factorial': {
      const last = rows[rows.length - 1];
      const s = settling(rows);
      const apart = last?.linear === undefined ? 0 : Math.abs(1 - last.ratio / last.linear);
      if (p.noise !== undefined || located?.quasiPeriodic === true || s === undefined || (s < MOVING && apart < APART)) return [];
      return [
        {
          code: 'pre-asymptotic',
          text: `the ratio test has not settled: its last linear extrapolant moved by ${short(100 * s, 2)} % and differs from the last ratio by ${short(100 * apart, 2)} %`,
        },
      ];
    }
    case 'terminating':
    case 'undecided':
      return [];
  }
}

export function flagsOf(
  p: Prepared,
  c: Classified,
  located: Located | undefined,
  rows: readonly RatioRow[],
  input: GrowthInput,
): GrowthFlag[] {
  const flags = [...inputFlags(p), ...noiseFlags(p, input, usableOf(p)), ...verdictFlags(p, c, located, rows)];
  const s = located?.nearest;
  if (s?.kind === 'complex pair') {
    const text = located?.quasiPeriodic
      ? 'complex-conjugate singularities off the real axis: the signs are quasi-periodic and the plain ratio test does not settle'
      : 'complex-conjugate singularities: nothing on the positive axis at this distance';
    flags.push({ code: 'complex-pair', text });
  }
  if (located?.essential !== undefined) {
    const { kappa, rate } = located.essential;
    flags.push({
      code: 'essential-singularity',
      text: `growth n! e^(${short(rate)} n^${short(kappa)}): no power exponent fits; the singularity is essential`,
    });
  }
  if (located?.competing === true) {
    flags.push({ code: 'competing-singularities', text: located.competition[0] ?? 'two singularities at similar distance' });
  }
  return flags;
}
