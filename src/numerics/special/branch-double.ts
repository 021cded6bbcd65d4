/**
 * @module F_b(x) and G_b(x) in double precision.
 *
 * Purpose    replicas and fits. Formulas as in branch-same.ts and branch-cut.ts.
 * Method     F_b: x >= 45 + |b|: asymptotic series to the smallest term; otherwise the convergent sum with the pole at integer b taken
 *            out. G_b: continued fraction from x = 0.8 on, below it the convergent sum.
 * Bound      none proved; measured on the test grids: F_b below 1e-13 relative to max(|F_b|, 1e-3) for |b| <= 7; G_b below 1e-14 relative.
 */
import {
  ZETA_MINUS_ONE,
  cosPiDouble,
  EULER_DOUBLE,
  gammaDouble,
  logGamma1pDouble,
  logGammaDouble,
  rgammaDouble,
  sinPiDouble,
} from './gamma-double.js';

export interface BranchDouble {
  readonly pv: number;
  readonly im: number;
}

/** The asymptotic series is tried from here on: its least term is about e^−x (heuristic). */
const ASYMPTOTIC = 45;
/** Below this the continued fraction of G_b converges too slowly (heuristic). */
const FRACTION_FROM = 0.8;
/** e^−x is taken out of the sums below this x; beyond it, it would underflow. */
const LOG_SCALE_FROM = 650;
const STOP = 1e-18;
const MAX_TERMS = 100_000;

/** log of x^ε/(Γ(1+ε) Π_{j<=m} (1+ε/j)). */
function growthLog(eps: number, m: number, logX: number): number {
  let s = eps * logX - logGamma1pDouble(eps);
  for (let j = 1; j <= m; j++) s -= Math.log1p(eps / j);
  return s;
}

function harmonic(m: number): number {
  let h = 0;
  for (let j = m; j >= 1; j--) h += 1 / j;
  return h;
}

/** (πε cot πε − 1)/ε = −2 Σ_{k>=1} ζ(2k) ε^(2k−1) (DLMF 4.19.6), with ζ = 1 + (ζ − 1) summed apart. */
function cotExcess(eps: number): number {
  const q = eps * eps;
  let s = 0;
  for (let k = 30; k >= 2; k -= 2) s = ZETA_MINUS_ONE[k - 2]! + q * s;
  return -2 * eps * (s + 1 / (1 - q));
}

/** H with (x^m/m!)·H the regularised pole part of F_b. */
function pvPole(eps: number, m: number, logX: number): number {
  if (eps === 0) return logX + EULER_DOUBLE - harmonic(m);
  const c = 1 + eps * cotExcess(eps);
  return (c * Math.expm1(growthLog(eps, m, logX))) / eps + cotExcess(eps);
}

/** F_b(x) and its imaginary part above the axis, x > 0; NaN for other x. */
export function branchSameDouble(b: number, x: number): BranchDouble {
  if (!(x > 0) || !Number.isFinite(b)) return { pv: NaN, im: NaN };
  const m = Math.floor(b + 0.5);
  const eps = b - m;
  const logX = Math.log(x);
  const far = asymptoticSum(b, x, 1);
  if (far !== undefined) return { pv: far, im: residueDouble(b, m, eps, x, logX) };
  const scaled = x < LOG_SCALE_FROM;
  if (m < 0) {
    const sum = poissonSum(b, x, m, scaled);
    const size = gammaDouble(-b) * x ** b * Math.exp(-x);
    return { pv: sum - size * cosPiDouble(b), im: -size * sinPiDouble(b) };
  }
  const weight = scaled && m < 200 ? poissonWeight(x, m) : Math.exp(m * logX - x - logGammaDouble(m + 1));
  const pv = poissonSum(b, x, m, scaled) + weight * pvPole(eps, m, logX);
  return { pv, im: Math.PI * weight * Math.exp(growthLog(eps, m, logX)) };
}

/** π x^b e^−x/Γ(1+b). */
function residueDouble(b: number, m: number, eps: number, x: number, logX: number): number {
  if (m < 0) return Math.PI * x ** b * Math.exp(-x) * rgammaDouble(1 + b);
  const weight =
    m < 20 ? x ** m * Math.exp(-x - logGammaDouble(m + 1)) : Math.exp(m * logX - x - logGammaDouble(m + 1));
  return Math.PI * weight * Math.exp(growthLog(eps, m, logX));
}

