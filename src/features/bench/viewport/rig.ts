// The camera: one in perspective for a person who stands somewhere, one without for square-on looks, and the way between
// looks. Orbiting, panning and zooming by hand are OrbitControls'; a square-on look only pans and zooms.
import { Matrix4, MOUSE, OrthographicCamera, PerspectiveCamera, TOUCH, Vector3 } from 'three';
import { OrbitControls } from 'three/addons/controls/OrbitControls.js';
import type { Frame } from './frame';
import type { Triple } from './vectors';
import { eyeDistance, eyeOf, FIELD_OF_VIEW, mixViews, pannedView, pictureAxes, type FreeArea, type View } from './view';

const FLIGHT_MS = 480;
/** At the end of a flight to a square-on look, perspective is all but gone. */
const FLAT = 2;

export interface Rig {
  readonly camera: () => PerspectiveCamera | OrthographicCamera;
  readonly view: () => View;
  /** Goes to a look; at once, or in a short flight. */
  readonly go: (view: View, atOnce: boolean) => void;
  /** Turns, pans or zooms by keys. */
  readonly turn: (around: number, above: number) => void;
  readonly pan: (right: number, up: number) => void;
  readonly zoom: (factor: number) => void;
  readonly resize: (area: FreeArea) => void;
  /** Moves on; true while there is still something moving. */
  readonly step: (now: number) => boolean;
  readonly frame: () => Frame;
  /** While a handle is dragged, the camera stays. */
  readonly hold: (held: boolean) => void;
  /** Renders with the picture's middle in the middle, as for a picture to take along. */
  readonly withoutOffset: <T>(job: () => T) => T;
  readonly dispose: () => void;
}

export interface RigOptions {
  readonly element: HTMLElement;
  readonly calm: () => boolean;
  /** Something has moved: draw. */
  readonly onMove: () => void;
  /** A hand has moved the camera. A square-on look that is only shifted is still the same look. */
  readonly onTaken: (isSquare: boolean) => void;
}

interface Flight {
  readonly from: View;
  readonly to: View;
  readonly start: number | null;
}

const ease = (t: number): number => (t < 0.5 ? 4 * t * t * t : 1 - (-2 * t + 2) ** 3 / 2);

