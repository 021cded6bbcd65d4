/**
 * @module Files that pictures need: two fonts and the rasteriser. In the built program they stand in `assets/` beside the
 * chunks; from the sources they are taken from the packages.
 */
import { existsSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';

const IN_PACKAGES = {
  'DejaVuSans.ttf': 'dejavu-fonts-ttf/ttf/DejaVuSans.ttf',
  'DejaVuSans-Oblique.ttf': 'dejavu-fonts-ttf/ttf/DejaVuSans-Oblique.ttf',
  'resvg.wasm': '@resvg/resvg-wasm/index_bg.wasm',
} as const;

export type Asset = keyof typeof IN_PACKAGES;

const read = new Map<Asset, Uint8Array>();

/** The bytes of an asset, read once. */
export function asset(name: Asset): Uint8Array {
  let bytes = read.get(name);
  if (bytes === undefined) {
    const built = fileURLToPath(new URL(`../assets/${name}`, import.meta.url));
    bytes = readFileSync(existsSync(built) ? built : createRequire(import.meta.url).resolve(IN_PACKAGES[name]));
    read.set(name, bytes);
  }
  return bytes;
}
