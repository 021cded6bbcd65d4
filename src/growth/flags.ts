/** @module The flags: what a reader must know beside the verdict, in words with numbers. */
import type { GrowthFlag, GrowthInput, RatioRow } from './growth.js';
import type { Located } from './locate.js';
import { settling } from './classify-short.js';
import type { Classified } from './verdict-rule.js';
import { noiseFlags, usableOf } from './noise-flags.js';
import type { Prepared } from './prepare.js';
import { plural, plusMinus, short } from './words.js';

/** Ratio test moving by more than this at the last order: pre-asymptotic. */
const MOVING = 0.1;
/** D_n and λ_n differing by more than this: pre-asymptotic. */
const APART = 0.25;

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
        `${plural(p.estimated.length, 'coefficient')} only estimated: left out of the growth diagnosis` +
        (k === undefined ? '' : ` (with ${p.estimated.length === 1 ? 'it' : 'them'} the Bayes factor is ${short(k)})`),
    });
  }
  return flags;
}

/** The ratio test still moves, and not because of the errors of the coefficients. */
function preAsymptotic(p: Prepared, rows: readonly RatioRow[]): GrowthFlag[] {
  const last = rows.at(-1);
  const moved = settling(rows);
  if (last?.linear === undefined || moved === undefined) return [];
  const apart = Math.abs(1 - last.ratio / last.linear);
  const noisy = p.noise !== undefined || p.nonZero.slice(-3).some((x) => x.n * x.quoted > MOVING);
  if (noisy || (moved < MOVING && apart < APART)) return [];
  const [a, b] = [moved, apart].map((v) => short(100 * v, 2));
  const text = `the ratio test has not settled: its last linear extrapolant moved by ${a} % and differs from the last ratio by ${b} %`;
  return [{ code: 'pre-asymptotic', text }];
}

function verdictFlags(
  p: Prepared,
  c: Classified,
  located: Located | undefined,
  rows: readonly RatioRow[],
): GrowthFlag[] {
  const order = c.order === undefined ? '' : ` (fitted power of n!: ${plusMinus(c.order)})`;
  switch (c.verdict) {
    case 'geometric':
      return [
        { code: 'geometric', text: `geometric growth: the series converges, its Borel transform is entire${order}` },
      ];
    case 'convergent':
      return [
        {
          code: 'convergent',
          text: `the coefficients fall faster than geometrically: infinite radius of convergence${order}`,
        },
      ];
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
    case 'factorial':
      return located?.quasiPeriodic === true ? [] : preAsymptotic(p, rows);
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
  opposite: string | undefined,
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
  if (located === undefined && opposite !== undefined) {
    flags.push({
      code: 'competing-singularities',
      text: `${opposite}: no single singularity dominates at these orders`,
    });
  }
  if (located?.competing === true) {
    flags.push({
      code: 'competing-singularities',
      text: located.competition[0] ?? 'two singularities at similar distance',
    });
  }
  return flags;
}
