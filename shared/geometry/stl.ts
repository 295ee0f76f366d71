// Reading STL, strictly: what is not plainly a mesh is refused with the reason, never half read.
// Layout of the binary form: 80 bytes of header, a little-endian uint32 count n, then 50 bytes a triangle (normal and
// three corners as float32, two bytes of attribute). The header says nothing: files that begin with the letters "solid"
// are often binary, so the size decides first and the text second.
import { readAsciiStl } from './stl-ascii';
import type { StlResult } from './triangle-soup';

/** The longest STL file that is read, in bytes. */
export const MAX_MESH_BYTES = 256 * 1024 * 1024;
/** The most triangles a mesh may hold. */
export const MAX_MESH_TRIANGLES = 5_000_000;

const refuse = (reason: string): StlResult => ({ ok: false, reason });

/** True if the first bytes are text that begins, after blanks and a byte order mark, with the word `solid`. */
function beginsAsText(bytes: Uint8Array): boolean {
  let i = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
  while (i < bytes.length && (bytes[i]! <= 0x20 || bytes[i] === 0xa0) && bytes[i] !== 0) i += 1;
  const word = [0x73, 0x6f, 0x6c, 0x69, 0x64];
  for (const letter of word) {
    if (((bytes[i] ?? 0) | 0x20) !== letter) return false;
    i += 1;
  }
  const end = Math.min(bytes.length, 512);
  for (let k = 0; k < end; k += 1) if (bytes[k] === 0) return false;
  return true;
}

function readBinary(bytes: Uint8Array, count: number): StlResult {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const soup = new Float32Array(count * 9);
  let o = 96;
  let k = 0;
  for (let t = 0; t < count; t += 1) {
    let sum = 0;
    for (let j = 0; j < 9; j += 1) {
      // adding zero turns -0 into 0, so that equal corners have equal bits
      const x = view.getFloat32(o + 4 * j, true) + 0;
      soup[k] = x;
      sum += x - x;
      k += 1;
    }
    // x - x is NaN for infinities and NaN alone, so one test serves all nine
    if (sum !== 0) return refuse(`triangle ${t + 1} of ${count} has a coordinate that is not a finite number`);
    o += 50;
  }
  return { ok: true, soup, form: 'binary' };
}

/**
 * Reads the bytes of an STL file.
 * @returns the triangles' corners in the file's own unit and frame, or the reason why the file is refused: empty,
 *   truncated, not STL, no triangle, too many, a coordinate that is not a finite number.
 */
export function readStl(bytes: Uint8Array): StlResult {
  const size = bytes.length;
  if (size === 0) return refuse('the file is empty');
  if (size > MAX_MESH_BYTES) return refuse(`the file has ${size} bytes, more than the ${MAX_MESH_BYTES} allowed`);
  const count =
    size >= 84 ? new DataView(bytes.buffer, bytes.byteOffset, size).getUint32(80, true) : Number.POSITIVE_INFINITY;
  if (size >= 84 + 50 * count) {
    if (count === 0) return refuse('the file holds no triangle');
    if (count > MAX_MESH_TRIANGLES) {
      return refuse(`the file holds ${count} triangles, more than the ${MAX_MESH_TRIANGLES} allowed`);
    }
    return readBinary(bytes, count);
  }
  if (beginsAsText(bytes)) return readAsciiStl(bytes, MAX_MESH_TRIANGLES);
  if (size < 84) return refuse('the file is not STL: it is shorter than an STL header and is no text either');
  const needs = 84 + 50 * count;
  return refuse(
    `the file is truncated or not STL: its header announces ${count} triangles, which take ${needs} bytes, and it has ${size}`,
  );
}
