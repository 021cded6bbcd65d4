/** @module The sign pattern that sequence transformations need. */

/** Do c_start … c_{count−1} alternate strictly in sign? */
export function alternates(c: Float64Array, start: number, count: number): boolean {
  if (c.length < count || count <= start) return false;
  for (let n = start; n < count; n++) {
    if (!(c[n]! > 0 || c[n]! < 0)) return false;
    if (n > start && c[n]! > 0 === c[n - 1]! > 0) return false;
  }
  return true;
}
