// A laser's plane where it stands in the zone: a faint curtain with one thin line around it.
import {
  BufferGeometry,
  DoubleSide,
  Float32BufferAttribute,
  Group,
  Mesh,
  MeshBasicMaterial,
  type ShaderMaterial,
} from 'three';
import type { Laser } from '#shared/scene';
import { tokenColour } from './colours';
import type { SharedLight } from './light';
import { ORDER } from './part-objects';
import { createScribeMaterial, scribeGeometry } from './scribe-material';
import { add, cornersOf, cross, dot, scale, sizeOf, sub, unit, type Box, type Triple } from './vectors';

const EDGES: readonly (readonly [number, number])[] = [
  [0, 1],
  [2, 3],
  [4, 5],
  [6, 7],
  [0, 2],
  [1, 3],
  [4, 6],
  [5, 7],
  [0, 4],
  [1, 5],
  [2, 6],
  [3, 7],
];

/** Corners of the plane's cut through a box, in order around it; empty where it misses. */
export function planeInBox(point: Triple, normal: Triple, box: Box): Triple[] {
  const n = unit(normal);
  const corners = cornersOf(box);
  const height = corners.map((p) => dot(n, sub(p, point)));
  const cuts = EDGES.flatMap(([a, b]): Triple[] => {
    const [from, to] = [height[a]!, height[b]!];
    if (from > 0 === to > 0) return [];
    return [add(corners[a]!, scale(sub(corners[b]!, corners[a]!), from / (from - to)))];
  });
  if (cuts.length < 3) return [];
  const middle = scale(cuts.reduce(add), 1 / cuts.length);
  const u = unit(sub(cuts[0]!, middle));
  const v = cross(n, u);
  const turn = (p: Triple): number => Math.atan2(dot(sub(p, middle), v), dot(sub(p, middle), u));
  return cuts.sort((p, q) => turn(p) - turn(q));
}

export interface Curtains {
  readonly root: Group;
  readonly hang: (lasers: readonly Laser[], box: Box) => void;
  readonly dispose: () => void;
}

export function createCurtains(light: SharedLight): Curtains {
  const root = new Group();
  const veil = new MeshBasicMaterial({
    color: tokenColour('laser'),
    transparent: true,
    opacity: 0.035,
    depthWrite: false,
    side: DoubleSide,
  });
  const line: ShaderMaterial = createScribeMaterial(light, { colour: 'laser', width: 1.1, opacity: 0.5 });
  const clear = (): void => {
    for (const child of [...root.children]) {
      (child as Mesh).geometry.dispose();
      child.removeFromParent();
    }
  };
  return {
    root,
    hang: (lasers, box) => {
      clear();
      for (const { point, normal } of lasers) {
        const ring = planeInBox(point, normal, box);
        if (ring.length < 3) continue;
        const fill = new BufferGeometry();
        fill.setAttribute('position', new Float32BufferAttribute(ring.flat(), 3));
        fill.setIndex(ring.slice(2).flatMap((_, i) => [0, i + 1, i + 2]));
        const curtain = new Mesh(fill, veil);
        curtain.renderOrder = ORDER.curtain;
        const ends = ring.flatMap((p, i) => [...p, ...ring[(i + 1) % ring.length]!]);
        const around = new Mesh(
          scribeGeometry({
            ends: Float32Array.from(ends),
            normals: new Float32Array(ends.length),
            extents: new Float32Array(ring.length).fill(Math.max(...sizeOf(box))),
          }),
          line,
        );
        around.frustumCulled = false;
        around.renderOrder = ORDER.curtain;
        root.add(curtain, around);
      }
    },
    dispose: () => {
      clear();
      veil.dispose();
      line.dispose();
    },
  };
}
