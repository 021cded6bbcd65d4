/** @module From operand and options to the question that bubbles asks. */
import type { Call, Given } from './command.js';
import { UsageError } from './faults.js';
import { USUAL_DIGITS, wantedCoupling } from './input.js';
import { scaleOf } from './quantities.js';
import { accepted } from './refused.js';
import { askedOf } from './request.js';
import type { BubbleQuestion } from '../extraction/index.js';
import type { Quantity } from '../bubbles/index.js';
import type { Exact, Rational } from '../numerics/index.js';

/** Coefficients that a laboratory starts with. */
const USUAL_ORDER = 8;
/** More take long: the prescriptions are all run on them. */
const MOST_ORDER = 60;
const MOST_DIGITS = 500;
/** Digits of an evolved coupling; one constant of the four-loop decoupling is known to 17. */
const COUPLING_DIGITS = 15;
const COUPLING_BITS = 64;

async function quantityOf(name: string, { cut }: Given, command: string): Promise<Quantity> {
  const { bubbles } = await import('./rooms-more.js');
  const found = bubbles.quantityNamed(name);
  if (found !== undefined) return found;
  const { series } = await import('./rooms.js');
  const own =
    cut === undefined && !/[./]/.test(name)
      ? ''
      : `; a series file or catalogue id is diagnosed, and cut at mu_f, by leastterm growth ${name}${cut === undefined ? '' : ` --cut ${cut}`}`;
  throw new UsageError(
    `no quantity "${name}" with an exact large-beta_0 limit${series.suggestion(name, bubbles.QUANTITY_NAMES)}; known: ${bubbles.QUANTITY_NAMES.join(', ')}${own}`,
    command,
  );
}

/** A positive plain number, such as the ratio of --mu. */
async function ratioOf(option: string, text: string, command: string): Promise<Rational> {
  const { numerics } = await import('./rooms.js');
  const q = numerics.Rational.parse(text);
  if (q !== undefined && q.sign() > 0) return q;
  const unit = /[GMT]eV$/.test(text.trim());
  throw new UsageError(
    `--${option}: "${text}" is ${unit ? 'a scale with a unit' : 'no positive number'}; wanted ${option === 'mu' ? 'mu over the hard scale, such as 2' : 'a ratio to the hard scale, such as 0.5'}`,
    command,
  );
}

/** Q in GeV: --scale, or the mass that the quantity has in its name. */
async function hardScale(given: Given, quantity: Quantity, command: string): Promise<Rational | undefined> {
  const { numerics, qcd } = await import('./rooms.js');
  if (given.scale !== undefined) return numerics.Rational.fromNumber(await scaleOf('scale', given.scale, command));
  return quantity.name === 'tau-width' ? numerics.Rational.parse(qcd.INPUTS.mTau.value) : undefined;
}

/** alpha_s at mu, as given or from M_Z. */
async function couplingAt(
  call: Call,
  quantity: Quantity,
  flavours: number,
  ratio: Exact,
  scale: Rational | undefined,
  command: string,
): Promise<Pick<BubbleQuestion, 'at' | 'path'>> {
  const wanted = await wantedCoupling(call, command);
  if (wanted.at !== undefined) return { at: wanted.at };
  if (scale === undefined) {
    throw new UsageError(
      `--alpha-s-mz: the hard scale ${quantity.hard} is not known; write --scale with its unit, such as --scale 1.777GeV`,
      command,
    );
  }
  const { extraction } = await import('./rooms-more.js');
  const { numerics, studies } = await import('./rooms.js');
  const point = { alpha: numerics.exact(numerics.Rational.ONE), flavours, ratio };
  const series = extraction.chainSeries(quantity, point, 1, { scale, scheme: 'MSbar' });
  const { at, path } = accepted(studies.couplingFromMZ(series, wanted.mz), command);
  // From here on the coupling is the number that is printed.
  const printed = numerics.toDecimal(at.value.ball(COUPLING_BITS), COUPLING_DIGITS).text;
  const value = numerics.exact(numerics.Rational.parse(printed) ?? numerics.Rational.ZERO);
  return { at: { ...at, value }, path: [...path, `rounded to ${printed}, which is exact from here on`] };
}

function checkSizes({ order, digits }: Given, command: string): void {
  if (order !== undefined && order > MOST_ORDER) {
    throw new UsageError(`--order: ${order} coefficients are more than the ${MOST_ORDER} that this takes`, command);
  }
  if (digits !== undefined && digits > MOST_DIGITS) {
    throw new UsageError(`--digits: ${digits} digits are more than the ${MOST_DIGITS} that this takes`, command);
  }
}

/** The question behind the command line. */
export async function bubbleQuestion(name: string, call: Call, command: string): Promise<BubbleQuestion> {
  const { given } = call;
  checkSizes(given, command);
  const quantity = await quantityOf(name, given, command);
  const { numerics } = await import('./rooms.js');
  const ratio = numerics.exact(given.mu === undefined ? numerics.Rational.ONE : await ratioOf('mu', given.mu, command));
  const flavours = given.flavours ?? quantity.flavours;
  const scale = await hardScale(given, quantity, command);
  const coupling = await couplingAt(call, quantity, flavours, ratio, scale, command);
  return {
    quantity,
    ...coupling,
    flavours,
    ratio,
    ...(scale === undefined ? {} : { scale }),
    digits: given.digits ?? USUAL_DIGITS,
    order: given.order ?? USUAL_ORDER,
    request: askedOf(command, { quantity: quantity.name }, given, { digits: USUAL_DIGITS }),
  };
}

/** mu_f over the hard scale, from a ratio or a scale with its unit. */
export async function cutOf(text: string, question: BubbleQuestion, command: string): Promise<Rational> {
  if (!/[GMT]eV$/.test(text.trim())) return ratioOf('cut', text, command);
  const { numerics } = await import('./rooms.js');
  const cut = numerics.Rational.fromNumber(await scaleOf('cut', text, command));
  if (question.scale !== undefined) return cut.div(question.scale);
  throw new UsageError(
    `--cut: ${text} needs the hard scale ${question.quantity.hard} in GeV; write --scale with its unit, or give the cut as a ratio to it`,
    command,
  );
}
