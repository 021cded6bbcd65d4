/** @module A measured mass of another definition: its relation to m(m) takes the place of a series. */
import type { Given } from './command.js';
import { quantityOf } from './extract-values.js';
import { UsageError } from './faults.js';
import { lightOf, placeOf, quarkOf } from './mass-input.js';
import { thresholdsOf } from './quantities.js';
import { accepted } from './refused.js';
import type { Datum } from '../extraction/index.js';
import type { Series } from '../series/index.js';

const COMMAND = 'extract';

export interface MeasuredMass {
  readonly series: Series;
  readonly threshold: NonNullable<Datum['threshold']>;
}

/** The relation of the mass named by --from, at the m(m) that its measured value leads to. */
export async function measuredMass(given: Given): Promise<MeasuredMass> {
  const { extraction, masses } = await import('./rooms-more.js');
  const { qcd } = await import('./rooms.js');
  if (given.for !== 'mass')
    throw new UsageError('--from names the definition of a measured mass: write --for mass', COMMAND);
  const [text, second] = given.measured ?? [];
  if (text === undefined || second !== undefined)
    throw new UsageError("--from takes one measured mass; write --measured '4.53(6) GeV'", COMMAND);
  const measured = await quantityOf('measured', text);
  if (measured.dimension !== 1) throw new UsageError(`--measured: "${text}" is no mass; write ${text}GeV`, COMMAND);
  const place = await placeOf('from', given.from ?? '', undefined);
  const value = Number(measured.value);
  const light = lightOf(given, quarkOf(given, value, await thresholdsOf(given.threshold, COMMAND)));
  const mass = { place, light };
  const objection = extraction.thresholdObjection(mass);
  if (objection !== undefined)
    throw new UsageError(`--from: ${objection.reason}; remedy: ${objection.remedy}`, COMMAND);
  const { MZ, alphaSMZ } = qcd.INPUTS;
  const alpha = given.alphaSMZ === undefined ? alphaSMZ.value : (await quantityOf('alpha-s-mz', given.alphaSMZ)).value;
  const there = accepted(
    masses.convertMass({
      mass: value,
      from: place,
      to: { definition: 'msbar' },
      alpha: { value: Number(alpha), scale: Number(MZ.value), flavours: 5 },
      light,
    }),
    COMMAND,
  );
  const reference = there.msbar;
  const series = accepted(extraction.thresholdSeries(mass, reference), COMMAND);
  return { series, threshold: { ...place, light, reference } };
}
