/** @module The ambiguity under its conventions and the power correction, as the result states them. */
import { condensateShift, conventions, inGeV, powerOf } from '../ambiguity/index.js';
import type { Convention, LateralSource } from '../ambiguity/index.js';
import { mulExact, R, toNumberExact } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import { divisorSize } from '../qcd/index.js';
import { imaginaryPieces } from '../prescriptions/index.js';
import type { Series } from '../series/index.js';
import type { AmbiguityReport, PowerCorrectionReport } from './assessment.js';
import type { Expanded } from './expand.js';
import { estimateText, exactText, indicative } from './figures.js';
import { LAMBDA_LOOPS } from './lambda.js';
import { outclassed } from './outclassed.js';
import { ambiguityOverPower } from './strength-report.js';
import type { LeadingStrength } from './strength-report.js';
import { hardScaleGeV, lambdaOverQ } from './summary.js';
import type { TermTable } from './terms.js';
import type { Evaluated } from './values.js';

/** Prescriptions whose imaginary part states the ambiguity, most structured first. */
const LATERAL_ORDER = ['singularity-model', 'borel-leroy-pade', 'borel-pade', 'borel-pade-2', 'terminant'];

/** The lateral sums that the ambiguity is read from: those of the preferred value, a converged sum, then the order above. */
export function lateralSource(
  values: readonly Evaluated[],
  count: number,
  preferred?: Evaluated,
): LateralSource | undefined {
  const candidates = values.flatMap((v) =>
    v.outcome.kind === 'sum' &&
    v.outcome.central === true &&
    v.outcome.imaginary !== undefined &&
    (v === preferred || !outclassed(v, values, count))
      ? [{ v, im: v.outcome.imaginary, trust: v.outcome.trust }]
      : [],
  );
  const rank = (name: string): number => LATERAL_ORDER.indexOf(name);
  candidates.sort(
    (a, b) =>
      Number(b.v === preferred) - Number(a.v === preferred) ||
      Number(b.trust === 'converged') - Number(a.trust === 'converged') ||
      rank(a.v.prescription.name) - rank(b.v.prescription.name),
  );
  const best = candidates[0];
  return best === undefined
    ? undefined
    : {
        im: Math.abs(R.toNumber(best.im)),
        size: best.v.outcome.kind === 'sum' ? Math.abs(R.toNumber(best.v.outcome.value)) : 0,
        origin: `${best.v.prescription.name} ${best.v.outcome.variant}`,
        ...(best.v.imaginaryInput === undefined ? {} : { error: best.v.imaginaryInput }),
      };
}

export interface AmbiguityFound {
  readonly report: AmbiguityReport;
  readonly list: readonly Convention[];
  /** |Im|/π, or the least term where no lateral sums stand; undefined when there is none to state. */
  readonly chosen?: Convention;
  readonly dimension?: number;
  readonly fromStrength?: NonNullable<PowerCorrectionReport['fromStrength']>;
}

/** Has the growth an ambiguity at all? */
export const DIVERGENT: ReadonlySet<string> = new Set(['factorial', 'superfactorial', 'undecided', 'subfactorial']);

