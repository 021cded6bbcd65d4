/**
 * @module What momenta below μ_f leave behind in a series: the model of one power correction, as a series and as a number.
 *
 * Method     the power (Λ/Q)^d with exponent γ comes from x^k C(x) F, x = x(Q), C = 1 + C_1 x + … the operator's coefficient and
 *              F(μ_f) = ∫_{τ<τ_f} dτ/τ τ^s x(k) (x(k)/x(Q))^ν,  τ = k²/Q²,  s = d/2,  τ_f = μ_f²/Q²,
 *            γ = 1 + d β_1/(2β_0²) + ν − k, ν ≥ −1/2. At μ_f = Q, F = Σ g_n x^(n+1) with
 *              s g_n = δ_(n0) + Σ_j (n − j + ν) b_j g_(n−1−j),  b_j of dx/d ln μ² = −Σ b_j x^(j+2).
 *            Sum: with w = 1/x as the variable, dy = dw/B(1/w), B(x) = Σ b_j x^j, y = ln τ,
 *              F = −∫_ray dw/B · w^(−1) (w_f/w)^ν e^(s (y(w) − y(w_f))),  w = w_f + v e^(2πi/3),
 *            a lateral Borel sum: the contour passes the Landau singularity on one side. Its real part is the principal value.
 * Bound      series exact; the sum by 6000 fourth-order steps, 1e-8. Refused where B is not led by its first term on the ray.
 * Reference  the one-loop integral is standard (M. Beneke, Phys. Rept. 317 (1999) 1, from memory); the rest is re-derived.
 */
