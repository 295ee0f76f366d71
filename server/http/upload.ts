// Taking a file in: streamed to disk with its size watched. Whatever goes wrong leaves nothing behind.
import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, readdir, rm, stat } from 'node:fs/promises';
import { hostname } from 'node:os';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { Request, RequestHandler } from 'express';
import multer, { MulterError, type StorageEngine } from 'multer';
import type { ErrorCode } from '#shared/api';
import { isAlive } from '../jobs/processes';
import { ApiError } from './api-error';

export interface Incoming {
  /** Where the bytes lie. */
  readonly file: string;
  /** The person's name for it, for showing only. */
  readonly name: string;
  readonly bytes: number;
}

const incomingFolder = (files: string): string => path.join(files, 'incoming');

/** Longer than any request may take. */
const STALE_MS = 24 * 60 * 60 * 1000;
/** Names tell whose they are: other servers may have uploads under way in the same folder. */
const prefixOf = (pid: number): string =>
  `${hostname()
    .toLowerCase()
    .replace(/[^a-z0-9]/g, '')}-${pid}-`;

/** Uploads that a killed server left half-done: those of this machine at once, others when they are a day old. */
export async function sweepIncoming(files: string): Promise<void> {
  const folder = incomingFolder(files);
  await mkdir(folder, { recursive: true });
  for (const name of await readdir(folder)) {
    const file = path.join(folder, name);
    const pid = Number(name.split('-')[1]);
    const isOurs = Number.isInteger(pid) && name.startsWith(prefixOf(pid));
    // this process has only just begun: what bears its number is a dead one's
    const isLeft = isOurs && (pid === process.pid || !isAlive(pid));
    const age = Date.now() - ((await stat(file).catch(() => null))?.mtimeMs ?? 0);
    if (isLeft || age > STALE_MS) await rm(file, { force: true });
  }
}

/** A full disk, a missing right: the server's own fault, and none of the caller's business. */
const isSystemFault = (error: unknown): boolean =>
  error instanceof Error && typeof (error as NodeJS.ErrnoException).syscall === 'string';

/** Streams to a file under a name of ours; removes it if the stream breaks off. */
function diskStorage(folder: string): StorageEngine {
  return {
    _handleFile(_req, file, done) {
      const target = path.join(folder, prefixOf(process.pid) + randomUUID());
      const sink = createWriteStream(target, { flags: 'wx' });
      pipeline(file.stream, sink).then(
        () => done(null, { path: target, size: sink.bytesWritten }),
        (error: unknown) => {
          const tell = (): void => done(error);
          rm(target, { force: true }).then(tell, tell);
        },
      );
    },
    _removeFile(_req, file, done) {
      rm(file.path, { force: true }).then(() => done(null), done);
    },
  };
}

/** Reads one file in the field `file`; refused beyond `most` bytes. */
export function readUpload(
  files: string,
  most: number,
  faults: { readonly noFile: ErrorCode; readonly tooLarge: ErrorCode },
): RequestHandler {
  const upload = multer({
    storage: diskStorage(incomingFolder(files)),
    defParamCharset: 'utf8',
    limits: { fileSize: most, files: 1, fields: 8, fieldSize: 4096, parts: 12, headerPairs: 40 },
  }).single('file');
  return (req, res, next) => {
    if (req.is('multipart/form-data') === false) {
      next(new ApiError(faults.noFile, { detail: 'The request must be a form with the file in the field “file”.' }));
      return;
    }
    upload(req, res, (error: unknown) => {
      if (error === undefined || error === null) next();
      else if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') next(new ApiError(faults.tooLarge));
      else if (isSystemFault(error)) next(error);
      else if (error instanceof MulterError || error instanceof Error) {
        next(new ApiError('request/invalid', { detail: `The upload was not read: ${error.message}.` }));
      } else next(new Error('the upload was not read'));
    });
  };
}

/** What came, or null. */
export function incomingOf(req: Request): Incoming | null {
  const { file } = req;
  if (file === undefined) return null;
  const name = path
    .basename(file.originalname.replaceAll('\\', '/'))
    .replace(/\p{Cc}/gu, '')
    .trim();
  return { file: file.path, name: [...name].slice(0, 120).join('') || 'mesh.stl', bytes: file.size };
}
