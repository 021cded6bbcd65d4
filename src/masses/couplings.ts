/**
 * @module α_s with n_l flavours at the mass and at μ, in doubles, from wherever it is given.
 *
 * Method     the given coupling is brought to μ = m(m) over the thresholds of the other quarks; the quark's own threshold is
 *            crossed at its own m(m), where the decoupling relation has no logarithm and no other mass.
 * Bound      rounding; decoupling with one loop less than the running.
 */
import {
  DEFAULT_THRESHOLDS,
  evolveAlpha,
  evolvePath,
  isRefusal,
  lambdaOf,
  matchDown,
  matchUp,
  type Matching,
  type Refusal,
  type Threshold,
} from '../qcd/index.js';
import { refuse } from '../qcd/index.js';
import type { GivenCoupling } from './request.js';

export interface CouplingSource {
  readonly given: GivenCoupling;
  /** n_l. */
  readonly light: number;
  /** Flavours with the quark active. */
  readonly flavours: number;
  readonly loops: number;
  readonly thresholds?: readonly Threshold[];
}

/** Decoupling of the quark itself at μ = m(m). */
const ownMatching = (source: CouplingSource): Matching => ({
  light: source.flavours - 1,
  log: 0,
  heavyMass: 'scale-invariant',
  loops: source.loops - 1,
});

/** The coupling at another scale and number of flavours, over the thresholds of other quarks. */
function along(source: CouplingSource, from: GivenCoupling, scale: number, flavours: number): number | Refusal {
  const { loops, thresholds = DEFAULT_THRESHOLDS } = source;
  if (from.flavours === flavours) {
    return evolveAlpha({ alpha: from.value, from: from.scale, to: scale, flavours, loops });
  }
  const end = evolvePath({ alpha: from.value, from, to: { scale, flavours }, options: { loops, thresholds } });
  return isRefusal(end) ? end : end.alpha;
}

/** α_s with the quark active, at μ = m(m). */
export function heavyAlpha(source: CouplingSource, msbar: number): number | Refusal {
  const { given, flavours } = source;
  if (given.flavours >= flavours) return along(source, given, msbar, flavours);
  const below = along(source, given, msbar, flavours - 1);
  return isRefusal(below) ? below : matchUp(below, ownMatching(source));
}

/** α_s with n_l flavours at μ = m(m). */
export function lightAlpha(source: CouplingSource, msbar: number): number | Refusal {
  const { given, flavours, light } = source;
  if (given.flavours < flavours) return along(source, given, msbar, light);
  const heavy = along(source, given, msbar, flavours);
  if (isRefusal(heavy)) return heavy;
  const below = matchDown(heavy, ownMatching(source));
  if (isRefusal(below) || light === flavours - 1) return below;
  return along(source, { value: below, scale: msbar, flavours: flavours - 1 }, msbar, light);
}

/** α_s with n_l flavours at μ, from its value at m(m). */
export function alphaAt(source: CouplingSource, atMass: number, msbar: number, mu: number): number | Refusal {
  if (mu === msbar) return atMass;
  return evolveAlpha({ alpha: atMass, from: msbar, to: mu, flavours: source.light, loops: source.loops });
}

/** Λ_MSbar with n_l flavours in GeV. */
export const lambdaAt = (source: CouplingSource, alpha: number, mu: number): number | Refusal =>
  lambdaOf(alpha, mu, { flavours: source.light, loops: source.loops });

const STEPS = 60;

/**
 * The geometric coupling at μ: ln(μ²/Λ²) = (1/b_0) [1/α_g + q ln(b_0 α_g)] with the Λ of the MSbar coupling; the branch
 * that is weak at high scales, α_g < 1/q.
 */
export function geometricAlpha(logOverLambda: number, b0: number, q: number, start: number): number | Refusal {
  const goal = b0 * logOverLambda - q * Math.log(b0);
  // f(y) = y − q ln y falls below y = q: no weak coupling there.
  if (!(goal > q - q * Math.log(q))) {
    return refuse(
      'the geometric coupling of the MRS mass does not exist at this scale: it is too near Λ',
      'use a heavier quark or a higher scale, or the pv definition',
    );
  }
  let y = Math.max(1 / start, q * 1.0001);
  for (let k = 0; k < STEPS; k++) {
    const step = (y - q * Math.log(y) - goal) / (1 - q / y);
    const next = y - step > q ? y - step : (y + q) / 2;
    const done = Math.abs(next - y) <= 2e-16 * y;
    y = next;
    if (done) break;
  }
  return 1 / y;
}
