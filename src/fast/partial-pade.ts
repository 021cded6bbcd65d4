/**
 * @module Partial Borel–Padé in doubles: stated singularities factored out, the rest rational, summed along a ray.
 *
 *   B(t) = Π (1 − t/t_i)^{−γ_i} [L/M](t). The ray is kept for every replica; complex poles lie on the side on which the contour of
 * prescriptions/ray-family.ts has them. Refused like there: no room for a contour, a pole where none may be, an entry that does not
 * exist; and complex poles that nearly coincide.
 */
import { binomialSeries, chooseRay, multiplySeries, NEAR_AXIS_ANGLE } from '../borel/index.js';
import { doubleField } from '../numerics/index.js';
import type { Kernel } from './kernel.js';
import { Approximant } from './poles.js';
import type { PoleRules } from './poles.js';
import { RationalOnRay } from './rational-ray.js';

export interface PartialPadeSetting extends PoleRules {
  readonly kind: 'borel-partial-pade';
  readonly L: number;
  readonly M: number;
  readonly factors: readonly { readonly t: number; readonly exponent: number }[];
  /** Pass above pairs next to the positive axis. */
  readonly lift: boolean;
  /** Central value of x. */
  readonly x: number;
}

/** Poles nearer to each other, relatively, have no residues of their own in doubles. Heuristic. */
const COLLISION = 1e-5;

export function partialPadeKernel({ L, M, factors, lift, x: X, ...rules }: PartialPadeSetting): Kernel {
  const N = L + M + 1;
  const fitted = new Approximant(L, M, rules);
  const { pade } = fitted;
  const strip = factors.reduce<number[]>(
    (acc, f) => multiplySeries(doubleField, acc, binomialSeries(doubleField, f.exponent, -1 / f.t, N), N),
    [1],
  );
  const factorAt = (re: number, im: number, out: Float64Array): void => {
    let log = 0;
    let turn = 0;
    for (const { t, exponent } of factors) {
      const a = 1 - re / t;
      const b = -im / t;
      log -= exponent * Math.log(Math.hypot(a, b));
      turn -= exponent * Math.atan2(b, a);
    }
    const size = Math.exp(log);
    out[0] = size * Math.cos(turn);
    out[1] = size * Math.sin(turn);
  };
  const sum = new RationalOnRay(fitted, factorAt, X);
  const borel = new Float64Array(N);
  const rest = new Float64Array(N);

  /** Angle below which the prescription's own contour passes above a pole; undefined when there is no room for one. */
  const contourAngle = (): number | undefined => {
    const args: number[] = [];
    for (let i = 0; i < pade.poleCount; i++)
      if (pade.poleIm[i]! > 0 && pade.poleRe[i]! > 0) args.push(Math.atan2(pade.poleIm[i]!, pade.poleRe[i]!));
    if (args.length > 0 && fitted.closest < COLLISION) return undefined;
    return chooseRay(args, lift ? NEAR_AXIS_ANGLE : 0)?.ray.angle;
  };

  return {
    prepare(c) {
      if (c.length < N) return false;
      let factorial = 1;
      for (let n = 0; n < N; n++) {
        borel[n] = c[n]! / factorial;
        factorial *= n + 1;
      }
      for (let n = 0; n < N; n++) {
        let term = 0;
        for (let k = 0; k <= n; k++) term += borel[k]! * (strip[n - k] ?? 0);
        rest[n] = term;
      }
      if (!fitted.fit(rest)) return false;
      const angle = contourAngle();
      if (angle === undefined) return false;
      sum.prepare((arg) => arg < angle);
      return true;
    },
    value: (x) => sum.value(x),
  };
}
