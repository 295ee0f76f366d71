// The files of the project, without what is installed, built or local.
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { readSource, type SourceFile } from './source-file';

export const ROOT = path.resolve(import.meta.dirname, '../..');

/** What the project's own .gitignore leaves out; a machine need not have git to run the tests. */
const LEFT_OUT =
  /^(\.git|node_modules|dist|coverage|\.local|test-results|playwright-report)$|\.(log|tsbuildinfo)$|^\.env$/;

/** Paths of all files of the project, from the root, with `/`. */
export function projectFiles(): string[] {
  const files: string[] = [];
  const walk = (folder: string): void => {
    for (const entry of readdirSync(path.join(ROOT, folder), { withFileTypes: true })) {
      if (LEFT_OUT.test(entry.name)) continue;
      const file = folder === '' ? entry.name : `${folder}/${entry.name}`;
      if (entry.isDirectory()) walk(file);
      else if (entry.isFile()) files.push(file);
    }
  };
  walk('');
  return files.sort();
}

const SOURCE = /^(shared|server|src|tests|e2e)\/.*\.(tsx?|mjs)$/;

export function projectSources(files: readonly string[]): SourceFile[] {
  return files
    .filter((file) => SOURCE.test(file))
    .map((file) => readSource(file, readFileSync(path.join(ROOT, file), 'utf8')));
}