export function ambiguityReport(
  series: Series,
  expanded: Expanded,
  growth: Growth,
  table: TermTable,
  values: readonly Evaluated[],
  more: { readonly preferred?: Evaluated; readonly strength?: LeadingStrength } = {},
): AmbiguityFound {
  const none = (statement: string): AmbiguityFound => ({ report: { conventions: [], statement }, list: [] });
  if (!DIVERGENT.has(growth.verdict)) return none(`the growth is ${growth.verdict}: there is no ambiguity to quote`);
  if (growth.flags.some((f) => f.code === 'errors-exceed-values'))
    return none('the coefficient errors exceed the coefficients: no ambiguity can be stated');
  if (growth.verdict === 'superfactorial' && growth.order !== 2)
    return none('the coefficients grow faster than any (kn)!: no ambiguity can be stated');
  const found = lateralSource(values, expanded.expansion.coefficients.length, more.preferred);
  // An approximant without a positive pole proves nothing where neither the terms nor the file tell of a singularity.
  const lateral =
    found?.im === 0 && growth.verdict === 'undecided' && expanded.expansion.stated.length === 0 ? undefined : found;
  const numbers = table.terms.map(R.toNumber);
  const sums = table.sums.slice(1).map(R.toNumber);
  const powers = numbers.map((_, n) => n + expanded.expansion.power);
  const reached = table.least?.reached === true;
  const summable = lateral !== undefined && lateral.im === 0;
  const own = fromStrength(series, expanded, more.strength);
  const list = [
    ...conventions(numbers, sums, powers, reached, lateral),
    ...(own === undefined || summable ? [] : [own.convention]),
  ];
  if (list.length === 0)
    return none('no lateral sums stand and the least term is not reached: no ambiguity can be stated from these terms');
  const dimension = leadingDimension(expanded);
  const Q = hardScaleGeV(series);
  const value = lateral?.size ?? Math.abs(sums[table.least?.index ?? sums.length - 1] ?? 0);
  const chosen = list.find((c) => c.name === '|Im|/pi') ?? list[0]!;
  const statement = summable
    ? 'no singularity on the positive axis shows: the Borel sum is unique as far as these terms tell; least-term rows measure the truncation, not an ambiguity'
    : 'conventions differ by factors of 2 and pi; compare numbers only within one row. The meaning of |Im|/pi as an error is a convention, not a theorem';
  return {
    report: {
      conventions: list.map((c) => ({
        name: c.name,
        value: indicative(c.value, 6),
        ...(c.error === undefined || !(c.error > 0) ? {} : { error: indicative(c.error, 2) }),
        ...(value > 0 ? { relative: indicative(c.value / value, 3) } : {}),
        ...(Q === undefined || dimension === undefined ? {} : { GeV: indicative(inGeV(c.value, Q, dimension), 4) }),
        standing: 'indicative' as const,
        origin: c.origin,
      })),
      statement,
      chosen: chosen.name,
    },
    list,
    chosen,
    ...(own === undefined ? {} : { fromStrength: own.power }),
    ...(dimension === undefined ? {} : { dimension }),
  };
}

/** |Im|/π from the strength N and Λ_MSbar; undefined where one of them is not known. */
function fromStrength(
  series: Series,
  expanded: Expanded,
  strength: LeadingStrength | undefined,
): { convention: Convention; power: NonNullable<PowerCorrectionReport['fromStrength']> } | undefined {
  const { flavours } = series;
  const alpha = series.coupling.plain
    ? expanded.expansion.x
    : mulExact(expanded.expansion.x, divisorSize(series.coupling.divisor));
  const lambda = lambdaOverQ(series, alpha);
  if (strength === undefined || flavours === undefined || lambda === undefined) return undefined;
  const over = ambiguityOverPower(strength, expanded, flavours);
  if (over === undefined) return undefined;
  const d = strength.dimension;
  const Q = hardScaleGeV(series);
  const power = powerOf(lambda, d);
  const [value, error] = [over.value * power, over.error * power];
  const texts = estimateText(value, error);
  const ratio = estimateText(over.value, over.error);
  const energy = Q === undefined ? undefined : inGeV(value, Q, d);
  return {
    convention: {
      name: '|Im|/pi from N',
      value,
      error,
      origin: `the strength N of the growth section and Lambda, all corrections resummed in it`,
    },
    power: {
      overPower: ratio.value,
      overPowerError: ratio.error,
      value: texts.value,
      error: texts.error,
      ...(energy === undefined
        ? {}
        : {
            GeV: { ...estimateText(energy, (energy * over.error) / over.value), power: String(d) },
            ...(d > 1 ? { root: indicative(energy ** (1 / d)) } : {}),
          }),
      lambda: `Lambda_MSbar, n_f = ${flavours}, exact definition at ${LAMBDA_LOOPS} loops`,
    },
  };
}

/** d = 2u of the nearest stated infrared singularity. */
function leadingDimension(expanded: Expanded): number | undefined {
  const s = expanded.expansion.stated.find((one) => toNumberExact(one.t) > 0);
  return s?.dimension === undefined ? undefined : toNumberExact(s.dimension);
}

