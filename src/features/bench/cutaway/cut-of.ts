// The cutaway as a plane: hung on a laser, a panel or an axis of the car, a way off it.
import type { Scene } from '#shared/scene';
import type { CutOn } from '../session';
import { datumFor } from '../tape/datums';
import type { Cut } from '../viewport/light';
import { add, scale, unit } from '../viewport/vectors';

export function cutOf(scene: Scene, cutOn: CutOn | null): Cut | null {
  if (cutOn === null) return null;
  const datum = datumFor(scene, cutOn.axis, cutOn.datum ?? undefined);
  const normal = unit(datum.normal);
  // the side that goes: to the right, to the rear, above; or the other
  const plus = normal[cutOn.axis] < 0 ? -1 : 1;
  return {
    point: add(datum.point, scale(normal, plus * cutOn.offset)),
    towards: scale(normal, plus * (cutOn.isFlipped ? -1 : 1)),
  };
}
