// Text on the line of a solid's name was passed over whole: a second solid on that line, or a first facet, got lost.
import { expect, test } from 'vitest';
import { readStl } from '#shared/geometry';
import { asciiStl, textBytes } from '../fixtures/stl';

const ONE = [0, 0, 0, 1, 0, 0, 0, 1, 0];
const TWO = [0, 0, 5, 1, 0, 5, 0, 1, 5];

test.each([
  ['two solids in one line', asciiStl(ONE, 'a', ' ') + asciiStl(TWO, 'b', ' ')],
  ['a first facet beside the name, each facet a line of its own', `solid a ${asciiStl(ONE, 'x', ' ').slice(8).replace('endsolid x ', '')}\n${asciiStl(TWO).slice(11)}`],
])('%s', (_, text) => {
  const read = readStl(textBytes(text));
  expect(read.ok && [...read.soup]).toEqual([...ONE, ...TWO]);
});

test('a second solid whose word alone stands on the line of the first one’s end is refused, not lost', () => {
  expect(readStl(textBytes(`${asciiStl(ONE).trimEnd()} ${asciiStl(TWO)}`)).ok).toBe(false);
});
