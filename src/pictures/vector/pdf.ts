/** @module A picture as PDF with one page of its size, real text in embedded fonts, and bytes that depend on it alone. */
import Pdf from 'pdfkit';
import { asset } from './assets.js';
import { typeset } from './typeset.js';
import type { PathMark, Picture, TextMark } from './scene.js';

type Document = InstanceType<typeof Pdf>;

const FONT = { upright: 'DejaVuSans.ttf', italic: 'DejaVuSans-Oblique.ttf' } as const;
const SHIFT = { start: 0, middle: 0.5, end: 1 } as const;

function drawPath(page: Document, mark: PathMark): void {
  const { stroke, fill, clip, opacity } = mark;
  page.save();
  if (clip !== undefined) page.rect(clip.x, clip.y, clip.width, clip.height).clip();
  if (opacity !== undefined) page.opacity(opacity);
  page.path(mark.d);
  if (stroke !== undefined) {
    page.lineWidth(stroke.width).lineJoin('round');
    const [first, second] = stroke.dash ?? [];
    if (first !== undefined) page.dash(first, { space: second ?? first });
  }
  if (stroke !== undefined && fill !== undefined) page.fillAndStroke(fill, stroke.colour);
  else if (stroke !== undefined) page.stroke(stroke.colour);
  else if (fill !== undefined) page.fill(fill);
  page.restore();
}

function drawText(page: Document, mark: TextMark): void {
  const { runs, width } = typeset(mark.text, mark.size);
  const left = mark.x - width * SHIFT[mark.anchor];
  page.save();
  if (mark.turn !== undefined) page.rotate(-mark.turn, { origin: [mark.x, mark.y] });
  for (const run of runs) {
    page
      .font(FONT[run.face])
      .fontSize(run.size)
      .fillColor(mark.colour)
      .text(run.text, left + run.dx, mark.y + run.dy, { lineBreak: false, baseline: 'alphabetic' });
  }
  page.restore();
}

/** The picture as a PDF file. */
export async function pdfOf(picture: Picture): Promise<Uint8Array> {
  const page = new Pdf({
    size: [picture.width, picture.height],
    margin: 0,
    font: Buffer.from(asset('DejaVuSans.ttf')) as unknown as string,
    info: { Title: picture.title, Subject: picture.description, CreationDate: new Date(0), ModDate: new Date(0) },
  });
  for (const name of Object.values(FONT)) page.registerFont(name, Buffer.from(asset(name)));
  const parts: Uint8Array[] = [];
  page.on('data', (part: Uint8Array) => parts.push(part));
  const ended = new Promise<void>((resolve, reject) => {
    page.on('end', () => resolve());
    page.on('error', reject);
  });
  for (const mark of picture.marks) {
    if (mark.kind === 'path') drawPath(page, mark);
    else drawText(page, mark);
  }
  page.end();
  await ended;
  return Buffer.concat(parts);
}
