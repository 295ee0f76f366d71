// The swept arc of a motion: ghost outlines of what it moves, at even steps of its stroke, in the colour of a finding where
// they hit or are tight.
import { Group, Mesh, type InstancedBufferGeometry, type ShaderMaterial } from 'three';
import type { Span } from '#shared/check';
import { worldPose, type Component, type Motion, type Scene } from '#shared/scene';
import { composeRigid, rigidFromPose } from '#shared/units';
import { displacementOf } from './bodies';
import type { Scribe } from './drawn';
import type { SharedLight } from './light';
import type { MeshSource } from './mesh-source';
import { ORDER } from './part-objects';
import { toMatrix } from './rigid-matrix';
import { createScribeMaterial, scribeGeometry } from './scribe-material';
import { drawnSolid, mergeDrawn } from './shapes';

/** Outlines drawn over a whole stroke. */
const OUTLINES = 12;
/** Share of its largest thing's size from which a thing's lines belong to the outline. */
const LARGE = 0.4;

export interface FanSpans {
  readonly hits: readonly Span[];
  readonly tight: readonly Span[];
}

export interface Fan {
  readonly root: Group;
  readonly spread: (scene: Scene, component: Component, motion: Motion, meshes: MeshSource, spans: FanSpans) => void;
  readonly fold: () => void;
  readonly dispose: () => void;
}

type Tone = 'plain' | 'tight' | 'hits';

const isIn = (spans: readonly Span[], p: number): boolean =>
  spans.some(([from, to]) => p >= from - 0.5 / OUTLINES && p <= to + 0.5 / OUTLINES);

/** The lines of what is large in a part: twelve outlines of every small thing would be a thicket. */
function largeLines({ ends, normals, extents }: Scribe): Scribe {
  const least = Math.max(...extents) * LARGE;
  const kept = [...extents.keys()].filter((i) => extents[i]! >= least);
  const pick = (from: Float32Array): Float32Array =>
    Float32Array.from(kept.flatMap((i) => [...from.subarray(6 * i, 6 * i + 6)]));
  return { ends: pick(ends), normals: pick(normals), extents: Float32Array.from(kept, (i) => extents[i]!) };
}

export function createFan(light: SharedLight): Fan {
  const root = new Group();
  const materials: Readonly<Record<Tone, ShaderMaterial>> = {
    plain: createScribeMaterial(light, { colour: 'scribe', width: 0.9, opacity: 0.26 }),
    tight: createScribeMaterial(light, { colour: 'tight', width: 1.1, opacity: 0.5 }),
    hits: createScribeMaterial(light, { colour: 'hits', width: 1.3, opacity: 0.75 }),
  };
  let geometry: InstancedBufferGeometry | null = null;
  const fold = (): void => {
    root.clear();
    geometry?.dispose();
    geometry = null;
  };
  return {
    root,
    spread: (scene, component, motion, meshes, spans) => {
      fold();
      const parts = component.solids.flatMap((solid) => {
        if (motion.solids !== undefined && !motion.solids.includes(solid.id)) return [];
        const drawn = drawnSolid(solid, meshes);
        return drawn === null ? [] : [{ drawn, pose: rigidFromPose(solid.pose?.at, solid.pose?.turn) }];
      });
      if (parts.length === 0) return;
      geometry = scribeGeometry(largeLines(mergeDrawn(parts).scribe));
      const frame = worldPose(scene, component);
      for (let i = 0; i <= OUTLINES; i += 1) {
        const p = i / OUTLINES;
        const tone: Tone = isIn(spans.hits, p) ? 'hits' : isIn(spans.tight, p) ? 'tight' : 'plain';
        const outline = new Mesh(geometry, materials[tone]);
        outline.matrixAutoUpdate = false;
        toMatrix(composeRigid(frame, displacementOf(motion, p)), outline.matrix);
        outline.matrixWorldNeedsUpdate = true;
        outline.frustumCulled = false;
        outline.renderOrder = ORDER.fan;
        root.add(outline);
      }
    },
    fold,
    dispose: () => {
      fold();
      for (const material of Object.values(materials)) material.dispose();
    },
  };
}
