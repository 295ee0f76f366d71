// Small pictures of the ready-made parts, drawn once by the hand that draws the bench: same finishes, same scribe lines.
import { OrthographicCamera, Scene as ThreeScene, Vector3, WebGLRenderer } from 'three';
import { newPart, type PartRecipe } from '#shared/parts';
import type { Component, Scene } from '#shared/scene';
import { componentBox } from '../viewport/extent';
import { createLight } from '../viewport/light';
import { lookOf } from '../viewport/look';
import type { MeshSource } from '../viewport/mesh-source';
import { createPartsLayer } from '../viewport/parts-layer';
import { centreOf, cornersOf, dot, sub, type Box } from '../viewport/vectors';
import { eyeDirection, pictureAxes } from '../viewport/view';
import { hasWebGl2 } from '../viewport/webgl';

const SIZE = 256;
/** From one side and above: as one looks at a part on a bench. */
const AHEAD = { around: 215, above: 26 };
const BEHIND = { around: 35, above: 22 };
const ROOM = 1.16;

const NO_MESHES: MeshSource = {
  get: () => undefined,
  want: () => undefined,
  retry: () => undefined,
  version: () => 0,
  subscribe: () => () => undefined,
};

function sceneOf(component: Component): Scene {
  return {
    format: 'gapwright-scene',
    version: 1,
    name: component.name,
    display: 'mm',
    lasers: [],
    groups: [],
    components: [component],
    rules: { gap: 0, movingGap: 0, touch: 0.01, pairs: [] },
    accuracy: 0.05,
  };
}

function cameraFor(box: Box, { seenFrom }: PartRecipe): OrthographicCamera {
  const from = seenFrom === 'behind' ? BEHIND : AHEAD;
  const { right, up } = pictureAxes(from);
  const eye = eyeDirection(from);
  const middle = centreOf(box);
  const corners = cornersOf(box).map((p) => sub(p, middle));
  const reach = Math.max(...corners.flatMap((p) => [Math.abs(dot(p, right)), Math.abs(dot(p, up))])) * ROOM;
  const camera = new OrthographicCamera(-reach, reach, reach, -reach, 1, 20_000);
  camera.up.set(0, 0, 1);
  camera.position.set(...middle).addScaledVector(new Vector3(...eye), 10_000);
  camera.lookAt(new Vector3(...middle));
  camera.updateMatrixWorld();
  return camera;
}

/** By the recipe's kind, as addresses for an image; none where the browser cannot draw them. */
export function drawRecipes(recipes: readonly PartRecipe[]): ReadonlyMap<string, string> {
  const pictures = new Map<string, string>();
  if (!hasWebGl2()) return pictures;
  const gl = new WebGLRenderer({ antialias: true, alpha: true, preserveDrawingBuffer: true });
  gl.setSize(SIZE, SIZE, false);
  gl.setClearAlpha(0);
  const light = createLight();
  light.screen.value.set(SIZE, SIZE);
  light.density.value = SIZE / 128;
  for (const recipe of recipes) {
    const made = newPart(recipe.kind, {}, { id: 'part', source: 'sheet' });
    if (!made.ok) continue;
    const scene = sceneOf(made.component);
    const box = componentBox(scene, made.component, NO_MESHES);
    if (box === null) continue;
    const layer = createPartsLayer(light);
    layer.sync(scene, NO_MESHES);
    layer.place(scene, {});
    layer.dress(
      (c) => ({ look: lookOf(c, false), isOff: false, isSelected: false, isHovered: false, isBehind: false }),
      scene,
      false,
    );
    const stage = new ThreeScene();
    stage.add(layer.root);
    gl.render(stage, cameraFor(box, recipe));
    pictures.set(recipe.kind, gl.domElement.toDataURL('image/png'));
    layer.dispose();
  }
  gl.dispose();
  gl.forceContextLoss();
  return pictures;
}
