/**
 * @module Three published estimators of the strength N of a Borel singularity N (1 − t/t_s)^(−1−p) [1 + c_1(1 − t/t_s) + …].
 *
 * All take r_n of R = Σ_{n≥0} r_n x^(n+1) and return one number for each count of known coefficients, so that their
 * convergence is seen.
 * Bound      none of their own: each converges only if no other singularity lies inside |t| < |t_s|.
 */

/** Γ(n + 1 + p)/Γ(1 + p) = (1 + p)(2 + p)…(n + p). */
function rising(p: number, n: number): number {
  let product = 1;
  for (let k = 1; k <= n; k++) product *= p + k;
  return product;
}

/**
 * r_n over its asymptotic form without N:
 * t_s^(−n) Γ(n+1+p)/Γ(1+p) [1 + Σ_k c_k p(p−1)…(p−k+1)/((n+p)(n+p−1)…(n+p−k+1))].
 * Reference: M. Beneke, P. Marquard, P. Nason, M. Steinhauser, arXiv:1605.03609.
 */
export function asymptoticRatio(r: readonly number[], t: number, p: number, corrections: readonly number[]): number[] {
  return r.map((value, n) => {
    let bracket = 1;
    let weight = 1;
    corrections.forEach((c, k) => {
      weight *= (p - k) / (n + p - k);
      bracket += c * weight;
    });
    return value / (t ** -n * rising(p, n) * bracket);
  });
}

/**
 * (1 − t/t_s)^(1+p) B(t), expanded in t and summed at t = t_s.
 * Reference: T. Lee, Phys. Rev. D56 (1997) 1091; A. Pineda, hep-ph/0105008.
 */
export function borelFactor(r: readonly number[], t: number, p: number): number[] {
  // Taylor coefficients of (1 − v)^(1+p): (−1)^k binomial(1+p, k).
  const factor = [1];
  for (let k = 1; k < r.length; k++) factor.push((-(factor[k - 1] ?? 0) * (2 + p - k)) / k);
  let factorial = 1;
  const borel = r.map((x, n) => {
    if (n > 0) factorial *= n;
    return (x * t ** n) / factorial;
  });
  let sum = 0;
  return borel.map((_, n) => {
    for (let k = 0; k <= n; k++) sum += (factor[k] ?? 0) * (borel[n - k] ?? 0);
    return sum;
  });
}

/**
 * The sum rule in the coupling with β = −b_0 x²/(1 − q x): with f_n = r_n − (2/d) Σ_{j<n} b_0 q^j (n − j) r_{n−1−j},
 * N = Γ(1+p) Σ_n (n + 1) f_n t_s^n/Γ(n + 2 + p), t_s = d/(2b_0), p = d β_1/(2β_0²).
 * Reference: J. Komijani, arXiv:1701.00347; N. Brambilla, J. Komijani, A. Kronfeld, A. Vairo, arXiv:1712.04983.
 */
export function sumRule(rGeometric: readonly number[], b0: number, q: number, d: number): number[] {
  let sum = 0;
  return sumRuleTerms(rGeometric, b0, q, d).map((h) => (sum += h));
}

/** The terms of the sum rule. */
export function sumRuleTerms(rGeometric: readonly number[], b0: number, q: number, d: number): number[] {
  const t = d / (2 * b0);
  // b_1 = q b_0 in any normalisation: β_1/(2β_0²) = q/(2b_0).
  const p = (d * q) / (2 * b0);
  return rGeometric.map((value, n) => {
    let f = value;
    for (let j = 0; j < n; j++) f -= (2 / d) * b0 * q ** j * (n - j) * (rGeometric[n - 1 - j] ?? 0);
    return ((n + 1) * f * t ** n) / rising(p, n + 1);
  });
}
