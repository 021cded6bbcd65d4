/**
 * How much wider than the ideal radius a result may be: the table of docs/numerics.md, section Tightness, is the limit, and every function of
 * tightness.ts stands in it. Lost bits are prec − log2(|value|/radius), for complex values with the larger part and the larger radius; exact
 * arguments, next to zeros and poles too.
 */
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { C, R } from '../../src/numerics/index.js';
import { COMPLEX, DIRECTIONS, planePoint, pointsOf, real, REAL } from './tightness.js';

const page = readFileSync(new URL('../../docs/numerics.md', import.meta.url), 'utf8');
const section = /\n## Tightness\n([\s\S]*?)\n## /.exec(page)?.[1] ?? '';
const ALLOWED = new Map(
  [...section.matchAll(/^\| (.+?) +\| +(-?[0-9.]+) +\|/gm)].map(([, name, bits]) => [name!.trim(), Number(bits)]),
);

const PRECISIONS = [53, 113, 370];

describe('the table of allowed radius growth', () => {
  it('names every function once', () => {
    expect([...ALLOWED.keys()].toSorted()).toEqual([...REAL, ...COMPLEX].map((f) => f.name).toSorted());
  });

  it.each(REAL.map((f) => [f.name, f] as const))('%s', (name, { f, domain }) => {
    let worst = { bits: -Infinity, at: '' };
    for (const text of pointsOf(domain)) {
      for (const prec of PRECISIONS) {
        const value = f(real(text, prec), prec);
        if (R.isExactZero(value)) continue;
        const bits = prec - R.accuracyBits(value);
        if (bits > worst.bits) worst = { bits, at: `${text} at ${prec} bits` };
      }
    }
    expect(worst.bits, `worst at ${worst.at}`).toBeLessThanOrEqual(ALLOWED.get(name)!);
  });

  it.each(COMPLEX.map((f) => [f.name, f] as const))('%s', (name, { f, from, to }) => {
    let worst = { bits: -Infinity, at: '' };
    for (const e of [-20, -5, -1, 0, 1, 2, 3, 20]) {
      if (e < from || e > to) continue;
      for (const turn of DIRECTIONS) {
        // The hypergeometric functions have a cut on the positive axis, √z and log z end on the negative one.
        if (name.startsWith('2F1') && turn === 0 && e >= 0) continue;
        for (const prec of [53, 200]) {
          const value = f(planePoint(e, turn, prec), prec);
          const bits = prec - C.accuracyBits(value);
          if (bits > worst.bits) worst = { bits, at: `1.7e${e}, ${turn} π, ${prec} bits` };
        }
      }
    }
    expect(worst.bits, `worst at ${worst.at}`).toBeLessThanOrEqual(ALLOWED.get(name)!);
  });
});
