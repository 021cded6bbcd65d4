/**
 * @module What a short series shows beside the verdict, in words: even–odd ratios, two poles, D-log poles, expected strengths.
 *
 * Method     (a) root ratios over two orders, (b_n/b_{n−2})^{1/2}, at even and at odd n; (b) the two poles of the three-term
 *            recurrence through the last four Borel coefficients, exact for poles, strongly biased for branch points;
 *            (c) the nearest pole of a near-diagonal D-log Padé approximant; (d) with expected positions, the strengths from
 *            the last two coefficients and the order at which the nearer one takes over.
 * Bound      all indicative.
 * Reference  C. Domb and M. F. Sykes 1957 (even–odd plots); G. A. Baker 1961 (D-log).
 */
import { scaledBorel } from './borel-coefficients.js';
import { dlogPoles } from './dlog.js';
import { crossing, fixedStrengths, type FixedPosition } from './fixed-strengths.js';
import type { GrowthInput } from './growth.js';
import type { Prepared } from './prepare.js';
import { ratios } from './ratio-test.js';
import type { Point } from './reading.js';
import { realPositions, recurrence } from './two-root.js';
import { short } from './words.js';

/** Even and odd root ratios differing by more than this are worth a line. */
const EVEN_ODD = 0.05;
/** Relative determinant of the recurrence below which it has no solution to speak of. */
const SINGULAR = 1e-9;
/** Coefficients up to which these lines are shown. */
const LONGEST = 12;
/** D-log poles with exponents outside are doublets and noise, not singularities. */
const EXPONENTS = { least: 0.1, most: 10 };
/** Two poles on opposite sides count as competition when their distances differ by no more than this factor. */
const COMPARABLE = 3;

export interface ShortLines {
  readonly lines: readonly string[];
  /** Set when the last four coefficients put two poles on opposite sides at similar distance. */
  readonly opposite?: string;
}

function evenOdd(points: readonly Point[]): string | undefined {
  const ratio = ratios(points, 1);
  const last = ratio.length - 1;
  const [a, b, c] = [ratio[last], ratio[last - 1], ratio[last - 2]];
  if (a === undefined || b === undefined || c === undefined || a * b <= 0 || b * c <= 0) return undefined;
  const now = Math.sqrt(a * b);
  const before = Math.sqrt(b * c);
  if (Math.abs(now / before - 1) < EVEN_ODD) return undefined;
  return `the root ratios over two orders differ between even and odd n: ${short(now)} and ${short(before)}`;
}

function twoPoles(points: readonly Point[]): { text: string; opposite: boolean } | undefined {
  const { beta, scale } = scaledBorel(points, 1);
  const row = recurrence(beta).at(-1);
  const noise = Math.max(...points.slice(-4).map((p) => p.sigma));
  // A single power solves the two equations twice over: what is left is rounding and noise.
  if (row === undefined || row.weight < Math.max(SINGULAR, noise)) return undefined;
  const head = 'two poles through the last four Borel coefficients would';
  const factor = Math.exp(-scale);
  const real = realPositions(row);
  if (real === undefined) {
    const modulus = factor / Math.sqrt(row.q);
    const degrees = (Math.acos(row.p / (2 * Math.sqrt(row.q))) * 180) / Math.PI;
    const text = `${head} be a complex pair at |t| = ${short(modulus)}, ±${short(degrees)}° (a hint, not a fit)`;
    return { text, opposite: false };
  }
  const [near, far] = [real[0] * factor, real[1] * factor];
  const text = `${head} stand at t = ${short(near)} and ${short(far)} (exact for poles, biased for branch points)`;
  return { text, opposite: near * far < 0 && Math.abs(far / near) < COMPARABLE };
}

function dlog(points: readonly Point[]): string | undefined {
  if (points.length < 4 || points.some((p, i) => p.k !== i)) return undefined;
  const { beta, scale } = scaledBorel(points, 1);
  const b = beta.map((v) => v ?? 0);
  const M = Math.floor((b.length - 1) / 2);
  const L = b.length - 2 - M;
  const pole = dlogPoles(b, L, M)?.find((d) => {
    const size = Math.hypot(d.exponent.re, d.exponent.im);
    return size >= EXPONENTS.least && size <= EXPONENTS.most;
  });
  if (pole === undefined) return undefined;
  const factor = Math.exp(-scale);
  const { position, exponent } = pole;
  const where =
    position.im === 0
      ? `t = ${short(position.re * factor)}, exponent ${short(exponent.re)}`
      : `|t| = ${short(Math.hypot(position.re, position.im) * factor)}, ±${short((Math.abs(Math.atan2(position.im, position.re)) * 180) / Math.PI)}°`;
  return `the D-log Padé approximant [${L}/${M}] has its nearest pole at ${where}`;
}

/** Strengths of the nearest expected singularity of each sign. */
function expectedStrengths(points: readonly Point[], expected: GrowthInput['expected']): string | undefined {
  const nearest = (sign: number): FixedPosition | undefined => {
    const side = expected.filter((e) => Math.sign(e.t) === sign).sort((a, b) => Math.abs(a.t) - Math.abs(b.t));
    return side[0] === undefined ? undefined : { t: side[0].t, exponent: side[0].exponent ?? 1 };
  };
  const minus = nearest(-1);
  const plus = nearest(1);
  const [p, l] = [points.at(-2), points.at(-1)];
  if (minus === undefined || plus === undefined || p === undefined || l === undefined || p.k !== l.k - 1)
    return undefined;
  const s = fixedStrengths(minus, plus, [p, l]);
  if (s === undefined) return undefined;
  const head =
    `with the expected positions t = ${short(minus.t)} and ${short(plus.t)} the last two coefficients give the strengths ` +
    `${short(s.first)} and ${short(s.second)} (condition number ${short(s.condition, 2)})`;
  const [near, sn, far, sf] =
    Math.abs(minus.t) < plus.t ? [minus, s.first, plus, s.second] : [plus, s.second, minus, s.first];
  const takeover = crossing(near, sn, far, sf, l.n);
  if (takeover === undefined) return head;
  return takeover === l.n
    ? `${head}; the nearer one dominates already`
    : `${head}; the nearer one would dominate from n = ${takeover} on`;
}

/** Lines for at most a dozen coefficients of a series that is not lacunary. */
export function shortLines(p: Prepared, input: GrowthInput): ShortLines {
  const n = p.nonZero.length;
  if (n < 4 || n > LONGEST || p.sequence.stride !== 1) return { lines: [] };
  const poles = twoPoles(p.points);
  const found = [evenOdd(p.nonZero), poles?.text, dlog(p.nonZero), expectedStrengths(p.nonZero, input.expected)];
  return {
    lines: found.filter((l) => l !== undefined),
    ...(poles?.opposite === true ? { opposite: poles.text } : {}),
  };
}
