// The stage and the camera as they run inside the canvas, and the drawing of one picture.
import type { Scene, WebGLRenderer } from 'three';
import type { Rig } from './rig';
import type { Stage } from './stage';

export interface Running {
  readonly stage: Stage;
  readonly rig: Rig;
  /** Brings the stage in step with the stores and draws. */
  readonly refresh: () => void;
  /** Stands anew where nobody has moved the camera since: more has come in, or the window has another shape. */
  readonly standAnew: () => void;
}

/** Also sets what the materials need to know of the screen. */
export function drawStage({ stage, rig }: Pick<Running, 'stage' | 'rig'>, gl: WebGLRenderer, scene: Scene): void {
  const { light } = stage;
  gl.getDrawingBufferSize(light.screen.value);
  light.density.value = gl.getPixelRatio();
  setRecede(stage, rig);
  gl.render(scene, rig.camera());
}

/** What lies farther than the target recedes a little into the dye. */
export function setRecede({ light }: Stage, rig: Rig): void {
  const { target, span, isSquare } = rig.view();
  const eye = rig.frame().eye;
  const distance = Math.hypot(eye[0] - target[0], eye[1] - target[1], eye[2] - target[2]);
  if (isSquare) light.recede.value.set(1e6, 2e6);
  else light.recede.value.set(distance, distance + Math.max(span * 1.6, 900));
}
