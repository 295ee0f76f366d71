import { plain, widthOf } from '../overlay/mark';

/** What the reading beside the name takes, px. */
const READING = 92;
const LINE = 16;

/** A label is one line high, or two where its pair has a long name. */
export function labelHeight(name: string, width: number, least: number): number {
  return widthOf(plain(name), 13, 600) > width - READING ? Math.max(least, 2 * LINE + 6) : least;
}
