/**
 * @module catalogue check: does every series file say what it should? Each is read at every number of flavours it is meant
 * for, held against the values that it records, written, and read again.
 */
import { R, subExact } from '../numerics/index.js';
import { InputError, checkSeries, loadSeries, parseSeries, writeSeries } from '../series/index.js';
import type { Series } from '../series/index.js';

export interface CheckedSeries {
  readonly id: string;
  /** Numbers of flavours at which it was read; none for a series without. */
  readonly flavours: readonly number[];
  /** Recorded values that were held against the coefficients. */
  readonly values: number;
  /** What is wrong; empty when all is well. */
  readonly problems: readonly string[];
}

/** Numbers of flavours that the file names: its own, its choices, those of its recorded values. */
function flavoursNamed(series: Series): readonly number[] {
  const { flavours, flavourChoices = [], checks = [] } = series;
  if (series.anyFlavours !== true) return flavours === undefined ? [] : [flavours];
  const recorded = checks.flatMap((c) => (c.flavours === undefined ? [] : [c.flavours]));
  const wanted =
    flavourChoices.length > 0 ? flavourChoices : [...recorded, ...(flavours === undefined ? [] : [flavours])];
  return [...new Set(wanted)].toSorted((a, b) => a - b);
}

/** Recorded values that apply to a series at its number of flavours. */
const recordedFor = (series: Series): number =>
  (series.checks ?? [])
    .filter((c) => c.flavours === undefined || c.flavours === series.flavours)
    .reduce((sum, c) => sum + c.values.length, 0);

/** The file written and read again gives the same numbers. */
async function comesBack(series: Series): Promise<string[]> {
  const again = await parseSeries(writeSeries(series), {
    name: series.id,
    form: 'yaml',
    ...(series.flavours === undefined ? {} : { flavours: series.flavours }),
  });
  return series.coefficients.flatMap((c, i) => {
    const back = again.coefficients[i]?.value;
    const same = back !== undefined && R.containsZero(subExact(c.value, back).ball(128));
    return same ? [] : [`${series.id}: coefficients[${i}] is another number after writing and reading`];
  });
}

async function checkOne(id: string): Promise<CheckedSeries> {
  const problems: string[] = [];
  let flavours: readonly number[] = [];
  let values = 0;
  try {
    const own = await loadSeries(id);
    flavours = flavoursNamed(own);
    const list =
      flavours.length === 0 ? [own] : await Promise.all(flavours.map((n) => loadSeries(id, { flavours: n })));
    for (const series of list) {
      values += recordedFor(series);
      problems.push(
        ...checkSeries(series).map((text) => at(series, text)),
        ...(await comesBack(series)).map((text) => at(series, text)),
      );
    }
    // Values for numbers of flavours that nobody would ever compare.
    const orphan = (own.checks ?? []).find((c) => c.flavours !== undefined && !flavours.includes(c.flavours));
    if (orphan !== undefined)
      problems.push(`${id}: values are recorded for nf = ${orphan.flavours}, which the file does not allow`);
  } catch (error) {
    if (!(error instanceof InputError)) throw error;
    problems.push(...error.message.split('\n'));
  }
  return { id, flavours, values, problems };
}

const at = (series: Series, text: string): string =>
  series.flavours === undefined ? text : `${text} (nf = ${series.flavours})`;

/** Checks the series named, one after the other. */
export async function catalogueCheck(ids: readonly string[]): Promise<readonly CheckedSeries[]> {
  const list: CheckedSeries[] = [];
  for (const id of ids) list.push(await checkOne(id));
  return list;
}
