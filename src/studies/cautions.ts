/** @module The cautions that apply to a result, in words. */
import { R, toNumberExact } from '../numerics/index.js';
import type { Growth } from '../growth/index.js';
import type { Sum } from '../prescriptions/index.js';
import type { Series } from '../series/index.js';
import type { Caution } from './assessment.js';
import type { Expanded } from './expand.js';
import type { TermTable } from './terms.js';
import { indicative } from './figures.js';
import type { Evaluated } from './values.js';

/** Couplings beyond which a perturbative series in α_s is hard to defend. Heuristic. */
const LARGE_ALPHA = 0.5;
/** A spread among central values above this multiple of the largest stated error is worth a word. Heuristic. */
const SPREAD_FACTOR = 3;

/** A coupling error above this part of the coupling leaves linear propagation an order of magnitude. Heuristic. */
const WIDE_COUPLING = 0.3;

export function cautions(
  series: Series,
  expanded: Expanded,
  growth: Growth,
  table: TermTable | undefined,
  values: readonly Evaluated[],
  alpha?: number,
): Caution[] {
  const list: Caution[] = [];
  if (series.invented)
    list.push({ code: 'invented', text: 'this series is invented for demonstration: quote nothing from it' });
  if (series.expandedFrom !== undefined) list.push(contourCaution(values));
  if (expanded.leadingZeros > 0)
    list.push({
      code: 'leading-zeros',
      text: `the first ${expanded.leadingZeros} coefficient${expanded.leadingZeros === 1 ? ' is' : 's are'} zero: the transform starts at the first non-zero one, which shifts the apparent exponent by ${expanded.leadingZeros}`,
    });
  for (const f of growth.flags) list.push({ code: f.code, text: f.text });
  if (series.coefficients.some((c) => c.status === 'estimated'))
    list.push({
      code: 'rests-on-estimate',
      text: 'the values use a coefficient that is an estimate, not a calculation',
    });
  if (!series.coupling.plain && alpha !== undefined && alpha > LARGE_ALPHA)
    list.push({
      code: 'large-coupling',
      text: `the coupling ${alpha} is large: truncated series and running are not reliable there`,
    });
  const silent = expanded.expansion.stated[0];
  if (silent !== undefined && silent.exponent === undefined)
    list.push({
      code: 'nearest-without-exponent',
      text: 'the nearest stated singularity has no known exponent: the singularity model leaves it out',
    });
  if (!series.coupling.plain && series.flavours === undefined)
    list.push({
      code: 'no-flavours',
      text: 'the number of flavours is not stated: no u plane, no Lambda, no expectation from the operator product expansion',
    });
  if (table !== undefined && table.least?.reached === true && table.least.index < table.terms.length - 1)
    list.push({
      code: 'past-least-term',
      text: 'the known orders go past the least term: at this coupling the later terms make the fixed-order sum worse',
    });
  const rejected = values.filter((v) => v.outcome.kind === 'refusal' && v.prescription.family === 'borel').length;
  const stood = values.filter((v) => v.outcome.kind === 'sum' && v.prescription.family === 'borel').length;
  if (stood > 0 && rejected > stood)
    list.push({
      code: 'unstable-table',
      text: `${rejected} of ${rejected + stood} Borel–Padé entries do not stand: read the ones that do with care`,
    });
  const silentOn = values.filter((v) => v.inputUnknown === true).map((v) => v.prescription.name);
  if (silentOn.length > 0)
    list.push({
      code: 'input-error-unknown',
      text: `the errors of the inputs could not be carried through ${silentOn.join(', ')}: nothing is stated there, and it is not zero`,
    });
  const wide = Math.max(0, ...values.map((v) => v.couplingError ?? 0));
  if (wide > WIDE_COUPLING)
    list.push({
      code: 'wide-coupling',
      text: `the error of the coupling is ${Math.round(100 * wide)} % of it: errors carried linearly are no more than orders of magnitude`,
    });
  const drowned = values.filter(drownedInAmbiguity).map((v) => v.prescription.name);
  if (drowned.length > 0)
    list.push({
      code: 'ambiguity-above-value',
      text: `the ambiguity |Im|/pi exceeds the value itself (${drowned.join(', ')}): at this coupling the series says nothing`,
    });
  const spread = centralSpread(values);
  if (spread !== undefined) list.push(spread);
  if (expanded.expansion.stated.length > 0 && growth.nearest !== undefined) {
    const nearest = toNumberExact(expanded.expansion.stated[0]!.t);
    if (
      Math.sign(nearest) !== Math.sign(growth.nearest.t.value) &&
      growth.nearest.kind !== 'complex pair' &&
      growth.nearest.kind !== 'both axes'
    )
      list.push({
        code: 'hidden-singularity',
        text: 'the nearest expected singularity does not show in these terms yet: it takes over at higher orders',
      });
  }
  return dedupe(list);
}

function drownedInAmbiguity({ outcome }: Evaluated): boolean {
  if (outcome.kind !== 'sum' || outcome.central !== true || outcome.imaginary === undefined) return false;
  return Math.abs(R.toNumber(outcome.imaginary)) / Math.PI > Math.abs(R.toNumber(outcome.value));
}

/** Central values of the resumming prescriptions that differ far beyond their stated errors. */
function centralSpread(values: readonly Evaluated[]): Caution | undefined {
  const rows = values.flatMap((v) =>
    v.outcome.kind === 'sum' &&
    v.outcome.central === true &&
    v.prescription.family !== 'truncation' &&
    v.prescription.family !== 'coupling' &&
    v.outcome.truncation !== undefined
      ? [{ value: R.toNumber(v.outcome.value), error: v.outcome.truncation }]
      : [],
  );
  if (rows.length < 2) return undefined;
  const range = Math.max(...rows.map((r) => r.value)) - Math.min(...rows.map((r) => r.value));
  const error = Math.max(...rows.map((r) => r.error));
  return range > SPREAD_FACTOR * error && range > 0
    ? {
        code: 'prescriptions-disagree',
        text: 'the resummed values differ by more than three times their own errors: the choice of prescription matters here',
      }
    : undefined;
}

/** A contour quantity has two expansions; where both stand, how far apart they are. */
function contourCaution(values: readonly Evaluated[]): Caution {
  const sumOf = (name: string): Sum | undefined =>
    values.flatMap((v) => (v.prescription.name === name && v.outcome.kind === 'sum' ? [v.outcome] : []))[0];
  const [fixed, improved] = [sumOf('fixed-order'), sumOf('contour-improved')];
  if (fixed === undefined || improved === undefined)
    return {
      code: 'contour-quantity',
      text: 'a contour quantity, here expanded at fixed order: contour-improved summation gives another value, and which is right is contested (contour-improved, and leastterm contour, show it)',
    };
  const gap = R.toNumber(R.sub(fixed.value, improved.value, 100));
  const error = Math.max(fixed.truncation ?? 0, improved.truncation ?? 0);
  const times = error > 0 ? `, ${indicative(Math.abs(gap) / error, 2)} times the larger truncation error` : '';
  return {
    code: 'contour-quantity',
    text: `fixed order minus contour improved is ${indicative(gap, 3)}${times}: the two have different Borel sums (arXiv:2008.00578, 2105.11222), the contour-improved one conflicts with the standard operator product expansion (arXiv:2305.10386), and the choice is contested; the default is fixed order and its Borel sum; they are not to be averaged`,
  };
}

function dedupe(list: readonly Caution[]): Caution[] {
  return list.filter((c, i) => list.findIndex((d) => d.code === c.code) === i);
}
