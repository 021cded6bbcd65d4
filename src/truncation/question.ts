/** @module The question put to the models: the known terms, and what else of the expansion they may ask for. */
import { exactReal, R, toNumberExact, type Exact } from '../numerics/index.js';
import { betaCoefficients, changeScale, divisorSize, evolveLog, flowOf, isRefusal, type Loops } from '../qcd/index.js';
import type { Expansion } from '../series/index.js';
import { firstTerms, knownTerms } from './known.js';
import { refuse, type Moved, type Question, type TruncationRefusal } from './model.js';
import type { Priors } from './priors.js';

export type Setting = Pick<Question, 'coupling' | 'flavours' | 'priors'>;

/** Bits of the coefficients at another scale: far more than a double holds, since the terms of the re-expansion cancel. */
const MOVED_BITS = 192;

/** The question for all terms of an expansion; undefined when every term is zero. */
export function questionOf(expansion: Expansion, setting: Setting): Question | undefined {
  const known = knownTerms(expansion);
  return known === undefined ? undefined : { ...setting, expansion, known, atScale: mover(expansion, setting) };
}

/** The same question when only the first `count` known terms are there. */
export function restricted(question: Question, count: number): Question | undefined {
  const known = firstTerms(question.known, count);
  if (known === undefined) return undefined;
  const { expansion } = question;
  const last = known.orders.at(-1) ?? 0;
  const coefficients = expansion.coefficients.slice(0, last - expansion.power + 1);
  return { ...question, known, expansion: { ...expansion, coefficients } };
}

const isLoops = (n: number): n is Loops => [1, 2, 3, 4, 5].some((k) => k === n);

/** x and coefficients at μ′ with ln(μ′²/μ²) = L; every L is worked out once. */
function mover(expansion: Expansion, { coupling, flavours, priors }: Setting): Question['atScale'] {
  const found = new Map<number, Moved | TruncationRefusal>();
  return (logRatio) => {
    const before = found.get(logRatio);
    if (before !== undefined) return before;
    const result = moved(expansion, coupling, flavours, priors, logRatio);
    found.set(logRatio, result);
    return result;
  };
}

function moved(
  expansion: Expansion,
  coupling: Setting['coupling'],
  flavours: number | undefined,
  priors: Priors,
  logRatio: number,
): Moved | TruncationRefusal {
  if (coupling.plain) return refuse('the variable is no coupling that runs', 'use a model that needs no scale');
  if (flavours === undefined) {
    return refuse(
      'the number of flavours is not stated: no beta function',
      'state the flavours in the series file, or with --flavours',
    );
  }
  const loops = priors['scale.loops'];
  if (!isLoops(loops))
    return refuse(`the beta function is known at 1 to 5 loops, not ${loops}`, 'set scale.loops to 1, 2, 3, 4 or 5');
  const divisor = toNumberExact(divisorSize(coupling.divisor));
  const alpha = evolveLog(flowOf(flavours, loops), toNumberExact(expansion.x) * divisor, logRatio);
  if (isRefusal(alpha)) return refuse(alpha.reason, `${alpha.remedy}; or let the scale vary less with scale.factor`);
  const beta = betaCoefficients(flavours, coupling.divisor).slice(0, loops);
  const series = { coefficients: expansion.coefficients, firstPower: expansion.power };
  const coefficients = logRatio === 0 ? expansion.coefficients : changeScale(series, beta, logOf(logRatio));
  return { kind: 'moved', alpha, x: alpha / divisor, coefficients: coefficients.map((c) => c.ball(MOVED_BITS)) };
}

/** The double L as an inexact number, so that rational coefficients do not grow with its powers. */
const logOf = (logRatio: number): Exact => {
  const half = R.fromNumber(logRatio);
  return exactReal((prec) => R.round(half, prec + 64));
};
