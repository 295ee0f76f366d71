// S3-compatible object storage of the tests' own, in a folder.
import { mkdtemp, rm } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import S3rver from 's3rver';

export interface ObjectStorage {
  /** The server's settings for it. */
  readonly env: Readonly<Record<string, string>>;
  readonly close: () => Promise<void>;
}

export async function startObjectStorage(): Promise<ObjectStorage> {
  const directory = await mkdtemp(path.join(os.tmpdir(), 'gapwright-s3-'));
  const configureBuckets = [{ name: 'meshes-and-pictures', configs: [] }];
  const server = new S3rver({ port: 0, address: '127.0.0.1', silent: true, directory, configureBuckets });
  const { port } = await server.run();
  return {
    env: {
      GAPWRIGHT_STORAGE: 's3',
      S3_ENDPOINT: `http://127.0.0.1:${port}`,
      S3_BUCKET: configureBuckets[0]!.name,
      S3_ACCESS_KEY: 'S3RVER',
      S3_SECRET_KEY: 'S3RVER',
    },
    async close() {
      await server.close();
      await rm(directory, { recursive: true, force: true });
    },
  };
}
