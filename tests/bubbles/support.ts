/** Shared by the tests of bubble chains. */
import { quantityNamed } from '../../src/bubbles/index.js';
import type { ChainPoint, Quantity } from '../../src/bubbles/index.js';
import { R, Rational, exact } from '../../src/numerics/index.js';
import type { Ball } from '../../src/numerics/index.js';

export const q = (text: string): Rational => {
  const found = Rational.parse(text.replace('e+', 'e'));
  if (found === undefined) throw new Error(`${text} is no number`);
  return found;
};

export const named = (name: string): Quantity => {
  const found = quantityNamed(name);
  if (found === undefined) throw new Error(`no quantity ${name}`);
  return found;
};

export const at = (flavours: number, alpha: string, ratio = '1'): ChainPoint => ({
  alpha: exact(q(alpha)),
  flavours,
  ratio: exact(q(ratio)),
});

/** Relative distance of a ball's midpoint from a reference, as a double. */
export function distance(ball: Ball, reference: Ball): number {
  return Math.abs(R.toNumber(R.div(R.sub(ball, reference, 600), reference, 60)));
}
