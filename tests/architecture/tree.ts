// The files of the project, as git would commit them.
import { execFileSync } from 'node:child_process';
import { readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { readSource, type SourceFile } from './source-file';

export const ROOT = path.resolve(import.meta.dirname, '../..');

/** Paths of all files that are tracked or about to be, from the root, with `/`. */
export function projectFiles(): string[] {
  const listed = execFileSync('git', ['ls-files', '-z', '--cached', '--others', '--exclude-standard'], {
    cwd: ROOT,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  return [...new Set(listed.split('\0'))]
    .filter((file) => file !== '' && statSync(path.join(ROOT, file), { throwIfNoEntry: false })?.isFile() === true)
    .sort();
}

const SOURCE = /^(shared|server|src|tests|e2e)\/.*\.(tsx?|mjs)$/;

export function projectSources(files: readonly string[]): SourceFile[] {
  return files
    .filter((file) => SOURCE.test(file))
    .map((file) => readSource(file, readFileSync(path.join(ROOT, file), 'utf8')));
}
