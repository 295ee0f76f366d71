// Sending a file with progress. fetch cannot tell how far an upload is, XMLHttpRequest can.
import type { z } from 'zod';
import type { Endpoint } from '#shared/api';
import { addressOf, parseAnswer, type CallOf } from './api';
import { localProblem, problemFrom } from './api-problem';

export interface UploadProgress {
  readonly sent: number;
  readonly total: number;
  /** All has been sent; the server is reading it. */
  readonly isReading: boolean;
}

/** Sends `file` in the field `file`. Aborting the signal stops it and throws `network/stopped`. */
export function uploadFile<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>,
  call: CallOf<P, Q, B>,
  file: Blob,
  options: { readonly name: string; readonly onProgress?: (progress: UploadProgress) => void },
): Promise<z.output<R>> {
  const { params, query, signal } = call as { params?: unknown; query?: unknown; signal?: AbortSignal };
  const { name, onProgress } = options;
  return new Promise((resolve, reject) => {
    if (signal?.aborted === true) {
      reject(localProblem('network/stopped'));
      return;
    }
    const request = new XMLHttpRequest();
    const stop = (): void => request.abort();
    const end = (settle: () => void): void => {
      signal?.removeEventListener('abort', stop);
      settle();
    };
    request.open(endpoint.method, addressOf(endpoint, params, query));
    request.upload.addEventListener('progress', (event) => {
      onProgress?.({ sent: event.loaded, total: event.total, isReading: false });
    });
    request.upload.addEventListener('load', () => {
      onProgress?.({ sent: file.size, total: file.size, isReading: true });
    });
    request.addEventListener('load', () => {
      end(() => {
        const body = readJson(request.responseText);
        if (request.status < 200 || request.status > 299) {
          reject(problemFrom(request.status, body));
          return;
        }
        try {
          resolve(parseAnswer(endpoint, body));
        } catch (error) {
          reject(error instanceof Error ? error : localProblem('answer/unreadable'));
        }
      });
    });
    request.addEventListener('error', () => end(() => reject(localProblem('network/unreachable'))));
    request.addEventListener('abort', () => end(() => reject(localProblem('network/stopped'))));
    signal?.addEventListener('abort', stop);
    const form = new FormData();
    form.set('file', file, name);
    request.send(form);
  });
}

function readJson(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return null;
  }
}
