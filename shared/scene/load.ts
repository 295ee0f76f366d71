// The only way from unknown data to a scene.
import { MAX_DOCUMENT_BYTES, MAX_REFUSALS } from './limits';
import { migrate } from './migrations';
import { findBrokenReferences, type Refusal } from './references';
import { pathText, refusalsOf } from './refusals';
import { sceneSchema } from './schema';
import type { Scene } from './types';

export type LoadResult =
  | { readonly ok: true; readonly scene: Scene }
  /** At least one; the first is the one to show where there is room for one. */
  | { readonly ok: false; readonly refusals: readonly [Refusal, ...Refusal[]] };

/** Deeper than any document goes; keeps hostile nesting away from recursive code. */
const DEEPEST = 32;

const refuse = (path: string, reason: string): LoadResult => ({ ok: false, refusals: [{ path, reason }] });

/**
 * What must not even reach the schema: nesting that no document has, and the one key that some code would take for an
 * object's prototype. zod passes over that key in silence in places, and an unknown key is to be refused.
 */
function findHostile(value: unknown, path: readonly PropertyKey[]): Refusal | null {
  if (typeof value !== 'object' || value === null) return null;
  if (path.length > DEEPEST) return { path: '', reason: 'the document is nested too deeply' };
  if (Array.isArray(value)) {
    for (let i = 0; i < value.length; i += 1) {
      const inner: unknown = value[i];
      const found = typeof inner === 'object' ? findHostile(inner, [...path, i]) : null;
      if (found !== null) return found;
    }
    return null;
  }
  for (const key of Object.keys(value)) {
    if (key === '__proto__') return { path: pathText([...path, key]), reason: 'is not known' };
    const inner = (value as Readonly<Record<string, unknown>>)[key];
    const found = typeof inner === 'object' ? findHostile(inner, [...path, key]) : null;
    if (found !== null) return found;
  }
  return null;
}

/**
 * Checks and, if it is older, upgrades a document; fills in its defaults. Never throws. The refusals stand in the
 * document's order, those that one value shows alone before those between values, a hundred at most.
 */
export function loadScene(input: unknown): LoadResult {
  if (typeof input !== 'object' || input === null || Array.isArray(input))
    return refuse('', 'the document must be an object');
  const hostile = findHostile(input, []);
  if (hostile !== null) return refuse(hostile.path, hostile.reason);
  const raw = input as Readonly<Record<string, unknown>>;
  if (raw['format'] !== 'gapwright-scene') {
    return refuse('format', raw['format'] === undefined ? 'is missing' : 'must be "gapwright-scene"');
  }
  const migrated = migrate(raw);
  if (!migrated.ok) return refuse('version', migrated.reason);
  const parsed = sceneSchema.safeParse(migrated.document);
  if (!parsed.success) {
    const [first, ...rest] = refusalsOf(parsed.error, migrated.document);
    return { ok: false, refusals: [first ?? { path: '', reason: 'the document is not valid' }, ...rest] };
  }
  const [first, ...rest] = findBrokenReferences(parsed.data).slice(0, MAX_REFUSALS);
  if (first !== undefined) return { ok: false, refusals: [first, ...rest] };
  return { ok: true, scene: parsed.data };
}

/** UTF-8 to text without a decoder of the platform; null if it is not UTF-8. */
function decodeUtf8(bytes: Uint8Array): string | null {
  const parts: string[] = [];
  let codes: number[] = [];
  let i = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
  while (i < bytes.length) {
    const a = bytes[i]!;
    const length = a < 0x80 ? 1 : a >= 0xc2 && a < 0xe0 ? 2 : a >= 0xe0 && a < 0xf0 ? 3 : a >= 0xf0 && a < 0xf5 ? 4 : 0;
    if (length === 0 || i + length > bytes.length) return null;
    let code = length === 1 ? a : a & (0xff >> (length + 1));
    for (let k = 1; k < length; k += 1) {
      const b = bytes[i + k]!;
      if ((b & 0xc0) !== 0x80) return null;
      code = (code << 6) | (b & 0x3f);
    }
    const overlong = (length === 3 && code < 0x800) || (length === 4 && (code < 0x10000 || code > 0x10ffff));
    if (overlong || (code >= 0xd800 && code <= 0xdfff)) return null;
    codes.push(code);
    if (codes.length === 4096) {
      parts.push(String.fromCodePoint(...codes));
      codes = [];
    }
    i += length;
  }
  parts.push(String.fromCodePoint(...codes));
  return parts.join('');
}

/** Length of a text in UTF-8, bytes. */
function utf8Length(text: string): number {
  let length = 0;
  for (let i = 0; i < text.length; i += 1) {
    const unit = text.charCodeAt(i);
    // each half of a pair counts two, together the four bytes of its character
    length += unit < 0x80 ? 1 : unit < 0x800 || (unit >= 0xd800 && unit < 0xe000) ? 2 : 3;
  }
  return length;
}

/**
 * Reads a document from a JSON file: its bytes (UTF-8) or its text. A byte order mark is passed over. Where an object
 * names a key twice the last one counts, as in every JSON reader of this program. Never throws.
 */
export function loadSceneText(source: Uint8Array | string): LoadResult {
  const size = typeof source === 'string' ? utf8Length(source) : source.length;
  if (size === 0) return refuse('', 'the document is empty');
  if (size > MAX_DOCUMENT_BYTES) {
    return refuse('', `the document has ${size} bytes, more than the ${MAX_DOCUMENT_BYTES} allowed`);
  }
  const text = typeof source === 'string' ? source.replace(/^\ufeff/, '') : decodeUtf8(source);
  if (text === null) return refuse('', 'the document is not UTF-8 text');
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    const detail = error instanceof Error ? error.message.replace(/\s+/g, ' ').slice(0, 200) : '';
    return refuse('', `the document is not JSON: ${detail}`);
  }
  return loadScene(value);
}
