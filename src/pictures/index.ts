/** @module Pictures: a plain result in, a chart out, drawn as SVG, PDF, PNG or in the terminal. */
export type { Chart, Plotted } from './chart.js';
export { chartCsv } from './csv.js';
export { CHART_KINDS, chartKind, isSavedResult } from './kinds.js';
export type { ChartKind, SavedResult } from './kinds.js';
export { terminalChart } from './terminal/draw.js';
export type { TerminalPage } from './terminal/draw.js';
export { FORMATS, formatNamed } from './vector/format.js';
export type { Format } from './vector/format.js';
export { pictureOf } from './vector/draw.js';
export { pdfOf } from './vector/pdf.js';
export { pngOf } from './vector/png.js';
export type { Picture } from './vector/scene.js';
export { svgOf } from './vector/svg.js';
