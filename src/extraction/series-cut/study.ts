/**
 * @module growth --cut: a user's own series without the momenta below μ_f, approximately: through its leading infrared singularity.
 *
 * The part k < μ_f is λ times the model of low-momenta.ts for the nearest infrared singularity that the series states. Its
 * coefficients grow alike at large n whatever μ_f is, so that the series without them has lost that factorial; its principal value
 * stands for what a condensate with the scale μ_f holds in perturbation theory. The sum of both depends on μ_f only by the terms
 * of k > μ_f that are not known.
 *
 * Bound      none: a model of one singularity, exact only for a series that is nothing else. Indicative.
 * Reference  as in low-momenta.ts; the exact cut of bubble chains is bubble-cut.ts.
 */
import { exact, mulExact, subExact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { isRefusal } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import {
  VERSION,
  couplingSummary,
  exactText,
  fixedOrderSeries,
  growthStudy,
  hardScaleOf,
  indicative,
  seriesSummary,
} from '../../studies/index.js';
import type { Caution, GrowthReport } from '../../studies/index.js';
import type { SeriesCutResult } from './result.js';
import { modelBelow, naturalExponent, nearerUltraviolet, settingOf, strengthsOf } from './setting.js';
import type { SeriesCutQuestion, Setting } from './setting.js';
import type { CutStrength } from './strength.js';
import { valuesOf, withoutLow } from './values.js';

const SHOWN = 5;

const words = ({ verdict, statement, signPattern }: GrowthReport): SeriesCutResult['cut']['growth']['whole'] => ({
  verdict,
  statement,
  signPattern,
});

/** What stands between the numbers and trust in them. */
function cautionsOf(setting: Setting, [first]: readonly CutStrength[]): Caution[] {
  const list: Caution[] = [];
  if (first !== undefined && first.error >= Math.abs(toNumberExact(first.value))) {
    list.push({
      code: 'strength-unknown',
      text: 'the strength of the singularity is not known better than its own size: the cut shows what low momenta could do, not what they do',
    });
  }
  const nearer = nearerUltraviolet(setting);
  if (nearer?.u !== undefined) {
    list.push({
      code: 'ultraviolet-nearer',
      text: `the ultraviolet singularity at u = ${exactText(nearer.u, 4)} is nearer: it stays in the part k > mu_f, whose coefficients alternate at large order`,
    });
  }
  return list;
}

/** The series cut at μ_f, or why it cannot be. */
export function seriesCut(given: SeriesCutQuestion): SeriesCutResult | Refusal {
  const question = { ...given, series: fixedOrderSeries(given.series) };
  const { series, cut, digits, request, at, path } = question;
  const setting = settingOf(question);
  if (isRefusal(setting)) return setting;
  const strengths = strengthsOf(series, setting);
  if (isRefusal(strengths)) return strengths;
  const strength = strengths[0]!;
  const { e, singularity, expanded } = setting;
  const model = modelBelow(setting, cut);
  const high = withoutLow(e.coefficients, model, strength.value);
  const growthOf = (values: readonly Exact[], title: string): ReturnType<typeof words> =>
    words(
      growthStudy(
        {
          ...series,
          title,
          coefficients: values.map((value) => ({ value, text: '', status: 'computed' as const })),
          singularities: [],
        },
        { digits, request },
      ).growth,
    );
  const Q = hardScaleOf(series);
  return {
    leastterm: VERSION,
    request,
    series: seriesSummary(series, expanded),
    ...(at === undefined ? {} : { coupling: couplingSummary(series, at, expanded, digits, path) }),
    cut: {
      overHard: indicative(cut.toNumber(), 8),
      ...(isRefusal(Q) ? {} : { GeV: indicative(cut.toNumber() * toNumberExact(Q), 6) }),
      singularity: {
        u: exactText(singularity.u, 10),
        dimension: exactText(mulExact(exact(2), singularity.u), 10),
        exponent: exactText(singularity.exponent ?? naturalExponent(setting), 10),
        origin: singularity.origin,
      },
      strengths: strengths.map(({ value, error, source }) => ({
        value: indicative(toNumberExact(value), SHOWN),
        error: indicative(error, 2),
        source,
      })),
      terms: e.coefficients.map((c, n) => ({
        n: n + e.power,
        whole: exactText(c, digits),
        low: indicative(toNumberExact(subExact(c, high[n]!)), SHOWN + 2),
        high: indicative(toNumberExact(high[n]!), SHOWN + 2),
      })),
      growth: { whole: growthOf(e.coefficients, 'all momenta'), high: growthOf(high, 'k > mu_f') },
      ...(at === undefined ? {} : { values: valuesOf(question, setting, strength, at) }),
      standing: 'indicative',
    },
    cautions: cautionsOf(setting, strengths),
  };
}
