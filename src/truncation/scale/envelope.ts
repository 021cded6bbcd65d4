/**
 * @module Scale envelope: how far the truncated sum moves when the renormalisation scale does.
 *
 * Assumption  none that could be tested; the exact answer does not depend on the scale, so the change is of the size of the
 *             first missing term, up to an unknown factor.
 * Method      μ from μ_0/F to F μ_0 at 21 points even in ln μ: coupling by exact running, coefficients by exact
 *             re-expansion; extremes inside are refined; the band runs from the lowest to the highest sum, asymmetric as it is.
 * Fails       where the coupling gets large, and where the sum is flat by accident.
 * Reference   common practice; the re-expansion follows from the renormalisation group.
 */
import { refuse, tooFew, type Band, type Question, type TruncationModel, type TruncationRefusal } from '../model.js';
import { movedTerms } from './moved-terms.js';

/** Points of the scan; the outer two and the middle one are the customary three. */
const POINTS = 21;
/** Couplings above this are no ground for a truncated series. A heuristic. */
const LARGE_COUPLING = 0.5;
/** Parabolas drawn for an extremum: each brings it several times nearer. */
const VERTEX_ROUNDS = 4;

export interface ScalePoint {
  /** μ/μ_0. */
  readonly ratio: number;
  readonly alpha: number;
  /** Sum of the known terms, in the unit of the terms. */
  readonly sum: number;
}

/** The truncated sum at one scale. */
function pointAt(question: Question, logMu: number): ScalePoint | TruncationRefusal {
  const moved = question.atScale(2 * logMu);
  if (moved.kind === 'refusal') return moved;
  const sum = movedTerms(question, moved).reduce((a, b) => a + b, 0);
  return { ratio: Math.exp(logMu), alpha: moved.alpha, sum };
}

/** The truncated sum at 21 scales. */
export function scaleScan(question: Question): ScalePoint[] | TruncationRefusal {
  const factor = question.priors['scale.factor'];
  const points: ScalePoint[] = [];
  for (let k = 0; k < POINTS; k++) {
    const point = pointAt(question, Math.log(factor) * ((2 * k) / (POINTS - 1) - 1));
    if ('kind' in point) return point;
    points.push(point);
  }
  return points;
}

/** The extremum between neighbours of the scan: vertex of the parabola through three points, a few times. */
function vertex(question: Question, before: ScalePoint, at: ScalePoint, after: ScalePoint): ScalePoint {
  let [a, b, c] = [before, at, after];
  for (let round = 0; round < VERTEX_ROUNDS; round++) {
    const [x, y, z] = [Math.log(a.ratio), Math.log(b.ratio), Math.log(c.ratio)];
    const [left, right] = [(b.sum - a.sum) / (y - x), (c.sum - b.sum) / (z - y)];
    const top = (x + y) / 2 - (left * (z - x)) / (2 * (right - left));
    if (!(top > x && top < z) || top === y) return b;
    const point = pointAt(question, top);
    if ('kind' in point) return b;
    // A maximum has b above a, a minimum below; the more extreme of the two inner points stays in the middle.
    const better = (point.sum - b.sum) * (b.sum - a.sum) > 0;
    if (better) [a, b, c] = top < y ? [a, point, b] : [b, point, c];
    else if (top < y) a = point;
    else c = point;
  }
  return b;
}

/** The points, with the extremes between them added. */
function withExtremes(question: Question, points: readonly ScalePoint[]): ScalePoint[] {
  const found = points.flatMap((at, k) => {
    const [before, after] = [points[k - 1], points[k + 1]];
    if (before === undefined || after === undefined) return [];
    return (at.sum - before.sum) * (after.sum - at.sum) < 0 ? [vertex(question, before, at, after)] : [];
  });
  return [...points, ...found];
}

const extremes = (points: readonly ScalePoint[]): Band => {
  const sums = points.map((p) => p.sum);
  return { low: Math.min(...sums), high: Math.max(...sums) };
};

/** What the scan shows beside its extremes, in words. */
function remarks(points: readonly ScalePoint[], three: Band, all: Band, size: number): string[] {
  const notes: string[] = [];
  const largest = Math.max(...points.map((p) => p.alpha));
  if (largest > LARGE_COUPLING) notes.push(`the coupling reaches ${largest.toPrecision(3)} within the range`);
  const inner = Math.max(three.low - all.low, all.high - three.high);
  if (inner > 1e-9 * size) {
    const at = points.find((p) => p.sum === (three.low - all.low > all.high - three.high ? all.low : all.high));
    notes.push(
      `an extremum lies inside, at ${(at?.ratio ?? 1).toPrecision(3)} times the scale: the two ends alone would miss it`,
    );
  }
  const centre = points[(POINTS - 1) / 2]?.sum ?? 0;
  if (centre <= three.low || centre >= three.high)
    notes.push('the sum at the central scale does not lie between those at the ends');
  return notes;
}

export const scaleEnvelope: TruncationModel = {
  name: 'scale-envelope',
  title: 'scale envelope',
  summary: 'how far the sum moves with the renormalisation scale',
  nature: 'conventional',
  about: 'remainder',
  digits: 5,
  priors: ['scale.factor', 'scale.loops', 'conventional.double'],
  reference: 'common practice',
  estimate(question) {
    const { known, priors } = question;
    const refused = tooFew(known, 1, 'there is no sum');
    if (refused !== undefined) return refused;
    if (known.stride !== 1)
      return refuse(
        'the series has every other coefficient only: it is no expansion in a running coupling',
        'use a model that needs no scale',
      );
    const points = scaleScan(question);
    if ('kind' in points) return points;
    const scanned = withExtremes(question, points);
    const all = extremes(scanned);
    const three = extremes(points.filter((_, k) => k % ((POINTS - 1) / 2) === 0));
    const centre = points[(POINTS - 1) / 2]?.sum ?? Number.NaN;
    const band = (widen: number): Band => ({ low: widen * (all.low - centre), high: widen * (all.high - centre) });
    return {
      kind: 'estimate',
      terms: known.values.length,
      bands: { 68: band(1), 95: band(priors['conventional.double']) },
      facts: [
        { name: 'coupling at the lower end', value: points[0]?.alpha ?? Number.NaN },
        { name: 'coupling at the upper end', value: points.at(-1)?.alpha ?? Number.NaN },
      ],
      notes: remarks(scanned, three, all, Math.abs(all.high - all.low)),
    };
  },
};
