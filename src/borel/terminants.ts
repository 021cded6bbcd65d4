/**
 * @module Level-one hyperasymptotics about one Borel singularity: terminants with coefficients read off the late terms.
 *
 * Purpose    c_n ~ Σ_j S_j Γ(n+γ−j) t*^{−n} (Darboux; poles and logarithms included, S_j = N c_j/Γ(γ−j) elsewhere). After the
 *            first ℓ terms the remainder of F is Σ_j S_j Ω_j(ℓ),
 *              t* > 0:  Ω_j = Γ(ℓ+γ−j) (x/t*)^ℓ ω F_{ℓ+γ−j−1}(ω)  (principal value),   Im above = π ω^{γ−j} e^{−ω},
 *              t* < 0:  Ω_j = Γ(ℓ+γ−j) (x/t*)^ℓ ω G_{ℓ+γ−j−1}(ω),                      ω = |t*|/x.
 * Method     the J unknown S_j from the last J coefficients: a J×J system, rows scaled by Γ(n+γ) t*^{−n}.
 * Bound      enclosures of what the truncated sum defines; how good it is, the prescription estimates.
 * Reference  M. V. Berry, C. J. Howls, Proc. R. Soc. A 430 (1990) 653; A. B. Olde Daalhuis, F. W. J. Olver (1995);
 *            DLMF 2.11(iii), 10.40(iv) (from memory; identities checked numerically).
 */
import {
  addExact,
  branchAlternating,
  branchSame,
  exact,
  exp,
  gamma,
  pi,
  pow,
  R,
  solveBall,
} from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { LaplaceSum } from './laplace.js';

export interface Leader {
  readonly t: Exact;
  readonly exponent: Exact;
}

const minus = (a: Exact, k: number): Exact => addExact(a, exact(-k));

/** Γ(n+γ−j)/Γ(n+γ) = 1/[(n+γ−1)…(n+γ−j)]. */
function relativeGamma(g: Ball, n: number, j: number, prec: number): Ball {
  let product: Ball = R.ONE;
  for (let i = 1; i <= j; i++) product = R.mul(product, R.add(g, R.fromNumber(n - i), prec), prec);
  return R.div(R.ONE, product, prec);
}

/** c_n t*^n/Γ(n+γ). */
function scaledCoefficient(c: Exact, n: number, s: Leader, prec: number): Ball {
  const weight = gamma(R.add(s.exponent.ball(prec), R.fromNumber(n), prec), prec);
  return R.div(R.mul(c.ball(prec), R.powInt(s.t.ball(prec), n, prec), prec), weight, prec);
}

/**
 * S_0 … S_{J−1} from the last J coefficients. `ties` gives S_j/S_0 for the leading pieces when the corrections are known:
 * they then count as one unknown, and J is 1. Undefined when the system cannot be solved at this precision.
 */
export function fitStrengths(
  c: readonly Exact[],
  s: Leader,
  J: number,
  prec: number,
  ties: readonly Exact[] = [],
): Ball[] | undefined {
  const g = s.exponent.ball(prec);
  const rows = Array.from({ length: J }, (_, i) => c.length - J + i);
  if (ties.length > 0) {
    const n = c.length - 1;
    const sum = ties.reduce(
      (acc, tie, i) => R.add(acc, R.mul(tie.ball(prec), relativeGamma(g, n, i + 1, prec), prec), prec),
      R.ONE,
    );
    const lead = R.div(scaledCoefficient(c[n]!, n, s, prec), sum, prec);
    return [lead, ...ties.map((tie) => R.mul(tie.ball(prec), lead, prec))];
  }
  const matrix = rows.map((n) => Array.from({ length: J }, (_, j) => relativeGamma(g, n, j, prec)));
  return solveBall(
    matrix,
    rows.map((n) => scaledCoefficient(c[n]!, n, s, prec)),
    prec,
  );
}

/** Σ_j S_j Γ(n+γ−j) t*^{−n}: what the leading singularity puts into c_n. */
export function lateCoefficient(s: Leader, strengths: readonly Ball[], n: number, prec: number): Ball {
  const g = s.exponent.ball(prec);
  const weight = R.div(gamma(R.add(g, R.fromNumber(n), prec), prec), R.powInt(s.t.ball(prec), n, prec), prec);
  const sum = strengths.reduce<Ball>(
    (acc, S, j) => R.add(acc, R.mul(S, relativeGamma(g, n, j, prec), prec), prec),
    R.ZERO,
  );
  return R.mul(weight, sum, prec);
}

/** Ω_j(ℓ) and its imaginary part; ℓ + γ − j must be positive. */
export function terminant(s: Leader, j: number, cut: number, x: Ball, prec: number): LaplaceSum {
  const t = s.t.ball(prec);
  const w = R.div(R.abs(t), x, prec);
  const argument = R.add(s.exponent.ball(prec), R.fromNumber(cut - j), prec);
  const front = R.mul(gamma(argument, prec), R.powInt(R.div(x, t, prec), cut, prec), prec);
  const b = minus(s.exponent, j + 1 - cut);
  if (!R.isPositive(t)) return { pv: R.mul(front, R.mul(w, branchAlternating(b, w, prec), prec), prec), im: R.ZERO };
  const pv = R.mul(front, R.mul(w, branchSame(b, w, prec).pv, prec), prec);
  const power = pow(w, minus(s.exponent, j).ball(prec), prec);
  return { pv, im: R.mul(pi(prec), R.mul(power, exp(R.neg(w), prec), prec), prec) };
}

/** Σ_{n<ℓ} c_n x^n + Σ_j S_j Ω_j(ℓ). */
export function hyperasymptoticSum(
  c: readonly Exact[],
  s: Leader,
  strengths: readonly Ball[],
  cut: number,
  x: Ball,
  prec: number,
): LaplaceSum {
  let pv: Ball = R.ZERO;
  for (let n = Math.min(cut, c.length) - 1; n >= 0; n--) pv = R.add(R.mul(pv, x, prec), c[n]!.ball(prec), prec);
  let im: Ball = R.ZERO;
  strengths.forEach((S, j) => {
    const piece = terminant(s, j, cut, x, prec);
    pv = R.add(pv, R.mul(S, piece.pv, prec), prec);
    im = R.add(im, R.mul(S, piece.im, prec), prec);
  });
  return { pv, im };
}
