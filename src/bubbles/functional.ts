/**
 * @module Linear functionals of a Borel transform, by their values on (u − p)^(−m).
 *
 * Purpose    the Laplace integral, its imaginary part, Taylor coefficients, the distribution of virtualities: each is a sum
 *            over the same poles, with other numbers in front.
 */
import { R } from '../numerics/index.js';
import type { Ball, Rational } from '../numerics/index.js';
import type { SineKernel } from './tower.js';

export interface Residual {
  at(at: Rational, orders: number): readonly Ball[];
  /** Bound at p >= first; falls by `decay` a step. */
  bound(first: number, m: number): number;
  readonly decay: number;
}

export interface Functional {
  /** F on (u − at)^(−m), m = 1 … orders: for towers a moment sequence ∫_0^1 x^k dν in k, up to the residual. */
  moments(at: Rational, orders: number): readonly Ball[];
  /** What comes on top of the moments at p > 0 and falls off like decay^p; zero where absent. */
  readonly residual?: Residual;
  /**
   * Bound of ∫|dν| for order m and a tower that starts at |p| = first, where the integrand beside dν is a polynomial
   * bounded by 1 with a derivative bounded by 2n² on [0, 1].
   */
  mass(side: 'infrared' | 'ultraviolet', first: number, m: number, n: number): number;
  /** Bound of |F| and its residual on every (u − p)^(−m) with p >= first, for the towers that fall off geometrically. */
  bound(first: number, m: number): number;
}

/** Moments and residual together. */
export function wholeValue(f: Functional, at: Rational, orders: number, prec: number): readonly Ball[] {
  const moments = f.moments(at, orders);
  if (f.residual === undefined || at.sign() <= 0) return moments;
  const more = f.residual.at(at, orders);
  return moments.map((x, i) => R.add(x, more[i]!, prec));
}

/**
 * The functional of K(u)·g(u), K = Σ_c w_c/(u − c), from that of g:
 *   1/((u−c)(u−p)^m) = (c−p)^(−m)/(u−c) − Σ_{i<=m} (c−p)^(i−m−1)/(u−p)^i, and (u−c)^(−m−1) for p = c.
 */
export function withKernelPoles(f: Functional, kernel: SineKernel, prec: number): Functional {
  if (kernel.poles.length === 0) return f;
  const constants = new Map<Rational, Ball>(kernel.poles.map(({ at }) => [at, wholeValue(f, at, 1, prec)[0]!]));
  const weights = kernel.poles.reduce((sum, { weight }) => sum + Math.abs(weight.toNumber()), 0);
  const largest = Math.max(...kernel.poles.map(({ at }) => at.toNumber()));

  const spread = (at: Rational, orders: number, values: readonly Ball[], fixed: boolean): Ball[] => {
    const out = Array.from({ length: orders }, (): Ball => R.ZERO);
    for (const { at: c, weight } of kernel.poles) {
      const gap = c.sub(at);
      for (let m = 1; m <= orders; m++) {
        let sum: Ball = R.ZERO;
        if (gap.isZero()) sum = values[m]!;
        else {
          if (fixed) sum = R.mul(constants.get(c)!, R.fromRational(gap.pow(-m), prec), prec);
          for (let i = 1; i <= m; i++) {
            sum = R.sub(sum, R.mul(values[i - 1]!, R.fromRational(gap.pow(i - m - 1), prec), prec), prec);
          }
        }
        out[m - 1] = R.add(out[m - 1]!, R.mul(sum, R.fromRational(weight, prec), prec), prec);
      }
    }
    return out;
  };

  const { residual } = f;
  return {
    moments: (at, orders) => spread(at, orders, f.moments(at, orders + 1), true),
    ...(residual === undefined
      ? {}
      : {
          residual: {
            at: (at: Rational, orders: number) => spread(at, orders, residual.at(at, orders + 1), false),
            bound: (first: number, m: number) => {
              let sum = 0;
              for (let i = 1; i <= m; i++) sum += residual.bound(first, i);
              return sum * weights;
            },
            decay: residual.decay,
          },
        }),
    mass(side, first, m, n) {
      let sum = 0;
      for (const { at: c, weight } of kernel.poles) {
        // (c − p)^(−i) in k: moments with the mass of its first value.
        const gap = side === 'infrared' ? first - c.toNumber() : first + c.toNumber();
        if (!(gap > 0)) return Infinity;
        let own = Math.abs(R.toNumber(constants.get(c)!)) * 1.001 * gap ** -m;
        for (let i = 1; i <= m; i++) own += gap ** (i - m - 1) * f.mass(side, first, i, n);
        sum += Math.abs(weight.toNumber()) * own;
      }
      return sum;
    },
    bound(first, m) {
      let sum = 0;
      for (const { at: c, weight } of kernel.poles) {
        let own = Math.abs(R.toNumber(constants.get(c)!)) * 1.001;
        for (let i = 1; i <= m; i++) own += f.bound(first, i);
        sum += Math.abs(weight.toNumber()) * own;
      }
      return first < largest + 1 ? Infinity : sum;
    },
  };
}
