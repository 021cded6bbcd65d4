/**
 * @module Wynn's ε algorithm on its even columns, with the singular rules.
 *
 * Purpose    ε_{2k}^{(n)} of the sequence s_0, s_1, …: Shanks' transform e_k(s_n), and for the partial sums of a power
 *            series the Padé approximant [n+k/k].
 * Method     the cross rule 1/(N−C) + 1/(S−C) = 1/(W−C) + 1/(E−C) with C = ε_{2k}^{(n+1)}, N = ε_{2k}^{(n)},
 *            S = ε_{2k}^{(n+2)}, W = ε_{2k−2}^{(n+2)}, E = ε_{2k+2}^{(n)}; W is infinite in the first column.
 *            Elements that certainly are equal down a column belong to a square block of equal elements; the elements
 *            behind it follow from the same rule across the block, counted from its corners, and an infinite C turns it
 *            into N + S = W + E.
 * Bound      that of the field. In balls a difference that may vanish gives INDETERMINATE; exact rationals decide.
 * Reference  P. Wynn, MTAC 10 (1956) 91 and Numer. Math. 8 (1966) 264; F. Cordellier, C. R. Acad. Sci. A 289 (1979) 183
 *            (block rule; from memory, checked here against Padé tables with blocks).
 */
import type { Field } from '../numerics/index.js';

/** An element of the table; undefined stands for infinity. */
export type Element<T> = T | undefined;

interface Block<T> {
  /** Column k of its left edge, row n + k of its upper edge, and side. */
  readonly left: number;
  readonly top: number;
  readonly side: number;
  readonly value: Element<T>;
}

/** Even columns: entry k holds ε_{2k}^{(0)}, ε_{2k}^{(1)}, …; two elements fewer each. */
export function epsilonColumns<T>(field: Field<T>, s: readonly T[]): Element<T>[][] {
  const columns: Element<T>[][] = [[...s]];
  const blocks: Block<T>[] = [];
  for (let k = 0; columns[k]!.length >= 3; k++) {
    findBlocks(field, columns[k]!, k, blocks);
    columns.push(columns[k]!.slice(2).map((_, n) => behind(field, columns, blocks, k, n)));
  }
  return columns;
}

/** Element of column k, row n + k; the column before the first is infinite. */
const at = <T>(columns: readonly Element<T>[][], k: number, row: number): Element<T> => columns[k]?.[row - k];

/** Records the runs of two or more equal elements in column k that do not belong to a block begun further left. */
function findBlocks<T>(field: Field<T>, column: readonly Element<T>[], k: number, blocks: Block<T>[]): void {
  let start = 0;
  while (start < column.length) {
    let end = start + 1;
    while (end < column.length && same(field, column[start], column[end])) end++;
    const side = end - start;
    const top = start + k;
    const known = blocks.some((b) => k < b.left + b.side && top >= b.top && top < b.top + b.side);
    if (side >= 2 && !known) blocks.push({ left: k, top, side, value: column[start] });
    start = end;
  }
}

function same<T>(field: Field<T>, a: Element<T>, b: Element<T>): boolean {
  if (a === undefined || b === undefined) return a === b;
  return field.isZero(field.sub(a, b));
}

/** Element of column k + 1 in the row of C = column k, index n + 1. */
function behind<T>(
  field: Field<T>,
  columns: readonly Element<T>[][],
  blocks: readonly Block<T>[],
  k: number,
  n: number,
): Element<T> {
  const row = n + 1 + k;
  const block = blocks.find((b) => k >= b.left && k < b.left + b.side && row >= b.top && row < b.top + b.side);
  if (block === undefined) {
    return east(field, at(columns, k, row), at(columns, k, row - 1), at(columns, k, row + 1), at(columns, k - 1, row));
  }
  if (k + 1 < block.left + block.side) return block.value;
  // Counted from the lower right corner for south and east, from the upper left one for north and west.
  const i = block.top + block.side - 1 - row;
  const north = at(columns, block.left + i, block.top - 1);
  const south = at(columns, k - i, block.top + block.side);
  const west = at(columns, block.left - 1, block.top + i);
  return east(field, block.value, north, south, west);
}

/** E of the cross rule. */
function east<T>(field: Field<T>, c: Element<T>, north: Element<T>, south: Element<T>, west: Element<T>): Element<T> {
  if (c === undefined) {
    if (north === undefined || south === undefined || west === undefined) return undefined;
    return field.sub(field.add(north, south), west);
  }
  const inverse = (x: Element<T>): T => (x === undefined ? field.zero : field.div(field.one, field.sub(x, c)));
  const sum = field.sub(field.add(inverse(north), inverse(south)), inverse(west));
  return field.isZero(sum) ? undefined : field.add(c, field.div(field.one, sum));
}

/** The estimates that use s_0 … s_m for m = 0, 1, …: ε_m^{(0)} for even m, ε_{m−1}^{(1)} for odd m. */
export function epsilonStaircase<T>(columns: readonly Element<T>[][]): Element<T>[] {
  return columns[0]!.map((_, m) => columns[Math.floor(m / 2)]![m % 2]);
}
