/** @module Pictures: a plain result in, a picture out, written as SVG, PDF or PNG. */
export { FORMATS, formatNamed } from './format.js';
export type { Format } from './format.js';
export { pdfOf } from './pdf.js';
export { pngOf } from './png.js';
export { svgOf } from './svg.js';
export type { Layer, Picture } from './scene.js';
export { termsPicture } from './kinds/terms.js';
