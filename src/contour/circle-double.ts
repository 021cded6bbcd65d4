/**
 * @module α_s along the upper half of a circle, in doubles, without objects: the inner loop of replicas.
 *
 * Method     as evolveAlongPath of the QCD room (closed form of the running, Newton's method from node to node), with a
 *            second-order start and a stop as soon as the next step could only change the last bit.
 * Bound      as there. NaN from the first node on at which a logarithm would turn too far or Newton's method wanders: the
 *            caller then asks evolveAlongPath, which can shorten its steps and knows how to refuse.
 */
import type { Flow } from '../qcd/index.js';

const NEWTON_STEPS = 8;
/** Newton's method squares a relative error of this size into the last bit. */
const NEARLY = 1e-8;
/** As in the QCD room: keeps every logarithm principal. */
const LARGEST_TURN = 0.6;

/** Writes Re and Im of α_s at ln μ² = ln μ_0² + i·angles[k] into `re` and `im`; angles rise from 0. */
export function couplingsOnArc(
  flow: Flow,
  alpha: number,
  angles: readonly number[],
  re: Float64Array,
  im: Float64Array,
): boolean {
  const { poles, s, b0 } = flow;
  const top = s.length - 1;
  let yr = 1 / alpha;
  let yi = 0;
  let at = 0;
  for (let k = 0; k < angles.length; k++) {
    // b_0 (F(y + d) − F(y)) = i t.
    const t = b0 * (angles[k]! - at);
    at = angles[k]!;
    // S(1/y) by Horner's rule, three times in all: start, midpoint, Newton.
    let dr = 0;
    let di = 0;
    for (let stage = 0; stage < 2; stage++) {
      const ur = yr + dr / 2;
      const ui = yi + di / 2;
      const size = ur * ur + ui * ui;
      const vr = ur / size;
      const vi = -ui / size;
      let sr = s[top]!;
      let si = 0;
      for (let j = top - 1; j >= 0; j--) {
        const next = sr * vr - si * vi + s[j]!;
        si = sr * vi + si * vr;
        sr = next;
      }
      dr = -si * t;
      di = sr * t;
    }
    let settled = false;
    for (let step = 0; step < NEWTON_STEPS && !settled; step++) {
      let fr = dr;
      let fi = di - t;
      for (let i = 0; i < poles.length; i++) {
        const { w, coupling } = poles[i]!;
        const er = yr - w.re;
        const ei = yi - w.im;
        const size = er * er + ei * ei;
        const qr = (dr * er + di * ei) / size;
        const qi = (di * er - dr * ei) / size;
        const length = qr * qr + qi * qi;
        if (!(length < LARGEST_TURN * LARGEST_TURN)) return false;
        const lr = Math.log1p(2 * qr + length) / 2;
        const li = Math.atan2(qi, 1 + qr);
        fr -= coupling.re * lr - coupling.im * li;
        fi -= coupling.re * li + coupling.im * lr;
      }
      const ur = yr + dr;
      const ui = yi + di;
      const size = ur * ur + ui * ui;
      const vr = ur / size;
      const vi = -ui / size;
      let sr = s[top]!;
      let si = 0;
      for (let j = top - 1; j >= 0; j--) {
        const next = sr * vr - si * vi + s[j]!;
        si = sr * vi + si * vr;
        sr = next;
      }
      const mr = fr * sr - fi * si;
      const mi = fr * si + fi * sr;
      dr -= mr;
      di -= mi;
      settled = mr * mr + mi * mi <= NEARLY * NEARLY * size;
    }
    if (!settled) return false;
    yr += dr;
    yi += di;
    const size = yr * yr + yi * yi;
    re[k] = yr / size;
    im[k] = -yi / size;
  }
  return true;
}
