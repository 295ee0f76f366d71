// From loose triangles to a mesh of shared corners: corners with equal coordinates become one, triangles with fewer than
// three different corners and exact repeats are dropped. Everything hashes exact bits; nothing is rounded together.
import type { TriangleSoup } from './triangle-soup';

export interface Welded {
  /** Corners, three numbers each, in file units. */
  readonly corners: Float64Array;
  /** Corner numbers, three a triangle. */
  readonly triangles: Uint32Array;
  readonly droppedDegenerate: number;
  readonly droppedRepeats: number;
}

/** Spreads the bits of h; the finaliser of MurmurHash3, which is in the public domain. */
function spread(h: number): number {
  let x = h ^ (h >>> 16);
  x = Math.imul(x, 0x85ebca6b);
  x ^= x >>> 13;
  x = Math.imul(x, 0xc2b2ae35);
  return (x ^ (x >>> 16)) >>> 0;
}

/** The smallest power of two that leaves a hash table of `entries` at most half full. */
export function tableSize(entries: number): number {
  let size = 16;
  while (size < entries * 2) size *= 2;
  return size;
}

/** Hash of up to three whole numbers. */
export function hashNumbers(a: number, b: number, c: number): number {
  return spread(Math.imul(spread(Math.imul(spread(a) ^ b, 0x9e3779b1)) ^ c, 0x85ebca77));
}

/** Gives every corner of the soup the number of the first corner with the same bits. */
function firstEqualCorners(words: Uint32Array, perCorner: number, count: number): { ids: Uint32Array; unique: number } {
  const ids = new Uint32Array(count);
  let mask = tableSize(Math.min(count, 4096)) - 1;
  let table = new Int32Array(mask + 1).fill(-1);
  let unique = 0;
  // representative corner and hash of each unique one, so that the table can grow without reading corners again
  let firsts = new Uint32Array(mask + 1);
  let hashes = new Uint32Array(mask + 1);
  for (let c = 0; c < count; c += 1) {
    const o = c * perCorner;
    let h = 0;
    for (let w = 0; w < perCorner; w += 1) h = spread(Math.imul(h ^ words[o + w]!, 0x9e3779b1) + w);
    let slot = h & mask;
    for (;;) {
      const id = table[slot]!;
      if (id < 0) break;
      if (hashes[id] === h) {
        const p = firsts[id]! * perCorner;
        let same = true;
        for (let w = 0; w < perCorner && same; w += 1) same = words[p + w] === words[o + w];
        if (same) break;
      }
      slot = (slot + 1) & mask;
    }
    const found = table[slot]!;
    if (found >= 0) {
      ids[c] = found;
      continue;
    }
    ids[c] = unique;
    table[slot] = unique;
    firsts[unique] = c;
    hashes[unique] = h;
    unique += 1;
    if (unique * 2 > mask) {
      mask = mask * 2 + 1;
      table = new Int32Array(mask + 1).fill(-1);
      const grownFirsts = new Uint32Array(mask + 1);
      grownFirsts.set(firsts);
      firsts = grownFirsts;
      const grownHashes = new Uint32Array(mask + 1);
      grownHashes.set(hashes);
      hashes = grownHashes;
      for (let id = 0; id < unique; id += 1) {
        let s = hashes[id]! & mask;
        while (table[s]! >= 0) s = (s + 1) & mask;
        table[s] = id;
      }
    }
  }
  return { ids, unique };
}

/** Drops triangles without three different corners and exact repeats (same corners, same turning sense). */
function keepTriangles(ids: Uint32Array): Omit<Welded, 'corners'> {
  const count = ids.length / 3;
  const kept = new Uint32Array(ids.length);
  const mask = tableSize(count) - 1;
  const table = new Int32Array(mask + 1).fill(-1);
  let n = 0;
  let droppedDegenerate = 0;
  let droppedRepeats = 0;
  for (let t = 0; t < count; t += 1) {
    let a = ids[3 * t]!;
    let b = ids[3 * t + 1]!;
    let c = ids[3 * t + 2]!;
    if (a === b || b === c || a === c) {
      droppedDegenerate += 1;
      continue;
    }
    // turn the smallest number to the front: the same triangle whichever corner it starts from
    while (a > b || a > c) [a, b, c] = [b, c, a];
    let slot = hashNumbers(a, b, c) & mask;
    let repeat = false;
    for (let k = table[slot]!; k >= 0; k = table[slot]!) {
      if (kept[3 * k] === a && kept[3 * k + 1] === b && kept[3 * k + 2] === c) {
        repeat = true;
        break;
      }
      slot = (slot + 1) & mask;
    }
    if (repeat) {
      droppedRepeats += 1;
      continue;
    }
    table[slot] = n;
    kept[3 * n] = a;
    kept[3 * n + 1] = b;
    kept[3 * n + 2] = c;
    n += 1;
  }
  return { triangles: kept.slice(0, 3 * n), droppedDegenerate, droppedRepeats };
}

/** Renumbers corners so that only those that a triangle uses remain, in order of first use. */
function usedCorners(soup: TriangleSoup, ids: Uint32Array, unique: number, triangles: Uint32Array): Float64Array {
  const firsts = new Int32Array(unique).fill(-1);
  for (let c = 0; c < ids.length; c += 1) if (firsts[ids[c]!]! < 0) firsts[ids[c]!] = c;
  const renumbered = new Int32Array(unique).fill(-1);
  const corners = new Float64Array(3 * unique);
  let n = 0;
  for (let k = 0; k < triangles.length; k += 1) {
    const id = triangles[k]!;
    if (renumbered[id]! < 0) {
      const o = firsts[id]! * 3;
      corners[3 * n] = soup[o]!;
      corners[3 * n + 1] = soup[o + 1]!;
      corners[3 * n + 2] = soup[o + 2]!;
      renumbered[id] = n;
      n += 1;
    }
    triangles[k] = renumbered[id]!;
  }
  return corners.slice(0, 3 * n);
}

/** Welds loose triangles (nine finite numbers each, no negative zero) into a mesh of shared corners. */
export function weld(soup: TriangleSoup): Welded {
  const perCorner = soup instanceof Float32Array ? 3 : 6;
  const words = new Uint32Array(soup.buffer, soup.byteOffset, (soup.length / 3) * perCorner);
  const { ids, unique } = firstEqualCorners(words, perCorner, soup.length / 3);
  const kept = keepTriangles(ids);
  return { corners: usedCorners(soup, ids, unique, kept.triangles), ...kept };
}
