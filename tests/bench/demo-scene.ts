// The demo's scenes, read as the command line reads them.
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { loadedMesh, meshNames, prepareScene, type LoadedMesh, type Prepared } from '#shared/check';
import { meshFromStl } from '#shared/geometry';
import { loadSceneText } from '#shared/scene';

const DEMO = path.resolve(import.meta.dirname, '../../assets/demo');

const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

export function demoScenes(): string[] {
  const facts = JSON.parse(readFileSync(path.join(DEMO, 'demo.json'), 'utf8')) as {
    readonly scenes: readonly string[];
  };
  const there = new Set(readdirSync(DEMO));
  return facts.scenes.filter((file) => there.has(file));
}

export interface ReadyScene {
  readonly name: string;
  readonly prepared: Prepared;
  readonly sha256: string;
}

/** Reads and prepares one scene; trees are built here, outside of what is timed. */
export function readyScene(file: string): ReadyScene {
  const bytes = readFileSync(path.join(DEMO, file));
  const loaded = loadSceneText(bytes);
  if (!loaded.ok) throw new Error(`${file}: ${loaded.refusals[0].path}: ${loaded.refusals[0].reason}`);
  const meshes = new Map<string, LoadedMesh>();
  for (const name of meshNames(loaded.scene)) {
    const stl = readFileSync(path.join(DEMO, name));
    const mesh = meshFromStl(stl);
    if (!mesh.ok) throw new Error(`${name}: ${mesh.reason}`);
    meshes.set(name, loadedMesh(mesh.mesh, sha256(stl)));
  }
  const result = prepareScene(loaded.scene, meshes);
  if (!result.ok) throw new Error(`${file}: ${result.refusal.path}: ${result.refusal.reason}`);
  return { name: loaded.scene.name, prepared: result.prepared, sha256: sha256(bytes) };
}
