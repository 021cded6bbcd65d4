/**
 * @module The components of the budget of one solution: each input of the theory shifted by its error, each estimate of what
 * is left open taken as a remainder of R.
 */
import { isRefusal, refuse } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import { TRUNCATION_MODELS, USUAL_PRIORS, questionOf } from '../truncation/index.js';
import type { Ambiguity } from './ambiguity-of.js';
import { component, correlatedError } from './budget.js';
import type { Component, ComponentName, Shift, Source } from './budget.js';
import { coefficientCauses, inputCauses, noisyOrders, powerCauses, remainderCause, scaleCause } from './causes.js';
import type { Cause } from './causes.js';
import type { Shifts } from './place.js';
import type { Datum, Problem, Quantity } from './problem.js';
import type { Solved } from './solve.js';

type Sources = { readonly sources: readonly Source[]; readonly refusals: readonly string[] };

/** The unknown's answers to the causes, and the answers that could not be had. */
function answers(solved: Solved, causes: readonly Cause[]): Sources {
  const refusals: string[] = [];
  const ask = (words: string, shifts: Shifts): Shift[] => {
    const changed = solved.shifted(shifts);
    if (!isRefusal(changed)) return [{ cause: words, shift: changed.value - solved.number, how: changed.how }];
    refusals.push(`${words}: ${changed.reason}`);
    return [];
  };
  const sources = causes.map(({ label, variations }) => ({
    label,
    shifts: variations.flatMap((v) => ask(v.cause, v.shifts)),
  }));
  // What moves nothing is no source: the threshold of the quark whose mass is extracted, say.
  return { sources: sources.filter((s) => s.shifts.some((one) => one.shift !== 0)), refusals };
}

/** A component from sources, with what could not be had named. */
function made(name: ComponentName, { sources, refusals }: Sources, note?: string): Component {
  if (refusals.length > 0 && sources.length === 0) return component(name, [], { missing: refusals.join('; ') });
  const words = [...(note === undefined ? [] : [note]), ...refusals.map((r) => `left out: ${r}`)];
  return component(name, sources, words.length === 0 ? {} : { note: words.join('; ') });
}

function measurement(solved: Solved, measured: Quantity | undefined): Component {
  if (measured === undefined) return component('measurement', [], { missing: 'nothing is measured: a prediction' });
  const refusals: string[] = [];
  const shifts = ([['+1σ of the measurement', measured.plus], ['-1σ of the measurement', -measured.minus]] as const).flatMap(
    ([cause, dX]): Shift[] => {
      if (dX === 0) return [];
      const changed = solved.shifted({}, dX);
      if (!isRefusal(changed)) return [{ cause, shift: changed.value - solved.number, how: changed.how }];
      refusals.push(`${cause}: ${changed.reason}`);
      return [];
    },
  ); // prettier-ignore
  return made('measurement', { sources: shifts.length === 0 ? [] : [{ label: 'measurement', shifts }], refusals });
}

/** Mean of the two answers to ±1σ. */
const linear = (s: Source): number =>
  ((s.shifts[0]?.shift ?? 0) - (s.shifts[1]?.shift ?? 0)) / Math.max(1, s.shifts.length);

/** √(J C Jᵀ) with the file's correlation matrix. */
function coefficients(solved: Solved): Component {
  const { stages } = solved.theory.prediction;
  const { correlation } = stages.series;
  const found = answers(solved, coefficientCauses(stages));
  const whole = made('coefficients', found);
  if (correlation === undefined || whole.missing !== undefined || found.refusals.length > 0) return whole;
  const noisy = noisyOrders(stages);
  const matrix = noisy.map((n) => noisy.map((m) => correlation[n]?.[m]?.toNumber() ?? 0));
  const error = correlatedError(found.sources.map(linear), matrix);
  return { ...whole, plus: error, minus: error, note: 'with the correlations of the file' };
}

/** The band of R around its value, by the prescription's own recipe or a model. */
export function truncationBand(solved: Solved, by: string): { low: number; high: number; note: string } | Refusal {
  const { theory, whole } = solved;
  if (by === 'own') {
    const { truncation } = whole.sum;
    return truncation === undefined
      ? refuse('the prescription states no truncation error', 'choose a model: --truncation-by')
      : { low: -truncation, high: truncation, note: "the prescription's own estimate" };
  }
  const { stages } = theory.prediction;
  const expansion = stages.central.at(whole.place.alpha);
  if (isRefusal(expansion)) return expansion;
  const { coupling, flavours } = stages.series;
  const setting = { coupling, ...(flavours === undefined ? {} : { flavours }), priors: USUAL_PRIORS };
  const question = questionOf(expansion, setting);
  const model = TRUNCATION_MODELS.find((m) => m.name === by);
  if (question === undefined || model === undefined) return refuse('every term is zero', 'give other coefficients');
  const answer = model.estimate(question);
  if (answer.kind === 'refusal') return refuse(answer.reason, answer.remedy);
  const unit = 2 ** question.known.unit;
  const { low, high } = answer.bands[68];
  const note = `68 % band of ${model.title}, which is about the truncated sum`;
  return { low: low * unit, high: high * unit, note };
}

function truncationComponent(solved: Solved, by: string): Component {
  const band = truncationBand(solved, by);
  if (isRefusal(band)) return component('truncation', [], { missing: band.reason });
  return made('truncation', answers(solved, [remainderCause('truncation', by, band.low, band.high)]), band.note);
}

function ambiguityComponent(solved: Solved, found: Ambiguity | Refusal): Component {
  if (isRefusal(found)) return component('ambiguity', [], { missing: found.reason });
  const { value, origin } = found;
  return made('ambiguity', answers(solved, [remainderCause('ambiguity', 'ambiguity', -value, value)]), origin);
}

/** All components of one solution except those that compare prescriptions. */
export function componentsOf(
  solved: Solved,
  problem: Problem,
  datum: Datum,
  found: Ambiguity | Refusal,
): readonly Component[] {
  // Thresholds that the path does not cross change nothing.
  const crossed = new Set(solved.whole.place.steps.map((s) => s.threshold));
  return [
    measurement(solved, datum.measured),
    made('inputs', answers(solved, inputCauses(problem, datum, crossed))),
    coefficients(solved),
    made('power corrections', answers(solved, powerCauses(solved.theory.terms))),
    truncationComponent(solved, problem.truncationBy),
    made('scale', answers(solved, [scaleCause])),
    ambiguityComponent(solved, found),
  ];
}
