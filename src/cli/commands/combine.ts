/** @module leastterm combine: products, powers and compositions of series in one coupling at one scale. */
import type { Call, Command } from '../command.js';
import { EXIT, UsageError } from '../faults.js';
import { readSeries } from '../input.js';
import { deliver } from '../output.js';
import { accepted } from '../refused.js';
import { askedOf } from '../request.js';
import type { Operand } from '../../studies/index.js';

const WITH = /^([^=]+)=(.+)$/;

/** The series of --with, each file read once. */
async function operands(call: Call): Promise<readonly Operand[]> {
  const list: Operand[] = [];
  for (const text of call.given.with ?? []) {
    const [, name, from] = WITH.exec(text) ?? [];
    if (name === undefined || from === undefined) {
      throw new UsageError(`--with: "${text}" names no series; write --with width=b-to-u-pole`, combine.name);
    }
    const known = list.find((o) => o.from === from);
    list.push({ name: name.trim(), from, series: known?.series ?? (await readSeries(from, call)) });
  }
  if (list.length === 0) {
    throw new UsageError('--with is missing: what the names stand for; write --with width=b-to-u-pole', combine.name);
  }
  return list;
}

async function run(call: Call): Promise<number> {
  const [expression = ''] = call.operands;
  const { given } = call;
  const list = await operands(call);
  const rooms = await import('../rooms.js');
  const title = given.title === undefined ? {} : { title: given.title };
  const result = accepted(await rooms.studies.combineStudy({ expression, operands: list, ...title }), combine.name);
  deliver(
    given.json
      ? rooms.report.plainJson({
          leastterm: rooms.studies.VERSION,
          request: askedOf(combine.name, { expression }, given),
          ...rooms.report.plainSeries(result),
        })
      : rooms.series.writeSeries(result),
    call,
  );
  return EXIT.done;
}

export const combine: Command = {
  name: 'combine',
  summary: 'products, powers, exp, log and compositions of series',
  about: [
    'Evaluates an expression whose names are series, and writes the result as a new series file, which says where it came from: + - * /, powers (fractions too), exp, log, sqrt, numbers, pi, zeta(n), and f(g), which puts the value of g for the coupling of f. Errors and correlations are carried; every coefficient is known exactly as far as the operands fix it.',
    'All series must be in one coupling, with one number of flavours, at one scale. Where they are not, the command says which one differs and how leastterm rewrite makes it agree.',
  ],
  operands: [{ name: 'EXPRESSION', help: "names, numbers and + - * / ^, in quotes: 'width * ratio^5'" }],
  options: ['with', 'title', 'json', 'output', 'quiet', 'no-color', 'help'],
  needs: ['with'],
  examples: [
    [
      "leastterm combine 'width * ratio^5' --with width=b-to-u-pole --with ratio=pole-msbar-nl4",
      'a width in the pole mass becomes one in the MSbar mass',
    ],
    [
      "leastterm combine 'd * c - 1' --with d=adler --with c=bjorken -o crewther.yaml",
      'the Crewther combination, into a file',
    ],
  ],
  run,
};
