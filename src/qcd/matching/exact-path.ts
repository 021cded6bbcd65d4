/**
 * @module The path of path.ts in exact numbers: α_s and masses over thresholds to any number of digits.
 *
 * Method     certified running between the thresholds; the truncated decoupling relation as a polynomial with exact
 *            coefficients; upwards its root by Newton's method, proved by a change of sign and the sign of the slope.
 * Bound      certified: enclosures of the exact solution of the truncated equations with the given masses.
 */
import { R, Rational, exact, exactReal, log, pi, toNumberExact, type Ball, type Exact } from '../../numerics/index.js';
import { isRefusal, type Refusal } from '../refusal.js';
import { exactAlpha, exactMassRatio } from '../running/exact-alpha.js';
import { evolvePath, type PathQuestion } from './path.js';
import { exactTable, type MatchedQuantity } from './tables.js';
import { DEFAULT_THRESHOLDS, crossingScale, type Threshold } from './thresholds.js';

export interface ExactPathQuestion extends Omit<PathQuestion, 'alpha' | 'mass' | 'from' | 'to'> {
  readonly alpha: Exact;
  readonly mass?: Exact;
  readonly from: { readonly scale: Exact; readonly flavours: number };
  readonly to: { readonly scale: Exact; readonly flavours: number };
}

export interface ExactPathResult {
  readonly alpha: Exact;
  readonly mass?: Exact;
}

/** Coefficients of (α_s/π)^k at the logarithm of the crossing, as enclosures. */
function coefficients(crossing: Threshold, quantity: MatchedQuantity, loops: number, prec: number): Ball[] {
  const { exactMass, exactScale } = exactly(crossing);
  const l = R.mul2exp(log(R.div(exactScale.ball(prec), exactMass.ball(prec), prec), prec), 1);
  return exactTable(crossing.flavours - 1, quantity, crossing.kind ?? 'scale-invariant')
    .slice(0, loops + 1)
    .map((row) => {
      let sum: Ball = R.ZERO;
      for (let j = row.length - 1; j >= 0; j--) {
        sum = R.add(R.mul(sum, l, prec), row[j]?.ball(prec) ?? R.INDETERMINATE, prec);
      }
      return sum;
    });
}

/**
 * The doubles of a threshold stand for the decimals that a person wrote: 4.18 is 209/50, and 4.18/2 is half of it only
 * when the crossing scale was given as such.
 */
function exactly(t: Threshold): { exactMass: Exact; exactScale: Exact } {
  const of = (x: number): Exact => exact(Rational.parse(String(x)) ?? Rational.fromNumber(x));
  return { exactMass: of(t.mass), exactScale: of(crossingScale(t)) };
}

function horner(c: readonly Ball[], x: Ball, prec: number): Ball {
  let sum: Ball = R.ZERO;
  for (let k = c.length - 1; k >= 0; k--) sum = R.add(R.mul(sum, x, prec), c[k] ?? R.ZERO, prec);
  return sum;
}

/** Bits of room around the root within which the change of sign is looked for. */
const LARGEST_ROOM = 12;

/** The root near `start` of x Z(x) = goal. */
function solveUp(z: readonly Ball[], goal: Ball, start: number, prec: number): Ball {
  const slopeOf = z.map((c, k) => R.mul(c, R.fromNumber(k + 1), prec));
  const f = (x: Ball): Ball => R.sub(R.mul(x, horner(z, x, prec), prec), goal, prec);
  let x = R.fromNumber(start);
  for (let bits = 40; bits < 4 * prec; bits *= 2) {
    x = R.exactMid(R.sub(x, R.div(f(x), horner(slopeOf, x, prec), prec), prec));
  }
  const size = R.upperBits(f(x));
  if (size === Infinity) return R.INDETERMINATE;
  for (let room = 0; room <= LARGEST_ROOM; room++) {
    const delta = R.mul2exp(R.ONE, Math.max(size, -4 * prec) + room);
    const root = R.widen(x, delta);
    const low = f(R.sub(x, delta, prec + 60));
    const high = f(R.add(x, delta, prec + 60));
    if (!R.isPositive(horner(slopeOf, root, prec))) return R.INDETERMINATE;
    if (R.isNegative(low) && R.isPositive(high)) return root;
  }
  return R.INDETERMINATE;
}

/** α_s (and a mass) at the goal as exact numbers; the refusals of evolvePath. */
export function exactPath(question: ExactPathQuestion): ExactPathResult | Refusal {
  const { options = {} } = question;
  const loops = options.loops ?? 5;
  const matchingLoops = options.matchingLoops ?? loops - 1;
  const thresholds = options.thresholds ?? DEFAULT_THRESHOLDS;
  // The doubles decide what is refused and where Newton's method starts.
  const guide = evolvePath({
    alpha: toNumberExact(question.alpha),
    from: { scale: toNumberExact(question.from.scale), flavours: question.from.flavours },
    to: { scale: toNumberExact(question.to.scale), flavours: question.to.flavours },
    options,
  });
  if (isRefusal(guide)) return guide;

  let { alpha, mass } = question;
  let scale = question.from.scale;
  let { flavours } = question.from;
  for (const step of guide.steps) {
    if (step.action === 'run') {
      const crossing = thresholds.find((t) => crossingScale(t) === step.scale);
      const last = step === guide.steps[guide.steps.length - 1];
      const to = last || crossing === undefined ? question.to.scale : exactly(crossing).exactScale;
      const leg = { alpha, from: scale, to, flavours, loops };
      const end = exactAlpha(leg);
      if (isRefusal(end)) return end;
      if (mass !== undefined) {
        const ratio = exactMassRatio(leg);
        if (isRefusal(ratio)) return ratio;
        mass = product(mass, ratio);
      }
      alpha = end;
      scale = to;
    } else if (step.action === 'match') {
      const crossing = thresholds.find((t) => t.name === step.threshold);
      if (crossing === undefined) continue;
      const up = step.flavours > flavours;
      const before = alpha;
      const after = matched(before, crossing, matchingLoops, up, step.alpha);
      const heavy = up ? after : before;
      if (mass !== undefined) mass = massMatched(mass, heavy, crossing, matchingLoops, up);
      alpha = after;
      ({ flavours } = step);
    }
  }
  return mass === undefined ? { alpha } : { alpha, mass };
}

const GUARD = 30;

function product(a: Exact, b: Exact): Exact {
  return exactReal((prec) => R.mul(a.ball(prec + GUARD), b.ball(prec + GUARD), prec + GUARD));
}

function matched(alpha: Exact, crossing: Threshold, loops: number, up: boolean, guess: number): Exact {
  return exactReal((prec) => {
    const work = prec + GUARD;
    const z = coefficients(crossing, 'coupling', loops, work);
    const circle = pi(work);
    const x = R.div(alpha.ball(work), circle, work);
    const other = up ? solveUp(z, x, guess / Math.PI, work) : R.mul(x, horner(z, x, work), work);
    return R.mul(other, circle, work);
  });
}

function massMatched(mass: Exact, heavy: Exact, crossing: Threshold, loops: number, up: boolean): Exact {
  return exactReal((prec) => {
    const work = prec + GUARD;
    const z = coefficients(crossing, 'mass', loops, work);
    const ratio = horner(z, R.div(heavy.ball(work), pi(work), work), work);
    const m = mass.ball(work);
    return up ? R.div(m, ratio, work) : R.mul(m, ratio, work);
  });
}