import { Rational, exact, gammaDouble } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { changeScale, liftExact, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';

/** Steps along the ray, and how many decay lengths it has. */
const STEPS = 6000;
const DECAYS = 40;
/** Orders of the ratio to the leading growth; their differences are powers of 1/n. */
const FIRST_ORDER = 50;
const DOUBLINGS = 4;

/** g_0 … g_(N−1). */
export function lowMomentumSeries(beta: readonly Exact[], s: Exact, length: number, nu?: Exact): Exact[] {
  const extra = nu === undefined ? [] : [nu];
  return liftExact([s, ...beta, ...extra], (ring, [power = ring.one, ...rest]) => {
    const b = rest.slice(0, beta.length);
    const shift = rest[beta.length] ?? ring.zero;
    const g: (typeof power)[] = [];
    for (let n = 0; n < length; n++) {
      let sum = n === 0 ? ring.one : ring.zero;
      b.forEach((own, j) => {
        const earlier = g[n - 1 - j];
        if (earlier === undefined) return;
        const weight = ring.add(ring.fromRational(Rational.of(n - j)), shift);
        sum = ring.add(sum, ring.mul(ring.mul(weight, own), earlier));
      });
      g.push(ring.div(sum, power));
    }
    return g;
  });
}

/** The same below μ_f in powers of x(Q), without τ_f^s; log = ln(Q²/μ_f²). */
export function loweredSeries(g: readonly Exact[], beta: readonly Exact[], log: Exact, nu: Exact): Exact[] {
  const moved = changeScale({ coefficients: g, firstPower: 1 }, beta, log);
  if (nu.rational?.isZero() === true) return moved;
  const unit = g.map((_, n) => exact(n === 0 ? 1 : 0));
  const coupling = changeScale({ coefficients: unit, firstPower: 1 }, beta, log);
  return liftExact([nu, ...coupling, ...moved], (ring, [exponent = ring.zero, ...rest]) => {
    const [f, series] = [rest.slice(0, g.length), rest.slice(g.length)];
    // (1 + f_1 x + …)^ν: n p_n = Σ_j (ν j − (n − j)) f_j p_(n−j).
    const p = [ring.one];
    for (let n = 1; n < g.length; n++) {
      let sum = ring.zero;
      for (let j = 1; j <= n; j++) {
        const size = ring.fromRational(Rational.of(j));
        const weight = ring.sub(ring.mul(exponent, size), ring.fromRational(Rational.of(n - j)));
        sum = ring.add(sum, ring.mul(ring.mul(weight, f[j] ?? ring.zero), p[n - j] ?? ring.zero));
      }
      p.push(ring.div(sum, ring.fromRational(Rational.of(n))));
    }
    return series.map((_, n) =>
      p.slice(0, n + 1).reduce((sum, own, j) => ring.add(sum, ring.mul(own, series[n - j] ?? ring.zero)), ring.zero),
    );
  });
}

/** N of g_n → N t_s^(−n) Γ(n + p + 1)/Γ(p + 1), p = s b_1/b_0² + ν. */
export function lowMomentumStrength(beta: readonly number[], s: number, nu: number): number {
  const [b0 = NaN, b1 = 0] = beta;
  const t = s / b0;
  const gamma = 1 + (s * b1) / (b0 * b0) + nu;
  const h = [1 / s];
  for (let n = 1; n <= FIRST_ORDER * 2 ** DOUBLINGS; n++) {
    let sum = 0;
    let falling = 1;
    for (let j = 0; j < beta.length && j < n; j++) {
      falling *= t / (n + gamma - 1 - j);
      sum += (n - j + nu) * (beta[j] ?? 0) * falling * (h[n - 1 - j] ?? 0);
    }
    h.push(sum / s);
  }
  let row = Array.from({ length: DOUBLINGS + 1 }, (_, k) => h[FIRST_ORDER * 2 ** k] ?? NaN);
  for (let m = 1; row.length > 1; m++)
    row = row.slice(1).map((fine, k) => fine + (fine - (row[k] ?? NaN)) / (2 ** m - 1));
  return row[0] ?? NaN;
}

/** N of x^k times such a series, for t_s^(−n) Γ(n + γ)/Γ(γ) with γ = p + 1 − k. */
export const shiftedStrength = (strength: number, t: number, gamma: number, k: number): number =>
  (strength * t ** k * gammaDouble(gamma)) / gammaDouble(gamma + k);

export interface LowMomentumSum {
  /** Principal value. */
  readonly pv: number;
  /** |Im| of the lateral sums. */
  readonly im: number;
}

type Complex = readonly [re: number, im: number];
const times = ([a, b]: Complex, [c, d]: Complex): Complex => [a * c - b * d, a * d + b * c];
const inverse = ([a, b]: Complex): Complex => [a / (a * a + b * b), -b / (a * a + b * b)];
const exponential = ([a, b]: Complex): Complex => [Math.exp(a) * Math.cos(b), Math.exp(a) * Math.sin(b)];
const logarithm = ([a, b]: Complex): Complex => [Math.log(Math.hypot(a, b)), Math.atan2(b, a)];
const DIRECTION: Complex = [-0.5, Math.sqrt(3) / 2];

/** ∫_{−∞}^0 dy e^(sy) x(y) (x(y)/x(0))^ν from x = x(0) on. */
export function lowMomentumSum(beta: readonly number[], s: number, x: number, nu: number): LowMomentumSum | Refusal {
  const [b0 = NaN] = beta;
  const start = 1 / x;
  const nearest = start * DIRECTION[1];
  const others = beta.slice(1).reduce((sum, b, j) => sum + Math.abs(b / b0) * nearest ** -(j + 1), 0);
  if (!(others < 1)) {
    return refuse(
      'the coupling at mu_f is so strong that its beta function is not led by the first loop any more',
      'choose a larger cut',
    );
  }
  // Slopes of y(w) − y(w_f) and of the integral at v.
  const slopes = (v: number, y: Complex): readonly [Complex, Complex] => {
    const w: Complex = [start + v * DIRECTION[0], v * DIRECTION[1]];
    const own = inverse(w);
    const b = beta.reduceRight<Complex>(
      (sum, c) => {
        const [re, im] = times(sum, own);
        return [re + c, im];
      },
      [0, 0],
    );
    const step = times(DIRECTION, inverse(b));
    const [logRe, logIm] = logarithm(w);
    const front = exponential([s * y[0] - nu * (logRe - Math.log(start)), s * y[1] - nu * logIm]);
    return [step, times(step, times(own, front))];
  };
  const h = (DECAYS * b0) / s / -DIRECTION[0] / STEPS;
  let y: Complex = [0, 0];
  let sum: Complex = [0, 0];
  const along = (a: Complex, slope: Complex, by: number): Complex => [a[0] + by * slope[0], a[1] + by * slope[1]];
  for (let i = 0; i < STEPS; i++) {
    const v = i * h;
    const k1 = slopes(v, y);
    const k2 = slopes(v + h / 2, along(y, k1[0], h / 2));
    const k3 = slopes(v + h / 2, along(y, k2[0], h / 2));
    const k4 = slopes(v + h, along(y, k3[0], h));
    const mean = (part: 0 | 1): Complex => [
      (k1[part][0] + 2 * k2[part][0] + 2 * k3[part][0] + k4[part][0]) / 6,
      (k1[part][1] + 2 * k2[part][1] + 2 * k3[part][1] + k4[part][1]) / 6,
    ];
    sum = along(sum, mean(1), h);
    y = along(y, mean(0), h);
  }
  return { pv: -sum[0], im: Math.abs(sum[1]) };
}
