/**
 * @module Weighs a text before anything expensive reads it: number of lines and entries, depth of nesting.
 * A rough count that may only be too high: it looks at punctuation, inside quotes as well as outside.
 */
import type { Complaints } from './complaints.js';
import { LIMITS, grouped } from './limits.js';

const MARKS = new Set(Array.from('\n,[]{}"\'?&*!|>%@`:', (c) => c.charCodeAt(0)));

/** Notes what is too much; true when the text may be parsed. */
export function weighed(text: string, complaints: Complaints): boolean {
  let entries = 1;
  let marks = 0;
  let depth = 0;
  let deepest = 0;
  let line = 1;
  let deepestLine = 1;
  for (let i = 0; i < text.length; i++) {
    const c = text.charCodeAt(i);
    if (!MARKS.has(c)) continue;
    marks++;
    if (c === 10) line++;
    if (c === 10 || c === 44)
      entries++; // line feed, comma
    else if (c === 91 || c === 123)
      depth++; // [ {
    else if (c === 93 || c === 125) depth--; // ] }
    if (depth > deepest) [deepest, deepestLine] = [depth, line];
  }
  const most = `at most ${grouped(LIMITS.coefficients)} coefficients, and ${grouped(LIMITS.entries)} lines and list entries in all`;
  if (entries > LIMITS.entries) complaints.add(undefined, '', `about ${grouped(entries)} lines and list entries`, most);
  else if (marks > LIMITS.marks)
    complaints.add(
      undefined,
      '',
      `${grouped(marks)} brackets, quotes and other marks`,
      `at most ${grouped(LIMITS.marks)}`,
    );
  if (deepest > LIMITS.depth) {
    complaints.add(
      { line: deepestLine, column: 1 },
      '',
      `more than ${LIMITS.depth} brackets inside each other`,
      'less nesting',
    );
  } else if (!complaints.any) {
    const steep = steepLine(text);
    if (steep !== undefined)
      complaints.add({ line: steep, column: 1 }, '', `more than ${LIMITS.depth} levels of nesting`, 'less nesting');
  }
  return !complaints.any;
}

/** First line whose indentation, or whose run of leading dashes, nests deeper than LIMITS.depth. */
function steepLine(text: string): number | undefined {
  const indents: number[] = [];
  let number = 0;
  for (const line of text.split('\n')) {
    number++;
    const lead = /^(?:[ \t]|[-?:](?=[ \t\r]|$))*/.exec(line)![0];
    if (lead.length === line.length) continue;
    const indent = /^[ \t]*/.exec(line)![0].length;
    while (indents.length > 0 && indents.at(-1)! >= indent) indents.pop();
    indents.push(indent);
    const dashes = lead.replace(/[ \t]/g, '').length;
    if (indents.length + dashes > LIMITS.depth) return number;
  }
  return undefined;
}
