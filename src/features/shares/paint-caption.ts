// Puts a caption under a picture: card stock below the dye, as in a report.
import { plain, type TextRun } from '../../lib/text-runs';
import { VERDICT_STROKES } from '../../lib/verdict-strokes';
import type { Caption } from './caption';
import { layoutCaption, type CaptionInk, type CaptionItem, type Measure } from './caption-layout';

const FONT = '"Exo 2", system-ui, sans-serif';

const token = (name: string): string => getComputedStyle(document.documentElement).getPropertyValue(`--${name}`).trim();
const inkOf = (ink: CaptionInk): string => token(ink === 'ink' || ink === 'ink-soft' ? ink : `${ink}-ink`);

type Pen = CanvasRenderingContext2D;

const fontOf = (size: number, weight: number): string => `${weight} ${size}px ${FONT}`;

const measureWith =
  (pen: Pen): Measure =>
  (runs, size, weight) =>
    runs.reduce((sum, run) => {
      pen.font = fontOf(size * run.size, weight);
      return sum + pen.measureText(run.text).width;
    }, 0);

function write(pen: Pen, runs: readonly TextRun[], x: number, y: number, size: number, weight: number): number {
  let at = x;
  for (const run of runs) {
    pen.font = fontOf(size * run.size, weight);
    pen.fillText(run.text, at, y - run.raise * size);
    at += pen.measureText(run.text).width;
  }
  return at;
}

function paint(pen: Pen, item: CaptionItem, width: number): void {
  if (item.kind === 'rule') {
    pen.fillStyle = token('card-edge');
    pen.fillRect(0, item.y, width, 1);
  } else if (item.kind === 'text') {
    pen.fillStyle = inkOf(item.ink);
    write(pen, item.runs, item.x, item.y, item.size, item.weight);
  } else {
    pen.save();
    pen.translate(item.x, item.y);
    pen.scale(item.size / 16, item.size / 16);
    pen.strokeStyle = inkOf(item.verdict);
    for (const { d, width: line, round, opacity } of VERDICT_STROKES[item.verdict]) {
      pen.lineWidth = line;
      pen.lineCap = round === true ? 'round' : 'butt';
      pen.globalAlpha = opacity ?? 1;
      pen.stroke(new Path2D(d));
    }
    pen.restore();
  }
}

/** The product's name as on its pages, a laser line between its halves. */
function paintName(pen: Pen, x: number, y: number, size: number): void {
  pen.fillStyle = token('ink-soft');
  const middle = write(pen, plain('gap'), x, y, size, 400) + size * 0.16;
  pen.fillStyle = token('laser');
  pen.fillRect(middle, y - size * 0.95, size * 0.1, size * 1.15);
  pen.fillStyle = token('ink');
  write(pen, plain('wright'), middle + size * 0.26, y, size, 800);
}

export interface BarePicture {
  readonly blob: Blob;
  readonly width: number;
  readonly height: number;
}

/** The picture with its caption below, as a PNG. */
export async function withCaption(picture: BarePicture, caption: Caption): Promise<Blob> {
  await Promise.all([400, 600, 800].map((weight) => document.fonts.load(fontOf(16, weight))));
  const image = await createImageBitmap(picture.blob);
  const sheet = document.createElement('canvas');
  const pen = sheet.getContext('2d');
  if (pen === null) throw new Error('The browser could not make a picture. Close some other pages and try again.');
  // a strip is laid out for a picture as wide as a thread shows it
  const scale = Math.max(1, picture.width / 1280);
  const width = picture.width / scale;
  const { height, items, name } = layoutCaption(caption, width, measureWith(pen));
  sheet.width = picture.width;
  sheet.height = picture.height + Math.ceil(height * scale);
  pen.drawImage(image, 0, 0);
  image.close();
  pen.fillStyle = token('card');
  pen.fillRect(0, picture.height, sheet.width, sheet.height - picture.height);
  pen.translate(0, picture.height);
  pen.scale(scale, scale);
  for (const item of items) paint(pen, item, width);
  paintName(pen, name.x, name.y, name.size);
  return new Promise((resolve, reject) => {
    sheet.toBlob((blob) => {
      if (blob === null) reject(new Error('The browser could not make a picture of this size. Try a smaller window.'));
      else resolve(blob);
    }, 'image/png');
  });
}