export function createRig({ element, calm, onMove, onTaken }: RigOptions, first: View, firstArea: FreeArea): Rig {
  const person = new PerspectiveCamera(FIELD_OF_VIEW, 1, 10, 20_000);
  const square = new OrthographicCamera(-1, 1, 1, -1, -20_000, 20_000);
  for (const camera of [person, square]) camera.up.set(0, 0, 1);
  let area = firstArea;
  let view = first;
  let flight: Flight | null = null;
  const active = (): PerspectiveCamera | OrthographicCamera => (view.isSquare && flight === null ? square : person);
  const controls = new OrbitControls<PerspectiveCamera | OrthographicCamera>(person, element);
  controls.enableDamping = !calm();
  controls.dampingFactor = 0.14;
  controls.zoomToCursor = true;
  controls.minDistance = 30;
  controls.maxDistance = 30_000;
  let isInHand = false;
  controls.addEventListener('change', () => {
    if (flight === null) view = readView();
    // a click that moves nothing leaves the standpoint as it is
    if (isInHand) onTaken(view.isSquare);
    onMove();
  });
  controls.addEventListener('end', () => {
    isInHand = false;
  });
  controls.addEventListener('start', () => {
    controls.enableDamping = !calm();
    if (flight !== null) land();
    isInHand = true;
  });

  /** The free area's middle lies beside the picture's. */
  function offset(camera: PerspectiveCamera | OrthographicCamera): void {
    const { width, height, left, right, top, bottom } = area;
    camera.setViewOffset(width, height, (right - left) / 2, (bottom - top) / 2, width, height);
  }

  function setPerson(next: Omit<View, 'isSquare'>, fieldOfView: number): void {
    const eye = eyeOf({ ...next, isSquare: false }, fieldOfView);
    const distance = eyeDistance(next.span, fieldOfView);
    person.fov = fieldOfView;
    person.aspect = area.width / area.height;
    person.near = Math.max(2, distance * 0.02);
    person.far = distance + 40_000;
    stand(person, eye, next);
  }

  function stand(
    camera: PerspectiveCamera | OrthographicCamera,
    eye: Triple,
    { target, around, above }: Pick<View, 'target' | 'around' | 'above'>,
  ): void {
    camera.position.set(...eye);
    const { right, up } = pictureAxes({ around, above });
    const back = new Vector3(...eye).sub(new Vector3(...target)).normalize();
    camera.quaternion.setFromRotationMatrix(new Matrix4().makeBasis(new Vector3(...right), new Vector3(...up), back));
    offset(camera);
    camera.updateProjectionMatrix();
    camera.updateMatrixWorld();
  }

  function setSquare(next: View): void {
    square.left = -area.width / 2;
    square.right = area.width / 2;
    square.top = area.height / 2;
    square.bottom = -area.height / 2;
    square.zoom = area.height / next.span;
    stand(square, eyeOf(next), next);
  }

  /** Puts both cameras and the controls where the view says. */
  function settle(): void {
    if (view.isSquare) setSquare(view);
    else setPerson(view, FIELD_OF_VIEW);
    controls.object = active();
    controls.target.set(...view.target);
    controls.enableRotate = !view.isSquare;
    controls.mouseButtons = {
      LEFT: view.isSquare ? MOUSE.PAN : MOUSE.ROTATE,
      MIDDLE: MOUSE.PAN,
      RIGHT: MOUSE.PAN,
    };
    controls.touches = { ONE: view.isSquare ? TOUCH.PAN : TOUCH.ROTATE, TWO: TOUCH.DOLLY_PAN };
    controls.enabled = true;
    controls.update();
  }

  function land(): void {
    if (flight !== null) view = flight.to;
    flight = null;
    settle();
    onMove();
  }

  function readView(): View {
    const camera = active();
    const target = controls.target.toArray();
    if (view.isSquare) return { ...view, target, span: area.height / square.zoom };
    const back = camera.position.clone().sub(controls.target);
    const degrees = 180 / Math.PI;
    return {
      target,
      around: Math.hypot(back.x, back.y) < 1e-6 * back.length() ? view.around : Math.atan2(back.y, back.x) * degrees,
      above: Math.asin(Math.max(-1, Math.min(1, back.z / back.length()))) * degrees,
      span: back.length() * 2 * Math.tan(FIELD_OF_VIEW / 2 / degrees),
      isSquare: false,
    };
  }

  function take(next: View): void {
    if (flight !== null) land();
    view = next;
    settle();
    onMove();
  }

  settle();
  return {
    camera: active,
    view: () => flight?.to ?? view,
    go: (to, atOnce) => {
      if (atOnce || calm()) {
        flight = null;
        take(to);
        return;
      }
      flight = { from: view, to, start: null };
      controls.enabled = false;
      onMove();
    },
    turn: (around, above) => {
      if (view.isSquare) return;
      take({ ...view, around: view.around + around, above: Math.max(-85, Math.min(89, view.above + above)) });
    },
    pan: (right, up) => {
      take(pannedView(view, right, up, area.height));
    },
    zoom: (factor) => take({ ...view, span: Math.max(20, Math.min(30_000, view.span * factor)) }),
    resize: (next) => {
      area = next;
      if (flight === null) settle();
      onMove();
    },
    step: (now) => {
      if (flight === null) return controls.enabled && controls.update();
      const start = flight.start ?? now;
      flight = { ...flight, start };
      const t = Math.min(1, (now - start) / FLIGHT_MS);
      if (t >= 1) {
        land();
        return true;
      }
      const e = ease(t);
      const from = flight.from.isSquare ? FLAT : FIELD_OF_VIEW;
      const to = flight.to.isSquare ? FLAT : FIELD_OF_VIEW;
      setPerson(
        mixViews(flight.from, flight.to, e),
        from + (to - from) * (flight.to.isSquare ? e ** 3 : 1 - (1 - e) ** 3),
      );
      return true;
    },
    frame: () => {
      const camera = active();
      const matrix = new Matrix4().multiplyMatrices(camera.projectionMatrix, camera.matrixWorldInverse);
      return {
        width: area.width,
        height: area.height,
        matrix: matrix.toArray(),
        isSquare: camera === square,
        millimetresPerPixel: camera === square ? 1 / square.zoom : null,
        eye: camera.position.toArray(),
      };
    },
    hold: (held) => {
      controls.enabled = !held;
    },
    withoutOffset: (job) => {
      const camera = active();
      camera.clearViewOffset();
      camera.updateProjectionMatrix();
      try {
        return job();
      } finally {
        offset(camera);
        camera.updateProjectionMatrix();
      }
    },
    dispose: () => controls.dispose(),
  };
}
