/**
 * @module Factorial against geometric growth.
 *
 * Purpose    how strongly do a few coefficients prefer |c_n| ~ Γ(n+1+b) A^n to |c_n| ~ A^n.
 * Method     straight lines through ln|c_n| and through ln|c_n| − ln[Γ(n+1+b)/Γ(1+b)], same two free parameters, unknown
 *            spread with prior 1/σ: K = (RSS_G/RSS_F)^((N−2)/2). ΔAICc = N ln(RSS_G/RSS_F) from 5 points on. A third
 *            fit leaves the power of n! free.
 * Bound      the spread about either line is model discrepancy, not statistics: K is to be read with the number of points.
 *            Where errors are quoted, RSS is not allowed below what they make likely.
 * Reference  R. E. Kass and A. E. Raftery, J. Am. Stat. Assoc. 90 (1995) 773 (wording); H. Akaike 1974, N. Sugiura 1978,
 *            C. M. Hurvich and C.-L. Tsai 1989 (AICc).
 */
import type { Estimate, GrowthModelComparison } from './growth.js';
import { leastSquares } from './least-squares.js';
import { logGammaDouble } from '../numerics/index.js';
import type { Point } from './reading.js';

/** The first coefficient is left out when it lies farther than this many standardised residuals off the better line. */
const DROP_FIRST = 2;
/** ΔAICc needs this many points (three fitted parameters: slope, constant, spread). */
const AICC_POINTS = 5;

/** Kass and Raftery's four grades, by name. */
export function evidenceGrade(k: number): 'not worth mentioning' | 'positive' | 'strong' | 'very strong' {
  return k < 3 ? 'not worth mentioning' : k < 20 ? 'positive' : k < 150 ? 'strong' : 'very strong';
}

function wording(k: number): string {
  const grade = evidenceGrade(k >= 1 ? k : 1 / k);
  if (grade === 'not worth mentioning') return 'not worth mentioning';
  return `${grade} evidence for ${k >= 1 ? 'factorial' : 'geometric'} growth`;
}

interface Pair {
  readonly rssGeometric: number;
  readonly rssFactorial: number;
  readonly slope: number;
  readonly firstResidual: number;
}

function fitPair(points: readonly Point[], b: number, q: number): Pair | undefined {
  const k = points.map((p) => p.k);
  const ones = k.map(() => 1);
  const y = points.map((p) => p.y);
  const z = points.map((p) => p.y - logGammaDouble(q * p.k + 1 + b) + logGammaDouble(1 + b));
  const plainG = leastSquares([ones, k], y);
  const plainF = leastSquares([ones, k], z);
  if (plainG === undefined || plainF === undefined) return undefined;
  const quoted = points.map((p) => p.quoted);
  let fitG = plainG;
  let fitF = plainF;
  let floor = 0;
  if (quoted.some((e) => e > 0)) {
    // Weight 1/(σ² + ρ²), σ² the discrepancy of the better line; scaled so that an exact coefficient has weight 1.
    const smallest = Math.max(Math.min(...quoted.filter((e) => e > 0)) ** 2, 1e-30);
    const s2 = Math.max(Math.min(plainG.rss, plainF.rss) / (k.length - 2), smallest);
    const w = quoted.map((e) => s2 / (s2 + e * e));
    fitG = leastSquares([ones, k], y, w) ?? plainG;
    fitF = leastSquares([ones, k], z, w) ?? plainF;
    floor = (quoted.reduce((s, e, i) => s + w[i]! * e * e, 0) * (k.length - 2)) / k.length;
  }
  const better = fitG.rss < fitF.rss ? fitG : fitF;
  const sum = ones.reduce((s, _, i) => s + (k[i]! - k[0]!), 0);
  const square = k.reduce((s, v) => s + (v - k[0]!) ** 2, 0);
  const mean = sum / k.length;
  const leverage = 1 / k.length + mean ** 2 / (square - k.length * mean ** 2);
  const spread = Math.sqrt(better.rss / (k.length - 2)) * Math.sqrt(Math.max(0, 1 - leverage));
  return {
    rssGeometric: Math.max(fitG.rss, floor),
    rssFactorial: Math.max(fitF.rss, floor),
    slope: fitF.coefficients[1]!,
    firstResidual: spread > 0 ? Math.abs(better.residuals[0]!) / spread : 0,
  };
}

/** Free power s of n!: y = c + a n + s ln Γ(n+1). */
function freeOrder(points: readonly Point[]): Estimate | undefined {
  if (points.length < 4) return undefined;
  const k = points.map((p) => p.k);
  const fit = leastSquares(
    [k.map(() => 1), k, points.map((p) => logGammaDouble(p.n + 1))],
    points.map((p) => p.y),
  );
  if (fit === undefined) return undefined;
  const error = Math.sqrt((fit.unitVariances[2]! * fit.rss) / (k.length - 3));
  return { value: fit.coefficients[2]!, error };
}

/**
 * Both models on the non-zero points. b: exponent of the expected singularity minus one, or 0.
 * Undefined below 3 points.
 */
export function compareModels(points: readonly Point[], stride: number, b: number): GrowthModelComparison | undefined {
  if (points.length < 3) return undefined;
  let used = points;
  let pair = fitPair(used, b, stride);
  if (pair === undefined) return undefined;
  if (pair.firstResidual > DROP_FIRST && points.length > 4) {
    const without = fitPair(points.slice(1), b, stride);
    if (without !== undefined) {
      used = points.slice(1);
      pair = without;
    }
  }
  const n = used.length;
  const ratio = pair.rssGeometric / pair.rssFactorial;
  const bayesFactor = Number.isNaN(ratio) ? 1 : ratio ** ((n - 2) / 2);
  const order = freeOrder(used);
  return {
    points: n,
    rssGeometric: pair.rssGeometric,
    rssFactorial: pair.rssFactorial,
    bayesFactor,
    ...(n >= AICC_POINTS && !Number.isNaN(ratio) ? { deltaAICc: n * Math.log(ratio) } : {}),
    inversePosition: Math.exp(pair.slope / stride),
    ...(order === undefined ? {} : { growthOrder: order }),
    wording: wording(bayesFactor),
    shift: b,
  };
}
