/**
 * @module A picture as SVG: text as outlines, so that it looks the same wherever it is opened and no font has to be there;
 * title and description for readers who do not see it.
 */
import { outline, typeset } from './typeset.js';
import { pt } from './scene.js';
import type { Box, Mark, PathMark, Picture, TextMark } from './scene.js';

const escapes: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const escaped = (text: string): string => text.replace(/[&<>"]/g, (c) => escapes[c]!);

/** A start that depends on the text alone: several pictures in one page must not share ids. */
function idOf(text: string): string {
  let hash = 0x811c9dc5;
  for (const c of text) hash = Math.imul(hash ^ c.codePointAt(0)!, 0x01000193) >>> 0;
  return `p${hash.toString(36)}`;
}

const boxKey = (box: Box): string => [box.x, box.y, box.width, box.height].map(pt).join(' ');

function pathElement(mark: PathMark, clipId: (box: Box) => string): string {
  const { stroke, fill, opacity, clip } = mark;
  const attributes = [
    `d="${mark.d}"`,
    `fill="${fill ?? 'none'}"`,
    ...(stroke === undefined ? [] : [`stroke="${stroke.colour}"`, `stroke-width="${pt(stroke.width)}"`]),
    ...(stroke?.dash === undefined ? [] : [`stroke-dasharray="${stroke.dash.map(pt).join(' ')}"`]),
    ...(opacity === undefined || opacity === 1 ? [] : [`opacity="${pt(opacity)}"`]),
    ...(clip === undefined ? [] : [`clip-path="url(#${clipId(clip)})"`]),
  ];
  return `<path ${attributes.join(' ')}/>`;
}

const SHIFT = { start: 0, middle: 0.5, end: 1 } as const;

function textElement(mark: TextMark): string {
  const { runs, width } = typeset(mark.text, mark.size);
  const left = mark.x - width * SHIFT[mark.anchor];
  const d = runs.map((run) => outline(run, left + run.dx, mark.y + run.dy)).join('');
  const turn = mark.turn === undefined ? '' : ` transform="rotate(${pt(-mark.turn)} ${pt(mark.x)} ${pt(mark.y)})"`;
  return `<path d="${d}" fill="${mark.colour}"${turn}/>`;
}

/** The picture as a complete SVG document; `place` tells its ids from those of the same picture elsewhere on a page. */
export function svgOf(picture: Picture, place = ''): string {
  const id = idOf(picture.title + picture.description + String(picture.marks.length) + place);
  const boxes = new Map<string, string>();
  const clipId = (box: Box): string => {
    const key = boxKey(box);
    const known = boxes.get(key);
    if (known !== undefined) return known;
    const made = `${id}-c${boxes.size}`;
    boxes.set(key, made);
    return made;
  };
  const element = (mark: Mark): string => (mark.kind === 'path' ? pathElement(mark, clipId) : textElement(mark));
  const body = picture.marks.map(element).join('\n');
  const clips = [...boxes].map(([key, name]) => {
    const [x, y, width, height] = key.split(' ');
    return `<clipPath id="${name}"><rect x="${x}" y="${y}" width="${width}" height="${height}"/></clipPath>`;
  });
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${pt(picture.width)}pt" height="${pt(picture.height)}pt" ` +
      `viewBox="0 0 ${pt(picture.width)} ${pt(picture.height)}" role="img" aria-labelledby="${id}-t ${id}-d">`,
    `<title id="${id}-t">${escaped(picture.title)}</title>`,
    `<desc id="${id}-d">${escaped(picture.description)}</desc>`,
    ...(clips.length === 0 ? [] : [`<defs>${clips.join('')}</defs>`]),
    body,
    '</svg>',
    '',
  ].join('\n');
}
