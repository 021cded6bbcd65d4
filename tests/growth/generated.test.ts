/**
 * Series made from a seed: other positions, exponents, strengths, competitors, pairs, strides, orders, noise, misprints.
 * LEASTTERM_TEST_MULTIPLIER scales the number of cases.
 */
import { describe, expect, it } from 'vitest';
import { diagnoseGrowth } from '../../src/growth/index.js';
import { Dice, families, type Case } from './generate.js';

const MULTIPLIER = Number(process.env['LEASTTERM_TEST_MULTIPLIER'] ?? '1');
const CASES = Math.max(5, Math.round(25 * MULTIPLIER));
/** Shares that must be right in each family (of the verdicts), and inside the stated errors (of positions and angles). */
const RIGHT = 0.95;
const COVERED = 0.95;

interface Tally {
  right: number;
  wrong: number;
  positions: number;
  covered: number;
  flagged: number;
  flags: number;
  orders: number;
  messages: string[];
}

function judge(c: Case, tally: Tally): void {
  const g = diagnoseGrowth(c.input);
  const right = c.verdicts.includes(g.verdict);
  if (right) tally.right++;
  else {
    if (g.verdict !== 'undecided') tally.wrong++;
    tally.messages.push(`${c.text}: ${g.statement}`);
  }
  if (right && c.order !== undefined && Math.abs((g.order ?? NaN) - c.order) > 0.011) {
    if (g.order !== c.order) tally.messages.push(`${c.text}: order ${g.order}`);
  } else if (right) tally.orders++;
  if (c.flag !== undefined) {
    tally.flags++;
    if (g.flags.some((f) => f.code === c.flag)) tally.flagged++;
    else tally.messages.push(`${c.text}: no flag ${c.flag}`);
  }
  const s = g.nearest;
  if (c.t === undefined || s === undefined) return;
  tally.positions++;
  const position = Math.abs(s.t.value - c.t) <= s.t.error;
  const angle = c.angle === undefined || (s.angle !== undefined && Math.abs(s.angle.value - c.angle) <= s.angle.error);
  if (position && angle) tally.covered++;
  else tally.messages.push(`${c.text}: ${s.t.value} ± ${s.t.error}`);
}

describe('generated series', () => {
  it.each(Object.entries(families))('%s', (name, make) => {
    const dice = new Dice(2027 + name.length);
    const tally: Tally = {
      right: 0,
      wrong: 0,
      positions: 0,
      covered: 0,
      flagged: 0,
      flags: 0,
      orders: 0,
      messages: [],
    };
    const needsPosition = make(new Dice(1)).t !== undefined;
    for (let i = 0; i < CASES; i++) judge(make(dice), tally);
    const text = `${name}: ${JSON.stringify(tally, undefined, 1)}`;
    expect(tally.right, text).toBeGreaterThanOrEqual(RIGHT * CASES);
    expect(tally.wrong, text).toBe(0);
    expect(tally.orders, text).toBeGreaterThanOrEqual(RIGHT * tally.right);
    expect(tally.flagged, text).toBeGreaterThanOrEqual(0.9 * tally.flags);
    expect(tally.covered, text).toBeGreaterThanOrEqual(COVERED * tally.positions);
    if (needsPosition) expect(tally.positions, text).toBeGreaterThanOrEqual(0.9 * CASES);
  });
});
