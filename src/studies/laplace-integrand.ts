/**
 * @module The integrand of the Borel integral, F(x) = (1/x) ∫_0^∞ dt e^{−t/x} B(t), with B a Padé approximant of the Borel
 * transform: along the positive axis, where poles show, and along a ray above it, where the lateral sum is smooth.
 * For a picture: values in doubles, indicative.
 */
import { borelTransform, nearDiagonal, padeOf, RAYS } from '../borel/index.js';
import { diagnoseGrowth } from '../growth/index.js';
import { R, Rational, toNumberExact } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { PRESCRIPTIONS } from '../prescriptions/index.js';
import type { Series, Uncertain } from '../series/index.js';
import type { AssessOptions } from './assess.js';
import type { Assessment, Refused } from './assessment.js';
import { expand } from './expand.js';
import type { Expanded } from './expand.js';
import { indicative } from './figures.js';
import { couplingSummary, seriesSummary } from './summary.js';
import { VERSION } from './version.js';

export interface IntegrandSample {
  /** Distance from the origin along the contour, in t. */
  readonly r: string;
  /** e^{−t/x} B(t)/x on the positive axis. */
  readonly axis: string;
  /** The same on the ray, times its direction: real and imaginary part. */
  readonly ray: { readonly re: string; readonly im: string };
}

export interface LaplaceIntegrand {
  readonly leastterm: string;
  readonly request: Assessment['request'];
  readonly series: Assessment['series'];
  readonly coupling: Assessment['coupling'];
  /** Which approximant of the Borel transform. */
  readonly approximant?: string;
  /** Degrees between the ray and the axis. */
  readonly angle: string;
  readonly samples: readonly IntegrandSample[];
  readonly refused?: Refused;
}

/** The integral is followed until e^{−t/x} has fallen to e^{−REACH}. */
const REACH = 9;
const SAMPLES = 360;
/** More coefficients change nothing that a picture shows. */
const MOST = 40;
const PREC = 256;
const DIGITS = 6;
const RAY = RAYS[1]!;

interface Complex {
  readonly re: number;
  readonly im: number;
}

const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const over = (a: Complex, b: Complex): Complex => {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
};
const horner = (p: readonly number[], z: Complex): Complex =>
  p.reduceRight<Complex>(
    (sum, c) => {
      const next = times(sum, z);
      return { re: next.re + c, im: next.im };
    },
    { re: 0, im: 0 },
  );

/** The member whose sum the Borel–Padé prescription quotes, so that the picture shows what its number comes from. */
function quoted({ expansion, growthInput }: Expanded): [number, number][] {
  const outcomes = PRESCRIPTIONS.find(({ name }) => name === 'borel-pade')?.apply(
    expansion,
    diagnoseGrowth(growthInput),
    { digits: 6 },
  );
  const variant = outcomes?.find((outcome) => outcome.kind === 'sum' && outcome.central === true)?.variant ?? '';
  const [, L, M] = /^\[(\d+)\/(\d+)\]$/.exec(variant) ?? [];
  return L === undefined || M === undefined || Number(L) + Number(M) >= MOST ? [] : [[Number(L), Number(M)]];
}

/** The integrand of the Borel integral of a series at a coupling. */
export function laplaceIntegrand(
  series: Series,
  at: Uncertain,
  options: Omit<AssessOptions, 'by' | 'verdictRule'>,
): LaplaceIntegrand {
  const expanded = expand(series, at.value, options.order);
  const { expansion } = expanded;
  const head = {
    leastterm: VERSION,
    request: options.request,
    series: seriesSummary(series, expanded),
    coupling: couplingSummary(series, at, expanded, options.digits, options.path),
    angle: indicative((RAY.angle * 180) / Math.PI),
  };
  const b = borelTransform(expansion.coefficients.slice(0, MOST), Rational.ZERO);
  for (const [L, M] of [...quoted(expanded), ...nearDiagonal(b.length - 1, 2)]) {
    const pade = padeOf(b, L, M, PREC);
    if (pade.exists !== true) continue;
    const doubles = (list: readonly Ball[]): number[] => list.map((c) => R.toNumber(c));
    const [p, q] = [doubles(pade.numerator), doubles(pade.denominator)];
    const x = toNumberExact(expansion.x);
    const along = (z: Complex): Complex => {
      const value = over(horner(p, z), horner(q, z));
      const size = Math.exp(-z.re / x) / x;
      return times(value, { re: size * Math.cos(z.im / x), im: -size * Math.sin(z.im / x) });
    };
    const turn = { re: Math.cos(RAY.angle), im: Math.sin(RAY.angle) };
    const samples = Array.from({ length: SAMPLES + 1 }, (_, k): IntegrandSample => {
      const r = (REACH * x * k) / SAMPLES;
      const ray = times(along({ re: r * turn.re, im: r * turn.im }), turn);
      return {
        r: indicative(r, DIGITS),
        axis: indicative(along({ re: r, im: 0 }).re, DIGITS),
        ray: { re: indicative(ray.re, DIGITS), im: indicative(ray.im, DIGITS) },
      };
    });
    return { ...head, approximant: `[${L}/${M}]`, samples };
  }
  return {
    ...head,
    samples: [],
    refused: {
      reason: 'no Padé approximant of the Borel transform near the diagonal exists',
      remedy: 'give more coefficients, or a series that is not a polynomial',
    },
  };
}
