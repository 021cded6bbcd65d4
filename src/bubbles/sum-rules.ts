/**
 * @module The polarised Bjorken and the Gross–Llewellyn Smith sum rules in the large-β0 limit, K = 1 − X: the same X for both.
 *
 *   X = (1/π β0) ∫ du e^(−u/a) e^(5u/3) b(u),
 *   b(u) = (1/3)(3+u)/[(1−u²)(1−u²/4)] = (1/9)[8/(1−u) + 4/(1+u) − 5/(2−u) − 1/(2+u)].
 * Four simple poles and nothing else. Light-by-light terms of the Gross–Llewellyn Smith rule start at α³ without a power of
 * n_f and are outside.
 *
 * Reference  D. J. Broadhurst, A. L. Kataev, Phys. Lett. B 315 (1993) 179. Status: formula from memory, checked against the
 *            leading-n_f terms of the four-loop results.
 */
import { Rational } from '../numerics/index.js';
import { PLAIN, UNIT } from './tower.js';
import type { Component } from './tower.js';

const q = (n: number, d = 1): Rational => Rational.of(n, d);

export const SUM_RULES: Component = {
  factor: UNIT,
  kernel: PLAIN,
  base: Rational.ONE,
  poles: [
    { at: q(1), parts: [q(-8, 9)] },
    { at: q(-1), parts: [q(4, 9)] },
    { at: q(2), parts: [q(5, 9)] },
    { at: q(-2), parts: [q(-1, 9)] },
  ],
  towers: [],
};
