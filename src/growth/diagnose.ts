/**
 * @module The growth diagnosis: from coefficients to a verdict with its evidence.
 *
 * Purpose    decide whether the growth is factorial and where the nearest Borel singularity is, or say why not.
 * Method     reading → pattern, outliers, noise, order, model comparison → verdict → position. Each step is a file here.
 * Bound      "certified" only for what is exact (terminating, all zero); "converged" where two methods agree on a long
 *            series; "indicative" otherwise.
 */
import { axisFit } from './axis-fit.js';
import { scaledBorel } from './borel-coefficients.js';
import { classify } from './classify.js';
import { flagsOf } from './flags.js';
import type { Estimate, FoundSingularity, Growth, GrowthInput } from './growth.js';
import { locate, type Located } from './locate.js';
import { usableOf } from './noise-flags.js';
import { predictions } from './predictions.js';
import { prepare, type Prepared } from './prepare.js';
import { ratioRows, scaledRows } from './ratio-test.js';
import { nonZero, readTerms, type Reading } from './reading.js';
import { shortLines } from './short-lines.js';
import { statementOf } from './statement.js';
import { complexPair, recurrence } from './two-root.js';
import { MIN_COEFFICIENTS } from './verdict-rule.js';
import type { Classified } from './verdict-rule.js';

/** Coefficients from which on a verdict may be called converged, and the error of the order it needs. */
const CONVERGED = { coefficients: 20, order: 0.1 };
/** Orders that growth laws have. */
const FAMILIAR = [-2, -1, -1 / 2, 0, 1 / 3, 1 / 2, 2 / 3, 1, 3 / 2, 2, 5 / 2, 3, 4];
const SNAP = { errors: 3, least: 0.06 };

const nothing = { ratios: [], predictions: [], competition: [], signPattern: 'none' } as const;

function trivial(reading: Exclude<Reading, { kind: 'series' }>): Growth {
  switch (reading.kind) {
    case 'empty': {
      const text = 'no coefficients';
      return {
        ...nothing,
        verdict: 'undecided',
        statement: `undecided: ${text}`,
        standing: 'certified',
        flags: [{ code: 'too-short', text }],
      };
    }
    case 'all-zero': {
      const text = `all ${reading.count} coefficients are zero: there are no ratios, and nothing to resum`;
      return {
        ...nothing,
        verdict: 'terminating',
        statement: text,
        standing: 'certified',
        flags: [{ code: 'all-zero', text }],
      };
    }
    case 'terminating': {
      const { degree, zeros } = reading;
      const text =
        degree === 0
          ? `a constant: all ${zeros} later coefficients are exactly zero`
          : `a polynomial of degree ${degree}: the ${zeros} later coefficients are exactly zero`;
      const flags: Growth['flags'] = [{ code: 'terminating', text: `${text}; nothing to resum` }];
      const points = nonZero(reading.sequence.points);
      return {
        ...nothing,
        verdict: 'terminating',
        statement: `the series terminates: ${text}`,
        standing: 'certified',
        ratios: ratioRows(points, reading.sequence.stride),
        flags: leading(reading.sequence.leadingZeros, flags),
      };
    }
  }
}

function leading(count: number, flags: Growth['flags']): Growth['flags'] {
  return count === 0 ? flags : [...flags, { code: 'leading-zeros', text: `${count} leading zeros were cut off` }];
}

/** The familiar order that the fit agrees with; else its two digits, or nothing where only familiar ones have a meaning. */
function snapped(order: Estimate, familiarOnly: boolean): number | undefined {
  const near = FAMILIAR.reduce((a, b) => (Math.abs(b - order.value) < Math.abs(a - order.value) ? b : a));
  const window = Math.max(SNAP.errors * order.error, SNAP.least);
  if (Math.abs(near - order.value) <= window) return near;
  return familiarOnly ? undefined : Number(order.value.toPrecision(2));
}

function orderOf(c: Classified, p: Prepared): number | undefined {
  if (c.beyond) return Infinity;
  switch (c.verdict) {
    case 'factorial':
      return 1;
    case 'geometric':
      return 0;
    case 'superfactorial':
    case 'subfactorial':
      return c.order && snapped(c.order, false);
    case 'convergent':
      // An envelope says no more than that the coefficients fall.
      return p.pattern.kind === 'irregular' ? undefined : c.order && snapped(c.order, true);
    case 'terminating':
    case 'undecided':
      return undefined;
  }
}

