/** @module leastterm mass: a heavy-quark mass in other definitions. */
import type { Call, Command } from '../command.js';
import { EXIT } from '../faults.js';
import { massQuestion } from '../mass-input.js';
import { deliver } from '../output.js';
import { presentation } from '../present.js';
import { accepted } from '../refused.js';
import { askedOf } from '../request.js';

async function run(call: Call): Promise<number> {
  const [operand = ''] = call.operands;
  const { given } = call;
  const question = await massQuestion(operand, given);
  const { masses, sheets } = await import('../rooms-more.js');
  const result = accepted(masses.massStudy(question), mass.name);
  const { report, studies } = await import('../rooms.js');
  const request = askedOf(mass.name, { mass: operand }, given, { from: 'msbar', digits: question.digits });
  if (given.json) deliver(report.plainJson({ leastterm: studies.VERSION, request, ...result }), call);
  else if (given.quiet) deliver(sheets.massLines(result), call);
  else deliver(sheets.massText(result, await presentation(call)), call);
  return result.values.every((value) => 'refused' in value) ? EXIT.allRefused : EXIT.done;
}

export const mass: Command = {
  name: 'mass',
  summary: 'a heavy-quark mass in other definitions: pole, MSbar, RS, MSR, PS, MRS, PV, kinetic',
  about: [
    'Converts a heavy-quark mass among the pole mass, the MSbar mass and the subtracted masses, in both directions, through m(m): all series in the coupling with n_l flavours at one scale. Shows the terms order by order, how much of each is the leading renormalon and how much the definition takes out, every error by itself, and the ambiguity that a pole mass keeps, under each convention.',
    'Definitions: pole, msbar (m(m)), running@SCALE (m at a scale), rs@SCALE, rs-prime@SCALE, msr@SCALE (natural), msr-practical@SCALE, ps@SCALE, mrs, pv, kinetic@SCALE. --cutoff gives the scale to those of --to that have none. Several are separated by commas; all shows every one side by side.',
    'With --quiet only the value in GeV, or a line with name and value for each of several definitions.',
  ],
  operands: [{ name: 'MASS', help: "the mass with its unit, and its error if there is one: '4.186(6)GeV'" }],
  options: [
    'from',
    'to',
    'cutoff',
    'alpha-s-mz',
    'alpha-s',
    'flavours',
    'light',
    'quark',
    'order',
    'loops',
    'scale',
    'strength',
    'threshold',
    'digits',
    'json',
    'output',
    'quiet',
    'no-color',
    'help',
  ],
  needs: ['to'],
  words: {
    from: { placeholder: 'DEFINITION', example: 'rs@2GeV', help: 'the definition of MASS (default msbar)' },
    to: { placeholder: 'DEFINITION', example: 'msr@2GeV', help: 'the definition wanted, several with commas, or all' },
    'alpha-s-mz': {
      help: 'alpha_s(M_Z) with five flavours (default: the world average)',
    },
    'alpha-s': {
      placeholder: 'VALUE@SCALE',
      example: "'0.2250(20)@4.18GeV'",
      help: 'alpha_s at another scale, with the flavours of --flavours, in place of alpha_s(M_Z)',
    },
    flavours: { help: 'flavours of the coupling of --alpha-s (default n_l)' },
    order: { example: '3', help: 'use only so many orders of alpha_s (default: all that both definitions have)' },
    scale: {
      placeholder: 'MU',
      example: '2',
      help: 'scale of all expansions: a multiple of m(m) (default 1), or mu with its unit',
    },
    digits: { help: 'certified digits wanted of the values (default 15)' },
  },
  examples: [
    ["leastterm mass '4.186(6)GeV' --to rs --cutoff 2GeV", 'the bottom mass in the RS scheme'],
    ["leastterm mass '4.186(6)GeV' --to all --cutoff 2GeV", 'every definition side by side'],
    ["leastterm mass '172.1(6)GeV' --from pole --to msbar", 'the top pole mass as m(m), with its ambiguity'],
    [
      "leastterm mass '4.18GeV' --to msr@2GeV --alpha-s 0.2250@4.18GeV --loops 4",
      'with four flavours in the coupling, and the path of the R-evolution',
    ],
  ],
  run,
};
