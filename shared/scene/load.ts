// The only way from unknown data to a scene.
import { MAX_DOCUMENT_BYTES } from './limits';
import { migrate } from './migrations';
import { findBrokenReferences, type Refusal } from './references';
import { refusalsOf } from './refusals';
import { sceneSchema } from './schema';
import type { Scene } from './types';

export type LoadResult =
  | { readonly ok: true; readonly scene: Scene }
  /** At least one; the first is the one to show where there is room for one. */
  | { readonly ok: false; readonly refusals: readonly [Refusal, ...Refusal[]] };

/** Deeper than any document goes; keeps hostile nesting away from recursive code. */
const DEEPEST = 32;

const refuse = (path: string, reason: string): LoadResult => ({ ok: false, refusals: [{ path, reason }] });

function isTooDeep(value: unknown, left: number): boolean {
  if (typeof value !== 'object' || value === null) return false;
  if (left === 0) return true;
  for (const inner of Object.values(value)) if (isTooDeep(inner, left - 1)) return true;
  return false;
}

/** Checks and, if it is older, upgrades a document; fills in its defaults. Never throws. */
export function loadScene(input: unknown): LoadResult {
  if (typeof input !== 'object' || input === null || Array.isArray(input))
    return refuse('', 'the document must be an object');
  if (isTooDeep(input, DEEPEST)) return refuse('', 'the document is nested too deeply');
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
  const [first, ...rest] = findBrokenReferences(parsed.data);
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

/** Reads a document from the bytes of a JSON file (UTF-8, a byte order mark is passed over). Never throws. */
export function loadSceneText(bytes: Uint8Array): LoadResult {
  if (bytes.length === 0) return refuse('', 'the document is empty');
  if (bytes.length > MAX_DOCUMENT_BYTES) {
    return refuse('', `the document has ${bytes.length} bytes, more than the ${MAX_DOCUMENT_BYTES} allowed`);
  }
  const text = decodeUtf8(bytes);
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
