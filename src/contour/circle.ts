/**
 * @module The coupling on the upper half of the circle |μ²| = s_0, to any number of digits.
 *
 * Method     the closed form of the running (QCD room, flow.ts): with y = 1/α_s, y_0 = 1/α_s(s_0) and L = iφ,
 *            G(y) = y − y_0 − Σ_i A_i ln((y − w_i)/(y_0 − w_i)) − b_0 L = 0. The path in doubles says on which sheet each
 *            logarithm stands; Newton's method doubles the digits; the mean-value form m − S(1/Y) G(m), G′ = 1/S(1/y),
 *            with Y around the last iterate, encloses the zero.
 * Bound      an enclosure of the zero of G on the sheets that the path in doubles has found.
 * Refused    circles that meet the Landau singularity, and couplings that cannot be run.
 */
import { C, R, clog, pi, toNumberExact } from '../numerics/index.js';
import type { Ball, Complex, Exact } from '../numerics/index.js';
import { ballFlow, complexBracket, divisorSize, evolveAlongPath, flowOf, pathBlocked } from '../qcd/index.js';
import type { BallFlow, ComplexNumber, Refusal } from '../qcd/index.js';
import type { ContourOrigin } from '../series/index.js';
import { loopsOf } from './loops.js';

const START_BITS = 53;
const GUARD = 30;
/** Y is so many times as wide as the last step was long. */
const ROOM = 4;

/** Turns of y − w_i along the path from y_0, for each node. */
function turns(flow: BallFlow, y0: number, path: readonly ComplexNumber[]): number[][] {
  const poles = flow.poles.map(({ w }) => C.toNumbers(w));
  const total = poles.map(() => 0);
  let before: ComplexNumber = { re: y0, im: 0 };
  return path.map((y) => {
    poles.forEach((w, i) => {
      const [ar, ai, br, bi] = [before.re - w.re, before.im - w.im, y.re - w.re, y.im - w.im];
      total[i] = total[i]! + Math.atan2(bi * ar - br * ai, br * ar + bi * ai);
    });
    before = y;
    return [...total];
  });
}

/** G at a point of the sheets given by the turns. */
function mismatch(flow: BallFlow, y0: Ball, y: Complex, angle: Ball, turn: readonly number[], prec: number): Complex {
  const start = C.fromReal(y0);
  let sum = C.sub(C.sub(y, start, prec), { re: R.ZERO, im: R.mul(flow.b0, angle, prec) }, prec);
  flow.poles.forEach(({ w, coupling }, i) => {
    const log = clog(C.div(C.sub(y, w, prec), C.sub(start, w, prec), prec), prec);
    const sheet = Math.round((turn[i]! - R.toNumber(log.im)) / (2 * Math.PI));
    const im = sheet === 0 ? log.im : R.add(log.im, R.mul(R.fromNumber(2 * sheet), pi(prec), prec), prec);
    sum = C.sub(sum, C.mul(coupling, { re: log.re, im }, prec), prec);
  });
  return sum;
}

/** The zero of G next to a start that is good to double precision. */
function solve(
  flow: BallFlow,
  y0: Ball,
  start: ComplexNumber,
  angle: Ball,
  turn: readonly number[],
  prec: number,
): Complex {
  let m = C.fromNumbers(start.re, start.im);
  const step = (bits: number): Complex => {
    const G = mismatch(flow, y0, m, angle, turn, bits);
    return C.mul(complexBracket(flow, C.inv(m, bits), bits), G, bits);
  };
  for (let bits = START_BITS; bits < prec; bits *= 2) {
    const work = Math.min(2 * bits, prec) + GUARD;
    m = C.exactMid(C.sub(m, step(work), work));
  }
  const work = prec + GUARD;
  const G = mismatch(flow, y0, m, angle, turn, work);
  const size = C.upperBits(C.mul(complexBracket(flow, C.inv(m, work), work), G, work));
  const room = R.mul(R.fromNumber(ROOM), R.mul2exp(R.ONE, Math.max(size, C.upperBits(m) - prec)), work);
  const Y = { re: R.widen(m.re, room), im: R.widen(m.im, room) };
  return C.sub(m, C.mul(complexBracket(flow, C.inv(Y, work), work), G, work), work);
}

/**
 * x = α_s/divisor at the angles of the upper half circle, rising from 0, from x at s_0.
 */
export function couplingsOnCircle(
  origin: ContourOrigin,
  x: Exact,
  angles: readonly Ball[],
  prec: number,
): readonly Complex[] | Refusal {
  const loops = loopsOf(origin.loops);
  const divisor = divisorSize(origin.divisor);
  const alpha = toNumberExact(x) * toNumberExact(divisor);
  const path = evolveAlongPath(
    flowOf(origin.flavours, loops),
    alpha,
    angles.map((angle) => ({ re: 0, im: R.toNumber(angle) })),
  );
  if ('reason' in path) return path;
  const work = prec + GUARD;
  const flow = ballFlow(origin.flavours, loops, work);
  if (flow === undefined) return pathBlocked;
  const d = divisor.ball(work);
  const y0 = R.div(R.ONE, R.mul(x.ball(work), d, work), work);
  const inverse = path.map(invert);
  const turn = turns(flow, 1 / alpha, inverse);
  return angles.map((angle, k) => {
    const y = solve(flow, y0, inverse[k]!, angle, turn[k]!, prec);
    return C.inv(C.mulReal(y, d, prec), prec);
  });
}

function invert({ re, im }: ComplexNumber): ComplexNumber {
  const size = re * re + im * im;
  return { re: re / size, im: -im / size };
}
