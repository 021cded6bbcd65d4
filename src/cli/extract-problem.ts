/** @module From the options of extract, or its problem file, to the problem as plain data. */
import type { Given } from './command.js';
import { chosenPrescriptions } from './choose.js';
import { condensateOf, correlationOf, definitionOf, quantityOf, searchOf } from './extract-values.js';
import type { Row } from './extract-file.js';
import { UsageError } from './faults.js';
import { USUAL_DIGITS } from './input.js';
import { scaleOf, thresholdsOf } from './quantities.js';
import type { AmbiguityName, Datum, Problem, Unknown } from '../extraction/index.js';
import type { Series } from '../series/index.js';

const COMMAND = 'extract';

/** One of the known words, or a complaint with the nearest. */
async function oneOf<T extends string>(option: string, text: string, known: readonly T[]): Promise<T> {
  const found = known.find((word) => word === text);
  if (found !== undefined) return found;
  const { series } = await import('./rooms.js');
  throw new UsageError(
    `--${option}: no "${text}"${series.suggestion(text, known)}; wanted one of ${known.join(', ')}`,
    COMMAND,
  );
}

async function unknownOf(text: string | undefined): Promise<{ for: Unknown; freeAlphaS: boolean }> {
  const { extraction } = await import('./rooms-more.js');
  if (text === undefined)
    throw new UsageError(
      '--for is missing: what is extracted; write --for alpha_s, mass, condensate or pole-mass',
      COMMAND,
    );
  const parts = text.split(',').map((part) => part.trim());
  const names = await Promise.all(parts.map((part) => oneOf('for', part, extraction.UNKNOWNS)));
  const [first = 'alpha_s', second, third] = names;
  if (second === undefined) return { for: first, freeAlphaS: false };
  if (third === undefined && names.includes('mass') && names.includes('alpha_s'))
    return { for: 'mass', freeAlphaS: true };
  throw new UsageError(`--for: "${text}" cannot be fitted together; wanted one unknown, or mass,alpha_s`, COMMAND);
}

/** Powers of the mass, whole numbers. */
function powerOf(text: string | undefined): number | undefined {
  if (text === undefined) return undefined;
  const power = Number(text);
  if (text.trim() === '' || !Number.isInteger(power))
    throw new UsageError(
      `--mass-power: "${text}" is no whole number; wanted such as -2 for a first moment, 5 for a width`,
      COMMAND,
    );
  return power;
}

async function datumOf(row: Row, of: Series, unknown: Unknown): Promise<Datum> {
  const { measurement } = of;
  const own = measurement === undefined ? undefined : `${measurement.text} ${measurement.unit ?? ''}`;
  const measured = row.measured ?? (unknown === 'pole-mass' ? undefined : own);
  const power = powerOf(row.massPower);
  return {
    series: row.series,
    ...(measured === undefined ? {} : { measured: await quantityOf('measured', measured) }),
    ...(row.scale === undefined ? {} : { scale: await scaleOf('scale-of-measurement', row.scale, COMMAND) }),
    ...(power === undefined ? {} : { massPower: power }),
    ...(row.norm === undefined ? {} : { norm: await quantityOf('norm', row.norm) }),
  };
}

/** α_s(M_Z) behind a mass or a condensate: as given, or the world average. */
async function alphaOf(given: Given, unknown: Unknown): Promise<Pick<Problem, 'alphaS' | 'coupling'>> {
  const { at, alphaSMZ } = given;
  if (unknown === 'alpha_s') {
    if (at !== undefined || alphaSMZ !== undefined)
      throw new UsageError('--at and --alpha-s-mz are inputs of other unknowns: here α_s is what is wanted', COMMAND);
    return {};
  }
  if (at !== undefined && alphaSMZ !== undefined)
    throw new UsageError('--at and --alpha-s-mz exclude each other: give one of them', COMMAND);
  if (at !== undefined) {
    if (unknown !== 'condensate')
      throw new UsageError('--at is the coupling at one scale, and a mass moves its scale: give --alpha-s-mz', COMMAND);
    return { coupling: await quantityOf('at', at) };
  }
  if (alphaSMZ !== undefined) return { alphaS: await quantityOf('alpha-s-mz', alphaSMZ) };
  const { qcd } = await import('./rooms.js');
  const { value, error } = qcd.INPUTS.alphaSMZ;
  return {
    alphaS: { text: `${value} +- ${error[0]}`, value, plus: Number(error[0]), minus: Math.abs(Number(error[1])) },
  };
}

/** Where α_s is wanted: M_Z unless said otherwise. */
async function goalOf({ to, toFlavours }: Given, unknown: Unknown): Promise<Problem['to']> {
  if (unknown !== 'alpha_s') return undefined;
  if (to === 'none') return undefined;
  const { qcd, studies } = await import('./rooms.js');
  if (to === undefined) return { scale: Number(qcd.INPUTS.MZ.value), flavours: 5 };
  const scale = await scaleOf('to', to, COMMAND);
  const quark = toFlavours === undefined ? studies.unclearQuark(scale) : undefined;
  if (quark !== undefined)
    throw new UsageError(
      `--to: at ${scale} GeV both ${quark.flavours - 1} and ${quark.flavours} flavours are in use; write --to-flavours ${quark.flavours - 1} or ${quark.flavours}`,
      COMMAND,
    );
  return { scale, flavours: toFlavours ?? qcd.flavoursAt(scale) };
}

