/**
 * @module MSbar quark mass at fixed n_f, in doubles, by the closed form of flow.ts.
 *
 * Method     ln m(μ)/m(μ_0) = [g_0 ln(α/α_0) + Σ_i B_i ln((1 − α/z_i)/(1 − α_0/z_i))]/b_0, α from the exact running.
 * Bound      a few 2^-53, as for the coupling.
 * Reference  renormalisation-group invariant mass: FLAG Review 2024, arXiv:2411.04268 (convention with 2β_0).
 */
import { refuse, type Refusal } from '../refusal.js';
import { checkCoupling, checkScale, checkTheory, isLoops, logOfRatio } from './domain.js';
import { evolveLog } from './evolve.js';
import { flowOf, massLogBeyondOneLoop, type Flow } from './flow.js';

/** ln of m(α)/m(α_0) along the flow. */
export function massLogRatio(flow: Flow, alpha: number, alpha0: number): number {
  const oneLoop = (flow.g0 / flow.b0) * Math.log(alpha / alpha0);
  return oneLoop + massLogBeyondOneLoop(flow, alpha) - massLogBeyondOneLoop(flow, alpha0);
}

export interface MassEvolution {
  /** m(from), in any unit. */
  readonly mass: number;
  /** α_s(from), same n_f. */
  readonly alpha: number;
  readonly from: number;
  readonly to: number;
  readonly flavours: number;
  /** Loops of β and γ_m, 1 to 5. */
  readonly loops: number;
}

export interface MassAtScale {
  readonly mass: number;
  readonly alpha: number;
}

export function checkMass(mass: number): Refusal | undefined {
  return Number.isFinite(mass) && mass > 0
    ? undefined
    : refuse(`the mass ${mass} is not a positive number`, 'give the mass as a positive number in GeV');
}

/** m(to) and α_s(to) at fixed n_f. */
export function evolveMass(question: MassEvolution): MassAtScale | Refusal {
  const { mass, alpha, from, to, flavours, loops } = question;
  const bad = checkTheory(flavours, loops) ?? checkScale('from', from) ?? checkScale('to', to) ?? checkMass(mass);
  if (bad !== undefined) return bad;
  const flow = flowOf(flavours, isLoops(loops) ? loops : 5);
  const end = evolveLog(flow, alpha, logOfRatio(from, to));
  return typeof end === 'number' ? { mass: mass * Math.exp(massLogRatio(flow, end, alpha)), alpha: end } : end;
}

/** Newton steps of massAtItself; the map is close to linear in ln μ. */
const STEPS = 60;

/**
 * The scale-invariant mass m(m) from m(from) and α_s(from) at fixed n_f: the solution of m(μ) = μ, with α_s there.
 */
export function massAtItself(question: Omit<MassEvolution, 'to'>): MassAtScale | Refusal {
  const { mass, alpha, from, flavours, loops } = question;
  const bad = checkTheory(flavours, loops) ?? checkScale('from', from) ?? checkMass(mass);
  if (bad !== undefined) return bad;
  const flow = flowOf(flavours, isLoops(loops) ? loops : 5);
  const wrong = checkCoupling(flow, alpha);
  if (wrong !== undefined) return wrong;
  // t = ln(μ/from): solve f(t) = ln m − t with f′ = −1 − 2 Σ g_k α^(k+1) < 0; damped where the coupling is strong.
  let t = 0;
  let last: MassAtScale = { mass, alpha };
  for (let k = 0; k < STEPS; k++) {
    const at = evolveLog(flow, alpha, 2 * t);
    if (typeof at !== 'number') return at;
    last = { mass: mass * Math.exp(massLogRatio(flow, at, alpha)), alpha: at };
    const f = Math.log(last.mass / from) - t;
    // One-loop γ_m is enough for the slope.
    const step = f / (1 + 2 * flow.g0 * at);
    if (Math.abs(step) < 1e-15 * (1 + Math.abs(t))) break;
    t += Math.max(-0.7, Math.min(0.7, step));
  }
  return { mass: from * Math.exp(t), alpha: last.alpha };
}

/**
 * Renormalisation-group invariant mass M = m(μ) (2β_0 a)^(−γ_0/β_0) exp(−∫_0^a dx/x [Γ(x)/S(x) − γ_0/β_0]),
 * a = α_s/(4π), Γ = Σ γ_k x^k: the lattice convention, with a factor 2 that Λ does not have.
 */
export function invariantMass(mass: number, alpha: number, flavours: number, loops: number): number | Refusal {
  const bad = checkTheory(flavours, loops) ?? checkMass(mass);
  if (bad !== undefined) return bad;
  const flow = flowOf(flavours, isLoops(loops) ? loops : 5);
  const wrong = checkCoupling(flow, alpha);
  if (wrong !== undefined) return wrong;
  return mass * (2 * flow.b0 * alpha) ** (-flow.g0 / flow.b0) * Math.exp(-massLogBeyondOneLoop(flow, alpha));
}
