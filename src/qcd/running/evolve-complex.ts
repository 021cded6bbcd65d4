/**
 * @module α_s at complex scales, in doubles: for contour integrals in the plane of μ² (or of −s).
 *
 * Method     the closed form of flow.ts, followed along the straight path from 0 to L = ln(μ²/μ_0²): each step solves
 *            F(y + Δ) − F(y) = h by Newton's method with principal logarithms of ratios near 1, so that no branch is ever
 *            chosen; the step halves when a logarithm would turn too far or Newton's method wanders.
 * Bound      a few 2^-53 per step, |L| steps and a few more near the singularities of the coupling.
 * Refused    paths that run into the Landau singularity.
 */
import { refuse, type Refusal } from '../refusal.js';
import { cabs, cadd, cdiv, clog1p, cmul, cscale, csub, polynomialAt, type ComplexNumber } from './complex-number.js';
import type { Flow } from './flow.js';
import { LARGEST_COUPLING, checkCoupling } from './domain.js';

const NEWTON_STEPS = 20;
/** No factor y − w may change by more than this fraction of itself in one step: keeps every logarithm principal. */
const LARGEST_TURN = 0.6;
/** Longest and shortest step in ln μ²; a path that needs shorter ones runs into the singularity. */
const LONGEST_STEP = 0.75;
const SHORTEST_STEP = 1e-4;

/** b_0 (F(y + d) − F(y)) = d − Σ A_i ln(1 + d/(y − w_i)); undefined when a logarithm would turn too far. */
function increment(flow: Flow, y: ComplexNumber, d: ComplexNumber): ComplexNumber | undefined {
  let sum = d;
  for (const { w, coupling } of flow.poles) {
    const ratio = cdiv(d, csub(y, w));
    if (!(cabs(ratio) < LARGEST_TURN)) return undefined;
    sum = csub(sum, cmul(coupling, clog1p(ratio)));
  }
  return sum;
}

/** dy/dL = b_0 S(1/y). */
const slope = (flow: Flow, y: ComplexNumber): ComplexNumber =>
  cscale(polynomialAt(flow.s, cdiv({ re: 1, im: 0 }, y)), flow.b0);

/** y after ln μ² has moved by h; undefined when the step must be shorter. */
function advance(flow: Flow, y: ComplexNumber, h: ComplexNumber): ComplexNumber | undefined {
  const target = cscale(h, flow.b0);
  let d = cmul(slope(flow, y), h);
  for (let k = 0; k < NEWTON_STEPS; k++) {
    const value = increment(flow, y, d);
    if (value === undefined) return undefined;
    const move = cscale(cmul(csub(value, target), slope(flow, cadd(y, d))), 1 / flow.b0);
    d = csub(d, move);
    if (cabs(move) <= 1e-16 * cabs(y)) return cadd(y, d);
  }
  return undefined;
}

/** The answer to a path that meets the singularity. */
export const pathBlocked: Refusal = refuse(
  'the path in the complex plane of μ² runs into the Landau singularity of the coupling',
  'use a larger radius, a higher scale or fewer loops',
);

/**
 * α_s at ln μ² = ln μ_0² + path[k] for each point of a path that starts at 0, from real α_s(μ_0) = alpha. The result
 * belongs to the polygon 0 → path[0] → path[1] → …: a path around the singularity leads to another sheet.
 */
export function evolveAlongPath(
  flow: Flow,
  alpha: number,
  path: readonly ComplexNumber[],
): readonly ComplexNumber[] | Refusal {
  const bad = checkCoupling(flow, alpha);
  if (bad !== undefined) return bad;
  const out: ComplexNumber[] = [];
  let y: ComplexNumber = { re: 1 / alpha, im: 0 };
  let at: ComplexNumber = { re: 0, im: 0 };
  for (const goal of path) {
    while (at.re !== goal.re || at.im !== goal.im) {
      const rest = csub(goal, at);
      let length = Math.min(cabs(rest), LONGEST_STEP);
      let next: ComplexNumber | undefined;
      for (;;) {
        const whole = length >= cabs(rest);
        const h = whole ? rest : cscale(rest, length / cabs(rest));
        next = advance(flow, y, h);
        if (next !== undefined) {
          at = whole ? goal : cadd(at, h);
          break;
        }
        length /= 2;
        if (length < SHORTEST_STEP) return pathBlocked;
      }
      y = next;
      if (!(cabs(y) * LARGEST_COUPLING > 1)) return pathBlocked;
    }
    out.push(cdiv({ re: 1, im: 0 }, y));
  }
  return out;
}

/** α_s after ln μ² has moved by the complex `logRatio` along a straight line. */
export function evolveComplex(flow: Flow, alpha: number, logRatio: ComplexNumber): ComplexNumber | Refusal {
  const values = evolveAlongPath(flow, alpha, [logRatio]);
  return 'reason' in values ? values : (values[0] ?? pathBlocked);
}