/** The names chosen; --except alone takes from the usual ones. */
async function prescriptionsOf(given: Given): Promise<readonly string[] | undefined> {
  const names = await chosenPrescriptions(given, COMMAND);
  if (names === undefined || given.only !== undefined || given.family !== undefined) return names;
  const { extraction } = await import('./rooms-more.js');
  return extraction.USUAL.filter((name) => names.includes(name));
}

async function condensatesOf(given: Given, unknown: Unknown): Promise<Partial<Problem>> {
  const list = given.condensate ?? [];
  const none = list.includes('none');
  const named = list.filter((text) => text !== 'none');
  const wanted = unknown === 'condensate' ? named.filter((text) => !text.includes('=')) : [];
  if (wanted.length > 1)
    throw new UsageError(`--condensate: ${wanted.join(' and ')} are both wanted; one at a time`, COMMAND);
  const by = await definitionOf(given.condensateBy);
  return {
    condensates: await Promise.all(named.filter((text) => !wanted.includes(text)).map(condensateOf)),
    ...(none ? { fileCondensates: false } : {}),
    ...(by === undefined ? {} : { condensateBy: by }),
    ...(wanted[0] === undefined ? {} : { condensate: wanted[0] }),
  };
}

async function weightsOf(text: string | undefined): Promise<Partial<Problem>> {
  if (text === undefined) return {};
  return (await oneOf('weights', text, ['measurement', 'theory'])) === 'theory' ? { theoryInWeights: true } : {};
}

/** What a pole mass or its like is predicted from. */
async function massOfPole({ mass }: Given, unknown: Unknown): Promise<Partial<Problem>> {
  if (unknown !== 'pole-mass') {
    if (mass !== undefined)
      throw new UsageError('--mass is the input of --for pole-mass; a measured mass is --measured', COMMAND);
    return {};
  }
  if (mass === undefined)
    throw new UsageError("--mass is missing: the MSbar mass m(m); write --mass '162.5(1.8)GeV'", COMMAND);
  const q = await quantityOf('mass', mass);
  if (q.dimension !== 1) throw new UsageError(`--mass: "${mass}" has no unit; write --mass ${mass}GeV`, COMMAND);
  return { mass: q };
}

export async function problemOf(given: Given, rows: readonly Row[], series: readonly Series[]): Promise<Problem> {
  const { extraction } = await import('./rooms-more.js');
  const { truncation } = await import('./rooms.js');
  const unknown = await unknownOf(given.for);
  const data = await Promise.all(rows.map((row, i) => datumOf(row, series[i]!, unknown.for)));
  const models = ['own', ...truncation.TRUNCATION_MODELS.map((m) => m.name)];
  const ambiguityBy: AmbiguityName =
    given.ambiguityBy === undefined
      ? 'im/pi'
      : await oneOf('ambiguity-by', given.ambiguityBy, extraction.AMBIGUITY_NAMES);
  const names = await prescriptionsOf(given);
  const to = await goalOf(given, unknown.for);
  const correlation = await correlationOf(given.correlation, rows.length);
  const search = searchOf(given.search);
  if (given.central !== undefined && names?.includes(given.central) === false)
    throw new UsageError(`--central: ${given.central} is not among the prescriptions that are run`, COMMAND);
  return {
    for: unknown.for,
    ...(unknown.freeAlphaS ? { freeAlphaS: true } : {}),
    data,
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(names === undefined ? {} : { prescriptions: names }),
    ...(given.central === undefined ? {} : { central: await centralOf(given.central) }),
    truncationBy: given.truncationBy === undefined ? 'own' : await oneOf('truncation-by', given.truncationBy, models),
    ambiguityBy,
    condensates: [],
    ...(await alphaOf(given, unknown.for)),
    ...(await massOfPole(given, unknown.for)),
    ...(await condensatesOf(given, unknown.for)),
    ...(await weightsOf(given.weights)),
    loops: given.loops ?? 5,
    thresholds: await thresholdsOf(given.threshold, COMMAND),
    ...(to === undefined ? {} : { to }),
    ...(correlation === undefined ? {} : { correlation }),
    ...(search === undefined ? {} : { search }),
    digits: given.digits ?? USUAL_DIGITS,
  };
}

async function centralOf(name: string): Promise<string> {
  const { prescriptions } = await import('./rooms.js');
  const all = [...prescriptions.PRESCRIPTIONS, ...Object.values(prescriptions.CONTOUR_NAMES)].map((p) => p.name);
  return oneOf('central', name, all);
}
