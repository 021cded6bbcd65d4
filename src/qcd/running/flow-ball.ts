/**
 * @module The closed-form flow of flow.ts in enclosures of any precision.
 *
 * Method     b_k and g_k as balls; the zeros of S in disjoint certified boxes; the logarithms in ball arithmetic.
 * Bound      every function returns an enclosure. A flow whose zeros cannot be separated does not exist (undefined): it
 *            does not occur for n_f from 0 to 16.
 */
import { C, R, atan2, certifiedRoots, log, log1p, type Ball, type Complex } from '../../numerics/index.js';
import { betaCoefficients, massDimensionCoefficients, type Loops } from '../beta-function.js';

export interface BallPole {
  readonly w: Complex;
  readonly coupling: Complex;
  readonly mass: Complex;
  /** Real zero, or the upper or lower member of a pair of w. */
  readonly half: 'real' | 'upper' | 'lower';
}

export interface BallFlow {
  readonly prec: number;
  readonly b0: Ball;
  readonly s: readonly Ball[];
  readonly g0: Ball;
  readonly poles: readonly BallPole[];
  readonly constant: Ball;
}

/** Bits beyond what is asked, for the cancellations in residues and logarithms. */
const GUARD = 40;

const flows = new Map<string, BallFlow>();

/** The flow to about `prec` bits; kept. */
export function ballFlow(flavours: number, loops: Loops, prec: number): BallFlow | undefined {
  const key = `${flavours} ${loops}`;
  let flow = flows.get(key);
  if (flow === undefined || flow.prec < prec) {
    flow = createFlow(flavours, loops, prec);
    if (flow !== undefined) flows.set(key, flow);
  }
  return flow;
}

function createFlow(flavours: number, loops: Loops, prec: number): BallFlow | undefined {
  const work = prec + GUARD;
  const b = betaCoefficients(flavours, '1')
    .slice(0, loops)
    .map((x) => x.ball(work));
  const g = massDimensionCoefficients(flavours, '1')
    .slice(0, loops)
    .map((x) => x.ball(work));
  const b0 = b[0] ?? R.INDETERMINATE;
  const s = b.map((x, k) => (k === 0 ? R.ONE : R.div(x, b0, work)));
  const slope = s.slice(1).map((c, k) => R.mul(c, R.fromNumber(k + 1), work));
  const poles: BallPole[] = [];
  if (loops > 1) {
    const found = certifiedRoots(s, work);
    if ('failed' in found) return undefined;
    for (const { value: z, real } of found.roots) {
      const d = polynomial(slope, z, work);
      const zd = C.mul(z, d, work);
      // The upper half-plane of z is the lower one of w = 1/z.
      const half = real ? 'real' : R.isPositive(z.im) ? 'lower' : 'upper';
      poles.push({
        w: C.inv(z, work),
        coupling: C.inv(C.mul(z, zd, work), work),
        mass: C.div(polynomial(g, z, work), zd, work),
        half,
      });
    }
  }
  const constant = R.mul(s[1] ?? R.ZERO, log(b0, work), work);
  return { prec, b0, s, g0: g[0] ?? R.ZERO, poles, constant };
}

function polynomial(c: readonly Ball[], x: Complex, prec: number): Complex {
  let sum: Complex = C.ZERO;
  for (let k = c.length - 1; k >= 0; k--) {
    sum = C.add(C.mul(sum, x, prec), C.fromReal(c[k] ?? R.ZERO), prec);
  }
  return sum;
}

/** S(α) for a complex ball. */
export const complexBracket = (flow: BallFlow, alpha: Complex, prec: number): Complex =>
  polynomial(flow.s, alpha, prec);

/** S(α) for a real ball. */
export function realBracket(flow: BallFlow, alpha: Ball, prec: number): Ball {
  let sum: Ball = R.ZERO;
  for (let k = flow.s.length - 1; k >= 0; k--) sum = R.add(R.mul(sum, alpha, prec), flow.s[k] ?? R.ZERO, prec);
  return sum;
}

/** Certainly y > 0 and y > w for every positive zero: the interval in which α runs. */
export function inDomain(flow: BallFlow, y: Ball, prec: number): boolean {
  return R.isPositive(y) && flow.poles.every(({ w, half }) => half !== 'real' || R.isPositive(R.sub(y, w.re, prec)));
}

/** ln(μ²/Λ²) as a function of y = 1/α; INDETERMINATE outside the domain. */
export function ballLogOfInverse(flow: BallFlow, y: Ball, prec: number): Ball {
  const work = prec + GUARD;
  let sum = R.add(y, flow.constant, work);
  for (const { w, coupling, half } of flow.poles) {
    if (half === 'lower') continue;
    const d = R.sub(y, w.re, work);
    if (half === 'real') {
      sum = R.sub(sum, R.mul(coupling.re, log(d, work), work), work);
    } else {
      const norm = R.add(R.sqr(d, work), R.sqr(w.im, work), work);
      const turn = R.mul2exp(R.mul(coupling.im, atan2(R.neg(w.im), d, work), work), 1);
      sum = R.add(R.sub(sum, R.mul(coupling.re, log(norm, work), work), work), turn, work);
    }
  }
  return R.div(sum, flow.b0, prec);
}

/** Σ_i B_i ln(1 − α w_i)/b_0: see massLogBeyondOneLoop of flow.ts. */
export function ballMassLog(flow: BallFlow, alpha: Ball, prec: number): Ball {
  const work = prec + GUARD;
  let sum: Ball = R.ZERO;
  for (const { w, mass, half } of flow.poles) {
    if (half === 'lower') continue;
    const re = R.neg(R.mul(alpha, w.re, work));
    if (half === 'real') {
      sum = R.add(sum, R.mul(mass.re, log1p(re, work), work), work);
    } else {
      const im = R.neg(R.mul(alpha, w.im, work));
      const one = R.add(R.ONE, re, work);
      const norm = R.add(R.sqr(one, work), R.sqr(im, work), work);
      const turn = R.mul2exp(R.mul(mass.im, atan2(im, one, work), work), 1);
      sum = R.sub(R.add(sum, R.mul(mass.re, log(norm, work), work), work), turn, work);
    }
  }
  return R.div(sum, flow.b0, prec);
}
