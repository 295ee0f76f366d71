// The name of the part under the pointer.
import { project, type Frame } from '../viewport/frame';
import { centreOf, type Box } from '../viewport/vectors';
import { plain, widthOf, type Mark } from './mark';

export function partLabel(frame: Frame, box: Box, name: string, note: string | null): Mark[] {
  const middle = centreOf(box);
  const at = project(frame, [middle[0], middle[1], box.high[2]]);
  if (at === null) return [];
  const runs = plain(name);
  const small = note === null ? [] : plain(`\u2002${note}`);
  const first = widthOf(runs, 13, 600);
  const width = first + widthOf(small, 12, 400) + 16;
  const x = Math.max(8, Math.min(frame.width - width - 8, at.x - width / 2));
  const y = Math.max(8, Math.min(frame.height - 34, at.y - 36));
  return [
    { kind: 'plate', x, y, width, height: 24, ink: 'scribe-soft' },
    { kind: 'text', x: x + 8, y: y + 16.5, runs, size: 13, weight: 600, ink: 'scribe' },
    { kind: 'text', x: x + 8 + first, y: y + 16.5, runs: small, size: 12, weight: 400, ink: 'scribe-soft' },
  ];
}
