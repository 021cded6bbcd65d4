/**
 * @module Real emission in the b → u width in the large-β0 limit: −(sin πu/π) Q(u)/4.
 *
 *   Q = R_0 + R_1 H + R_2 H′,  H(u) = ₃F₂(1,1,1; 2−u,2−u; 1),  H(u+1) = α(u) H(u) + β(u),
 *   α = u³/[2(u−1)²(2u+1)],  β = 3u/[2(2u+1)],  H(0) = ζ(2).
 * Q = ∫_0^1 dz z^(−1−u) r(z) of the emission rate r of a gluon of mass² z: it is the sum of its principal parts, at
 * u = 0, 1/2, 1, 3/2, …, which fall off like 4^(−u). H has simple poles at 1/2, 3/2, … with the residues
 * h_(1/2) = −π/8, h_(u+1) = α(u) h_u, and at 2, 3, 4, …; Q has R_1 h − R_2′ h simply and −R_2 h doubly.
 * At u = 0 … 4, where R_i have poles, the Laurent series of H follow from H(0) alone.
 * Bounds     α <= 0.39 from u = 5 on, |R_1| + |R_2′| <= 50 and |R_2| <= 5 there, all falling.
 * Reference  own derivation, as for the virtual part. H(−1/2) = 9π − 27, from which h_(1/2): numerically, to 40 digits.
 */
import { Rational } from '../numerics/index.js';
import { formalRational, formalSymbol, powersOfSymbol, rationalOfFormal } from '../qcd/index.js';
import type { Formal } from '../qcd/index.js';
import { addLaurent, deriveLaurent, expandFraction, mulLaurent, principal, valueAt, slopeAt } from './laurent.js';
import type { Fraction, Laurent } from './laurent.js';
import { remembered } from './tower.js';
import type { Component, Pole, SineKernel, Tower } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);

const R0: Fraction = {
  factor: q(2, 3),
  numerator: [9, -238, 1772, -5974, 10317, -9096, 3658, -760, 504, -288],
  roots: [0, 0, 0, 1, 1, 1, 2, 2, 2, 3, 4].map((r) => q(r)),
};
const R1: Fraction = {
  factor: q(-2, 3),
  numerator: [9, -184, 569, -500, 226, -24],
  roots: [0, 1, 1, 1, 1, 2, 4].map((r) => q(r)),
};
const R2: Fraction = { factor: q(16), numerator: [2, 1, -1], roots: [1, 1, 1, 2, 4].map((r) => q(r)) };
const ALPHA: Fraction = { factor: q(1, 4), numerator: [1, 0, 0, 0], roots: [q(1), q(1), q(-1, 2)] };
const BETA: Fraction = { factor: q(3, 4), numerator: [1, 0], roots: [q(-1, 2)] };

/** Orders of ε kept: enough for the principal parts at 0 … 4. */
const LENGTH = 8;

/** The Laurent series of H at 0, 1, …, 4; H(ε) is known through its constant only, which α(ε) = O(ε³) makes enough. */
function seriesOfH(): Laurent[] {
  const list: Laurent[] = [{ low: 0, c: [formalSymbol('z2')] }];
  for (let k = 0; k < 4; k++) {
    const at = q(k);
    list.push(addLaurent(mulLaurent(expandFraction(ALPHA, at, LENGTH), list[k]!), expandFraction(BETA, at, LENGTH)));
  }
  return list;
}

/** Principal parts of Q at 0 … 4, and the residue of H at 4. */
function nearOrigin(): { readonly parts: readonly (readonly Formal[])[]; readonly residue: Rational } {
  const h = seriesOfH();
  const parts = h.map((series, k) => {
    const at = q(k);
    const sum = addLaurent(
      expandFraction(R0, at, LENGTH),
      addLaurent(
        mulLaurent(expandFraction(R1, at, LENGTH), series),
        mulLaurent(expandFraction(R2, at, LENGTH), deriveLaurent(series)),
      ),
    );
    return principal(sum);
  });
  return { parts, residue: rationalOfFormal(principal(h[4]!)[0] ?? formalRational(q(0))) ?? q(0) };
}

const partsFrom = (u: Rational, h: Rational): readonly Rational[] => [
  h.mul(valueAt(R1, u).sub(slopeAt(R2, u))),
  h.mul(valueAt(R2, u)).neg(),
];

/** Residues of H at start, start + 1, …, each from the one before. */
class Residues {
  private readonly start: Rational;
  private readonly list: Rational[];

  constructor(start: Rational, first: Rational) {
    this.start = start;
    this.list = [first];
  }

  at(k: number): Rational {
    for (let n = this.list.length; n <= k; n++) {
      this.list.push(this.list[n - 1]!.mul(valueAt(ALPHA, this.start.add(q(n - 1)))));
    }
    return this.list[k]!;
  }
}

/** The tower of Q from u = first >= 5 on. */
function towerFrom(residues: Residues, start: Rational, first: Rational): Tower {
  const skip = Number(first.sub(start).num);
  return {
    side: 'infrared',
    first,
    parts: remembered((k) => partsFrom(first.add(q(k)), residues.at(k + skip))),
    decay: {
      kind: 'geometric',
      ratio: 0.39,
      from: 0,
      bound: (k) => 50 * Math.abs(residues.at(k + skip).toNumber()) * 1.001,
    },
  };
}

const SINE: SineKernel = { kind: 'sine', poles: [] };
const component = (rational: Rational, power: number, poles: readonly Pole[], towers: readonly Tower[]): Component => ({
  factor: { rational, pi: power },
  kernel: SINE,
  base: Rational.ONE,
  poles,
  towers,
});

const HALF = q(1, 2);
const ORIGIN = nearOrigin();
const halves = new Residues(HALF, q(-1, 8));
const integers = new Residues(q(4), ORIGIN.residue);

/** The rational and the ζ(2) part of principal parts. */
const split = (power: number): Pole[] =>
  ORIGIN.parts.map((parts, k) => ({
    at: q(k),
    parts: parts.map((part) => rationalOfFormal(powersOfSymbol(part, 'z2')[power] ?? formalRational(q(0))) ?? q(0)),
  }));

/** −Q/4 with its kernel, in units of C_F/π. */
export const REAL: readonly Component[] = [
  component(q(-1, 4), 0, split(0), [towerFrom(integers, q(4), q(5))]),
  // ζ(2) = π²/6.
  component(q(-1, 24), 2, split(1), []),
  component(
    q(-1, 4),
    1,
    [0, 1, 2, 3, 4].map((k) => ({ at: HALF.add(q(k)), parts: partsFrom(HALF.add(q(k)), halves.at(k)) })),
    [towerFrom(halves, HALF, q(11, 2))],
  ),
];