function radiusOf(p: Prepared): Estimate | undefined {
  const stride = p.sequence.stride;
  if (p.pattern.kind === 'irregular') {
    const { beta, scale } = scaledBorel(p.points, 0);
    const pair = complexPair(recurrence(beta));
    if (pair === undefined) return undefined;
    const value = Math.exp((Math.log(pair.modulus.value) - scale) / stride);
    return { value, error: (value * pair.modulus.error) / pair.modulus.value / stride };
  }
  const fit = axisFit(p.tail, stride, 0, p.pattern.sign, p.exact);
  if (fit === undefined) return undefined;
  const value = Math.exp(fit.logT / stride);
  return { value, error: (value * fit.relativeError) / stride };
}

function standingOf(p: Prepared, c: Classified, nearest: FoundSingularity | undefined): Growth['standing'] {
  const long = p.nonZero.length >= CONVERGED.coefficients;
  if (!long || c.verdict === 'undecided') return 'indicative';
  if (c.verdict === 'factorial' && nearest !== undefined && nearest.standing === 'indicative') return 'indicative';
  return c.beyond || (c.order !== undefined && c.order.error < CONVERGED.order) ? 'converged' : 'indicative';
}

/** Two or three signs as they are: no more than a description. */
function shortPattern({ nonZero: points }: Prepared): Growth['signPattern'] {
  const changes = points.slice(1).filter((point, i) => point.sign !== points[i]!.sign).length;
  return changes === 0 ? 'same' : changes === points.length - 1 ? 'alternating' : 'irregular';
}

function patternOf(p: Prepared, located: Located | undefined): Growth['signPattern'] {
  if (p.nonZero.length < 2) return 'none';
  if (p.sequence.stride > 1) return 'lacunary';
  if (p.nonZero.length < MIN_COEFFICIENTS) return shortPattern(p);
  return located?.quasiPeriodic === true ? 'quasi-periodic' : p.pattern.kind;
}

/**
 * The diagnosis. terms: ln|c_n| and sign of c_n x^(n+n₀), with relative errors; expected: singularities stated
 * beforehand (they set b of the factorial model and the competition lines, never the fitted position); exact: the
 * coefficients themselves, for positions beyond double precision. Never throws; what cannot be decided is "undecided"
 * with the reason in the statement.
 */
export function diagnoseGrowth(input: GrowthInput): Growth {
  const reading = readTerms(input);
  if (reading.kind !== 'series') return trivial(reading);
  const p = prepare(reading.sequence, input);
  const stride = p.sequence.stride;
  const { rows } = scaledRows(p.nonZero, stride);
  const c = classify(p, rows);
  const order = orderOf(c, p);
  const whole = order !== undefined && Number.isInteger(order) && order >= 1;
  const located = whole ? locate(p, order * stride) : undefined;
  const radius = c.verdict === 'geometric' ? radiusOf(p) : undefined;
  const shownRows = ratioRows([...p.nonZero, ...p.estimated], stride);
  const usable = usableOf(p);
  const shown = c.verdict === 'factorial' || c.verdict === 'undecided' ? shortLines(p, input) : { lines: [] };
  const flags = flagsOf(p, c, located, rows, input, shown.opposite);
  const tooShort = p.nonZero.length < MIN_COEFFICIENTS;
  const nearest = located?.nearest;
  return {
    verdict: c.verdict,
    ...(order === undefined ? {} : { order }),
    statement: statementOf(p, c, located, radius, order),
    standing: standingOf(p, c, nearest),
    signPattern: patternOf(p, located),
    ...(nearest === undefined ? {} : order === 1 ? { nearest } : { rootPlane: nearest }),
    ...(located?.second === undefined || order !== 1 ? {} : { second: located.second }),
    ...(radius === undefined ? {} : { radius }),
    stride,
    ratios: shownRows,
    ...(p.comparisonAll === undefined || tooShort ? {} : { comparison: p.comparisonAll }),
    predictions: tooShort
      ? []
      : predictions(
          p.tail.length >= 4 ? p.tail : p.nonZero,
          stride,
          p.pattern.kind === 'irregular' ? undefined : p.pattern.kind,
          p.comparison?.shift ?? 0,
        ),
    competition: [...(located?.competition ?? []), ...shown.lines],
    ...(usable === undefined ? {} : { usableCoefficients: usable }),
    flags: tooShort ? [{ code: 'too-short', text: c.reason }, ...flags] : flags,
  };
}
