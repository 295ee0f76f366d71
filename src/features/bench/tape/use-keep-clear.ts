// A part that is selected while it stands behind the tape is brought out beside it.
import { useEffect } from 'react';
import { useBench, useSession } from '../bench-model';
import { selectionNow } from '../part-deeds';
import { sceneBox } from '../viewport/extent';
import { project } from '../viewport/frame';
import { centreOf } from '../viewport/vectors';

/** How far beside the tape it is put, and how near it may come by itself, CSS px. */
const BESIDE = 150;
const NEAR = 24;

export function useKeepClear(enabled: boolean): void {
  const bench = useBench();
  const selected = useSession((s) => s.selected);
  useEffect(() => {
    if (!enabled || selected.length === 0) return;
    const frame = bench.frames.get();
    const card = document.querySelector('.tape')?.getBoundingClientRect();
    const box = sceneBox(bench.open.getState().scene, bench.meshes, selectionNow(bench).moving);
    if (frame === null || card === undefined || box === null) return;
    const at = project(frame, centreOf(box));
    if (at === null || at.x > card.right + NEAR || at.y < card.top - NEAR || at.x < 0 || at.y > frame.height) return;
    bench.view.hand()?.glide(at.x - card.right - BESIDE, 0);
  }, [bench, enabled, selected]);
}
