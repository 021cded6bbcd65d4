/** @module Bit sizes of BigInt integers. */

const f64 = new Float64Array(1);
const u32 = new Uint32Array(f64.buffer);
const HIGH = new Uint8Array(new Uint32Array([1]).buffer)[0] === 1 ? 1 : 0;
const CHUNK = 960;

/**
 * Number of bits of |n|, 0 for 0. May be one too large when |n| lies within a relative 2^-53 below a power of two
 * (the conversion to a double rounds up): callers use it to size shifts, where one bit does not matter.
 */
export function bitLength(n: bigint): number {
  let base = 0;
  let d = Number(n);
  if (d === 0) return 0;
  if (d === Infinity || d === -Infinity) {
    // Gallop, then continue on the top part; each shift costs a linear pass over what is left.
    let m = n < 0n ? -n : n;
    let step = CHUNK;
    while (d === Infinity || d === -Infinity) {
      const next = m >> BigInt(step);
      if (next === 0n) {
        step = CHUNK;
        continue;
      }
      m = next;
      base += step;
      d = Number(m);
      step *= 2;
    }
  }
  return base + doubleBits(d);
}

/** The E with 2^(E−1) <= |x| < 2^E, for a normal double. */
export function doubleBits(x: number): number {
  f64[0] = x;
  return ((u32[HIGH]! >>> 20) & 0x7ff) - 1022;
}

/** n·2^k rounded toward minus infinity (a shift by a negative count goes to the right). */
export function shift(n: bigint, k: number): bigint {
  return n << BigInt(k);
}

/** Floor of the square root of n >= 0 (Newton from a double start). */
export function isqrt(n: bigint): bigint {
  if (n < 0n) throw new RangeError('isqrt: negative argument');
  if (n < 2n) return n;
  const bits = bitLength(n);
  if (bits <= 52) return BigInt(Math.floor(Math.sqrt(Number(n))));
  // Half-precision recursion: the root of the top half of the bits starts one Newton step at full size.
  const k = (bits >> 2) - 2;
  let x: bigint;
  if (k <= 0 || bits < 100) {
    const even = bits - 52 + ((bits - 52) & 1);
    x = BigInt(Math.ceil(Math.sqrt(Number(n >> BigInt(even))) + 1)) << BigInt(even / 2);
  } else {
    x = (isqrt(n >> BigInt(2 * k)) + 1n) << BigInt(k);
  }
  for (;;) {
    const y = (x + n / x) >> 1n;
    if (y >= x) return x;
    x = y;
  }
}
