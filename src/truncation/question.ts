/** @module The question put to the models: the known terms, and what else of the expansion they may ask for. */
import { toNumberExact, type Ball } from '../numerics/index.js';
import { betaCoefficients, divisorSize, evolveLog, flowOf, isRefusal, type Loops } from '../qcd/index.js';
import type { Expansion } from '../series/index.js';
import { firstTerms, knownTerms } from './known.js';
import { refuse, type Moved, type Question, type TruncationRefusal } from './model.js';
import type { Priors } from './priors.js';
import { logTable } from './scale/log-table.js';

export type Setting = Pick<Question, 'coupling' | 'flavours' | 'priors' | 'found'>;

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

type CoefficientsAt = (flavours: number, loops: Loops, logRatio: number) => Ball[];

/** x and coefficients at μ′ with ln(μ′²/μ²) = L; every L is worked out once. */
function mover(expansion: Expansion, { coupling, flavours, priors }: Setting): Question['atScale'] {
  const found = new Map<number, Moved | TruncationRefusal>();
  let table: ((logRatio: number) => Ball[]) | undefined;
  const coefficientsAt: CoefficientsAt = (flavourNumber, loops, logRatio) => {
    const beta = (): ReturnType<typeof betaCoefficients> => betaCoefficients(flavourNumber, coupling.divisor);
    table ??= logTable(expansion.coefficients, expansion.power, beta().slice(0, loops), MOVED_BITS);
    return table(logRatio);
  };
  return (logRatio) => {
    const before = found.get(logRatio);
    if (before !== undefined) return before;
    const result = moved(expansion, coupling, flavours, priors, logRatio, coefficientsAt);
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
  coefficientsAt: CoefficientsAt,
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
  return { kind: 'moved', alpha, x: alpha / divisor, coefficients: coefficientsAt(flavours, loops, logRatio) };
}
