/**
 * @module A posterior density of one variable, and the shortest interval that holds a given share of it.
 */

export interface Predictive {
  /** Distribution function and density at y. */
  at(y: number): { readonly cdf: number; readonly pdf: number };
  /** A point inside the bulk, and a length that tells its size. */
  readonly centre: number;
  readonly spread: number;
}

export interface Interval {
  readonly low: number;
  readonly high: number;
}

interface Knot {
  readonly y: number;
  readonly cdf: number;
  readonly pdf: number;
}

/** Share of the probability that the table leaves out at either end. */
const TAIL = 1e-5;
/** Largest step of the distribution function between two knots of the table. */
const STEP = 0.06;
/** Lower ends tried before the search narrows. */
const TRIALS = 120;
const MOST_KNOTS = 600;

/** First step of the table from the centre, and its growth, in units of the spread. Matters of speed. */
const [FIRST, GROWTH] = [0.25, 2];

/** Knots from tail to tail, dense where the distribution rises. */
function tabulate(p: Predictive): Knot[] {
  const knot = (y: number): Knot => ({ y, ...p.at(y) });
  const middle = knot(p.centre);
  const [left, right]: [Knot[], Knot[]] = [[], []];
  for (let k = 0, d = FIRST * p.spread; k < 120 && (left.at(-1) ?? middle).cdf > TAIL; k++, d *= GROWTH) {
    left.push(knot(p.centre - d));
  }
  for (let k = 0, d = FIRST * p.spread; k < 120 && (right.at(-1) ?? middle).cdf < 1 - TAIL; k++, d *= GROWTH) {
    right.push(knot(p.centre + d));
  }
  const coarse = [...left.toReversed(), middle, ...right];
  const knots: Knot[] = [];
  const refine = (a: Knot, b: Knot): void => {
    const y = (a.y + b.y) / 2;
    if (b.cdf - a.cdf <= STEP || knots.length >= MOST_KNOTS || !(y > a.y && y < b.y)) {
      knots.push(b);
      return;
    }
    const between = knot(y);
    refine(a, between);
    refine(between, b);
  };
  const [first] = coarse;
  if (first === undefined) return [];
  knots.push(first);
  for (let i = 0; i + 1 < coarse.length; i++) {
    const [a, b] = [coarse[i], coarse[i + 1]];
    if (a !== undefined && b !== undefined) refine(a, b);
  }
  return knots;
}

/** Cubic Hermite value of the distribution function inside a step, slopes limited so that it stays monotone. */
function rise(a: Knot, b: Knot, u: number): number {
  const h = b.y - a.y;
  const secant = 3 * (b.cdf - a.cdf);
  const [s, t] = [Math.min(a.pdf * h, secant), Math.min(b.pdf * h, secant)];
  const v = 1 - u;
  return a.cdf * v * v * (1 + 2 * u) + b.cdf * u * u * (3 - 2 * u) + u * v * (v * s - u * t);
}

/** y with F(y) = q from the table. */
function quantile(knots: readonly Knot[], q: number): number {
  let [low, high] = [0, knots.length - 1];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((knots[middle]?.cdf ?? 0) < q) low = middle;
    else high = middle;
  }
  const [a, b] = [knots[low], knots[high]];
  if (a === undefined || b === undefined) return Number.NaN;
  let [from, to] = [0, 1];
  for (let k = 0; k < 40; k++) {
    const u = (from + to) / 2;
    if (rise(a, b, u) < q) from = u;
    else to = u;
  }
  return a.y + ((from + to) / 2) * (b.y - a.y);
}

/**
 * The shortest intervals [low, high] with F(high) − F(low) = level, one for each level.
 *
 * Method     the distribution is tabulated, the lower end varied until the interval from the table is shortest (a scan, so
 *            that several maxima do no harm, then golden sections); from there the densities at both ends are made equal
 *            by secants on the distribution itself, the upper end following by Newton's method.
 * Bound      the content is exact; the length errs by the square of what the ends do.
 */
export function shortestIntervals(p: Predictive, levels: readonly number[]): Interval[] {
  const knots = tabulate(p);
  return levels.map((level) => {
    const length = (q: number): number => quantile(knots, q + level) - quantile(knots, q);
    const free = 1 - level;
    const at = (k: number): number => TAIL + ((free - 2 * TAIL) * k) / TRIALS;
    let best = 0;
    for (let k = 1; k <= TRIALS; k++) if (length(at(k)) < length(at(best))) best = k;
    const q = golden(length, at(Math.max(0, best - 1)), at(Math.min(TRIALS, best + 1)));
    return polished(p, level, { low: quantile(knots, q), high: quantile(knots, q + level) });
  });
}

/** Largest move of the lower end in one step of the polish, and where it stops, in units of the length. */
const [LARGEST_MOVE, SETTLED] = [0.02, 1e-6];
const MOST_MOVES = 8;

/** From the table's interval to the one of the distribution itself. */
function polished(p: Predictive, level: number, { low, high }: Interval): Interval {
  const length = high - low;
  /** The interval that starts at y, and the excess of the density at its lower end. */
  const from = (y: number, guess: number): Interval & { readonly excess: number } => {
    const start = p.at(y);
    const end = upperEnd(p, start.cdf + level, guess);
    return { low: y, high: end, excess: start.pdf - p.at(end).pdf };
  };
  let best = from(low, high);
  let before = best;
  let move = best.excess < 0 ? length * 1e-3 : -length * 1e-3;
  for (let k = 0; k < MOST_MOVES && Math.abs(move) > SETTLED * length; k++) {
    const next = from(before.low + move, before.high + move);
    if (next.high - next.low < best.high - best.low) best = next;
    const slope = (next.excess - before.excess) / move;
    const step = -next.excess / slope;
    // The excess rises with the lower end around a minimum of the length; anything else is noise or another shape.
    if (!(slope > 0) || !Number.isFinite(step)) break;
    before = next;
    move = Math.max(-LARGEST_MOVE * length, Math.min(LARGEST_MOVE * length, step));
  }
  return { low: best.low, high: best.high };
}

/** Minimum of f between two points. */
function golden(f: (x: number) => number, from: number, to: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [from, to];
  let [c, d] = [b - ratio * (b - a), a + ratio * (b - a)];
  let [fc, fd] = [f(c), f(d)];
  for (let k = 0; k < 40; k++) {
    if (fc < fd) {
      [b, d, fd] = [d, c, fc];
      c = b - ratio * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + ratio * (b - a);
      fd = f(d);
    }
  }
  return (a + b) / 2;
}

/** Newton's method for F(y) = q, from the table's answer. */
function upperEnd(p: Predictive, q: number, start: number): number {
  let y = start;
  for (let k = 0; k < 4; k++) {
    const { cdf, pdf } = p.at(y);
    const step = (q - cdf) / pdf;
    // A step that leaves the neighbourhood means a vanishing density: the table's answer is the better one.
    if (!Number.isFinite(step) || Math.abs(step) > p.spread) return start;
    y += step;
    if (Math.abs(step) <= 1e-12 * p.spread) break;
  }
  return y;
}
