/**
 * @module Growth n! e^{C n^κ}: no power exponent fits.
 *
 * Purpose    an essential singularity exp(a/(1−t/t*)^m) gives c_n ~ n! t*^(−n) e^{C n^κ} with κ = m/(m+1); the exponent γ
 *            read off at order n then grows like n^κ for ever.
 * Method     g_k = k(k−1)(D_{k−1} − D_k)/D_k tends to γ−1 for a power and to C κ(1−κ) k^κ here: its logarithmic slope
 *            over two octaves. Confirmed by a least-squares comparison of ln|c_k| with k^κ against one with 1/k.
 * Bound      heuristic constants below; the position comes from the second fit.
 * Reference  E. M. Wright, J. London Math. Soc. 24 (1949) 304 (coefficients at an essential singularity; from memory).
 */
import type { Estimate } from './growth.js';
import { leastSquares, type LinearFit } from './least-squares.js';
import { logGammaDouble } from '../numerics/index.js';
import { ratios } from './ratio-test.js';
import type { Point } from './reading.js';

/** Fewest points, and the window of slopes (κ = 1/2 to 3/4, approached from above). */
const MIN_POINTS = 20;
const SLOPE = { low: 0.25, high: 0.95 };
/** The slope must not fall by more than this from one octave to the next, as it does for a power with a large exponent. */
const STEADY = 0.3;
/** The fit with k^κ must leave this part, at most, of the residual of the fit with powers of 1/k. */
const BETTER = 0.1;
/** κ = m/(m+1) for m = 1, 2, 3. */
const KAPPAS = [1 / 2, 2 / 3, 3 / 4];
/** Stated error over the change between the fit to all and to the later points. */
const INFLATION = 3;

export interface EssentialGrowth {
  readonly kappa: number;
  /** C of e^{C k^κ}. */
  readonly rate: number;
  readonly logT: Estimate;
}

/** points: consecutive, regular signs, growth order q per step. */
export function essentialGrowth(points: readonly Point[], q: number): EssentialGrowth | undefined {
  const last = points[points.length - 1]!.k;
  if (points.length < MIN_POINTS) return undefined;
  const scale = points[points.length - 1]!.y - points[points.length - 2]!.y;
  const d = ratios(
    points.map((p) => ({ ...p, sign: 1 })),
    q,
    scale,
  );
  const g = (k: number): number => {
    const a = d[k - 1];
    const b = d[k];
    return a === undefined || b === undefined ? NaN : (k * (k - 1) * (a - b)) / b;
  };
  const at = [last, Math.round(last / 2), Math.round(last / 4)] as const;
  const [g0, g1, g2] = [g(at[0]), g(at[1]), g(at[2])];
  const late = Math.log(g0 / g1) / Math.log(at[0] / at[1]);
  const early = Math.log(g1 / g2) / Math.log(at[1] / at[2]);
  if (!(late > SLOPE.low && late < SLOPE.high && early - late < STEADY && Math.abs(g0) > 1)) return undefined;
  const y = points.map((p) => p.y - logGammaDouble(q * p.k + 1));
  const k = points.map((p) => p.k + 1);
  const common = [k.map(() => 1), k, k.map(Math.log)];
  const columns = (kappa: number): number[][] => [...common, k.map((v) => v ** kappa), k.map((v) => v ** (kappa - 1))];
  const later = (c: readonly number[]): number[] => c.slice(Math.floor(k.length / 3));
  const fit = (c: readonly (readonly number[])[]): LinearFit | undefined => leastSquares(c.map(later), later(y));
  const power = fit([...common, k.map((v) => 1 / v), k.map((v) => 1 / v ** 2)]);
  const tried = KAPPAS.map((kappa) => ({ kappa, found: fit(columns(kappa)) }));
  const { kappa, found } = tried.reduce((u, v) => ((v.found?.rss ?? Infinity) < (u.found?.rss ?? Infinity) ? v : u));
  const full = leastSquares(columns(kappa), y);
  if (power === undefined || full === undefined || found === undefined || !(found.rss < BETTER * power.rss))
    return undefined;
  const value = -found.coefficients[1]!;
  const error = INFLATION * Math.abs(found.coefficients[1]! - full.coefficients[1]!);
  return { kappa, rate: found.coefficients[3]!, logT: { value, error } };
}
