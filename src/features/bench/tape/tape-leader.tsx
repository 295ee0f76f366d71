// The scribed line from the tape to the part it is for.
import { useSyncExternalStore } from 'react';
import { useBench, useShown } from '../bench-model';
import { useIsNarrow } from '../use-is-narrow';
import { useSelection } from '../use-selection';
import { sceneBox } from '../viewport/extent';
import { project } from '../viewport/frame';
import { useMeshVersion } from '../viewport/use-mesh-version';
import { centreOf } from '../viewport/vectors';
import { useKeepClear } from './use-keep-clear';

export function TapeLeader() {
  const { frames, meshes } = useBench();
  const frame = useSyncExternalStore(frames.subscribe, frames.get);
  const scene = useShown();
  const { moving } = useSelection();
  const isNarrow = useIsNarrow();
  useMeshVersion();
  useKeepClear(!isNarrow);
  if (frame === null || isNarrow || moving.size === 0) return null;
  const box = sceneBox(scene, meshes, moving);
  const at = box === null ? null : project(frame, centreOf(box));
  const card = document.querySelector('.tape')?.getBoundingClientRect();
  if (at === null || card === undefined) return null;
  const y = card.top + 34;
  if (at.x < card.right + 24) return null;
  return (
    <svg className="bench-overlay" width={frame.width} height={frame.height} aria-hidden="true">
      <path
        d={`M${card.right} ${y}h22L${at.x.toFixed(1)} ${at.y.toFixed(1)}`}
        fill="none"
        stroke="var(--laser)"
        strokeWidth="1.2"
        opacity="0.85"
      />
      <circle cx={at.x} cy={at.y} r="2.6" fill="var(--laser)" />
    </svg>
  );
}
