/**
 * @module A smooth function of one to a few variables on a box, as a table of Chebyshev coefficients.
 *
 * Purpose    maps that cost much and are wanted a million times: the evolution of a coupling over thresholds. Plain data, so that
 *            it can be sent to a worker.
 * Method     degrees from the lines through the middle of the box, each raised until the last coefficients fall below the tolerance;
 *            a tensor grid of Chebyshev points; discrete cosine sums along each direction.
 * Bound      checked, not proved: the largest error at points off the grid (Halton points and the corners of the box, slightly
 *            inside), relative to the largest value there, is returned and must not exceed the tolerance; otherwise the degrees are
 *            raised.
 * Reference  L. N. Trefethen, Approximation Theory and Approximation Practice (2013), ch. 3–4; J. H. Halton (1960) (memory).
 */

export interface ChebyshevMap {
  readonly from: readonly number[];
  readonly to: readonly number[];
  /** Degree in each variable; the first variable runs fastest in `coefficients`. */
  readonly degrees: readonly number[];
  readonly coefficients: Float64Array;
  /** Largest error that the check found, relative to the largest value. */
  readonly error: number;
}

/** Heuristics: degrees tried along a line, entries of a table, points of the check, attempts. */
const DEGREES = [4, 6, 8, 12, 16, 24, 32, 48, 64, 96, 128];
const LARGEST = 400_000;
const CHECKS = 60;
const ATTEMPTS = 3;
const BASES = [2, 3, 5, 7, 11, 13];

export type ManyVariables = (p: readonly number[]) => number;

/** Chebyshev points of the second kind on [−1, 1], descending. */
const node = (j: number, degree: number): number => (degree === 0 ? 0 : Math.cos((Math.PI * j) / degree));

const place = (s: number, from: number, to: number): number => from + ((to - from) * (s + 1)) / 2;

/** Coefficients from values at the Chebyshev points, in place, for entries at offset + j·stride. */
function transform(data: Float64Array, degree: number, offset: number, stride: number): void {
  if (degree === 0) return;
  const values = Array.from({ length: degree + 1 }, (_, j) => data[offset + j * stride]!);
  for (let k = 0; k <= degree; k++) {
    let sum = 0;
    for (let j = 0; j <= degree; j++) {
      const end = j === 0 || j === degree ? 0.5 : 1;
      sum += end * values[j]! * Math.cos((Math.PI * ((j * k) % (2 * degree))) / degree);
    }
    data[offset + k * stride] = (sum * (k === 0 || k === degree ? 1 : 2)) / degree;
  }
}

/** Degree that a line through the middle needs in direction d; undefined when none tried is enough. */
function degreeAlong(
  f: ManyVariables,
  middle: readonly number[],
  d: number,
  from: number,
  to: number,
  tolerance: number,
): number | undefined {
  for (const degree of DEGREES) {
    const line = Float64Array.from({ length: degree + 1 }, (_, j) =>
      f(middle.map((m, i) => (i === d ? place(node(j, degree), from, to) : m))),
    );
    const size = line.reduce((m, v) => Math.max(m, Math.abs(v)), 0);
    transform(line, degree, 0, 1);
    if (!line.every(Number.isFinite)) return undefined;
    if (Math.max(Math.abs(line[degree]!), Math.abs(line[degree - 1]!)) <= tolerance * size) return degree;
  }
  return undefined;
}

/** The j-th element of the van der Corput sequence. */
function halton(j: number, base: number): number {
  let value = 0;
  for (let n = j, unit = 1 / base; n > 0; n = Math.floor(n / base), unit /= base) value += unit * (n % base);
  return value;
}

/** Points of the check: quasi-random ones, and the corners drawn in a little. */
function checkPoints(dimension: number): number[][] {
  const inside = Array.from({ length: CHECKS }, (_, j) =>
    Array.from({ length: dimension }, (_row, d) => 2 * halton(j + 1, BASES[d]!) - 1),
  );
  const corners = Array.from({ length: 2 ** dimension }, (_, bits) =>
    Array.from({ length: dimension }, (_row, d) => (Math.floor(bits / 2 ** d) % 2 === 0 ? -0.997 : 0.997)),
  );
  return [...inside, ...corners];
}

/**
 * The map of f on the box; f gives NaN where it has no value. Undefined when the tolerance (relative to the largest value, at the
 * points of the check) is not met: a box that reaches a singularity, or more than six variables.
 */
