// A scene for the live check: parts at rest, two that swing, one that is drawn out, a joint and a mesh.
import { createHash } from 'node:crypto';
import { loadedMesh, type LoadedMesh } from '#shared/check';
import { meshFromStl } from '#shared/geometry';
import { loadScene, type Scene } from '#shared/scene';

/** A closed pyramid as an STL file, binary. */
function pyramid(): Uint8Array {
  const [a, b, c, d] = [
    [0, 0, 0],
    [40, 0, 0],
    [0, 40, 0],
    [0, 0, 40],
  ] as const;
  const faces = [
    [a, c, b],
    [a, b, d],
    [b, c, d],
    [c, a, d],
  ];
  const bytes = new Uint8Array(84 + 50 * faces.length);
  const view = new DataView(bytes.buffer);
  view.setUint32(80, faces.length, true);
  for (const [i, corners] of faces.entries()) {
    for (const [j, xyz] of corners.entries()) {
      for (const [k, x] of xyz.entries()) view.setFloat32(84 + 50 * i + 12 + 12 * j + 4 * k, x, true);
    }
  }
  return bytes;
}

const bytes = pyramid();
export const MESH = createHash('sha256').update(bytes).digest('hex');

/** Read afresh, as a restarted worker would. */
export function pyramidMesh(): LoadedMesh {
  const result = meshFromStl(bytes);
  if (!result.ok) throw new Error(result.reason);
  return loadedMesh(result.mesh, MESH);
}

const swing = (id: string, to: number) => ({
  id,
  name: id,
  use: 'operating',
  steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], to }],
});

export function benchScene(): Scene {
  const plain = (id: string, at: number[], size: number[], more: object = {}) => ({
    id,
    name: id,
    category: 'other',
    pose: { at },
    solids: [{ id: 'body', shape: { kind: 'box', size } }],
    ...more,
  });
  const arm = { id: 'arm', shape: { kind: 'box', size: [10, 10, 120] }, pose: { at: [0, 0, -60] } };
  const loaded = loadScene({
    format: 'gapwright-scene',
    version: 1,
    name: 'Bench',
    groups: [{ id: 'box', name: 'Box', pose: { at: [0, 0, 200] } }],
    components: [
      plain('wall', [80, 0, 100], [4, 300, 300], { tolerance: 1 }),
      plain('floor', [0, 0, 0], [400, 400, 4]),
      plain('post', [30, 60, 120], [10, 10, 200], {
        motions: [{ id: 'out', name: 'out', use: 'service', steps: [{ kind: 'slide', along: [0, 0, 1], to: 150 }] }],
      }),
      { id: 'left', name: 'left', category: 'pedal', group: 'box', solids: [arm], motions: [swing('stroke', 25)] },
      {
        id: 'right',
        name: 'right',
        category: 'pedal',
        group: 'box',
        pose: { at: [0, 25, 0] },
        solids: [arm],
        motions: [swing('stroke', 30)],
      },
      plain('hanger', [0, 12, 205], [20, 60, 20], { group: undefined }),
      {
        id: 'rock',
        name: 'rock',
        category: 'other',
        pose: { at: [-60, -60, 20] },
        solids: [{ id: 'body', shape: { kind: 'mesh', mesh: MESH, scale: 1 } }],
      },
    ],
    rules: { pairs: [{ between: [{ component: 'left' }, { component: 'hanger' }], joint: { allow: 20 } }] },
  });
  if (!loaded.ok) throw new Error(JSON.stringify(loaded.refusals));
  return loaded.scene;
}
