// Reading STL: what the contract reads, and every way in which it refuses.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { meshFromStl, readStl } from '#shared/geometry';
import { boxSoup } from '../../fixtures/soups';
import { asciiStl, binaryStl, facetText, textBytes } from '../../fixtures/stl';

const BOX = boxSoup(2, 3, 4);
const ONE = [0, 0, 0, 1, 0, 0, 0, 1, 0];

function cornersOf(bytes: Uint8Array): number[] {
  const read = readStl(bytes);
  if (!read.ok) throw new Error(read.reason);
  return [...read.soup];
}
function reasonOf(bytes: Uint8Array): string {
  const read = meshFromStl(bytes);
  if (read.ok) throw new Error(`read ${read.mesh.triangles.length / 3} triangles`);
  return read.reason;
}

describe('binary', () => {
  test('84 + 50 n bytes give n triangles, exactly as written', () => {
    const single = BOX.map((x) => Math.fround(x + 0.1));
    expect(cornersOf(binaryStl(single))).toEqual(single);
  });

  test('a header that begins with "solid" is still binary', () => {
    expect(cornersOf(binaryStl(BOX, 'solid part\nfacet normal'))).toEqual(BOX);
  });

  test('bytes beyond are ignored', () => {
    const exact = binaryStl(BOX);
    const longer = new Uint8Array(exact.length + 777).fill(0x55);
    longer.set(exact);
    expect(cornersOf(longer)).toEqual(BOX);
  });

  test('a view into a larger buffer is read from where it begins', () => {
    const exact = binaryStl(BOX);
    const around = new Uint8Array(exact.length + 13).fill(7);
    around.set(exact, 13);
    expect(cornersOf(around.subarray(13))).toEqual(BOX);
  });

  test.each([1, 49, 50, 51, 599])('%i bytes too few are refused as truncated', (missing) => {
    expect(reasonOf(binaryStl(BOX).subarray(0, 684 - missing))).toMatch(/truncated/);
  });

  test('a count far beyond the file is refused, not believed', () => {
    expect(reasonOf(binaryStl(ONE, 'h', 0xffffffff))).toMatch(/truncated/);
  });

  test('no triangle is refused', () => {
    expect(reasonOf(binaryStl([]))).toBe('the file holds no triangle');
  });

  test.each([NaN, Infinity, -Infinity])('a coordinate %d is refused with the triangle that has it', (bad) => {
    for (let k = 0; k < 9; k += 1) {
      const soup = [...ONE, ...ONE];
      soup[9 + k] = bad;
      expect(reasonOf(binaryStl(soup))).toMatch(/^triangle 2 of 2 .*not a finite number/);
    }
  });

  test('a normal that is no number does not matter', () => {
    const bytes = binaryStl(ONE);
    new DataView(bytes.buffer).setFloat32(84, NaN, true);
    expect(cornersOf(bytes)).toEqual(ONE);
  });
});

