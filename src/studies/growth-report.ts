/** @module The growth diagnosis as the result states it, in t and in u, beside what is expected. */
import { exact, mulExact, subExact, toNumberExact } from '../numerics/index.js';
import type { Exact } from '../numerics/index.js';
import type { FoundSingularity, Growth } from '../growth/index.js';
import type { StatedSingularity } from '../series/index.js';
import type {
  ExpectedSingularity,
  GrowthReport,
  SingularityReport,
  StrengthReport,
  UltravioletReport,
} from './assessment.js';
import type { Expanded } from './expand.js';
import { estimateText, exactText, indicative } from './figures.js';

/** Digits of expected (exact) positions and exponents. */
const EXPECTED_DIGITS = 10;
/** Digits of the corrections. */
const CORRECTION_DIGITS = 8;
const MARGIN = 1.5;
/** A fitted power of n! is not known better than its rounding. */
const LEAST_ORDER_ERROR = 1e-12;

export function growthReport(
  growth: Growth,
  expanded: Expanded,
  strength?: StrengthReport,
  ultraviolet?: UltravioletReport,
): GrowthReport {
  const stated = expanded.expansion.stated;
  const agreement = compare(growth, stated);
  const c = growth.comparison;
  return {
    verdict: growth.verdict,
    ...(growth.order === undefined ? {} : { order: growth.order === Infinity ? 'infinite' : String(growth.order) }),
    statement: growth.statement,
    standing: growth.standing,
    signPattern: growth.signPattern,
    ...(growth.nearest === undefined ? {} : { nearest: singularityReport(growth.nearest, expanded) }),
    expected: stated.map(expectedReport),
    ...(strength === undefined ? {} : { strength }),
    ...(ultraviolet === undefined ? {} : { ultraviolet }),
    ...(agreement === undefined ? {} : { agreement }),
    evidence: {
      ratios: growth.ratios.map((r) => ({
        n: r.n,
        ratio: indicative(r.ratio, 6),
        ...(r.linear === undefined ? {} : { linear: indicative(r.linear, 6) }),
        ...(r.linearError === undefined
          ? {}
          : { linearError: indicative(beyondRounding(r.linearError, r.linear ?? 1), 2) }),
      })),
      ...(c === undefined
        ? {}
        : {
            comparison: {
              points: c.points,
              bayesFactor: indicative(c.bayesFactor, 3),
              ...(c.deltaAICc === undefined ? {} : { deltaAICc: indicative(c.deltaAICc, 3) }),
              ...(c.growthOrder === undefined
                ? {}
                : {
                    growthOrder: indicative(c.growthOrder.value, 3),
                    growthOrderError: indicative(Math.max(c.growthOrder.error, LEAST_ORDER_ERROR), 2),
                  }),
              inversePosition: indicative(c.inversePosition, 4),
              wording: c.wording,
            },
          }),
      predictions: growth.predictions.map((p) => ({
        n: p.n,
        method: p.method,
        relativeMiss: indicative(beyondRounding(p.relativeMiss, 1), 3),
      })),
      competition: growth.competition,
    },
    ...(growth.usableCoefficients === undefined ? {} : { usableCoefficients: growth.usableCoefficients }),
    flags: growth.flags,
  };
}

/** Relative sizes below this are the rounding of doubles. */
const ROUNDING = 1e-12;

/** `x` as it is, 0 where it is no more than the rounding of something of the size of `of`. */
const beyondRounding = (x: number, of: number): number => (Math.abs(x) < ROUNDING * Math.abs(of) ? 0 : x);

function singularityReport(s: FoundSingularity, expanded: Expanded): SingularityReport {
  const t = estimateText(s.t.value, s.t.error);
  const scale = expanded.uPerT === undefined ? undefined : toNumberExact(expanded.uPerT);
  const u = scale === undefined ? undefined : estimateText(s.t.value * scale, s.t.error * Math.abs(scale));
  const exponent = s.exponent && estimateText(s.exponent.value, s.exponent.error);
  const strength = s.strength && estimateText(s.strength.value, s.strength.error);
  const degrees = s.angle && estimateText((s.angle.value * 180) / Math.PI, (s.angle.error * 180) / Math.PI);
  const kind =
    s.kind === 'positive axis'
      ? 'infrared (positive axis)'
      : s.kind === 'negative axis'
        ? 'ultraviolet (negative axis)'
        : s.kind;
  return {
    t: t.value,
    tError: t.error,
    ...(u === undefined ? {} : { u: u.value, uError: u.error }),
    ...(degrees === undefined ? {} : { angle: degrees.value }),
    ...(exponent === undefined ? {} : { exponent: exponent.value, exponentError: exponent.error }),
    ...(strength === undefined ? {} : { strength: strength.value, strengthError: strength.error }),
    kind: scale === undefined ? s.kind : kind,
    standing: s.standing,
  };
}

/** e_j = c_j p(p−1)…(p−j+1): what stands over (n+p)(n+p−1)…(n+p−j+1). */
function overN(exponent: Exact, corrections: readonly Exact[]): Exact[] {
  let falling = exact(1);
  return corrections.map((c, j) => {
    falling = mulExact(falling, subExact(exponent, exact(j + 1)));
    return mulExact(c, falling);
  });
}

function expectedReport(s: StatedSingularity): ExpectedSingularity {
  const { exponent, corrections } = s;
  return {
    t: exactText(s.t, EXPECTED_DIGITS),
    ...(s.u === undefined ? {} : { u: exactText(s.u, EXPECTED_DIGITS) }),
    ...(s.dimension === undefined ? {} : { dimension: exactText(s.dimension, EXPECTED_DIGITS) }),
    ...(s.exponent === undefined ? {} : { exponent: exactText(s.exponent, EXPECTED_DIGITS) }),
    ...(s.strength === undefined ? {} : { strength: exactText(s.strength, EXPECTED_DIGITS) }),
    ...(s.dimensionAlone === true ? { dimensionAlone: true } : {}),
    ...(exponent === undefined || corrections.length === 0
      ? {}
      : {
          corrections: corrections.map((c) => exactText(c, CORRECTION_DIGITS)),
          overN: overN(exponent, corrections).map((c) => exactText(c, CORRECTION_DIGITS)),
        }),
    kind: s.kind,
    origin: s.origin,
  };
}

/** Observation against the nearest expected singularity on the same side. */
function compare(growth: Growth, stated: readonly StatedSingularity[]): string | undefined {
  const found = growth.nearest;
  const first = stated[0];
  if (first === undefined) return undefined;
  if (found === undefined) return 'the terms alone do not fix a position; the expected one is not tested';
  if (found.kind === 'complex pair')
    return 'the terms show a complex pair; the expected singularities lie on the real axis';
  const t0 = toNumberExact(first.t);
  const same = stated.find((s) => Math.sign(toNumberExact(s.t)) === Math.sign(found.t.value)) ?? first;
  const t = toNumberExact(same.t);
  const deviation = Math.abs(found.t.value - t);
  const words =
    deviation <= MARGIN * found.t.error
      ? 'agrees with'
      : deviation <= 0.15 * Math.abs(t)
        ? 'lies within 15 % of'
        : 'differs from';
  const nearer =
    same !== first ? `; the nearest expected one, at t = ${indicative(t0)}, does not show in these terms yet` : '';
  return `the position found ${words} the expected t = ${indicative(t)} (${same.kind}, ${same.origin})${nearer}`;
}
