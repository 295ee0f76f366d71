// A tag is as wide as its name set on two lines, so that many tags find room beside one another.
import { plain, widthOf } from '../overlay/mark';

const LEAST = 34;
const MOST = 118;

/** Width of a name on at most two lines, px. */
export function nameWidth(name: string): number {
  const words = name.split(/\s+/).filter((w) => w !== '');
  const wide = (from: number, to: number): number => widthOf(plain(words.slice(from, to).join(' ')), 12, 700);
  let best = wide(0, words.length);
  for (let i = 1; i < words.length; i += 1) best = Math.min(best, Math.max(wide(0, i), wide(i, words.length)));
  return Math.max(LEAST, Math.min(MOST, Math.ceil(best) + 2));
}
