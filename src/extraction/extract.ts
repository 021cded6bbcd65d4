/**
 * @module extract: the unknown behind one measurement, by every chosen prescription, with its budget.
 */
import { exact, toNumberExact } from '../numerics/index.js';
import { divisorSize, isRefusal } from '../qcd/index.js';
import type { Refusal } from '../qcd/index.js';
import type { Series } from '../series/index.js';
import { VERSION, fixedOrderSeries, indicative, seriesSummary } from '../studies/index.js';
import type { Assessment, Caution } from '../studies/index.js';
import { checkEvolution, isMSbar } from './check.js';
import { errorText } from './entries.js';
import { evolver } from './evolved.js';
import type { Evolver } from './evolved.js';
import { hardScale, powerOfGeV, variableOf } from './place.js';
import { definitionWords, powerFactor } from './power-terms.js';
import type { Problem } from './problem.js';
import type { DatumSummary, ExtractResult, PowerTermEntry, UnknownSummary } from './result.js';
import { evaluated, refusedRow, rowEntry, rowNumbers } from './rows.js';
import type { RowNumbers, Setting } from './rows.js';
import { chosen, settingOf, solveAll } from './setting.js';
import { contested, summaryOf, withEvolved } from './summary.js';

/** The datum as the result states it. */
export function datumSummary(setting: Setting): DatumSummary {
  const { datum, stages } = setting;
  const { measured } = datum;
  const Q = hardScale(stages.series, datum);
  return {
    series: seriesSummary(fixedOrderSeries(stages.series), stages.central.expanded),
    ...(measured === undefined
      ? {}
      : {
          measured: {
            text: measured.text,
            value: measured.value,
            plus: errorText(measured.plus),
            minus: errorText(measured.minus),
            ...(measured.dimension === undefined || measured.dimension === 0
              ? {}
              : { unit: powerOfGeV(measured.dimension) }),
          },
        }),
    ...(Q === undefined || setting.problem.for === 'mass' ? {} : { scale: indicative(Q, 8) }),
  };
}

function unknownSummary(setting: Setting): UnknownSummary {
  const { problem, stages, extracted, datum } = setting;
  const { series } = stages;
  switch (problem.for) {
    case 'alpha_s': {
      const Q = hardScale(series, datum);
      const ratio = series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio);
      return {
        name: 'alpha_s',
        symbol: series.coupling.name,
        ...(Q === undefined ? {} : { scale: indicative(Q * ratio, 8) }),
        ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
      };
    }
    case 'mass':
      return { name: 'mass', symbol: 'm(m)', unit: 'GeV' };
    case 'pole-mass':
      return { name: 'pole-mass', symbol: 'M', unit: 'GeV' };
    case 'condensate':
      return {
        name: 'condensate',
        symbol: extracted?.name ?? 'condensate',
        ...(hardScale(series, datum) === undefined ? {} : { unit: powerOfGeV(extracted?.dimension ?? 4) }),
      };
  }
}

/** From the series' own scale to where α_s is wanted; the reason where it cannot be brought there. */
function evolverOf(setting: Setting): Evolver | Refusal | undefined {
  const { problem, stages, datum } = setting;
  const { series } = stages;
  if (problem.for !== 'alpha_s' || problem.to === undefined) return undefined;
  const bad = checkEvolution(series, datum);
  if (bad !== undefined) return bad;
  const ratio = series.scaleRatio === undefined ? 1 : toNumberExact(series.scaleRatio);
  const from = { scale: (hardScale(series, datum) ?? 0) * ratio, flavours: series.flavours ?? 0 };
  return evolver(problem, from, problem.to);
}

function powerEntries(setting: Setting, row: RowNumbers | undefined): readonly PowerTermEntry[] | undefined {
  const { terms, stages } = setting;
  if (terms.length === 0 || row === undefined) return undefined;
  const { coupling } = stages.series;
  const divisor = coupling.plain ? exact(1) : divisorSize(coupling.divisor);
  const { alpha, Q } = row.solved.whole.place;
  return terms.map((t): PowerTermEntry => ({
    name: t.name,
    dimension: String(t.dimension),
    value: errorText(t.value),
    origin: t.origin,
    belongsTo: definitionWords(t.definition),
    adds: errorText(t.value * powerFactor(t, variableOf(alpha, divisor), Q ?? 1)),
  }));
}

/** Words about the question as a whole. */
export function problemCautions(setting: Setting, evolve?: Evolver | Refusal): Caution[] {
  const { problem, stages, terms } = setting;
  const { series } = stages;
  const list: Caution[] = [];
  if (series.invented)
    list.push({ code: 'invented', text: 'this series is invented for demonstration: quote nothing from it' });
  if (isRefusal(evolve))
    list.push({ code: 'not evolved', text: `the coupling stays at its own scale: ${evolve.reason}` });
  if (series.coefficients.some((c) => c.status === 'estimated'))
    list.push({
      code: 'rests-on-estimate',
      text: 'the values use a coefficient that is an estimate, not a calculation',
    });
  if (terms.some((t) => t.definition.kind === 'any'))
    list.push({
      code: 'definitions mixed',
      text: 'one condensate value is added to sums of different definitions, as asked: their difference contains the ambiguity',
    });
  const left = series.condensates.filter((c) => c.value !== undefined && terms.every((t) => t.name !== c.name));
  if (problem.for !== 'condensate' && problem.fileCondensates !== false && left.length > 0)
    list.push({
      code: 'condensates left out',
      text: `the file states ${[...new Set(left.map((c) => c.name))].join(', ')}, but not to which prescription the value belongs: nothing is added (--condensate with --condensate-by adds it)`,
    });
  return list;
}

/** The extraction; a refusal when the question cannot be put. Rows that refuse stay in the result. */
export function extract(problem: Problem, series: Series, request: Assessment['request']): ExtractResult | Refusal {
  const [datum] = problem.data;
  if (datum === undefined) return { reason: 'there is no series', remedy: 'name one' };
  const setting = settingOf(problem, series, datum);
  if (isRefusal(setting)) return setting;
  const evolve = evolverOf(setting);
  if (isRefusal(evolve) && isMSbar(series)) return evolve;
  const stated = datumSummary(setting);
  const usable = isRefusal(evolve) ? undefined : evolve;
  const solved = solveAll(setting, chosen(problem, [series]));
  const others = [...solved.values()].flatMap((s) =>
    isRefusal(s) || s.whole.sum.imaginary === undefined ? [] : [evaluated(s)],
  );
  const numbers: RowNumbers[] = [];
  const rows = [...solved].map(([prescription, one]) => {
    if (isRefusal(one)) return refusedRow(prescription, one);
    const row = rowNumbers(setting, one, others);
    numbers.push(row);
    return withEvolved(rowEntry(row, problem), row, usable);
  });
  const unknown = unknownSummary(setting);
  const summary = summaryOf(numbers, problem, unknown.unit, usable);
  const quoted = numbers.find((r) => r.prescription.name === summary?.prescription);
  const condensates = powerEntries(setting, quoted);
  const { search } = setting;
  return {
    leastterm: VERSION,
    request,
    kind: 'single',
    unknown,
    datum: stated,
    ...(search === undefined || problem.for === 'pole-mass' || problem.for === 'condensate'
      ? {}
      : { searched: { from: indicative(search.from), to: indicative(search.to) } }),
    rows,
    ...(summary === undefined ? {} : { summary }),
    ...(condensates === undefined ? {} : { condensates }),
    cautions: [
      ...problemCautions(setting, evolve),
      ...contested(
        numbers,
        numbers.map((r) => r.solved.number),
      ),
    ],
  };
}
