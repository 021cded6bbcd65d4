/** @module leastterm rewrite: a series at another scale, in another coupling, with other flavours, in another mass. */
import type { Call, Command, Given } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { readSeries } from '../input.js';
import { deliver } from '../output.js';
import { scaleOf, thresholdsOf } from '../quantities.js';
import { accepted } from '../refused.js';
import { askedOf } from '../request.js';
import type { Exact } from '../../numerics/index.js';
import type { MassDefinition } from '../../qcd/index.js';
import type { Series } from '../../series/index.js';
import type { CouplingScheme, RewriteRequest } from '../../studies/index.js';

const fault = (message: string): UsageError => new UsageError(message, rewrite.name);

/** μ/Q as a number, or μ with its unit over the hard scale of the series. */
async function scaleRatio(text: string, series: Series): Promise<Exact> {
  const { numerics, studies } = await import('../rooms.js');
  const q = numerics.Rational.parse(text);
  if (q !== undefined && q.sign() > 0) return numerics.exact(q);
  if (q !== undefined) throw fault(`--scale: "${text}" is not positive; wanted mu/Q, such as 2, or mu, such as 3GeV`);
  const mu = await scaleOf('scale', text, rewrite.name);
  const hard = accepted(studies.hardScaleOf(series), rewrite.name);
  const exactMu = numerics.exact(numerics.Rational.parse(String(mu)) ?? numerics.Rational.fromNumber(mu));
  return numerics.divExact(exactMu, hard);
}

const COUPLINGS = 'MSbar, C:VALUE, V, mini-MOM, a catalogue id or a series file';

/** The scheme that --coupling names. */
async function scheme(text: string): Promise<CouplingScheme> {
  const { numerics, series } = await import('../rooms.js');
  const simple = (['MSbar', 'V', 'mini-MOM'] as const).find((name) => name.toLowerCase() === text.toLowerCase());
  if (simple !== undefined) return { kind: simple };
  const c = /^C(?::(.*))?$/i.exec(text);
  if (c !== null) {
    const value = numerics.Rational.parse(c[1] ?? '');
    if (value === undefined)
      throw fault(`--coupling: "${text}" needs the parameter of the C-scheme; write --coupling C:0`);
    return { kind: 'C', c: value };
  }
  const file = /[./\\]/.test(text);
  if (file || (await series.catalogueText(text)) !== undefined) return { kind: 'series', name: text };
  const near = series.suggestion(text, ['MSbar', 'C:0', 'V', 'mini-MOM', ...(await series.catalogueIds())]);
  throw fault(`--coupling: no coupling "${text}"${near}; wanted ${COUPLINGS}`);
}

const MASSES: readonly MassDefinition[] = ['pole', 'msbar', 'running'];

function massName(option: string, text: string): MassDefinition {
  const found = MASSES.find((name) => name === text.toLowerCase());
  if (found !== undefined) return found;
  throw fault(`--${option}: no mass "${text}"; wanted pole, msbar (m at its own scale) or running (m at mu)`);
}

async function mass(given: Given): Promise<RewriteRequest['mass']> {
  const others = { 'mass-power': given.massPower, 'from-mass': given.fromMass, 'mass-of-scale': given.massOfScale };
  if (given.mass === undefined) {
    const idle = Object.entries(others).find(([, value]) => value !== undefined)?.[0];
    if (idle !== undefined) throw fault(`--${idle} says nothing without --mass; write --mass msbar`);
    return undefined;
  }
  const { numerics } = await import('../rooms.js');
  const to = massName('mass', given.mass);
  if (given.massPower === undefined) {
    throw fault('--mass-power is missing: the power of the mass in the quantity; write --mass-power 5 for a width');
  }
  const power = numerics.Rational.parse(given.massPower);
  if (power === undefined) throw fault(`--mass-power: "${given.massPower}" is no number; wanted 5, or 1/2`);
  const of = given.massOfScale === undefined ? undefined : massName('mass-of-scale', given.massOfScale);
  if (of === 'running') throw fault('--mass-of-scale: Q stands for pole or msbar, which do not run');
  return {
    to,
    power,
    ...(given.fromMass === undefined ? {} : { from: massName('from-mass', given.fromMass) }),
    ...(given.heavyInCoupling === true ? { heavyInCoupling: true } : {}),
    ...(of === undefined ? {} : { hardScale: of }),
  };
}

/** The series as the file has it: --flavours is where it goes, not where it comes from. */
function readAsWritten(name: string, call: Call): Promise<Series> {
  const { flavours: _goal, ...given } = call.given;
  return readSeries(name, { ...call, given });
}

async function run(call: Call): Promise<number> {
  const [name = ''] = call.operands;
  const { given } = call;
  const massChange = await mass(given);
  if ([given.scale, given.coupling, given.flavours, given.mass].every((value) => value === undefined)) {
    throw fault('nothing to rewrite; wanted at least one of --scale, --coupling, --flavours, --mass');
  }
  const coupling = given.coupling === undefined ? undefined : await scheme(given.coupling);
  const thresholds = await thresholdsOf(given.threshold, rewrite.name);
  const series = await readAsWritten(name, call);
  const rooms = await import('../rooms.js');
  const flavoursOfFile = series.flavours;
  const request: RewriteRequest = {
    ...(given.scale === undefined ? {} : { scale: await scaleRatio(given.scale, series) }),
    ...(coupling === undefined ? {} : { coupling }),
    ...(given.flavours === undefined ? {} : { flavours: given.flavours }),
    ...(massChange === undefined ? {} : { mass: massChange }),
    thresholds,
    find: (id) => rooms.series.loadSeries(id, flavoursOfFile === undefined ? {} : { flavours: flavoursOfFile }),
  };
  const result = accepted(await rooms.studies.rewriteStudy(series, request), rewrite.name);
  deliver(
    given.json
      ? rooms.report.plainJson({
          leastterm: rooms.studies.VERSION,
          request: askedOf(rewrite.name, { series: name }, given),
          ...rooms.report.plainSeries(result),
        })
      : rooms.series.writeSeries(result),
    call,
  );
  return EXIT.done;
}

export const rewrite: Command = {
  name: 'rewrite',
  summary: 'a series at another scale, in another coupling, flavours or mass',
  about: [
    'Re-expands a series and writes it as a new series file, which says where it came from. Exact where the input is exact: coefficients come out in closed form, and the way back gives the first file again. Errors and correlations are carried along.',
    'Several changes at once are made in this order: to MSbar if that is asked, mass, scale, flavours, and the new coupling last. Scale and flavours of a series in another coupling than MSbar are changed by way of MSbar.',
  ],
  operands: [{ name: 'SERIES', help: 'a catalogue id, a series file, or - for standard input' }],
  options: [
    'scale',
    'coupling',
    'flavours',
    'threshold',
    'mass',
    'mass-power',
    'from-mass',
    'mass-of-scale',
    'heavy-in-coupling',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  words: {
    flavours: { help: 'the new number of active flavours of the coupling, by decoupling' },
    mass: {
      placeholder: 'NAME',
      example: 'msbar',
      help: 'the new mass in front of the series: pole, msbar for m(m), or running for m(mu)',
    },
  },
  examples: [
    ['leastterm rewrite adler --scale 2', 'the Adler function at mu = 2 Q'],
    ['leastterm rewrite adler --coupling C:-1 -o adler-c.yaml', 'in the C-scheme with C = -1, into a file'],
    ['leastterm rewrite b-to-u-pole --mass msbar --mass-power 5', 'a width, proportional to m^5, in the MSbar mass'],
  ],
  run,
};
