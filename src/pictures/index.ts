/** @module Pictures: a plain result in, a chart out, drawn as SVG, PDF, PNG or in the terminal. */
export type { Chart, Plotted } from './chart.js';
export { FORMATS, formatNamed } from './vector/format.js';
export type { Format } from './vector/format.js';
export { pictureOf } from './vector/draw.js';
export { pdfOf } from './vector/pdf.js';
export { pngOf } from './vector/png.js';
export type { Picture } from './vector/scene.js';
export { svgOf } from './vector/svg.js';
export { ratiosChart } from './kinds/ratios.js';
export { termsChart } from './kinds/terms.js';
export { terminalChart } from './terminal/draw.js';
export type { TerminalPage } from './terminal/draw.js';
export { planeChart } from './kinds/plane.js';
export { valuesChart } from './kinds/values.js';
export { coverageChart } from './kinds/coverage.js';
export { integrandChart } from './kinds/integrand.js';
export { scaleChart } from './kinds/scale.js';
