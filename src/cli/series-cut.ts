/** @module growth --cut: the series without its soft momenta, from option texts to the page. */
import type { Call } from './command.js';
import { UsageError } from './faults.js';
import { couplingOf, requestOf, USUAL_DIGITS, wantedCoupling } from './input.js';
import { deliver } from './output.js';
import { presentation } from './present.js';
import { scaleOf } from './quantities.js';
import { accepted } from './refused.js';
import type { Rational } from '../numerics/index.js';
import type { Series } from '../series/index.js';

/** mu_f over the hard scale of the series, from a ratio or a scale with its unit. */
async function cutOf(text: string, series: Series, command: string): Promise<Rational> {
  const { numerics, studies } = await import('./rooms.js');
  const { Rational: Q } = numerics;
  if (/[GMT]eV$/.test(text.trim())) {
    const cut = Q.fromNumber(await scaleOf('cut', text, command));
    const hard = studies.hardScaleOf(series);
    if ('reason' in hard) {
      throw new UsageError(
        `--cut: ${text} needs the hard scale Q in GeV, and ${hard.reason}; ${hard.remedy}, or give the cut as a ratio to Q, such as 0.5`,
        command,
      );
    }
    return cut.div(Q.fromNumber(numerics.toNumberExact(hard)));
  }
  const ratio = Q.parse(text);
  if (ratio !== undefined && ratio.sign() > 0) return ratio;
  throw new UsageError(
    `--cut: "${text}" is no positive number; wanted mu_f as a ratio to Q, such as 0.5, or with its unit, such as 0.9GeV`,
    command,
  );
}

/** The page, the JSON or, with --quiet, the verdict on what is left above the cut. */
export async function deliverCut(series: Series, text: string, call: Call, command: string): Promise<void> {
  const { given } = call;
  const [name = ''] = call.operands;
  const cut = await cutOf(text, series, command);
  const coupled = given.at !== undefined || given.alphaSMZ !== undefined;
  const coupling = coupled ? await couplingOf(await wantedCoupling(call, command), series, command) : undefined;
  const { extraction, sheets } = await import('./rooms-more.js');
  const { report } = await import('./rooms.js');
  const result = accepted(
    extraction.seriesCut({
      series,
      ...(coupling === undefined ? {} : { at: coupling.at }),
      ...(coupling?.path === undefined ? {} : { path: coupling.path }),
      cut,
      ...(given.order === undefined ? {} : { order: given.order }),
      digits: given.digits ?? USUAL_DIGITS,
      request: { ...requestOf(command, name, call), cut: text },
    }),
    command,
  );
  if (given.json) deliver(report.plainJson(result), call);
  else if (given.quiet) deliver(`${result.cut.growth.high.verdict}\n`, call);
  else deliver(sheets.seriesCutText(result, await presentation(call)), call);
}
