/** @module A picture as PNG: its SVG, drawn by the resvg rasteriser. No font is needed, since the text is outlines. */
import { initWasm, Resvg } from '@resvg/resvg-wasm';
import { asset } from './assets.js';
import { PAPER } from './palette.js';
import { svgOf } from './svg.js';
import type { Picture } from './scene.js';

let ready: Promise<void> | undefined;

/** The picture as a PNG file of `scale` pixels a point (2 is 144 dots an inch). */
export async function pngOf(picture: Picture, scale = 3): Promise<Uint8Array> {
  ready ??= initWasm(asset('resvg.wasm').slice().buffer);
  await ready;
  const drawing = new Resvg(svgOf(picture), {
    background: PAPER,
    fitTo: { mode: 'width', value: Math.round(picture.width * scale) },
    font: { loadSystemFonts: false },
  });
  const image = drawing.render();
  const bytes = image.asPng();
  image.free();
  drawing.free();
  return bytes;
}
