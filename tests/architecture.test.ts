// Holds the directions of the architecture over the real tree. That each rule catches what it is for is proved in
// architecture/rules.test.ts.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { kebabCase, noForeignPlaces, topLevel } from './architecture/names';
import { RULES } from './architecture/rules';
import { projectFiles, projectSources, ROOT } from './architecture/tree';
import { fileLength } from './architecture/whole-rules';

/** Files above 400 lines, each with the reason why it is better in one piece. */
const LONG_FILES: Readonly<Record<string, string>> = {};

const files = projectFiles();
const sources = projectSources(files);

/** Pictures, meshes, fonts. */
const isText = (file: string): boolean => !/\.(png|jpe?g|webp|ico|stl|glb|woff2?|wasm|gz)$/.test(file);

test('the tree was read', () => {
  expect(sources.length).toBeGreaterThan(100);
  expect(sources.flatMap((file) => file.imports).length).toBeGreaterThan(300);
});

describe('sources', () => {
  for (const [sentence, rule] of Object.entries(RULES)) {
    test(sentence, () => {
      expect(rule(sources)).toEqual([]);
    });
  }

  test('no file is longer than 400 lines without a reason', () => {
    expect(fileLength(LONG_FILES)(sources)).toEqual([]);
  });
});

describe('files', () => {
  test('the top level is what the architecture names', () => {
    expect(topLevel(files)).toEqual([]);
  });

  test('names are in kebab-case', () => {
    expect(kebabCase(files)).toEqual([]);
  });

  test('no file names a registry or a folder of the machine it was made on', () => {
    const faults = files
      .filter(isText)
      .flatMap((file) => noForeignPlaces(file, readFileSync(path.join(ROOT, file), 'utf8')));
    expect(faults).toEqual([]);
  });
});
