/**
 * @module The couplings of couplings.ts as exact numbers.
 * Bound   certified for the truncated equations with the thresholds given.
 */
import { R, exact, exactReal, log, toNumberExact, Rational, type Exact } from '../numerics/index.js';
import { pi } from '../numerics/index.js';
import {
  DEFAULT_THRESHOLDS,
  betaCoefficients,
  exactAlpha,
  exactLambda,
  exactPath,
  exactTable,
  isRefusal,
  type Refusal,
} from '../qcd/index.js';
import { geometricAlpha, type CouplingSource } from './couplings.js';
import { provedRoot } from './proved-root.js';

/** The decimals that a person wrote stand for the double. */
export const asWritten = (x: number): Exact => exact(Rational.parse(String(x)) ?? Rational.fromNumber(x));

const GUARD = 30;

function along(
  source: CouplingSource,
  from: { readonly alpha: Exact; readonly scale: Exact; readonly flavours: number },
  scale: Exact,
  flavours: number,
): Exact | Refusal {
  const { loops, thresholds = DEFAULT_THRESHOLDS } = source;
  if (from.flavours === flavours)
    return exactAlpha({ alpha: from.alpha, from: from.scale, to: scale, flavours, loops });
  const end = exactPath({ alpha: from.alpha, from, to: { scale, flavours }, options: { loops, thresholds } });
  return isRefusal(end) ? end : end.alpha;
}

/** α_s^(f−1) from α_s^(f) at μ = m(m) of the quark. */
function decoupled(heavy: Exact, light: number, loops: number): Exact {
  const z = exactTable(light, 'coupling', 'scale-invariant').slice(0, loops + 1);
  return exactReal((prec) => {
    const work = prec + GUARD;
    const a = heavy.ball(work);
    const x = R.div(a, pi(work), work);
    let sum = R.ZERO;
    for (let k = z.length - 1; k >= 0; k--) {
      sum = R.add(R.mul(sum, x, work), z[k]?.[0]?.ball(work) ?? R.ZERO, work);
    }
    return R.mul(a, sum, work);
  });
}

/** α_s with the quark active at μ = m(m); undefined where the relation would have to be solved upwards. */
export function exactHeavyAlpha(source: CouplingSource, alpha: Exact, msbar: Exact): Exact | Refusal | undefined {
  const { given, flavours } = source;
  if (given.flavours < flavours) return undefined;
  return along(source, { ...given, alpha, scale: asWritten(given.scale) }, msbar, flavours);
}

/** α_s with n_l flavours at μ = m(m), from the exact value of the given coupling. */
export function exactLightAlpha(source: CouplingSource, alpha: Exact, msbar: Exact): Exact | Refusal {
  const { given, flavours, light, loops } = source;
  const start = { ...given, alpha, scale: asWritten(given.scale) };
  if (given.flavours < flavours) return along(source, start, msbar, light);
  const heavy = along(source, start, msbar, flavours);
  if (isRefusal(heavy)) return heavy;
  const below = decoupled(heavy, flavours - 1, loops - 1);
  if (light === flavours - 1) return below;
  return along(source, { alpha: below, scale: msbar, flavours: flavours - 1 }, msbar, light);
}

/** The geometric coupling at μ: the root of y − q ln y = b_0 ln(μ²/Λ²) − q ln b_0, y = 1/α_g > q. */
export function exactGeometric(source: CouplingSource, alpha: Exact, mu: Exact): Exact | Refusal {
  const { light, loops } = source;
  const lambda = exactLambda(alpha, mu, light, loops);
  if (isRefusal(lambda)) return lambda;
  const [b0 = exact(1), b1 = exact(0)] = betaCoefficients(light, '1');
  const [beta0, beta1] = [toNumberExact(b0), toNumberExact(b1)];
  const q0 = beta1 / beta0;
  const guess = geometricAlpha(
    2 * Math.log(toNumberExact(mu) / toNumberExact(lambda)),
    beta0,
    q0,
    toNumberExact(alpha),
  );
  if (isRefusal(guess)) return guess;
  return exactReal((prec) => {
    const work = prec + GUARD;
    const q = R.div(b1.ball(work), b0.ball(work), work);
    const half = log(R.div(mu.ball(work), lambda.ball(work), work), work);
    const goal = R.sub(R.mul(b0.ball(work), R.mul2exp(half, 1), work), R.mul(q, log(b0.ball(work), work), work), work);
    const f = (y: R.Ball): R.Ball => R.sub(R.sub(y, R.mul(q, log(y, work), work), work), goal, work);
    return R.div(R.ONE, provedRoot(f, R.fromNumber(1 / guess), 1 - q0 * guess, work), work);
  });
}
