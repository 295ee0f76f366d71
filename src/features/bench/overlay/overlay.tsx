// What lies over the picture and moves with the camera: witness marks, the selected part's laser ticks, names, scale bar.
import { useSyncExternalStore } from 'react';
import { useBench, useFacts, useLive, useOpen, useSession, useShown } from '../bench-model';
import { componentBox, sceneBox } from '../viewport/extent';
import { project } from '../viewport/frame';
import { useInsets } from '../viewport/insets';
import { useMeshVersion } from '../viewport/use-mesh-version';
import { useSelection } from '../use-selection';
import { zeroPoint } from '../edits';
import { datumFor } from '../tape/datums';
import { useMoved } from '../tape/use-moved';
import type { Mark } from './mark';
import { MarksSvg } from './marks-svg';
import { measureLine } from './measure-line';
import { partLabel } from './part-label';
import { scaleBar } from './scale-bar';
import { laserTicks } from './ticks';
import { witnessMarks } from './witness';
import { chooseWitnesses } from './witness-choice';

/** Around the handles no label is put, px. */
const HANDLES = 56;

export function Overlay() {
  const { frames, meshes } = useBench();
  const { display } = useFacts();
  const frame = useSyncExternalStore(frames.subscribe, frames.get);
  const scene = useShown();
  const findings = useLive((live) => live.findings);
  const open = useSession((s) => s.finding);
  const hoveredFinding = useSession((s) => s.hoveredFinding);
  const hovered = useSession((s) => s.hovered);
  const presence = useSession((s) => s.presence);
  const measuredAxis = useSession((s) => s.measuredAxis);
  const datums = useSession((s) => s.datums);
  const isDragging = useOpen((o) => o.preview !== null);
  const selection = useSelection();
  const moved = useMoved();
  const insets = useInsets();
  useMeshVersion();
  if (frame === null) return null;
  const room = {
    left: insets.left + 4,
    top: insets.top,
    right: frame.width - insets.right - 4,
    bottom: frame.height - insets.bottom,
  };
  const marks: Mark[] = [];
  if (frame.millimetresPerPixel !== null) {
    marks.push(...scaleBar(frame.millimetresPerPixel, display, Math.max(room.left, 24), room.bottom - 8));
  }
  if (selection.moving.size > 0) {
    const box = sceneBox(scene, meshes, selection.moving);
    if (box !== null) marks.push(...laserTicks(frame, box));
  }
  const witnesses = chooseWitnesses({
    findings,
    open,
    hovered: hoveredFinding,
    selected: selection.moving,
    isOff: (id) => presence[id] === 'off',
  });
  const card = document.querySelector('.tape')?.getBoundingClientRect();
  const foot = selection.moving.size === 0 ? null : project(frame, zeroPoint(scene, moved));
  const blocked = [
    ...(card === undefined ? [] : [card]),
    ...(foot === null ? [] : [{ x: foot.x - HANDLES, y: foot.y - HANDLES, width: 2 * HANDLES, height: 1.6 * HANDLES }]),
  ];
  marks.push(...witnessMarks(frame, witnesses, display, room, blocked));
  if (measuredAxis !== null && selection.ids.length > 0) {
    const datum = datumFor(scene, measuredAxis, datums[measuredAxis]);
    marks.push(...measureLine(frame, datum, measuredAxis, zeroPoint(scene, moved), { display, isBare: isDragging }));
  }
  const part = scene.components.find((c) => c.id === hovered);
  if (part !== undefined && !selection.moving.has(part.id)) {
    const box = componentBox(scene, part, meshes);
    if (box !== null) marks.push(...partLabel(frame, box, part.name, part.source === 'guess' ? 'a guess' : null));
  }
  return (
    <svg className="bench-overlay" width={frame.width} height={frame.height} aria-hidden="true">
      <MarksSvg marks={marks} />
    </svg>
  );
}
