/**
 * @module The first ultraviolet singularity beyond large β_0, beside the exponent that the series file gives it: what the
 * four-quark operators make of it where that is known, and what is not known where it is not.
 */
import { toNumberExact } from '../numerics/index.js';
import { currentUltraviolet, fourQuarkShifts } from '../qcd/index.js';
import type { Series } from '../series/index.js';
import type { UltravioletReport } from './assessment-growth.js';
import type { Expanded } from './expand.js';
import { indicative } from './figures.js';
import { couplingScheme, isMSbar } from './scheme.js';

const DIGITS = 4;
const EXPONENT_DIGITS = 6;
/** Order of the pole at u = −1 in the large-β_0 limit, by the chain that the file names. */
const POLE: Readonly<Record<string, 'double' | 'simple' | 'none'>> = {
  adler: 'double',
  'r-ratio': 'simple',
  'tau-width': 'simple',
  'pole-mass': 'simple',
  bjorken: 'simple',
  'gross-llewellyn-smith': 'simple',
  'b-to-u-pole': 'simple',
  'b-to-u-msbar': 'simple',
  'static-potential': 'none',
};
/** Chains whose quantity is a correlator of currents, or a cross section made of one. */
const CURRENTS: Readonly<Record<string, 'correlator' | 'cross section'>> = {
  adler: 'correlator',
  'r-ratio': 'cross section',
  'tau-width': 'cross section',
};
const SAME = 1e-9;

/** Undefined for series of another world, or without a singularity at u = −1. */
export function ultravioletReport(series: Series, { expansion }: Expanded): UltravioletReport | undefined {
  const { flavours, bubbleChain } = series;
  const stated = expansion.stated.find((s) => s.u !== undefined && Math.abs(toNumberExact(s.u) + 1) < SAME);
  if (stated === undefined || flavours === undefined || flavours < 1 || series.coupling.plain) return undefined;
  const scheme = couplingScheme(series);
  if ('reason' in scheme || scheme.kind === 'toy' || !isMSbar(series)) return undefined;
  const kind = bubbleChain === undefined || expansion.power !== 1 ? undefined : CURRENTS[bubbleChain];
  const pole = bubbleChain === undefined ? undefined : POLE[bubbleChain];
  const limit =
    pole === undefined || pole === 'none'
      ? ''
      : `. In the large-beta_0 limit it is a ${pole} pole, exponent ${pole === 'double' ? 2 : 1}`;
  const shared = {
    u: '-1',
    shifts: fourQuarkShifts(flavours).map((x) => indicative(x, DIGITS)),
    ...(stated.exponent === undefined ? {} : { inFile: indicative(toNumberExact(stated.exponent), EXPONENT_DIGITS) }),
    reference: 'hep-ph/9703389',
    standing: 'indicative' as const,
  };
  if (kind === undefined) {
    return {
      ...shared,
      statement: `how the four-quark operators enter this quantity, and whether others do, is not worked out here: beyond large beta_0 its exponent is not known${limit}`,
    };
  }
  const gamma = currentUltraviolet(flavours, kind);
  return {
    ...shared,
    exponent: indicative(gamma, EXPONENT_DIGITS),
    statement: `c(n) grows like n! n^${(gamma - 1).toFixed(3)} times (−1)^n and a power, exponent ${kind === 'correlator' ? 3 : 2} − beta_1/beta_0^2 + lambda_1, with the largest shift${limit}. The shifts are one-loop; the number ${kind === 'correlator' ? 3 : 2} rests on how the operators mix and is not checked against coefficients; the strength is not known${stated.exponent === undefined ? '' : ", and prescriptions go by the file's own exponent"}`,
  };
}
