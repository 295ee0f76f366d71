import { tokenText } from '../viewport/colours';
import { FONT, type Mark } from './mark';

/** Paints marks on a canvas. @param scale px of the canvas for one CSS px */
export function paintMarks(pen: CanvasRenderingContext2D, marks: readonly Mark[], scale: number): void {
  pen.save();
  pen.scale(scale, scale);
  for (const mark of marks) paint(pen, mark);
  pen.restore();
}

function paint(pen: CanvasRenderingContext2D, mark: Mark): void {
  const ink = tokenText(mark.ink);
  pen.globalAlpha = (mark.kind === 'text' ? undefined : mark.opacity) ?? 1;
  pen.setLineDash(mark.kind === 'line' ? [...(mark.dash ?? [])] : []);
  switch (mark.kind) {
    case 'line':
      pen.strokeStyle = ink;
      pen.lineWidth = mark.width;
      pen.beginPath();
      mark.points.forEach(([x, y], i) => (i === 0 ? pen.moveTo(x, y) : pen.lineTo(x, y)));
      pen.stroke();
      return;
    case 'path': {
      pen.save();
      pen.translate(mark.x, mark.y);
      pen.scale(mark.scale ?? 1, mark.scale ?? 1);
      pen.lineCap = mark.round === true ? 'round' : 'butt';
      pen.lineWidth = mark.width;
      const path = new Path2D(mark.d);
      if (mark.filled === true) {
        pen.fillStyle = ink;
        pen.fill(path);
      } else {
        pen.strokeStyle = ink;
        pen.stroke(path);
      }
      pen.restore();
      return;
    }
    case 'plate':
      pen.fillStyle = tokenText('dye-deep');
      pen.globalAlpha *= 0.92;
      pen.fillRect(mark.x, mark.y, mark.width, mark.height);
      pen.globalAlpha = mark.opacity ?? 1;
      pen.strokeStyle = ink;
      pen.lineWidth = 1.2;
      pen.strokeRect(mark.x, mark.y, mark.width, mark.height);
      return;
    case 'text': {
      pen.globalAlpha = 1;
      pen.fillStyle = ink;
      let x = mark.x;
      for (const run of mark.runs) {
        pen.font = `${mark.weight} ${mark.size * run.size}px ${FONT}`;
        pen.fillText(run.text, x, mark.y - run.raise * mark.size);
        x += pen.measureText(run.text).width;
      }
      return;
    }
  }
}
