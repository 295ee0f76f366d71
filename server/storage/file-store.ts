// Where meshes and pictures lie: by key, outside the database. One interface, two ways: a folder, or S3-compatible object
// storage.
import type { Config } from '../config';
import { createFolderStore } from './folder-store';
import type { FileStore } from './stored';

export type { FileStore, StoredFile } from './stored';

export async function createFileStore(config: Config): Promise<FileStore> {
  if (config.storage.kind === 'local') return createFolderStore(`${config.files}/store`);
  // loaded only where it is used: the client is large
  const { createS3Store } = await import('./s3-store');
  return createS3Store(config.storage);
}
