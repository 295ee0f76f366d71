// Files that go out: never sniffed, never run, never cached by others. What lies under a hash never changes.
import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import type { FileStore } from '../storage/file-store';
import { ApiError } from './api-error';

export interface SendOptions {
  readonly type: string;
  /** Names the content; the same tag means the same bytes. */
  readonly tag: string;
  /** Offered under this name for saving; shown in place if left out. */
  readonly download?: string;
  /** Whether a shared cache may keep it. */
  readonly isPublic?: boolean;
}

function head(req: Request, res: Response, options: SendOptions): boolean {
  res.setHeader('Content-Type', options.type);
  res.setHeader('X-Content-Type-Options', 'nosniff');
  res.setHeader('ETag', `"${options.tag}"`);
  res.setHeader('Cache-Control', options.isPublic === true ? 'public, max-age=300' : 'private, no-cache');
  // RFC 6266: a plain name for old clients, the real one in UTF-8
  if (options.download !== undefined) {
    const plain = options.download.replace(/[^\x20-\x7e]|["\\%]/g, '_');
    const real = encodeURIComponent(options.download).replace(
      /['()*]/g,
      (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`,
    );
    res.setHeader('Content-Disposition', `attachment; filename="${plain}"; filename*=UTF-8''${real}`);
  } else res.setHeader('Content-Disposition', 'inline');
  if (req.fresh) {
    res.status(304).end();
    return true;
  }
  return false;
}

export async function sendFile(
  req: Request,
  res: Response,
  store: FileStore,
  key: string,
  options: SendOptions,
): Promise<void> {
  const file = await store.open(key);
  if (file === null) throw new ApiError('thing/missing');
  if (head(req, res, options)) {
    file.stream.destroy();
    return;
  }
  res.setHeader('Content-Length', String(file.bytes));
  try {
    await pipeline(file.stream, res);
  } catch (error) {
    // a client that goes away in the middle is no fault of the server's
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}

export function sendBytes(req: Request, res: Response, bytes: Uint8Array, options: SendOptions): void {
  if (head(req, res, options)) return;
  res.setHeader('Content-Length', String(bytes.length));
  res.end(bytes);
}
