/**
 * Colours that stay apart: CIE 1976 lightness (CIE 015:2018; sRGB by IEC 61966-2-1) and the contrast ratio of WCAG 2.2,
 * success criterion 1.4.11, which asks for 3 to 1 for graphical objects and 4.5 to 1 for text.
 */
import { expect, test } from 'vitest';
import { INKS, PAPER, TEXT } from '../../src/pictures/vector/palette.js';

const channel = (hex: string, at: number): number => {
  const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
};
const luminance = (hex: string): number =>
  0.2126 * channel(hex, 1) + 0.7152 * channel(hex, 3) + 0.0722 * channel(hex, 5);
const lightness = (hex: string): number => 116 * Math.cbrt(luminance(hex)) - 16;
const contrast = (a: string, b: string): number => {
  const [low, high] = [luminance(a), luminance(b)].sort((x, y) => x - y) as [number, number];
  return (high + 0.05) / (low + 0.05);
};

test('the measure itself: black on white is 21 to 1, and white has lightness 100', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  expect(lightness('#ffffff')).toBeCloseTo(100, 3);
});

test.each(INKS)('%s stands out from paper', (ink) => {
  expect(contrast(ink, PAPER)).toBeGreaterThan(3);
});

test('text is readable', () => {
  expect(contrast(TEXT, PAPER)).toBeGreaterThan(4.5);
});

test('no two inks have about the same lightness, so that grey and any colour vision tell them apart', () => {
  const sorted = INKS.map(lightness).sort((a, b) => a - b);
  for (const [i, value] of sorted.slice(1).entries()) expect(value - sorted[i]!).toBeGreaterThan(7);
});
