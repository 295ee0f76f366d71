// The part of a scene that can be checked now: parts whose mesh is missing or that go beyond a limit are left out, so that
// one bad file does not hide all other gaps.
import { prepareScene, type LoadedMesh, type Prepared } from '#shared/check';
import type { Component, Scene } from '#shared/scene';

export interface Usable {
  readonly prepared: Prepared;
  /** A sentence for each part that goes beyond a limit. */
  readonly problems: readonly string[];
}

const meshesOf = (c: Component): string[] => c.solids.flatMap((s) => (s.shape.kind === 'mesh' ? [s.shape.mesh] : []));

const EMPTY: ReadonlyMap<string, LoadedMesh> = new Map();

export function usableScene(scene: Scene, meshes: ReadonlyMap<string, LoadedMesh>): Usable {
  let components = scene.components.filter((c) => meshesOf(c).every((mesh) => meshes.has(mesh)));
  const problems: string[] = [];
  for (;;) {
    const whole = components.length === scene.components.length;
    const result = prepareScene(whole ? scene : { ...scene, components }, meshes);
    if (result.ok) return { prepared: result.prepared, problems };
    const at = Number(/^components\[(\d+)\]/.exec(result.refusal.path)?.[1]);
    const bad = components[at];
    if (bad === undefined) return { prepared: nothing(scene), problems: [...problems, result.refusal.reason] };
    problems.push(`${bad.name} is not checked: ${result.refusal.reason}.`);
    components = components.filter((c) => c !== bad);
  }
}

function nothing(scene: Scene): Prepared {
  const result = prepareScene({ ...scene, components: [] }, EMPTY);
  if (!result.ok) throw new Error(result.refusal.reason);
  return result.prepared;
}

/** Names of the parts that wait for a mesh. */
export function partsWith(scene: Scene, mesh: string): string[] {
  return scene.components.filter((c) => meshesOf(c).includes(mesh)).map((c) => c.name);
}
