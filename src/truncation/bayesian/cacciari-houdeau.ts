/**
 * @module Cacciari and Houdeau: all coefficients are bounded by one unknown number.
 *
 * Assumption  |c_k| ≤ c̄, each c_k uniform in [−c̄, c̄], ln c̄ uniform.
 * Formula     n known coefficients, next order k + 1, S = |x|^(k+1) max|c|: the next term z·S has the density of
 *             bounded-uniform with s = n. Half-width S (n+1)p/n for p ≤ n/(n+1), else S [(n+1)(1−p)]^(−1/n).
 * Fails       for factorial growth; and it changes with the variable: c̄ bounds the coefficients of α/π or of α, not both.
 * Reference   M. Cacciari, N. Houdeau, JHEP 09 (2011) 039, arXiv:1105.5152 [abstract seen; formulas re-derived].
 */
import { toNumberExact } from '../../numerics/index.js';
import { divisorSize } from '../../qcd/index.js';
import { nextOrder, type Known } from '../known.js';
import { symmetric, tooFew, type Estimate, type Level, type Question, type TruncationModel } from '../model.js';
import { halfWidth } from './bounded-uniform.js';

/** ln of max_k |t_k| y^(next − k): the size of the next term when the largest coefficient in powers of y returns. */
export function logNextSize(known: Known, logY: number): number {
  const next = nextOrder(known);
  return Math.max(...known.logs.map((l, k) => l + (next - (known.orders[k] ?? 0)) * logY));
}

/** Both bands of a symmetric posterior of scale S and power s. */
export function bandsOf(scale: number, s: number): Estimate['bands'] {
  const band = (level: Level): { low: number; high: number } => symmetric(scale * halfWidth(s, level / 100));
  return { 68: band(68), 95: band(95) };
}

/** ln|additive| as one more term, of order 0, in the unit of the others. */
function withConstant(question: Question): Known {
  const { known, expansion, priors } = question;
  const additive = Math.abs(toNumberExact(expansion.additive));
  if (priors['ch.constant'] !== 1 || !(additive > 0)) return known;
  return {
    ...known,
    orders: [0, ...known.orders],
    values: [0, ...known.values],
    logs: [Math.log(additive) - known.unit * Math.LN2, ...known.logs],
  };
}

/** The half-width at 68 % if the coefficients were counted in another variable, in words. */
function otherVariable(question: Question, known: Known, s: number): string {
  const { name, divisor, plain } = question.coupling;
  const own = question.priors['ch.unit'];
  const size = toNumberExact(divisorSize(divisor));
  const inAlpha = divisor === '1';
  // In powers of α: x/unit = α, unit = 1/divisor. In powers of α/π where the series is in α already: unit = π.
  const unit = plain ? 2 * own : inAlpha ? Math.PI : 1 / size;
  const half = Math.exp(logNextSize(known, known.logX - Math.log(unit))) * halfWidth(s, 0.68);
  const usual = Math.exp(logNextSize(known, known.logX - Math.log(own))) * halfWidth(s, 0.68);
  const words = plain
    ? `powers of ${name}/2`
    : `powers of ${name}${inAlpha ? '/pi' : ''} instead of ${name}${inAlpha ? '' : `/${divisor.includes('*') ? `(${divisor})` : divisor}`}`;
  const ratio = half / usual;
  return `not invariant under a change of variable: counted in ${words} the bands are ${ratio.toPrecision(3)} times as wide`;
}

export const cacciariHoudeau: TruncationModel = {
  name: 'cacciari-houdeau',
  title: 'Cacciari–Houdeau',
  summary: 'coefficients bounded by one unknown number',
  nature: 'credible',
  about: 'next term',
  digits: 5,
  priors: ['ch.unit', 'ch.slope', 'ch.constant'],
  reference: 'M. Cacciari, N. Houdeau, arXiv:1105.5152',
  estimate(question) {
    const refused = tooFew(question.known, 2, 'the width would be the prior alone');
    if (refused !== undefined) return refused;
    const known = withConstant(question);
    const s = known.logs.length + question.priors['ch.slope'];
    const logY = known.logX - Math.log(question.priors['ch.unit']);
    const scale = Math.exp(logNextSize(known, logY));
    const notes = [otherVariable(question, known, s)];
    if (logY >= 0) notes.push('the variable is not below 1: bounded coefficients do not make falling terms');
    return {
      kind: 'estimate',
      terms: question.known.logs.length,
      bands: bandsOf(scale, s),
      facts: [{ name: 'S', value: scale, scaled: true }],
      notes,
    };
  },
};
