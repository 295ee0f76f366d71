// What both stores have in common: their interface, their keys.
import type { Readable } from 'node:stream';

export interface StoredFile {
  readonly stream: Readable;
  readonly bytes: number;
}

export interface FileStore {
  /** Takes a file that lies on this machine; it is gone from there afterwards. An existing key is replaced. */
  readonly takeFile: (key: string, file: string) => Promise<void>;
  readonly putBytes: (key: string, bytes: Uint8Array) => Promise<void>;
  /** Null if there is nothing under the key. */
  readonly open: (key: string) => Promise<StoredFile | null>;
  readonly readBytes: (key: string) => Promise<Uint8Array | null>;
  readonly has: (key: string) => Promise<boolean>;
  /** No fault if there is nothing. */
  readonly remove: (key: string) => Promise<void>;
  readonly keys: (prefix: string) => Promise<string[]>;
}

/** Keys are ours alone: lower-case words, digits and dashes between slashes, one dot. */
const KEY = /^[a-z0-9-]+(\/[a-z0-9-]+)*(\.[a-z0-9]+)?$/;

export function assertKey(key: string): void {
  if (!KEY.test(key)) throw new Error(`not a storage key: ${key}`);
}

export async function collect(stream: Readable): Promise<Uint8Array> {
  const chunks: Buffer[] = [];
  for await (const chunk of stream) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}
