/** @module Competing ultraviolet and infrared growth: the two least orders and the bracket between them. */
import type { CompetingReport, CompetingSide } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import type { Fact } from '../layout/page.js';

const place = ({ t, u, exponent, leastAt, origin }: CompetingSide): string =>
  `least term at order ${leastAt} (${u === undefined ? `t = ${shorten(t, 6)}` : `u = ${shorten(u, 6)}`}, exponent ${exponent === undefined ? 'unknown, 1 taken' : shorten(exponent, 6)}; ${origin})`;

export function competingFacts({ ultraviolet, infrared, orders, sums }: CompetingReport, digits: number): Fact[] {
  return [
    { label: 'ultraviolet', text: place(ultraviolet) },
    { label: 'infrared', text: place(infrared) },
    {
      label: 'bracket',
      text: `orders ${orders[0]} to ${orders[1]}${sums === undefined ? '' : `: sums from ${shorten(sums.low, digits)} to ${shorten(sums.high, digits)}${sums.through < orders[1] ? ` through order ${sums.through}` : ''}`}`,
    },
  ];
}