/** Why a condensate's shift, or its size against the value, is not stated. */
function lackingOf(has: {
  readonly im: number | undefined;
  readonly Q: number | undefined;
  readonly wilson: number | undefined;
  readonly fileValue: number | undefined;
}): string[] {
  return [
    ...(has.wilson === undefined
      ? ['no Wilson coefficient in the file']
      : has.wilson === 0
        ? ['Wilson coefficient 0']
        : []),
    ...(has.im === undefined ? ['no imaginary part of its own dimension'] : []),
    ...(has.Q === undefined ? ['no hard scale'] : []),
    ...(has.fileValue === undefined ? ['no value in the file'] : []),
  ];
}

export function powerReport(
  series: Series,
  expanded: Expanded,
  found: AmbiguityFound,
  at: number,
): PowerCorrectionReport {
  const d = found.dimension;
  const lambda = lambdaOverQ(series, { ball: () => R.fromNumber(at) });
  const Q = hardScaleGeV(series);
  const A = found.chosen?.value;
  if (d === undefined || A === undefined)
    return {
      condensates: [],
      statement:
        d === undefined
          ? 'the operator dimension is not known: no power of Lambda/Q can be assigned'
          : 'no ambiguity is stated, so none is to be absorbed',
    };
  const power = lambda === undefined ? undefined : powerOf(lambda, d);
  const pieces = imaginaryPieces(expanded.expansion);
  const condensates = series.condensates.map((c) => {
    const dim = c.dimension.toNumber();
    const t = expanded.expansion.stated.find((s) => s.dimension !== undefined && toNumberExact(s.dimension) === dim)?.t;
    const own =
      t === undefined ? undefined : pieces.find((p) => Math.abs(p.t - toNumberExact(t)) < 1e-9 * Math.abs(p.t));
    const im =
      own !== undefined ? Math.abs(own.im) : dim === d && found.chosen?.name === '|Im|/pi' ? A * Math.PI : undefined;
    const wilson = c.wilson === undefined ? undefined : toNumberExact(c.wilson);
    const shift = (amount: number): number | undefined =>
      Q === undefined || wilson === undefined || wilson === 0 ? undefined : condensateShift(amount, Q, dim, wilson);
    const both = im === undefined ? undefined : { pi: shift(im / Math.PI), full: shift(im) };
    const fileValue = c.value === undefined ? undefined : Math.abs(toNumberExact(c.value.value));
    const lacking = lackingOf({ im, Q, wilson, fileValue });
    return {
      name: c.name,
      dimension: String(dim),
      ...(c.wilson === undefined ? {} : { wilson: exactText(c.wilson, 8) }),
      ...(c.value === undefined ? {} : { fileValue: c.value.text }),
      ...(c.unit === undefined ? {} : { unit: c.unit }),
      ...(both?.pi === undefined ? {} : { shift: indicative(both.pi), shiftIm: indicative(both.full!) }),
      ...(both?.pi === undefined || fileValue === undefined || fileValue === 0
        ? {}
        : { shiftOverValue: indicative(both.pi / fileValue, 3) }),
      ...(lacking.length === 0 ? {} : { missing: lacking.join(', ') }),
    };
  });
  const missing = [
    ...(Q === undefined ? ['the hard scale Q'] : []),
    ...(lambda === undefined ? ['Lambda (needs an MSbar coupling and n_f)'] : []),
  ];
  return {
    dimension: String(d),
    ...(power === undefined
      ? {}
      : { power: indicative(power), lambdaOverQ: indicative(lambda!), inPowerUnits: indicative(A / power) }),
    ...(Q === undefined ? {} : { GeV: { value: indicative(inGeV(A, Q, d)), power: String(d) } }),
    ...(found.fromStrength === undefined ? {} : { fromStrength: found.fromStrength }),
    condensates,
    statement:
      missing.length === 0
        ? `the ambiguity (${found.chosen!.name}) is a power correction of dimension ${d}; a condensate defined with the principal value shifts by the amount shown when the prescription changes`
        : `not known: ${missing.join(', ')}`,
  };
}
