// Where a dragged part catches: steps of the tape, lasers and other datums, faces of its neighbours.
import type { Scene } from '#shared/scene';
import { datumCoordinate, datumsOf, type Axis } from '../tape/datums';
import { componentBox } from '../viewport/extent';
import type { MeshSource } from '../viewport/mesh-source';
import type { Box, Triple } from '../viewport/vectors';

export interface Catch {
  /** How far the part has to be moved from where it began, mm along the axis. */
  readonly travel: number;
  /** "on Column line", "flush with Firewall". */
  readonly words: string;
}

/** What a drag along an axis may catch on; worked out once, when it begins. */
export function catchesAlong(
  scene: Scene,
  meshes: MeshSource,
  axis: Axis,
  at: Triple,
  box: Box | null,
  moving: ReadonlySet<string>,
): Catch[] {
  const onDatums = datumsOf(scene, axis).map((datum): Catch => {
    const travel = datumCoordinate(datum, axis, at) - at[axis];
    return { travel, words: `on ${datum.name}` };
  });
  if (box === null) return onDatums;
  const faces = scene.components.flatMap((c): Catch[] => {
    if (moving.has(c.id)) return [];
    const other = componentBox(scene, c, meshes);
    if (other === null || !isBeside(box, other, axis)) return [];
    const words = `flush with ${c.name}`;
    return [
      { travel: other.low[axis] - box.high[axis], words },
      { travel: other.high[axis] - box.low[axis], words },
    ];
  });
  return [...onDatums, ...faces];
}

/** Whether the two would meet at all if one went along the axis. */
function isBeside(a: Box, b: Box, axis: Axis): boolean {
  return ([0, 1, 2] as const).every((k) => k === axis || (a.low[k] < b.high[k] && b.low[k] < a.high[k]));
}

export interface Snapped {
  readonly travel: number;
  readonly words: string | null;
}

export interface SnapOptions {
  readonly mode: 'step' | 'fine' | 'free';
  /** mm. */
  readonly step: number;
  /** How near a catch holds, mm: some pixels at this distance. */
  readonly reach: number;
}

/** Steps count from the datum, so that readings come out round. */
export function snapTravel(
  travel: number,
  start: number,
  catches: readonly Catch[],
  { mode, step, reach }: SnapOptions,
): Snapped {
  if (mode === 'free') return { travel, words: null };
  const nearest = catches.reduce<Catch | null>(
    (best, c) =>
      Math.abs(c.travel - travel) < Math.min(reach, best === null ? Infinity : Math.abs(best.travel - travel))
        ? c
        : best,
    null,
  );
  if (nearest !== null) return { travel: nearest.travel, words: nearest.words };
  const grid = mode === 'fine' ? step / 4 : step;
  return { travel: Math.round((start + travel) / grid) * grid - start, words: null };
}
