// Handles on the selected part: scribed arrows along the car's axes, scribed arcs to turn it. They carry their reading while
// they are dragged.
import { useSyncExternalStore } from 'react';
import { useBench, useOpen, useSession, useShown } from '../bench-model';
import { zeroPoint } from '../edits';
import { useSelection } from '../use-selection';
import { useMoved } from '../tape/use-moved';
import { sceneBox } from '../viewport/extent';
import { project } from '../viewport/frame';
import { useMeshVersion } from '../viewport/use-mesh-version';
import { centreOf, type Box, type Triple } from '../viewport/vectors';
import { MoveHandles } from './move-handles';
import { TurnHandles } from './turn-handles';

/** Handles stand at the zero point, or in the middle of a part whose zero point is somewhere else. */
const NEAR = 60;

function handlePoint(zero: Triple, box: Box | null): Triple {
  if (box === null) return zero;
  const isNear = zero.every((x, k) => x > box.low[k]! - NEAR && x < box.high[k]! + NEAR);
  return isNear ? zero : centreOf(box);
}

export function Handles() {
  const { frames, meshes } = useBench();
  const frame = useSyncExternalStore(frames.subscribe, frames.get);
  const scene = useShown();
  const moved = useMoved();
  const { moving } = useSelection();
  const canEdit = useOpen((o) => o.canEdit);
  const kind = useSession((s) => s.handles);
  useMeshVersion();
  if (frame === null || !canEdit || moving.size === 0) return null;
  const zero = zeroPoint(scene, moved);
  const box = sceneBox(scene, meshes, moving);
  const at = handlePoint(zero, box);
  if (project(frame, at) === null) return null;
  const props = { frame, at, zero, moved, moving };
  return (
    <svg className="bench-handles" width={frame.width} height={frame.height} aria-hidden="true">
      {kind === 'move' ? <MoveHandles {...props} /> : <TurnHandles {...props} />}
    </svg>
  );
}
