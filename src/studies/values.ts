/**
 * @module Every prescription on one expansion, with truncation, ambiguity and input errors; sums and refusals side by side.
 */
import { addExact, exact, mulExact, R, Rational } from '../numerics/index.js';
import type { Ball, Exact } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import type { Outcome, Prescription, Sum } from '../prescriptions/index.js';
import type { Expansion } from '../series/index.js';
import type { ValueEntry } from './assessment.js';
import { fixedOrderOf } from './contour/moment.js';
import { ballText, indicative } from './figures.js';

export interface Inputs {
  /** One-sigma relative error of x. */
  readonly xError: number;
  /** Absolute one-sigma errors of the coefficients. */
  readonly coefficientErrors: readonly number[];
  /** Correlation matrix of the coefficient errors; identity when absent. */
  readonly correlation?: readonly (readonly number[])[];
  /** Of a contour quantity: the errors of the coefficients of D, for the prescriptions that sum these. */
  readonly onCircle?: Pick<Inputs, 'coefficientErrors' | 'correlation'>;
}

export interface Evaluated {
  readonly prescription: Prescription;
  readonly outcome: Outcome;
  /** Error from coefficients and coupling, absolute. */
  readonly input?: number;
  /** The same of the imaginary part of the lateral sums. */
  readonly imaginaryInput?: number;
  /** An input has an error, and what it does to this value could not be computed. */
  readonly inputUnknown?: true;
  /** One-sigma relative error of the coupling that `input` holds. */
  readonly couplingError?: number;
}

/** Widest relative step of the coupling to either side: beyond it a difference quotient is no derivative. */
const WIDEST_STEP = 0.25;
/** Parts of the wanted step that are tried, the next where a prescription does not stand at the one before. */
const STEPS = [1, 1 / 16, 1 / 256];

/** Certified digits asked of the shifted evaluations: enough for a difference quotient. */
const SHIFT_DIGITS = 12;

/** Runs the prescriptions; the family's central member also gets its input error. With `central` no other one is wanted. */
export function evaluateAll(
  e: Expansion,
  growth: Growth,
  prescriptions: readonly Prescription[],
  digits: number,
  inputs: Inputs,
  central = false,
): Evaluated[] {
  const request = central ? { digits, central } : { digits };
  return prescriptions.flatMap((prescription) =>
    prescription.apply(e, growth, request).map((outcome): Evaluated => {
      if (outcome.kind === 'refusal' || outcome.central !== true) return { prescription, outcome };
      return { prescription, outcome, ...inputError(e, growth, prescription, outcome, inputs) };
    }),
  );
}

/** A change of the value and of the imaginary part. */
interface Move {
  readonly value: number;
  readonly imaginary: number;
}

const NO_MOVE: Move = { value: 0, imaginary: 0 };

/**
 * Linear propagation by central differences of half a standard deviation, or of less where the prescription does not stand
 * that far; √(J C Jᵀ), of the value and of its imaginary part. Empty without any input error.
 */
