/**
 * @module Do the operands agree in coupling, scheme, flavours and scale? If not: which one does not, and the command that
 * makes it agree.
 */
import { divExact, mulExact, toNumberExact } from '../../numerics/index.js';
import type { Exact } from '../../numerics/index.js';
import { isRefusal, refuse } from '../../qcd/index.js';
import type { Refusal } from '../../qcd/index.js';
import { textOf } from '../../series/index.js';
import { couplingScheme, hardScaleOf, schemeText } from '../scheme.js';
import type { CouplingScheme } from '../scheme.js';
import type { Operand } from './operands.js';

/** Two scales agree when they do to this relative accuracy: files quote a few digits, decimals are exact. */
const SAME_SCALE = 1e-9;

const rewrite = (operand: Operand, options: string): string =>
  `leastterm rewrite ${operand.from} ${options} -o ${operand.name}-rewritten.yaml, and combine that`;

/** The word of a scheme on the command line. */
function couplingWord(scheme: CouplingScheme): string {
  if (scheme.kind === 'C') return `C:${scheme.c.toString()}`;
  return scheme.kind === 'series' ? scheme.name : scheme.kind;
}

function schemes(first: Operand, other: Operand): Refusal | undefined {
  if (first.series.scheme === other.series.scheme) return undefined;
  const [a, b] = [couplingScheme(first.series), couplingScheme(other.series)];
  if (isRefusal(a)) return a;
  if (isRefusal(b)) return b;
  if (schemeText(a) === schemeText(b)) return undefined;
  const toy = a.kind === 'toy' || b.kind === 'toy';
  return refuse(
    `${first.name} is in ${schemeText(a)}, ${other.name} in ${schemeText(b)}: one combination, one coupling`,
    toy ? 'combine series of one world only' : rewrite(other, `--coupling ${couplingWord(a)}`),
  );
}

function flavours(first: Operand, other: Operand): Refusal | undefined {
  const [a, b] = [first.series.flavours, other.series.flavours];
  if (a === b) return undefined;
  if (a === undefined || b === undefined) {
    const silent = a === undefined ? first : other;
    return refuse(
      `${silent.name} (${silent.from}) does not say its number of flavours`,
      `write "flavours: ${a ?? b}" into its file if it is that`,
    );
  }
  const stem = other.from.replace(/-n[fl]\d+$/, '');
  const variant = other.series.anyFlavours === true ? `${stem}-nf${a} if it is meant for ${a} flavours, or ` : '';
  return refuse(
    `${first.name} has nf = ${a}, ${other.name} nf = ${b}: one combination, one coupling`,
    variant + rewrite(other, `--flavours ${a}`),
  );
}

const differ = (a: Exact, b: Exact): boolean => {
  if (a.rational !== undefined && b.rational !== undefined && a.rational.equals(b.rational)) return false;
  return !(Math.abs(toNumberExact(divExact(a, b)) - 1) < SAME_SCALE);
};

function scales(first: Operand, other: Operand): Refusal | undefined {
  const [a, b] = [first.series.scaleRatio, other.series.scaleRatio];
  if (a === undefined && b === undefined) return undefined;
  if (a === undefined || b === undefined) {
    const silent = a === undefined ? first : other;
    const known = a ?? b;
    return refuse(
      `${silent.name} (${silent.from}) does not say its renormalisation scale`,
      `write "scale ratio: ${known === undefined ? 1 : textOf(known)}" into its file if it is that`,
    );
  }
  const [p, q] = [hardScaleOf(first.series), hardScaleOf(other.series)];
  if (isRefusal(p) || isRefusal(q)) {
    if (!differ(a, b)) return undefined;
    return refuse(
      `${first.name} has mu/Q = ${textOf(a)}, ${other.name} mu/Q = ${textOf(b)}: one combination, one scale`,
      rewrite(other, `--scale ${textOf(a)}`),
    );
  }
  const [mu, nu] = [mulExact(p, a), mulExact(q, b)];
  if (!differ(mu, nu)) return undefined;
  return refuse(
    `${first.name} has mu = ${toNumberExact(mu)} GeV, ${other.name} mu = ${toNumberExact(nu)} GeV: one combination, one scale`,
    rewrite(other, `--scale ${toNumberExact(mu)}GeV`),
  );
}

function variables(first: Operand, other: Operand): Refusal | undefined {
  const [a, b] = [first.series.coupling, other.series.coupling];
  if (a.plain && b.plain && a.name === b.name) return undefined;
  if (a.plain || b.plain) {
    return refuse(
      `${first.name} is a series in ${a.name}, ${other.name} in ${b.name}`,
      'series in one variable (a plain variable has no scheme, so it cannot be rewritten)',
    );
  }
  return undefined;
}

/** The first disagreement, or none. */
export function disagreement(operands: readonly Operand[]): Refusal | undefined {
  const [first, ...others] = operands;
  if (first === undefined) return undefined;
  const onCircle = operands.find((o) => o.series.contour !== undefined);
  if (onCircle !== undefined) {
    return refuse(
      `${onCircle.name} (${onCircle.from}) is a contour quantity: its coefficients stand under an integral, and a product of integrals is not the integral of the product`,
      'combine the series under the integral, and write "kind: contour" and its weight into the result',
    );
  }
  for (const other of others) {
    const bad = variables(first, other);
    if (bad !== undefined) return bad;
    if (first.series.coupling.plain) continue;
    const wrong = schemes(first, other) ?? flavours(first, other) ?? scales(first, other);
    if (wrong !== undefined) return wrong;
  }
  return undefined;
}