/** e^−x x^m/m! as a running product. */
function poissonWeight(x: number, m: number): number {
  let t = Math.exp(-x);
  for (let k = 1; k <= m; k++) t *= x / k;
  return t;
}

/** Σ_{k≠m} e^−x x^k/(k!(k−b)), outward from the largest term when e^−x itself would underflow. */
function poissonSum(b: number, x: number, m: number, scaled: boolean): number {
  const start = scaled ? 0 : Math.floor(x);
  const first = scaled ? Math.exp(-x) : Math.exp(start * Math.log(x) - x - logGammaDouble(start + 1));
  let s = 0;
  let t = first;
  for (let k = start; k < MAX_TERMS; k++) {
    if (k !== m) s += t / (k - b);
    t *= x / (k + 1);
    if (k > x && k > b && t < STOP * Math.abs(s) && t < STOP) break;
  }
  t = first;
  for (let k = start - 1; k >= 0 && t > 0; k--) {
    t *= (k + 1) / x;
    if (k !== m) s += t / (k - b);
  }
  return s;
}

/** Σ s^n (1+b)_n/x^(n+1); undefined when its terms do not fall below STOP. */
function asymptoticSum(b: number, x: number, s: 1 | -1): number | undefined {
  if (x < ASYMPTOTIC + Math.max(0, b)) return undefined;
  let sum = 1;
  let t = 1;
  for (let n = 1; n < x; n++) {
    t *= (s * (n + b)) / x;
    sum += t;
    if (Math.abs(t) < STOP) return sum / x;
  }
  return undefined;
}

/** G_b(x), x > 0; NaN for other x. */
export function branchAlternatingDouble(b: number, x: number): number {
  if (!(x > 0) || !Number.isFinite(b)) return NaN;
  const far = asymptoticSum(b, x, -1);
  if (far !== undefined) return far;
  if (x >= FRACTION_FROM) return fraction(b, x);
  const m = Math.floor(b + 0.5);
  let t = 1;
  let s = 0;
  for (let k = 0; k < MAX_TERMS; k++) {
    if (k !== m) s += t / (k - b);
    t *= -x / (k + 1);
    if (k > b && Math.abs(t) < STOP * Math.abs(s)) break;
    if (t === 0) break;
  }
  if (m < 0) return Math.exp(x) * (gammaDouble(-b) * x ** b - s);
  const eps = b - m;
  const logX = Math.log(x);
  const weight = m < 150 ? poissonWeight(x, m) * Math.exp(x) : 0;
  return Math.exp(x) * (-(m % 2 === 0 ? weight : -weight) * alternatingPole(eps, m, logX) - s);
}

/** (e^A − 1)/ε, A = ε log x + log Γ(1−ε) − Σ log(1+ε/j). */
function alternatingPole(eps: number, m: number, logX: number): number {
  if (eps === 0) return logX + EULER_DOUBLE - harmonic(m);
  let a = eps * logX + logGamma1pDouble(-eps);
  for (let j = 1; j <= m; j++) a -= Math.log1p(eps / j);
  return Math.expm1(a) / eps;
}

/** The fraction for b > −1; below it x G_(β−1) = 1 − β G_β downward from b + n in (−1, 0], where nothing cancels. */
function fraction(b: number, x: number): number {
  if (b > -1) return fromTail(b, x);
  const n = Math.floor(-b);
  let value = fromTail(b + n, x);
  for (let k = n; k >= 1; k--) value = (1 - (b + k) * value) / x;
  return value;
}

/** 1/(x+1+b − 1(1+b)/(x+3+b − 2(2+b)/(x+5+b − …))) from the tail, b > −1; the truncation error is below e^(−4√(N x)). */
function fromTail(b: number, x: number): number {
  let s = 0;
  for (let n = Math.ceil(90 / x) + 8; n >= 0; n--) s = 1 / (x + 2 * n + 1 + b - (n + 1) * (n + 1 + b) * s);
  return s;
}
