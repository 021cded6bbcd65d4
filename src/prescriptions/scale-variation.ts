/**
 * @module Fixed order with its scale varied: the sum at the scale of the series, and how far it moves from μ/2 to 2μ.
 *
 * Method     D_N at POINTS scales even in ln μ, re-expanded exactly, the coupling run by the closed form of its truncated beta
 *            function. Truncation error: the larger of the two distances from the central value to the lowest and the highest
 *            one; extremes inside the range count.
 * Fails      where the coupling gets large, and where the sum is flat by accident. No probability stands behind the factor 2.
 * Reference  common practice.
 */
import { exact, R, Rational } from '../numerics/index.js';
import type { Ball } from '../numerics/index.js';
import { logTable } from '../truncation/index.js';
import type { Expansion, Running } from '../series/index.js';
import { inputObjection } from './eligibility.js';
import type { Outcome, Prescription } from './prescription.js';
import { dressed, partialSums, refusal, toDigits } from './prescription.js';
import { betaFunction, runner } from './running-coupling.js';
import { ratioAt, runningObjection } from './scale-choice.js';

const FACTOR = 2;
/** Scales looked at, ends and middle included. */
const POINTS = 9;
const BITS = 96;

interface At {
  readonly ratio: number;
  readonly value: number;
}

/** The truncated sum at each scale; the ratio μ/Q of the first one at or below the Landau pole otherwise. */
function scan(e: Expansion, running: Running): readonly At[] | number {
  const beta = betaFunction(
    running.beta.map((b) => b.ball(BITS)),
    BITS,
  );
  const run = runner(beta, e.x.ball(BITS), BITS);
  const coefficientsAt = logTable(e.coefficients, e.power, running.beta, BITS);
  const step = (4 * Math.log(FACTOR)) / (POINTS - 1);
  const list: At[] = [];
  for (let k = 0; k < POINTS; k++) {
    const shift = (k - (POINTS - 1) / 2) * step;
    const ratio = ratioAt(running, exact(Rational.fromNumber(shift)));
    const x = run(R.fromNumber(shift));
    if (x === undefined) return ratio;
    const f = coefficientsAt(shift).reduceRight<Ball>((acc, c) => R.add(R.mul(acc, x, BITS), c, BITS), R.ZERO);
    list.push({ ratio, value: R.toNumber(dressed({ ...e, x: { ball: () => x } }, f, BITS)) });
  }
  return list;
}

/** "lowest 0.1201 at μ/Q = 2, highest 0.1531 at μ/Q = 0.5". */
function extremes(points: readonly At[]): string {
  const low = points.reduce((a, b) => (b.value < a.value ? b : a));
  const high = points.reduce((a, b) => (b.value > a.value ? b : a));
  const words = ({ value, ratio }: At): string => `${value.toPrecision(5)} at μ/Q = ${Number(ratio.toPrecision(3))}`;
  return `lowest ${words(low)}, highest ${words(high)}`;
}

export const scaleVariation: Prescription = {
  name: 'scale-variation',
  title: 'fixed order with its scale varied',
  summary: 'sum of all known terms; error: how far it moves when the scale goes from half to twice its value',
  family: 'scale',
  apply(e, growth, request): readonly Outcome[] {
    const N = e.coefficients.length;
    const variant = `through order ${N - 1 + e.power}, μ/${FACTOR} to ${FACTOR}μ`;
    const no = runningObjection(e, variant) ?? inputObjection(e, growth, variant, 1);
    if (no !== undefined) return [no];
    const value = toDigits(
      request.digits,
      (prec) => partialSums(e, prec)[N]!,
      (v) => v,
    );
    const points = request.only === undefined ? scan(e, e.running!) : [];
    if (typeof points === 'number')
      return [
        refusal(
          variant,
          `the scale μ/Q = ${points.toPrecision(3)} lies below the Landau pole`,
          'take a smaller coupling (a higher scale)',
        ),
      ];
    const centre = R.toNumber(value);
    const truncation = Math.max(...points.map((p) => Math.abs(p.value - centre)));
    return [
      {
        kind: 'sum',
        variant,
        value,
        ...(points.length === 0 ? {} : { truncation }),
        termsUsed: N,
        trust: 'indicative',
        notes: points.length === 0 ? [] : [extremes(points)],
        central: true,
      },
    ];
  },
};
