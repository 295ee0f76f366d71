import { widthOf, type TextRun } from '../overlay/mark';
import { MarksSvg } from '../overlay/marks-svg';
import type { Frame } from '../viewport/frame';

interface ReadingPlateProps {
  /** Middle of its upper edge. */
  readonly x: number;
  readonly y: number;
  readonly runs: readonly TextRun[];
  readonly frame: Frame;
}

/** What a handle says while it is dragged. */
export function ReadingPlate({ x, y, runs, frame }: ReadingPlateProps) {
  const width = widthOf(runs, 14, 600) + 18;
  const left = Math.max(8, Math.min(frame.width - width - 8, x - width / 2));
  const top = Math.max(8, Math.min(frame.height - 36, y));
  return (
    <MarksSvg
      marks={[
        { kind: 'plate', x: left, y: top, width, height: 27, ink: 'laser' },
        { kind: 'text', x: left + 9, y: top + 18.5, runs, size: 14, weight: 600, ink: 'chalk' },
      ]}
    />
  );
}
