// What buttons and keys can ask of the camera, and the taking of pictures.
import type { Scene as ThreeScene, WebGLRenderer } from 'three';
import { findingKey, type Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import type { Bench } from '../bench-model';
import { viewFrom, zoneOf } from '../standpoints/standpoints';
import { scaleBar } from '../overlay/scale-bar';
import { witnessMarks } from '../overlay/witness';
import { chooseWitnesses } from '../overlay/witness-choice';
import { motionKey } from './bodies';
import { blobOf, drawPicture, type Picture } from './capture';
import { sceneBox } from './extent';
import type { Rig } from './rig';
import { setRecede } from './running';
import type { Stage, StageState } from './stage';
import { cross, dot, length, scale, sizeOf, sub, unit, type Triple } from './vectors';
import { eyeDirection, fitView, pannedView, type FreeArea, type View } from './view';
import type { CameraHand } from './view-control';

export interface HandParts {
  readonly rig: Rig;
  readonly stage: Stage;
  readonly gl: WebGLRenderer;
  readonly scene: ThreeScene;
  readonly bench: Bench;
  readonly read: (display: LengthDisplay) => StageState;
  readonly area: () => FreeArea;
  readonly facts: () => { readonly display: LengthDisplay };
  readonly refresh: () => void;
}

const degrees = (radians: number): number => (radians * 180) / Math.PI;

/** The look at a finding: across the gap, so that it shows in its true length, and as near to the present side as can be. */
export function lookAtFinding(finding: Finding, from: View, reach: number): View {
  const [p, q] = finding.at.points;
  const gap = sub(q, p);
  const middle: Triple = [(p[0] + q[0]) / 2, (p[1] + q[1]) / 2, (p[2] + q[2]) / 2];
  let eye = eyeDirection(from.isSquare ? { around: from.around, above: Math.max(18, Math.min(60, from.above)) } : from);
  if (length(gap) > 0.5) {
    const along = unit(gap);
    const across = sub(eye, scale(along, dot(eye, along)));
    eye = length(across) > 0.2 ? unit(across) : unit(cross(along, Math.abs(along[2]) > 0.9 ? [1, 0, 0] : [0, 0, 1]));
  }
  // from below the floor nobody looks, and straight down nothing stands out
  const above = Math.max(4, Math.min(62, degrees(Math.asin(eye[2]))));
  return {
    target: middle,
    around: degrees(Math.atan2(eye[1], eye[0])),
    above,
    span: Math.max(length(gap) * 5, Math.min(reach, 620), 170),
    isSquare: false,
  };
}

export function cameraHand(parts: HandParts): CameraHand {
  const { rig, bench, area } = parts;
  const { session, open, meshes } = bench;
  const taken = (): void => session.getState().set({ standpoint: null });
  return {
    standAt: (id) => {
      session.getState().set({ standpoint: id });
      rig.go(viewFrom(id, zoneOf(open.getState().scene, meshes), area()), false);
    },
    fit: (box) => {
      if (!rig.view().isSquare) taken();
      rig.go(fitView(rig.view(), box, area(), 1.15), false);
    },
    lookAt: (finding) => {
      taken();
      rig.go(viewOf(parts, finding), false);
    },
    turn: (around, above) => {
      if (!rig.view().isSquare) taken();
      rig.turn(around, above);
    },
    pan: rig.pan,
    glide: (right, up) => rig.go(pannedView(rig.view(), right, up, area().height), false),
    zoom: rig.zoom,
    hold: rig.hold,
    view: rig.view,
    captureView: () => captureView(parts),
    captureFinding: (finding, size) => captureFinding(parts, finding, size),
  };
}

function viewOf({ rig, bench }: HandParts, finding: Finding): View {
  const scene = bench.open.getState().scene;
  const sizes = finding.between.map((id) => {
    const box = sceneBox(scene, bench.meshes, new Set([id]));
    return box === null ? 300 : Math.max(...sizeOf(box));
  });
  return lookAtFinding(finding, rig.view(), Math.min(...sizes) * 2.1);
}

interface Sheet {
  readonly state: StageState;
  readonly finding: string | null;
  readonly width: number;
  readonly height: number;
  readonly scale: number;
}

function draw({ rig, stage, gl, scene, facts, refresh }: HandParts, sheet: Sheet): HTMLCanvasElement {
  const { width, height, scale: k, state, finding } = sheet;
  try {
    return rig.withoutOffset(() => {
      // a picture shows the parts, not what somebody had selected
      stage.update({ ...state, selected: new Set(), hovered: null });
      setRecede(stage, rig);
      const frame = rig.frame();
      const room = { left: 8, top: 8, right: width - 8, bottom: height - 8 };
      const witnesses = chooseWitnesses({
        findings: state.findings,
        open: finding,
        hovered: null,
        selected: new Set(),
        isOff: (id) => state.presence[id] === 'off',
      });
      const marks = [
        ...witnessMarks(frame, witnesses, facts().display, room),
        ...(frame.millimetresPerPixel === null
          ? []
          : scaleBar(frame.millimetresPerPixel, facts().display, 24, height - 20)),
      ];
      return drawPicture({ gl, scene, camera: rig.camera(), light: stage.light, width, height, scale: k, marks });
    });
  } finally {
    refresh();
  }
}

async function captureView(parts: HandParts): Promise<Picture> {
  const { rig, bench, area, read, facts } = parts;
  const { width, height } = area();
  const { standpoint, finding } = bench.session.getState();
  const { millimetresPerPixel } = rig.frame();
  const sheet = draw(parts, { state: read(facts().display), finding, width, height, scale: 2 });
  return {
    blob: await blobOf(sheet),
    width: sheet.width,
    height: sheet.height,
    standpoint,
    millimetresPerPixel: millimetresPerPixel === null ? null : (millimetresPerPixel * width) / sheet.width,
  };
}

/** The camera goes there and comes back within one tick, so that nobody sees it. */
async function captureFinding(
  parts: HandParts,
  finding: Finding,
  { width, height }: { readonly width: number; readonly height: number },
): Promise<Picture> {
  const { rig, area, read, facts } = parts;
  const before = rig.view();
  const positions = Object.fromEntries(
    finding.motions.map((m, i) => [motionKey(m.component, m.motion), finding.at.positions[i] ?? 0]),
  );
  const view = viewOf(parts, finding);
  let sheet: HTMLCanvasElement;
  try {
    rig.resize({ width, height, left: 0, right: 0, top: 0, bottom: 0 });
    rig.go(view, true);
    const state: StageState = {
      ...read(facts().display),
      positions,
      presence: {},
      focus: new Set(finding.between),
      cut: null,
      arc: null,
      findings: [finding],
    };
    sheet = draw(parts, { state, finding: findingKey(finding), width, height, scale: 2 });
  } finally {
    rig.resize(area());
    rig.go(before, true);
  }
  return {
    blob: await blobOf(sheet),
    width: sheet.width,
    height: sheet.height,
    standpoint: null,
    millimetresPerPixel: null,
  };
}
