// The text form of STL: `solid`, facets of exactly three corners, `endsolid`, once or several times over, in any case and
// indentation. Normals are not used for anything and may be wrong or missing; corners may not.
import type { StlResult } from './triangle-soup';

type Word = 'solid' | 'facet' | 'normal' | 'outer' | 'loop' | 'vertex' | 'endloop' | 'endfacet' | 'endsolid';

const refuse = (reason: string): StlResult => ({ ok: false, reason });
const isBlank = (c: number): boolean => c <= 0x20;
const isLineEnd = (c: number): boolean => c === 0x0a || c === 0x0d;

/** Walks the bytes token by token and knows the line it is on, for messages. */
class Tokens {
  private at: number;
  private start = 0;
  private end = 0;
  line = 1;
  constructor(private readonly bytes: Uint8Array) {
    this.at = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
  }
  /** Moves to the next token; false at the end of the file. */
  next(): boolean {
    const { bytes } = this;
    let i = this.at;
    while (i < bytes.length && isBlank(bytes[i]!)) {
      if (bytes[i] === 0x0a) this.line += 1;
      i += 1;
    }
    this.start = i;
    while (i < bytes.length && !isBlank(bytes[i]!)) i += 1;
    this.end = i;
    this.at = i;
    return this.end > this.start;
  }
  /** Moves to the next token of the same line; false, and nowhere, if the line ends before. */
  nextOnLine(): boolean {
    const { bytes } = this;
    for (let i = this.at; i < bytes.length; i += 1) {
      if (isLineEnd(bytes[i]!)) return false;
      if (!isBlank(bytes[i]!)) return this.next();
    }
    return false;
  }
  /** True if the token is `facet` and the one after it, on the same line, is `normal`. */
  beginsFacet(): boolean {
    if (!this.is('facet')) return false;
    const { at, start, end } = this;
    const begins = this.nextOnLine() && this.is('normal');
    [this.at, this.start, this.end] = [at, start, end];
    return begins;
  }
  /** True if a facet begins on what is left of the line. */
  hasFacetOnLine(): boolean {
    const { at, start, end } = this;
    let has = false;
    while (!has && this.nextOnLine()) has = this.beginsFacet();
    [this.at, this.start, this.end] = [at, start, end];
    return has;
  }
  /** True if no line ends in what is left of the file. */
  isLastLine(): boolean {
    const { bytes } = this;
    let i = this.at;
    while (i < bytes.length && !isLineEnd(bytes[i]!)) i += 1;
    return i === bytes.length;
  }
  is(word: Word): boolean {
    if (this.end - this.start !== word.length) return false;
    for (let i = 0; i < word.length; i += 1) {
      if ((this.bytes[this.start + i]! | 0x20) !== word.charCodeAt(i)) return false;
    }
    return true;
  }
  text(): string {
    let s = '';
    const end = Math.min(this.end, this.start + 40);
    for (let i = this.start; i < end; i += 1) s += String.fromCharCode(this.bytes[i]!);
    return this.end > end ? `${s}…` : s;
  }
  /** The token as a number, or NaN: digits, one point, sign and exponent only (no hex, no `Infinity`). */
  number(): number {
    const length = this.end - this.start;
    if (length > 64) return NaN;
    let s = '';
    for (let i = this.start; i < this.end; i += 1) {
      const c = this.bytes[i]!;
      const allowed = (c >= 0x30 && c <= 0x39) || c === 0x2e || c === 0x2d || c === 0x2b || c === 0x65 || c === 0x45;
      if (!allowed) return NaN;
      s += String.fromCharCode(c);
    }
    return s === '' ? NaN : Number(s);
  }
}

/** Corners as they come; grows by doubling. */
class Corners {
  private data = new Float64Array(9 * 1024);
  length = 0;
  push(x: number): void {
    if (this.length === this.data.length) {
      const grown = new Float64Array(this.data.length * 2);
      grown.set(this.data);
      this.data = grown;
    }
    this.data[this.length] = x + 0;
    this.length += 1;
  }
  take(): Float64Array {
    return this.data.slice(0, this.length);
  }
}

/** Passes over `normal` and whatever stands for its numbers, up to `outer`. */
function skipNormal(tokens: Tokens): boolean {
  for (let i = 0; i < 8; i += 1) {
    if (!tokens.next()) return false;
    if (tokens.is('outer')) return true;
  }
  return false;
}

function readFacet(tokens: Tokens, corners: Corners, facet: number): string | null {
  const where = (): string => `line ${tokens.line}, facet ${facet}`;
  if (!skipNormal(tokens)) return `${where()}: "outer loop" is missing`;
  if (!tokens.next() || !tokens.is('loop')) return `${where()}: "loop" is missing after "outer"`;
  for (let corner = 0; ; corner += 1) {
    if (!tokens.next()) return `${where()}: the file ends in the middle of a facet`;
    if (tokens.is('endloop')) {
      if (corner !== 3) return `${where()}: a facet needs exactly three corners, this one has ${corner}`;
      break;
    }
    if (!tokens.is('vertex')) return `${where()}: "vertex" or "endloop" was expected, not "${tokens.text()}"`;
    if (corner === 3) return `${where()}: a facet needs exactly three corners, this one has more`;
    for (let k = 0; k < 3; k += 1) {
      if (!tokens.next()) return `${where()}: the file ends in the middle of a corner`;
      const x = tokens.number();
      if (!Number.isFinite(x)) return `${where()}: "${tokens.text()}" is not a finite number`;
      corners.push(x);
    }
  }
  if (!tokens.next() || !tokens.is('endfacet')) return `${where()}: "endfacet" is missing`;
  return null;
}

/** Passes over the name after `solid`, which runs to the end of the line or to a facet; false at the end of the file. */
function passName(tokens: Tokens): boolean {
  const isLast = tokens.isLastLine();
  while (tokens.nextOnLine()) if (tokens.beginsFacet() || (isLast && tokens.is('endsolid'))) return true;
  return tokens.next();
}

/** Passes over the name after `endsolid`; true if another solid begins on the same line (then its word is the token). */
function passEndName(tokens: Tokens): boolean {
  const hasMore = tokens.hasFacetOnLine();
  while (tokens.nextOnLine()) if (hasMore && (tokens.is('solid') || tokens.is('facet'))) return true;
  return false;
}

/** Reads STL text; see readStl. `maxTriangles` is the most it takes before it refuses. */
export function readAsciiStl(bytes: Uint8Array, maxTriangles: number): StlResult {
  const tokens = new Tokens(bytes);
  const corners = new Corners();
  let facets = 0;
  let isAtSolid = false;
  while (isAtSolid || tokens.next()) {
    if (!tokens.is('solid')) {
      return refuse(`line ${tokens.line}: "solid" or the end of the file was expected, not "${tokens.text()}"`);
    }
    let more = passName(tokens);
    for (;;) {
      if (!more) return refuse('"endsolid" is missing: the file is truncated');
      if (tokens.is('endsolid')) break;
      if (!tokens.is('facet')) {
        return refuse(`line ${tokens.line}: "facet" or "endsolid" was expected, not "${tokens.text()}"`);
      }
      facets += 1;
      if (facets > maxTriangles) return refuse(`the file holds more than the ${maxTriangles} triangles allowed`);
      const fault = readFacet(tokens, corners, facets);
      if (fault !== null) return refuse(fault);
      more = tokens.next();
    }
    isAtSolid = passEndName(tokens);
  }
  if (facets === 0) return refuse('the file holds no triangle');
  return { ok: true, soup: corners.take(), form: 'text' };
}
