// Files in S3-compatible object storage.
import { createReadStream } from 'node:fs';
import { rm, stat } from 'node:fs/promises';
import type { Readable } from 'node:stream';
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import type { Config } from '../config';
import { assertKey, collect, type FileStore } from './stored';

type S3Settings = Extract<Config['storage'], { kind: 's3' }>;

function isMissing(error: unknown): boolean {
  const e = error as { name?: string; $metadata?: { httpStatusCode?: number } };
  return e.name === 'NoSuchKey' || e.name === 'NotFound' || e.$metadata?.httpStatusCode === 404;
}

export function createS3Store(settings: S3Settings): FileStore {
  const client = new S3Client({
    region: settings.region,
    ...(settings.endpoint === undefined ? {} : { endpoint: settings.endpoint, forcePathStyle: true }),
    credentials: { accessKeyId: settings.accessKey, secretAccessKey: settings.secretKey },
    // otherwise a checksum trailer ends up inside the object on some stores
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  const at = (key: string): { Bucket: string; Key: string } => {
    assertKey(key);
    return { Bucket: settings.bucket, Key: key };
  };
  const openObject: FileStore['open'] = async (key) => {
    try {
      const answer = await client.send(new GetObjectCommand(at(key)));
      return { stream: answer.Body as Readable, bytes: answer.ContentLength ?? 0 };
    } catch (error) {
      if (isMissing(error)) return null;
      throw error;
    }
  };
  return {
    async takeFile(key, file) {
      const { size } = await stat(file);
      await client.send(new PutObjectCommand({ ...at(key), Body: createReadStream(file), ContentLength: size }));
      await rm(file, { force: true });
    },
    async putBytes(key, bytes) {
      await client.send(new PutObjectCommand({ ...at(key), Body: bytes, ContentLength: bytes.length }));
    },
    open: openObject,
    async readBytes(key) {
      const file = await openObject(key);
      return file === null ? null : collect(file.stream);
    },
    async has(key) {
      try {
        await client.send(new HeadObjectCommand(at(key)));
        return true;
      } catch (error) {
        if (isMissing(error)) return false;
        throw error;
      }
    },
    async remove(key) {
      await client.send(new DeleteObjectCommand(at(key)));
    },
    async keys(prefix) {
      const keys: string[] = [];
      let token: string | undefined;
      do {
        const page = await client.send(
          new ListObjectsV2Command({ Bucket: settings.bucket, Prefix: `${prefix}/`, ContinuationToken: token }),
        );
        for (const object of page.Contents ?? []) if (object.Key !== undefined) keys.push(object.Key);
        token = page.NextContinuationToken;
      } while (token !== undefined);
      return keys.sort();
    },
  };
}
