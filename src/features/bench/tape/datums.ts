// What a place is read off: the lasers of the scene, the firewall, the floor. Read as one would with a tape: straight along
// the car, across it, or up, from the part to where that line meets the datum.
import { rigidOf, worldPose, type Component, type Scene } from '#shared/scene';
import { applyRigid, composeRigid, turnByRigid } from '#shared/units';
import { dot, sub, unit, type Triple } from '../viewport/vectors';

export type Axis = 0 | 1 | 2;

export interface Datum {
  /** `laser column-line`, `part firewall`, `zero`. */
  readonly key: string;
  readonly name: string;
  readonly point: Triple;
  readonly normal: Triple;
}

const AXES: readonly Triple[] = [
  [1, 0, 0],
  [0, 1, 0],
  [0, 0, 1],
];

/** Words for either side of a datum: towards plus and towards minus. */
export const SIDES: readonly (readonly [string, string])[] = [
  ['behind', 'ahead of'],
  ['right of', 'left of'],
  ['above', 'below'],
];
const ZERO_NAME = ['zero of the car', 'middle of the car', 'zero of the car'] as const;

/** A plane that leans more than this from square would read nonsense: cosine of 45 degrees. */
const SQUARE = 0.7;

/** The face of a panel towards the cabin: of its largest box, the thin way. */
function panelFace(scene: Scene, component: Component, towards: Triple): Pick<Datum, 'point' | 'normal'> | null {
  let best: { area: number; point: Triple; normal: Triple } | null = null;
  const frame = worldPose(scene, component);
  for (const { shape, pose } of component.solids) {
    if (shape.kind !== 'box') continue;
    const thin = shape.size.indexOf(Math.min(...shape.size));
    const area = (shape.size[0] * shape.size[1] * shape.size[2]) / shape.size[thin]!;
    if (best !== null && area <= best.area) continue;
    const placed = composeRigid(frame, rigidOf(pose));
    let normal: Triple = turnByRigid(placed, AXES[thin]!);
    const side = dot(normal, towards) < 0 ? -1 : 1;
    normal = [normal[0] * side, normal[1] * side, normal[2] * side];
    const local: [number, number, number] = [0, 0, 0];
    local[thin] = (side * shape.size[thin]!) / 2;
    best = { area, point: applyRigid(placed, local), normal };
  }
  return best;
}

/** All datums of an axis, the one to begin with first. */
export function datumsOf(scene: Scene, axis: Axis): Datum[] {
  const lasers = scene.lasers
    .filter((laser) => Math.abs(unit(laser.normal)[axis]) > SQUARE)
    .map((l): Datum => ({ key: `laser ${l.id}`, name: l.name, point: l.point, normal: l.normal }));
  const category = axis === 0 ? 'firewall' : axis === 2 ? 'floor' : null;
  const panels = scene.components.flatMap((c): Datum[] => {
    if (category === null || c.category !== category) return [];
    const face = panelFace(scene, c, AXES[axis]!);
    if (face === null || Math.abs(face.normal[axis]) < SQUARE) return [];
    return [{ key: `part ${c.id}`, name: c.name, ...face }];
  });
  const zero: Datum = { key: 'zero', name: ZERO_NAME[axis], point: [0, 0, 0], normal: AXES[axis]! };
  // along the car the shop measures from the firewall; across and up from the lasers
  return axis === 0 ? [...panels, ...lasers, zero] : [...lasers, ...panels, zero];
}

/** Where the line through `at` along the axis meets the datum. */
export function datumCoordinate(datum: Datum, axis: Axis, at: Triple): number {
  const n = datum.normal;
  return at[axis] + dot(n, sub(datum.point, at)) / n[axis];
}

/** Signed distance from the datum along the axis, mm. */
export const readingFrom = (datum: Datum, axis: Axis, at: Triple): number =>
  at[axis] - datumCoordinate(datum, axis, at);

/** The datum in use for an axis: the chosen one if it is still there. */
export function datumFor(scene: Scene, axis: Axis, chosen: string | undefined): Datum {
  const datums = datumsOf(scene, axis);
  return datums.find((d) => d.key === chosen) ?? datums[0]!;
}
