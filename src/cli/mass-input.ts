/** @module What `mass` is asked, from the words of the command line. */
import type { Given } from './command.js';
import { UsageError } from './faults.js';
import { USUAL_DIGITS } from './input.js';
import { couplingValue, massOf, scaleOf, thresholdsOf } from './quantities.js';
import type { DefinitionName, MassPlace, MassQuestion } from '../masses/index.js';
import type { Threshold } from '../qcd/index.js';

const COMMAND = 'mass';

/** Other ways to write a name. */
const ALIASES: Readonly<Record<string, DefinitionName>> = {
  "rs'": 'rs-prime',
  'msr-natural': 'msr',
  msrn: 'msr',
  msrp: 'msr-practical',
  kin: 'kinetic',
  os: 'pole',
  'on-shell': 'pole',
};

/** NAME or NAME@SCALE. */
const PLACE = /^([^@]*)(?:@(.*))?$/;

async function nameOf(option: string, text: string): Promise<DefinitionName> {
  const { masses } = await import('./rooms-more.js');
  const word = text.trim().toLowerCase();
  const name = ALIASES[word] ?? word;
  if (masses.isDefinitionName(name)) return name;
  const { series } = await import('./rooms.js');
  const inside = /^([a-z'-]+)\((.*)\)$/.exec(word);
  const meant = inside?.[1] ?? word;
  const near = series.suggestion(meant, [...masses.DEFINITION_NAMES, ...Object.keys(ALIASES)]);
  const form = inside === null ? '' : `; a scale stands behind @, with its unit: ${inside[1] ?? ''}@2GeV`;
  throw new UsageError(
    `--${option}: no mass definition "${text.trim()}"${inside === null ? near : form}; wanted one of ${masses.DEFINITION_NAMES.join(', ')}`,
    COMMAND,
  );
}

/** A definition with its scale: its own, or that of --cutoff. */
export async function placeOf(option: string, text: string, cutoff: number | undefined): Promise<MassPlace> {
  const { masses } = await import('./rooms-more.js');
  const [, word = '', own] = PLACE.exec(text) ?? [];
  const definition = await nameOf(option, word);
  const { parameter, title } = masses.definitionOf(definition);
  if (own !== undefined && parameter === undefined) {
    throw new UsageError(`--${option}: the ${definition} mass has no scale; write ${definition} without @`, COMMAND);
  }
  const scale = own === undefined ? cutoff : await scaleOf(option, own, COMMAND);
  if (parameter === undefined) return { definition };
  if (scale === undefined) {
    const remedy =
      option === 'to' ? `write --cutoff 2GeV or --to ${definition}@2GeV` : `write --${option} ${definition}@2GeV`;
    throw new UsageError(`--${option}: ${title} needs ${parameter.symbol} (${parameter.meaning}); ${remedy}`, COMMAND);
  }
  return { definition, scale };
}

/** What `all` stands for: every definition with a scale that --cutoff gives, except the one that is given. */
async function allOf(from: MassPlace, cutoff: number | undefined): Promise<readonly MassPlace[]> {
  const { masses } = await import('./rooms-more.js');
  const names = masses.DEFINITION_NAMES.filter((name) => name !== 'running');
  if (cutoff === undefined) {
    const need = names.filter((name) => masses.definitionOf(name).parameter !== undefined);
    throw new UsageError(`--cutoff is missing: ${need.join(', ')} need a scale; write --cutoff 2GeV`, COMMAND);
  }
  const places = names.map((definition): MassPlace =>
    masses.definitionOf(definition).parameter === undefined ? { definition } : { definition, scale: cutoff },
  );
  return places.filter((p) => p.definition !== from.definition || p.scale !== from.scale);
}

async function targetsOf(given: Given, from: MassPlace): Promise<readonly MassPlace[]> {
  if (given.to === undefined) {
    throw new UsageError('--to is missing; write --to msr@2GeV, or --to all --cutoff 2GeV', COMMAND);
  }
  const cutoff = given.cutoff === undefined ? undefined : await scaleOf('cutoff', given.cutoff, COMMAND);
  const words = given.to.split(',').map((word) => word.trim());
  if (words.includes('all')) return allOf(from, cutoff);
  const places: MassPlace[] = [];
  for (const word of words) places.push(await placeOf('to', word, cutoff));
  const used = await usesCutoff(places);
  if (cutoff !== undefined && !used) {
    throw new UsageError(`--cutoff: ${words.join(', ')} needs no scale; leave --cutoff out`, COMMAND);
  }
  return places;
}

async function usesCutoff(places: readonly MassPlace[]): Promise<boolean> {
  const { masses } = await import('./rooms-more.js');
  return places.some((p) => masses.definitionOf(p.definition).parameter !== undefined);
}

/** The quark by name, or the one whose threshold is nearest on a logarithmic scale. */
export function quarkOf(given: Given, mass: number, thresholds: readonly Threshold[]): Threshold {
  const far = (t: Threshold): number => Math.abs(Math.log(t.mass / mass));
  const named = thresholds.find((t) => t.name === given.quark);
  if (given.quark !== undefined && named === undefined) {
    const names = thresholds.map((t) => t.name).join(', ');
    throw new UsageError(`--quark: no quark "${given.quark}"; wanted one of ${names}`, COMMAND);
  }
  const [first, ...rest] = thresholds;
  const nearest = rest.reduce((best, t) => (best === undefined || far(t) < far(best) ? t : best), first);
  const found = named ?? nearest;
  if (found === undefined) throw new UsageError('--quark is missing; write --quark b', COMMAND);
  return found;
}

export function lightOf(given: Given, quark: Threshold): number {
  const most = quark.flavours - 1;
  const { light = most } = given;
  if (light <= most) return light;
  throw new UsageError(
    `--light: ${light} light flavours do not fit the ${quark.name} quark, beside which there are ${most}; write --light ${most}, or name another quark by --quark`,
    COMMAND,
  );
}

/** The coupling of --alpha-s, --alpha-s-mz, or the world average. */
async function alphaOf(given: Given, light: number): Promise<MassQuestion['alpha']> {
  const { numerics, qcd } = await import('./rooms.js');
  const { alphaS, alphaSMZ, flavours } = given;
  if (alphaS !== undefined && alphaSMZ !== undefined) {
    throw new UsageError('--alpha-s and --alpha-s-mz exclude each other: one coupling is enough', COMMAND);
  }
  if (alphaS === undefined) {
    if (flavours !== undefined) {
      throw new UsageError('--flavours belongs to the coupling of --alpha-s; that at M_Z has five', COMMAND);
    }
    const { value: average, error } = qcd.INPUTS.alphaSMZ;
    const rounded = numerics.roundPdg(average, [error[0]]);
    const usual = (rounded && numerics.writeParentheses(rounded)) ?? average;
    const text = alphaSMZ ?? usual;
    const value = await couplingValue('alpha-s-mz', text, COMMAND);
    return { value: positive('alpha-s-mz', value), scale: Number(qcd.INPUTS.MZ.value), flavours: 5 };
  }
  const [, number = '', where] = PLACE.exec(alphaS) ?? [];
  if (where === undefined) {
    throw new UsageError(
      `--alpha-s: "${alphaS}" does not say at which scale; write --alpha-s '${alphaS}@4.18GeV'`,
      COMMAND,
    );
  }
  const value = await couplingValue('alpha-s', number, COMMAND);
  return {
    value: positive('alpha-s', value),
    scale: await scaleOf('alpha-s', where, COMMAND),
    flavours: flavours ?? light,
  };
}

type Value = MassQuestion['alpha']['value'];

function positive(option: string, value: Value, what = 'coupling'): Value {
  if ((value.value.rational?.sign() ?? 1) > 0) return value;
  throw new UsageError(`--${option}: ${value.text} is not positive; wanted a ${what} above 0`, COMMAND);
}

/** μ: a bare number is a multiple of m(m), a scale has its unit. */
async function muOf(text: string | undefined): Promise<MassQuestion['scale']> {
  if (text === undefined) return undefined;
  const { numerics } = await import('./rooms.js');
  const ratio = numerics.Rational.parse(text);
  if (ratio === undefined) return { GeV: await scaleOf('scale', text, COMMAND) };
  if (ratio.sign() > 0) return { ratio: ratio.toNumber() };
  throw new UsageError(`--scale: "${text}" is not positive; wanted a multiple of m(m), such as 2, or 3GeV`, COMMAND);
}

/** The whole question. */
export async function massQuestion(operand: string, given: Given): Promise<MassQuestion> {
  const { numerics } = await import('./rooms.js');
  const mass = await massOf('MASS', operand, COMMAND);
  const from = await placeOf('from', given.from ?? 'msbar', undefined);
  const to = await targetsOf(given, from);
  const thresholds = await thresholdsOf(given.threshold, COMMAND);
  const quark = quarkOf(given, numerics.toNumberExact(mass.value), thresholds);
  const light = lightOf(given, quark);
  const scale = await muOf(given.scale);
  const strength =
    given.strength === undefined
      ? undefined
      : positive('strength', await couplingValue('strength', given.strength, COMMAND), 'strength');
  return {
    mass: { ...mass, text: operand.trim() },
    from,
    to,
    alpha: await alphaOf(given, light),
    light,
    flavours: quark.flavours,
    thresholds,
    digits: given.digits ?? USUAL_DIGITS,
    ...(given.loops === undefined ? {} : { loops: given.loops }),
    ...(given.order === undefined ? {} : { order: given.order }),
    ...(strength === undefined ? {} : { strength }),
    ...(scale === undefined ? {} : { scale }),
  };
}
