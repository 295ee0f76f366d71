// All parts of a scene as objects of three.js, kept in step with the document. Plain three, so that the bench, its pictures
// and the shelf draw with the same hand.
import { GreaterDepth, Group, type ShaderMaterial } from 'three';
import type { Component, Scene } from '#shared/scene';
import type { Positions } from './bodies';
import type { SharedLight } from './light';
import type { MeshSource } from './mesh-source';
import { buildPart, disposePart, dressPart, placePart, type PartObjects, type PartStanding } from './part-objects';
import { createScribeMaterial } from './scribe-material';

export interface PartsLayer {
  readonly root: Group;
  /** Builds what is new, drops what is gone, keeps the rest. */
  readonly sync: (scene: Scene, meshes: MeshSource) => void;
  /** Puts every part where it stands. */
  readonly place: (scene: Scene, positions: Positions) => void;
  readonly dress: (standingOf: (component: Component) => PartStanding, scene: Scene, isCut: boolean) => void;
  readonly dispose: () => void;
}

const usesMesh = (component: Component): boolean => component.solids.some((s) => s.shape.kind === 'mesh');

function isStale(part: PartObjects, component: Component, meshVersion: number): boolean {
  const { solids, motions, meshVersion: builtAt } = part.builtFrom;
  if (solids !== component.solids || motions !== component.motions) return true;
  return builtAt !== meshVersion && usesMesh(component);
}

export function createPartsLayer(light: SharedLight): PartsLayer {
  const root = new Group();
  const parts = new Map<string, PartObjects>();
  const through: ShaderMaterial = createScribeMaterial(light, { colour: 'chalk', width: 1, opacity: 0.2 });
  through.depthFunc = GreaterDepth;
  const drop = (id: string): void => {
    const part = parts.get(id);
    if (part !== undefined) disposePart(part);
    parts.delete(id);
  };
  return {
    root,
    sync: (scene, meshes) => {
      const ids = new Set(scene.components.map((c) => c.id));
      for (const id of [...parts.keys()]) if (!ids.has(id)) drop(id);
      for (const component of scene.components) {
        const old = parts.get(component.id);
        if (old !== undefined && !isStale(old, component, meshes.version())) continue;
        drop(component.id);
        const part = buildPart(component, meshes, light, through);
        parts.set(component.id, part);
        root.add(part.group);
      }
    },
    place: (scene, positions) => {
      for (const component of scene.components) {
        const part = parts.get(component.id);
        if (part !== undefined) placePart(part, scene, component, positions);
      }
    },
    dress: (standingOf, scene, isCut) => {
      for (const component of scene.components) {
        const part = parts.get(component.id);
        if (part !== undefined) dressPart(part, standingOf(component), isCut);
      }
    },
    dispose: () => {
      for (const id of [...parts.keys()]) drop(id);
      through.dispose();
    },
  };
}