describe('text', () => {
  test.each([
    ['as it should be', (t: string) => t],
    ['upper case', (t: string) => t.toUpperCase()],
    ['indented with tabs', (t: string) => t.replace(/^/gm, '\t  ')],
    ['CRLF', (t: string) => t.replace(/\n/g, '\r\n')],
    ['CR alone', (t: string) => t.replace(/\n/g, '\r')],
    ['all in one line', (t: string) => t.replace(/\n/g, ' ')],
    ['no line end at the end', (t: string) => t.trimEnd()],
    ['a byte order mark', (t: string) => `\ufeff${t}`],
    ['no names', (t: string) => t.replace(/ part/g, '')],
    ['a name of several words', (t: string) => t.replace(/part/g, 'my facet of a solid')],
    ['blank lines', (t: string) => t.replace(/\n/g, '\n\n\n')],
    ['a first facet on the line of the name', (t: string) => t.replace('solid part\n', 'solid part ')],
    ['exponents', (t: string) => t.replace(/vertex 1 /, 'vertex 10.0e-1 ')],
  ])('%s', (_, change) => {
    expect(cornersOf(textBytes(change(asciiStl(BOX))))).toEqual(BOX);
  });

  test.each(['\n', '\r\n', ' '])('several solids are one mesh (lines end with %j)', (newline) => {
    const text = asciiStl(ONE, 'a', newline) + asciiStl(BOX, 'b', newline) + asciiStl(ONE, 'solid c', newline);
    expect(cornersOf(textBytes(text))).toEqual([...ONE, ...BOX, ...ONE]);
  });

  test('an empty solid beside a full one is fine; empty ones alone are refused', () => {
    expect(cornersOf(textBytes(`solid a\nendsolid a\n${asciiStl(ONE)}`))).toEqual(ONE);
    expect(reasonOf(textBytes('solid a\nendsolid a\n'))).toBe('the file holds no triangle');
    expect(reasonOf(textBytes('solid empty endsolid empty'))).toBe('the file holds no triangle');
  });

  test('doubles are kept as doubles', () => {
    const fine = [0.1, 1 / 3, 1e-9, 7, 8, 9.000000001, 1e5, 2, 3];
    expect(cornersOf(textBytes(asciiStl(fine)))).toEqual(fine);
  });

  test.each([
    ['endsolid missing', asciiStl(BOX).replace(/endsolid.*\n/, ''), /endsolid/],
    ['endsolid missing, one line', asciiStl(BOX, 'a', ' ').replace(/endsolid.*/, ''), /endsolid/],
    ['the second endsolid missing', asciiStl(ONE) + asciiStl(ONE).replace(/endsolid.*\n/, ''), /endsolid/],
    ['two corners', `solid\n${facetText(ONE.slice(0, 6))}endsolid\n`, /exactly three corners, this one has 2/],
    ['four corners', `solid\n${facetText([...ONE, 1, 1, 0])}endsolid\n`, /exactly three corners/],
    ['no corner', `solid\n${facetText([])}endsolid\n`, /exactly three corners, this one has 0/],
    ['nan', asciiStl(ONE).replace('vertex 1', 'vertex nan'), /"nan" is not a finite number/],
    ['inf', asciiStl(ONE).replace('vertex 1', 'vertex -inf'), /not a finite number/],
    ['Infinity', asciiStl(ONE).replace('vertex 1', 'vertex Infinity'), /not a finite number/],
    ['too large for a number', asciiStl(ONE).replace('vertex 1', 'vertex 1e999'), /not a finite number/],
    ['hex', asciiStl(ONE).replace('vertex 1', 'vertex 0x10'), /not a finite number/],
    ['a decimal comma', asciiStl(ONE).replace('vertex 1', 'vertex 1,5'), /not a finite number/],
    ['a coordinate short', asciiStl(ONE).replace('vertex 1 0 0', 'vertex 1 0'), /not a finite number/],
    ['cut inside a facet', asciiStl(BOX).slice(0, 400), /./],
    ['endfacet missing', asciiStl(ONE).replace('endfacet\n', ''), /"endfacet" is missing/],
    ['endloop missing', asciiStl(ONE).replace('endloop\n', ''), /expected/],
    ['outer loop missing', asciiStl(ONE).replace('outer loop\n', ''), /"outer loop" is missing/],
    ['words after the end', `${asciiStl(ONE)}and more\n`, /expected/],
    ['another format', 'o part\nv 0 0 0\n'.repeat(30), /not STL|truncated/],
    ['a page', '<!doctype html><html></html>'.repeat(9), /not STL|truncated/],
  ])('refused: %s', (_, text, reason) => {
    expect(reasonOf(textBytes(text))).toMatch(reason);
  });

  test('every prefix of a text file is refused', () => {
    const whole = textBytes(asciiStl([...ONE, ...BOX.slice(0, 9)]).trimEnd());
    // the name of the solid at the end may be cut: the file is whole without it
    const needed = whole.length - ' part'.length;
    for (let n = 0; n < needed; n += 1) expect(readStl(whole.subarray(0, n)).ok, `${n} bytes`).toBe(false);
    expect(readStl(whole.subarray(0, needed)).ok).toBe(true);
  });
});

test('an empty file is refused', () => {
  expect(reasonOf(new Uint8Array())).toBe('the file is empty');
});

test('any bytes are read or refused, never thrown at (seed 31)', () => {
  const words = fc.constantFrom(
    'solid',
    'facet',
    'normal',
    'outer',
    'loop',
    'vertex',
    'endloop',
    'endfacet',
    'endsolid',
  );
  const text = fc.array(fc.oneof({ weight: 4, arbitrary: words }, fc.constantFrom('0', '1.5', '-2e3', 'nan', '\n')), {
    maxLength: 60,
  });
  fc.assert(
    fc.property(
      fc.oneof(
        fc.uint8Array({ maxLength: 400 }),
        text.map((t) => textBytes(t.join(' '))),
      ),
      (bytes) => {
        const read = readStl(bytes);
        if (!read.ok) expect(read.reason).not.toBe('');
        else expect(read.soup.length > 0 && read.soup.length % 9 === 0 && read.soup.every(Number.isFinite)).toBe(true);
      },
    ),
    { seed: 31, numRuns: 3000 },
  );
});

test('text and binary of the same single-precision corners weld to the same mesh (seed 32)', () => {
  const single = fc.float({ noNaN: true, noDefaultInfinity: true, min: -1000, max: 1000 });
  fc.assert(
    fc.property(fc.array(fc.array(single, { minLength: 9, maxLength: 9 }), { minLength: 1, maxLength: 8 }), (soups) => {
      const soup = soups.flat();
      const [a, b] = [meshFromStl(binaryStl(soup)), meshFromStl(textBytes(asciiStl(soup)))];
      expect(a).toEqual(b);
    }),
    { seed: 32, numRuns: 300 },
  );
});