export function chebyshevMap(
  f: ManyVariables,
  from: readonly number[],
  to: readonly number[],
  tolerance: number,
): ChebyshevMap | undefined {
  const dimension = from.length;
  if (dimension === 0 || dimension > BASES.length) return undefined;
  const middle = from.map((a, d) => (a + to[d]!) / 2);
  let degrees: number[] = [];
  for (let d = 0; d < dimension; d++) {
    const degree = to[d] === from[d] ? 0 : degreeAlong(f, middle, d, from[d]!, to[d]!, tolerance / 10);
    if (degree === undefined) return undefined;
    degrees.push(degree);
  }
  for (let attempt = 0; attempt < ATTEMPTS; attempt++) {
    const map = tabulate(f, from, to, degrees);
    if (map === undefined) return undefined;
    const error = worst(f, map);
    if (error <= tolerance) return { ...map, error };
    degrees = degrees.map((n) => (n === 0 ? 0 : Math.ceil(n * 1.4)));
  }
  return undefined;
}

function tabulate(
  f: ManyVariables,
  from: readonly number[],
  to: readonly number[],
  degrees: readonly number[],
): Omit<ChebyshevMap, 'error'> | undefined {
  const total = degrees.reduce((product, n) => product * (n + 1), 1);
  if (total > LARGEST) return undefined;
  const data = new Float64Array(total);
  for (let index = 0; index < total; index++) {
    let rest = index;
    const point = degrees.map((n, d) => {
      const j = rest % (n + 1);
      rest = Math.floor(rest / (n + 1));
      return place(node(j, n), from[d]!, to[d]!);
    });
    const value = f(point);
    if (!Number.isFinite(value)) return undefined;
    data[index] = value;
  }
  let stride = 1;
  for (const n of degrees) {
    const span = stride * (n + 1);
    for (let offset = 0; offset < total; offset++) if (offset % span < stride) transform(data, n, offset, stride);
    stride = span;
  }
  return { from, to, degrees, coefficients: data };
}

function worst(f: ManyVariables, map: Omit<ChebyshevMap, 'error'>): number {
  const reader = new MapReader({ ...map, error: 0 });
  let error = 0;
  let size = 0;
  for (const s of checkPoints(map.from.length)) {
    const p = s.map((v, d) => place(v, map.from[d]!, map.to[d]!));
    const expected = f(p);
    reader.fix(p.slice(1));
    const gap = Math.abs(reader.at(p[0]!) - expected);
    if (Number.isNaN(gap)) return Infinity;
    error = Math.max(error, gap);
    size = Math.max(size, Math.abs(expected));
  }
  return size === 0 ? error : error / size;
}

/** Evaluates a map: all variables but the first are fixed once, the first then runs at the cost of one Clenshaw sum. */
export class MapReader {
  private readonly map: ChebyshevMap;
  private readonly line: Float64Array;
  private readonly work: Float64Array;

  constructor(map: ChebyshevMap) {
    this.map = map;
    this.line = new Float64Array(map.degrees[0]! + 1);
    this.work = Float64Array.from(map.coefficients);
    if (map.degrees.length === 1) this.line.set(map.coefficients);
  }

  /** Values of the second, third, … variable. Outside the box the map has no value there. */
  fix(values: ArrayLike<number>): void {
    const { degrees, from, to, coefficients } = this.map;
    if (degrees.length === 1) return;
    const { work } = this;
    work.set(coefficients);
    let length = coefficients.length;
    for (let d = degrees.length - 1; d >= 1; d--) {
      const n = degrees[d]!;
      const below = length / (n + 1);
      const s = normalised(values[d - 1]!, from[d]!, to[d]!);
      // T_k(s) one after the other; the slab of k is collapsed onto the first one.
      let previous = 1;
      let current = s;
      for (let k = 1; k <= n; k++) {
        for (let i = 0; i < below; i++) work[i]! += current * work[k * below + i]!;
        const next = 2 * s * current - previous;
        previous = current;
        current = next;
      }
      length = below;
    }
    for (let k = 0; k < this.line.length; k++) this.line[k] = work[k]!;
  }

  /** The value at the first variable = u; NaN outside the box. */
  at(u: number): number {
    const { from, to } = this.map;
    const s = normalised(u, from[0]!, to[0]!);
    let b1 = 0;
    let b2 = 0;
    for (let k = this.line.length - 1; k >= 1; k--) {
      const b = 2 * s * b1 - b2 + this.line[k]!;
      b2 = b1;
      b1 = b;
    }
    return s * b1 - b2 + this.line[0]!;
  }
}

/** A little beyond the ends, for values that stand at them up to rounding. */
const EDGE = 1 + 1e-12;

/** u in [−1, 1]; NaN outside. A direction without extent has the one value 0. */
function normalised(u: number, from: number, to: number): number {
  if (from === to) return 0;
  const s = (2 * u - from - to) / (to - from);
  return Math.abs(s) <= EDGE ? s : NaN;
}
