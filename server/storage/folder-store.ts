// Files in a folder. Written beside and renamed, so that a key never shows half a file.
import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { copyFile, mkdir, open, readdir, readFile, rename, rm, stat, unlink, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { assertKey, type FileStore } from './stored';

const isMissing = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === 'ENOENT';

export function createFolderStore(root: string): FileStore {
  const fileOf = (key: string): string => {
    assertKey(key);
    return path.join(root, key);
  };
  const beside = async (target: string): Promise<string> => {
    await mkdir(path.dirname(target), { recursive: true });
    return `${target}.${randomUUID()}.part`;
  };
  return {
    async takeFile(key, file) {
      const target = fileOf(key);
      const part = await beside(target);
      try {
        await rename(file, part);
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code !== 'EXDEV') throw error;
        // the folder lies on another disk
        try {
          await copyFile(file, part);
        } catch (fault) {
          await rm(part, { force: true });
          throw fault;
        }
        await unlink(file);
      }
      await rename(part, target);
    },
    async putBytes(key, bytes) {
      const target = fileOf(key);
      const part = await beside(target);
      try {
        await writeFile(part, bytes, { flag: 'wx' });
        await rename(part, target);
      } catch (error) {
        await rm(part, { force: true });
        throw error;
      }
    },
    async open(key) {
      try {
        const handle = await open(fileOf(key), 'r');
        const { size } = await handle.stat();
        return { stream: createReadStream('', { fd: handle, autoClose: true }), bytes: size };
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async readBytes(key) {
      try {
        return await readFile(fileOf(key));
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async has(key) {
      try {
        return (await stat(fileOf(key))).isFile();
      } catch (error) {
        if (isMissing(error)) return false;
        throw error;
      }
    },
    async remove(key) {
      await rm(fileOf(key), { force: true });
    },
    async keys(prefix) {
      try {
        const entries = await readdir(path.join(root, prefix), { recursive: true, withFileTypes: true });
        return entries
          .filter((e) => e.isFile() && !e.name.endsWith('.part'))
          .map((e) => path.relative(root, path.join(e.parentPath, e.name)).split(path.sep).join('/'))
          .sort();
      } catch (error) {
        if (isMissing(error)) return [];
        throw error;
      }
    },
  };
}
