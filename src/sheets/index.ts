/** @module Text pages of the rooms that only some commands load; the report room draws those of the others. */
export { massLines, massText } from './mass.js';
export { bubbleCutCsv, bubbleCutText, bubbleViewCsv, bubbleViewText } from './bubble-momenta.js';
export { contourLines, contourText } from './contour.js';
export { bubbleList, bubbleText } from './bubbles.js';
export { seriesCutText } from './series-cut.js';
export { extractLines, extractText } from './extract.js';
