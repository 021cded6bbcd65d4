/** @module The extracted coupling at another scale: the value, its components taken through the evolution, the evolution's own errors. */
import { Rational, exact } from '../numerics/index.js';
import { evolvePath, isRefusal } from '../qcd/index.js';
import type { Refusal, ScalePoint } from '../qcd/index.js';
import { evolveStudy } from '../studies/index.js';
import type { EvolveStep } from '../studies/index.js';
import { component, mapped } from './budget.js';
import type { Component, Shift } from './budget.js';
import type { Problem } from './problem.js';

export interface Evolver {
  readonly from: ScalePoint;
  readonly to: ScalePoint;
  /** α_s there; undefined where it cannot be evolved. */
  at(alpha: number): number | undefined;
}

export function evolver(problem: Problem, from: ScalePoint, to: ScalePoint): Evolver {
  const options = { loops: problem.loops, thresholds: problem.thresholds };
  return {
    from,
    to,
    at(alpha) {
      const end = evolvePath({ alpha, from, to, options });
      return isRefusal(end) ? undefined : end.alpha;
    },
  };
}

export interface EvolvedBudget {
  readonly value: number;
  readonly components: readonly Component[];
  readonly path: readonly EvolveStep[];
}

const signed = (cause: string, text: string | undefined): Shift[] =>
  text === undefined ? [] : [{ cause, shift: Number(text), how: 'refit' }];

/** The budget there: the components of the extraction, the threshold masses among the inputs, and the evolution. */
export function evolvedBudget(
  problem: Problem,
  evolve: Evolver,
  alpha: number,
  components: readonly Component[],
): EvolvedBudget | Refusal {
  const { from, to } = evolve;
  const at = (p: number): number | undefined => evolve.at(p);
  const study = evolveStudy({
    quantity: 'alpha_s',
    value: { value: exact(Rational.fromNumber(alpha)), text: String(alpha) },
    from,
    to,
    loops: problem.loops,
    thresholds: problem.thresholds,
  });
  if (isRefusal(study)) return study;
  const masses = study.errors.find((e) => e.label === 'quark masses');
  const through = mapped(components, alpha, at);
  const inputs = through.find((c) => c.name === 'inputs');
  const thresholds =
    masses === undefined
      ? []
      : [
          {
            label: 'threshold masses',
            shifts: [...signed('+1σ of the masses', masses.plus), ...signed('-1σ of the masses', `-${masses.minus}`)],
          },
        ];
  const spread = study.matching?.spread;
  const evolution = component('evolution', [
    { label: 'one loop less', shifts: signed(`${problem.loops - 1} loops`, study.oneLoopLess?.shift) },
    {
      label: 'thresholds crossed elsewhere',
      shifts: spread === undefined ? [] : [...signed('spread', spread), ...signed('spread', `-${spread}`)],
    },
  ]);
  // One loop less moves to one side; as an estimate of what is missing it counts on both.
  const [plus, minus] = [evolution.plus, evolution.minus];
  const both = Math.max(plus, minus);
  return {
    value: at(alpha) ?? Number(study.value),
    components: [
      ...through.map((c) => (c === inputs ? component('inputs', [...c.sources, ...thresholds]) : c)),
      { ...evolution, plus: both, minus: both },
    ],
    path: study.path,
  };
}
