/** @module The errors of a conversion: shifted inputs, other scales. Components stay apart. */
import { crossingScale, isRefusal, refuse, DEFAULT_THRESHOLDS, type Refusal } from '../qcd/index.js';
import type { Uncertain } from '../series/index.js';
import { convertMass } from './convert.js';
import { definitionOf } from './definitions.js';
import type { MassConversion, MassRequest } from './request.js';
import type { MassQuestion } from './study-types.js';

export interface Shift {
  readonly label: string;
  readonly plus: number;
  readonly minus: number;
  /** One of the shifted inputs has no conversion: the other side stands for both. */
  readonly oneSided?: boolean;
}

const sigmas = (u: Uncertain | undefined): readonly number[] =>
  u?.error === undefined ? [] : [u.error.plus.toNumber(), -u.error.minus.toNumber()].filter((x) => x !== 0);

/** The shift between the ends of an error; undefined without one, a refusal where neither end has a conversion. */
function shiftOf(label: string, central: number, requests: readonly MassRequest[]): Shift | Refusal | undefined {
  const ends = requests.map(convertMass);
  const moves = ends.flatMap((found) => (isRefusal(found) ? [] : [found.value - central]));
  const lost = ends.find(isRefusal);
  if (moves.length === 0 && lost !== undefined)
    return refuse(
      `the error of ${label} reaches values that have no conversion: ${lost.reason}`,
      'give a smaller error, or the value without one',
    );
  const plus = Math.max(0, ...moves);
  const minus = Math.max(0, ...moves.map((x) => -x));
  if (plus === 0 && minus === 0) return undefined;
  if (moves.length === requests.length) return { label, plus, minus };
  const size = Math.max(plus, minus);
  return { label, plus: size, minus: size, oneSided: true };
}

/** Masses of the other quarks' thresholds, in quadrature; a crossing scale moves with its mass. */
function thresholdShift(request: MassRequest, central: number): Shift | undefined {
  const { thresholds = DEFAULT_THRESHOLDS, flavours = request.light + 1 } = request;
  let square = 0;
  for (const t of thresholds) {
    if (t.error === undefined || t.flavours === flavours) continue;
    const factor = 1 + t.error / t.mass;
    const heavier = { ...t, mass: t.mass * factor, scale: crossingScale(t) * factor };
    const moved = convertMass({ ...request, thresholds: thresholds.map((u) => (u === t ? heavier : u)) });
    if (!isRefusal(moved)) square += (moved.value - central) ** 2;
  }
  const size = Math.sqrt(square);
  // The path that crosses no threshold repeats the same arithmetic: anything above rounding is real.
  return size > 1e-13 * central ? { label: 'threshold masses', plus: size, minus: size } : undefined;
}

/** Errors from the inputs, each by itself; a refusal where one of them leaves the range of the conversion on both sides. */
export function inputErrors(
  request: MassRequest,
  question: MassQuestion,
  strength: { readonly value: number; readonly error: number },
  central: number,
): readonly Shift[] | Refusal {
  const ends = [definitionOf(request.from.definition), definitionOf(request.to.definition)];
  const withAlpha = (d: number): MassRequest => ({
    ...request,
    alpha: { ...request.alpha, value: request.alpha.value + d },
  });
  const signs = [1, -1];
  const shifts: readonly (Shift | Refusal | undefined)[] = [
    shiftOf(
      'mass',
      central,
      sigmas(question.mass).map((d) => ({ ...request, mass: request.mass + d })),
    ),
    shiftOf('α_s', central, sigmas(question.alpha.value).map(withAlpha)),
    shiftOf(
      'four-loop coefficient',
      central,
      signs.map((pole) => ({ ...request, shifts: { pole } })),
    ),
    ends.some((e) => e.name === 'ps')
      ? shiftOf(
          'three-loop potential',
          central,
          signs.map((potential) => ({ ...request, shifts: { potential } })),
        )
      : undefined,
    ends.some((e) => e.needsStrength)
      ? shiftOf(
          'strength N',
          central,
          signs.map((s) => ({ ...request, strength: strength.value + s * strength.error })),
        )
      : undefined,
    thresholdShift(request, central),
  ];
  return shifts.find(isRefusal) ?? shifts.filter((s): s is Shift => s !== undefined && !isRefusal(s));
}

/** Scales looked at, in units of the one used. */
const FACTORS = [0.5, Math.SQRT1_2, Math.SQRT2, 2] as const;
/** Heuristic: a scale with a larger coupling than this says more about the coupling than about the terms left out. */
const LARGEST_VARIED_COUPLING = 0.6;

export interface VariedScale {
  readonly factor: number;
  readonly outcome: MassConversion | Refusal;
}

/** The conversion at other scales of the expansion. */
export function variedScales(request: MassRequest): readonly VariedScale[] {
  const scale = request.scale ?? { ratio: 1 };
  return FACTORS.map((factor) => {
    const other = 'GeV' in scale ? { GeV: scale.GeV * factor } : { ratio: scale.ratio * factor };
    const outcome = convertMass({ ...request, scale: other });
    if (isRefusal(outcome) || outcome.alphaAtScale <= LARGEST_VARIED_COUPLING) return { factor, outcome };
    const reason = `α_s = ${outcome.alphaAtScale.toPrecision(3)} at μ = ${outcome.scale.toPrecision(3)} GeV is too large for a scale variation`;
    return { factor, outcome: { reason, remedy: 'none needed: the other scales stand for it' } };
  });
}
