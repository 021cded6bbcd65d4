/** @module Scales and masses on the command line. A unit is never guessed: a bare number is refused. */
import { UsageError } from './faults.js';
import type { Threshold } from '../qcd/index.js';
import type { Uncertain } from '../series/index.js';

/** Scales that have a name, as the published inputs give them. */
const NAMED = { MZ: 'MZ', mZ: 'MZ', MW: 'MW', mW: 'MW', mtau: 'mTau' } as const;

const isNamed = (text: string): text is keyof typeof NAMED => text in NAMED;

const QUANTITY = /^(.*?)\s*(GeV|MeV|TeV)$/;
const IN_GEV = { GeV: 1, MeV: 1e-3, TeV: 1e3 } as const;
const isUnit = (text: string | undefined): text is keyof typeof IN_GEV => text !== undefined && text in IN_GEV;

const FORM = 'a positive number with its unit, such as 91.1879GeV or 500MeV, or one of MZ, MW, mtau';

/** An option, or an operand, which has a name in capitals. */
const written = (option: string): string => (/^[A-Z]/.test(option) ? option : `--${option}`);

/** What the user wrote, and the option, in front of a complaint. */
function wrong(option: string, text: string, wanted: string, command: string): UsageError {
  return new UsageError(`${written(option)}: "${text}" ${wanted}`, command);
}

const withoutUnit = (option: string, text: string, command: string): UsageError =>
  wrong(option, text, `has no unit; write ${/^[A-Z]/.test(option) ? '' : `--${option} `}${text}GeV`, command);

/** A scale in GeV. */
export async function scaleOf(option: string, text: string, command: string): Promise<number> {
  const { numerics, qcd } = await import('./rooms.js');
  if (isNamed(text)) return Number(qcd.INPUTS[NAMED[text]].value);
  const m = QUANTITY.exec(text.trim());
  const unit = m?.[2];
  const q = numerics.Rational.parse(m?.[1] ?? text);
  if (q === undefined || q.sign() <= 0) throw wrong(option, text, `is no scale; wanted ${FORM}`, command);
  if (!isUnit(unit)) throw withoutUnit(option, text, command);
  return q.toNumber() * IN_GEV[unit];
}

/** A mass with an optional error, in GeV. */
export async function massOf(option: string, text: string, command: string): Promise<Uncertain> {
  const { numerics, series } = await import('./rooms.js');
  const m = QUANTITY.exec(text.trim());
  const unit = m?.[2];
  const read = series.parseUncertain(m?.[1] ?? text);
  if (series.isNumberProblem(read)) throw wrong(option, text, `is no mass; wanted '4.186(6)GeV'`, command);
  if (!isUnit(unit)) throw withoutUnit(option, text, command);
  const value = read.value.rational ?? numerics.Rational.ZERO;
  if (value.sign() <= 0) throw wrong(option, text, 'is not positive; wanted a mass above 0', command);
  if (unit === 'GeV') return read;
  const factor = unit === 'MeV' ? numerics.Rational.of(1, 1000) : numerics.Rational.of(1000);
  const error = read.error && { plus: read.error.plus.mul(factor), minus: read.error.minus.mul(factor) };
  return { value: numerics.exact(value.mul(factor)), ...(error && { error }), text: read.text };
}

/** A coupling with an optional error. */
export async function couplingValue(option: string, text: string, command: string): Promise<Uncertain> {
  const { series } = await import('./rooms.js');
  const read = series.parseUncertain(text);
  if (series.isNumberProblem(read))
    throw new UsageError(`--${option}: ${read.problem}; wanted ${read.wanted}`, command);
  return read;
}

/** b=4.18GeV, b=4.18(3)GeV@2.1GeV. */
const THRESHOLD = /^([a-z])=([^@]+)(?:@(.+))?$/;

/** The usual thresholds with those of --threshold in their place. */
export async function thresholdsOf(
  list: readonly string[] | undefined,
  command: string,
): Promise<readonly Threshold[]> {
  const { numerics, qcd } = await import('./rooms.js');
  let thresholds: readonly Threshold[] = qcd.DEFAULT_THRESHOLDS;
  for (const text of list ?? []) {
    const [, name, massText, scaleText] = THRESHOLD.exec(text) ?? [];
    const usual = thresholds.find((t) => t.name === name);
    if (usual === undefined || massText === undefined) {
      throw wrong('threshold', text, 'is no threshold; wanted c, b or t with its mass, such as b=4.18GeV', command);
    }
    const mass = await massOf('threshold', massText, command);
    const { error: _error, scale: _scale, ...rest } = usual;
    const replaced: Threshold = {
      ...rest,
      mass: numerics.toNumberExact(mass.value),
      ...(mass.error === undefined ? {} : { error: mass.error.plus.add(mass.error.minus).toNumber() / 2 }),
      ...(scaleText === undefined ? {} : { scale: await scaleOf('threshold', scaleText, command) }),
    };
    thresholds = thresholds.map((t) => (t === usual ? replaced : t));
  }
  return thresholds;
}
