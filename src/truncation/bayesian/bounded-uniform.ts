/**
 * @module The next member of a sequence that is uniform within an unknown bound.
 *
 * Purpose    the elementary step of all credible models: z uniform in [−c, c], and c has the posterior
 *            s c^(−1−s) for c > 1 (the largest member seen sets the unit).
 * Method     integration over c in closed form:
 *            f(z) = s/(2(s+1)) · min(1, |z|^(−s−1)),   P(|z| < r) = s r/(s+1) for r ≤ 1, 1 − r^(−s)/(s+1) beyond.
 * Bound      rounding only.
 * Reference  M. Cacciari, N. Houdeau, JHEP 09 (2011) 039, arXiv:1105.5152 [abstract seen; formulas re-derived].
 */

/** P(|z| < r). */
export function within(s: number, r: number): number {
  return r <= 1 ? (s * r) / (s + 1) : 1 - r ** -s / (s + 1);
}

/** Density of z at distance r. */
export function densityAt(s: number, r: number): number {
  return (s / (2 * (s + 1))) * (r <= 1 ? 1 : r ** (-s - 1));
}

/** within and densityAt in one: they share the power. */
export function distributionAt(s: number, r: number): { readonly inside: number; readonly density: number } {
  const flat = s / (2 * (s + 1));
  if (r <= 1) return { inside: 2 * flat * r, density: flat };
  const tail = r ** -s;
  return { inside: 1 - tail / (s + 1), density: (flat * tail) / r };
}

/** r with P(|z| < r) = p. */
export function halfWidth(s: number, p: number): number {
  return p <= s / (s + 1) ? ((s + 1) * p) / s : ((s + 1) * (1 - p)) ** (-1 / s);
}