function inputError(
  e: Expansion,
  growth: Growth,
  p: Prescription,
  sum: Sum,
  inputs: Inputs,
): Pick<Evaluated, 'input' | 'imaginaryInput' | 'inputUnknown' | 'couplingError'> {
  const at = (shifted: Expansion): Move | undefined => {
    const found = p.apply(shifted, growth, { digits: SHIFT_DIGITS, only: sum.variant })[0];
    if (found?.kind !== 'sum') return undefined;
    const difference = (a: Ball, b: Ball): number => R.toNumber(R.sub(a, b, 160));
    const im =
      found.imaginary === undefined || sum.imaginary === undefined ? 0 : difference(found.imaginary, sum.imaginary);
    return { value: difference(found.value, sum.value), imaginary: im };
  };
  const slope = (up: Expansion, down: Expansion): Move | undefined => {
    const [a, b] = [at(up), at(down)];
    return a === undefined || b === undefined
      ? undefined
      : { value: a.value - b.value, imaginary: a.imaginary - b.imaginary };
  };
  /** The move for a whole standard deviation from shifts by parts of it, of the first part at which both ends stand. */
  const move = (largest: number, shifted: (part: number) => Expansion): Move | undefined => {
    for (const step of STEPS) {
      const part = step * largest;
      const found = slope(shifted(part / 2), shifted(-part / 2));
      if (found !== undefined) return { value: found.value / part, imaginary: found.imaginary / part };
    }
    return undefined;
  };
  const { xError } = inputs;
  const fromX =
    xError > 0
      ? move(Math.min(1, (2 * WIDEST_STEP) / xError), (part) => ({ ...e, x: scaledBy(e.x, 1 + part * xError) }))
      : NO_MOVE;
  const onCircle = p.family === 'contour' ? inputs.onCircle : undefined;
  const { coefficientErrors, correlation } = onCircle ?? inputs;
  const shifted = onCircle === undefined ? shift : shiftOnCircle;
  const count = (onCircle === undefined ? e : (e.contour ?? e)).coefficients.length;
  const noisy = coefficientErrors.flatMap((s, n) => (s > 0 && n < count ? [n] : []));
  const fromC = noisy.map((n) => move(1, (part) => shifted(e, n, part * coefficientErrors[n]!)));
  if (xError === 0 && noisy.length === 0) return {};
  if (fromX === undefined || !fromC.every((s) => s !== undefined)) return { inputUnknown: true };
  const total = (part: keyof Move): number => {
    let variance = fromX[part] ** 2;
    noisy.forEach((n, i) =>
      noisy.forEach((m, j) => {
        const rho = i === j ? 1 : (correlation?.[n]?.[m] ?? 0);
        variance += rho * fromC[i]![part] * fromC[j]![part];
      }),
    );
    return Math.sqrt(Math.max(0, variance));
  };
  return {
    input: total('value'),
    ...(sum.imaginary === undefined ? {} : { imaginaryInput: total('imaginary') }),
    couplingError: xError,
  };
}

function scaledBy(x: Exact, factor: number): Exact {
  return mulExact(x, exact(Rational.fromNumber(factor)));
}

function shift(e: Expansion, n: number, by: number): Expansion {
  return {
    ...e,
    coefficients: e.coefficients.map((c, k) => (k === n ? addExact(c, exact(Rational.fromNumber(by))) : c)),
  };
}

/** The same for a coefficient of D; the fixed-order coefficients follow where a prescription needs both. */
function shiftOnCircle(e: Expansion, n: number, by: number): Expansion {
  const { contour } = e;
  if (contour === undefined) return e;
  const coefficients = contour.coefficients.map((c, k) => (k === n ? addExact(c, exact(Rational.fromNumber(by))) : c));
  return { ...e, contour: { ...contour, coefficients }, coefficients: fixedOrderOf(contour, coefficients, e) };
}

/** A truncation error of 0 that no theorem stands behind: the coefficients known so far follow a rational Borel transform. */
export const restsOnPattern = (sum: Sum): boolean => sum.truncation === 0 && sum.trust === 'converged';

const PATTERN =
  'truncation 0 assumes that all further coefficients follow the same rational Borel transform: nothing in the known ones says so';

/** The plain row of the result. */
export function valueEntry(v: Evaluated, digits: number): ValueEntry {
  const { prescription, outcome } = v;
  if (outcome.kind === 'refusal')
    return {
      prescription: prescription.name,
      variant: outcome.variant,
      refused: { reason: outcome.reason, remedy: outcome.remedy },
    };
  const im = outcome.imaginary;
  const hasIm = im !== undefined;
  return {
    prescription: prescription.name,
    variant: outcome.variant,
    value: ballText(outcome.value, digits),
    ...(outcome.truncation === undefined ? {} : { truncationError: indicative(outcome.truncation, 3) }),
    ...(hasIm
      ? {
          ambiguity: indicative(Math.abs(R.toNumber(im)) / Math.PI, 6),
          imaginary: R.isExactZero(im) ? '0' : ballText(im, digits),
          ...(v.imaginaryInput === undefined || !(v.imaginaryInput > 0)
            ? {}
            : { ambiguityError: indicative(v.imaginaryInput / Math.PI, 2) }),
        }
      : {}),
    ...(v.input === undefined ? {} : { inputError: indicative(v.input, 3) }),
    termsUsed: outcome.termsUsed,
    standing: outcome.trust,
    digits: outcome.digitsTrust ?? 'certified',
    notes: restsOnPattern(outcome) ? [...outcome.notes, PATTERN] : outcome.notes,
    ...(outcome.central === true ? { central: true } : {}),
  };
}
