/**
 * @module Two short looks at what is missing, beside the verdict's own truncation error: the sum of all known terms at half
 * and at twice the scale, and the answers of the truncation-error models that are closed formulas. `truncation` has them all.
 */
import type { Growth } from '../growth/index.js';
import { R, toNumberExact } from '../numerics/index.js';
import { refuse } from '../qcd/index.js';
import type { Expansion, Series } from '../series/index.js';
import { questionOf, TRUNCATION_MODELS, USUAL_PRIORS } from '../truncation/index.js';
import type { Question } from '../truncation/index.js';
import type { OptimalTruncationReport, Refused } from './assessment.js';
import { competingReport, foundLeading } from './competing-report.js';
import type { Expanded } from './expand.js';
import { indicative } from './figures.js';
import { couplingScheme, massDefinition } from './scheme.js';
import { ask, bandText } from './truncation-answer.js';

/** μ/Q of the comparison, by custom. */
const RATIOS = [0.5, 1, 2] as const;
/** Digits of a sum in doubles. */
const DIGITS = 8;

/** Models that answer by a formula, cheap enough for every assessment. */
const CHEAP: ReadonlySet<string> = new Set([
  'last-term',
  'last-ratio',
  'geometric-tail',
  'least-term',
  'pade-next',
  'cacciari-houdeau',
  'modified-ch',
  'renormalon-ch',
]);

type Scales = NonNullable<OptimalTruncationReport['scales']>;

/** Why the scale of a coupling series stays where it is. */
function fixedScale(series: Series): Refused {
  if (series.flavours === undefined)
    return refuse('the number of flavours is not stated', 'write flavours: into the series file');
  if (massDefinition(series) === 'running')
    return refuse('a running mass stands in the series beside the coupling', 'use leastterm rewrite --scale');
  const scheme = couplingScheme(series);
  return 'reason' in scheme
    ? scheme
    : refuse(
        'this coupling has no running of its own here',
        'bring it to MSbar first: leastterm rewrite --coupling MSbar',
      );
}

function scalesOf(series: Series, e: Expansion, question: Question | undefined): Scales | undefined {
  if (series.coupling.plain || question === undefined) return undefined;
  const { running } = e;
  if (running === undefined) return { points: [], refused: fixedScale(series) };
  const here = toNumberExact(running.scaleRatio);
  const [factor, additive] = [toNumberExact(e.factor), toNumberExact(e.additive)];
  const points: { ratio: string; coupling: string; value: number }[] = [];
  let refused: Refused | undefined;
  for (const ratio of RATIOS) {
    const moved = question.atScale(2 * Math.log(ratio / here));
    if (moved.kind === 'refusal') {
      refused ??= { reason: `at μ/Q = ${ratio}: ${moved.reason}`, remedy: moved.remedy };
      continue;
    }
    const sum = moved.coefficients.reduceRight((acc, c) => acc * moved.x + R.toNumber(c), 0) * moved.x ** e.power;
    points.push({ ratio: String(ratio), coupling: indicative(moved.alpha, 6), value: additive + factor * sum });
  }
  const own = points.find((p) => p.ratio === '1')?.value;
  const spread =
    own === undefined || points.length < 2 ? undefined : Math.max(...points.map((p) => Math.abs(p.value - own)));
  return {
    points: points.map((p) => ({ ...p, value: indicative(p.value, DIGITS) })),
    ...(spread === undefined ? {} : { spread: indicative(spread, 3) }),
    ...(refused === undefined ? {} : { refused }),
  };
}

function modelsOf(question: Question): NonNullable<OptimalTruncationReport['models']> {
  const all = question.known.values.length;
  return TRUNCATION_MODELS.filter((m) => CHEAP.has(m.name)).flatMap((m) => {
    const answer = ask(m, question);
    // A band about another sum than that of all terms would not stand beside the others.
    if ('reason' in answer || answer.terms !== all) return [];
    const { low, high } = bandText(answer.bands[68], question.known.unit, m.digits);
    return [{ model: m.name, title: m.title, nature: m.nature, about: m.about, low, high }];
  });
}

/** Values at other scales and answers of other models. */
export function truncationLines(
  series: Series,
  { expansion: e, uPerT }: Expanded,
  growth: Growth,
): Pick<OptimalTruncationReport, 'scales' | 'models' | 'competing'> {
  const question = questionOf(e, {
    coupling: series.coupling,
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
    priors: USUAL_PRIORS,
    found: foundLeading(growth),
  });
  const competing = competingReport(question, e, uPerT);
  const scales = scalesOf(series, e, question);
  return {
    ...(scales === undefined ? {} : { scales }),
    ...(question === undefined ? {} : { models: modelsOf(question) }),
    ...(competing === undefined ? {} : { competing }),
  };
}
