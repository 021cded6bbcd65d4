/**
 * @module A series whose numbers need no names: nf and the file's own constants replaced by their values, so that the series
 * can be given other flavours and written without its constants.
 */
import { exact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { textOf, written } from '../../series/index.js';
import type { Condensate, KnownSingularity, Scale, Series, Uncertain } from '../../series/index.js';
import { formalText } from './formal-text.js';
import { FormalReader } from './read-formal.js';

/** The same number with a text of its own. */
async function freed(value: Exact, reader: FormalReader): Promise<Exact> {
  if (value.rational !== undefined) return exact(value.rational);
  const formal = await reader.read(value);
  const bare: Exact = { ball: (prec) => value.ball(prec) };
  return written(value, formal === undefined ? textOf(bare) : formalText(formal));
}

const freedOptional = async (value: Exact | undefined, reader: FormalReader): Promise<Exact | undefined> =>
  value === undefined ? undefined : freed(value, reader);

/** Texts of numbers with errors hold no names unless the value is an expression. */
async function freedUncertain(n: Uncertain, reader: FormalReader): Promise<Uncertain> {
  if (n.value.rational !== undefined) return n;
  const value = await freed(n.value, reader);
  return { ...n, value, text: textOf(value) };
}

async function singularity(s: KnownSingularity, reader: FormalReader): Promise<KnownSingularity> {
  const [u, t, exponent, anomalousDimension] = await Promise.all(
    [s.u, s.t, s.exponent, s.anomalousDimension].map((value) => freedOptional(value, reader)),
  );
  const wilsonCorrections =
    s.wilsonCorrections && (await Promise.all(s.wilsonCorrections.map((c) => freed(c, reader))));
  const strength = s.strength && (await freedUncertain(s.strength, reader));
  return {
    ...(u && { u }),
    ...(t && { t }),
    ...(s.dimension && { dimension: s.dimension }),
    ...(exponent && { exponent }),
    ...(anomalousDimension && { anomalousDimension }),
    ...(wilsonCorrections && { wilsonCorrections }),
    ...(strength && { strength }),
    kind: s.kind,
  };
}

async function condensate(c: Condensate, reader: FormalReader): Promise<Condensate> {
  const wilson = await freedOptional(c.wilson, reader);
  const value = c.value && (await freedUncertain(c.value, reader));
  return { ...c, ...(wilson && { wilson }), ...(value && { value }) };
}

async function scale(s: Scale, reader: FormalReader): Promise<Scale> {
  if (s.value.rational !== undefined && /^[\d.]+ (?:GeV|MeV)$/.test(s.text)) return s;
  const value = await freed(s.value, reader);
  return { ...s, value, text: `${textOf(value)} ${s.unit}` };
}

/** Everything but the coefficients freed of names; constants, checks and choices of flavours are gone. */
export async function freestanding(series: Series): Promise<Series> {
  const reader = new FormalReader(series);
  const { constants: _constants, checks: _checks, anyFlavours: _any, flavourChoices: _choices, ...rest } = series;
  const { scaleRatio, hardScale, measurement } = series;
  const ratio = await freedOptional(scaleRatio, reader);
  return {
    ...rest,
    factor: await freed(series.factor, reader),
    additive: await freed(series.additive, reader),
    ...(ratio && { scaleRatio: ratio }),
    ...(hardScale && { hardScale: await scale(hardScale, reader) }),
    ...(measurement && { measurement: { ...measurement, ...(await freedUncertain(measurement, reader)) } }),
    singularities: await Promise.all(series.singularities.map((s) => singularity(s, reader))),
    condensates: await Promise.all(series.condensates.map((c) => condensate(c, reader))),
  };
}
