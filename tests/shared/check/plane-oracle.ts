// Gaps in a plane by closed forms, for scenes whose solids are long along Y and move in X and Z alone: round rods and
// blocks, seen end on as circles and rectangles. Shares no code with the kernel: its own sines, its own distances.
import { block, mesh, motion, part, rod, slide, swing } from '../../fixtures/scenes';

type Point = readonly [number, number];
type Json = Readonly<Record<string, unknown>>;

export interface PlaneStep {
  readonly kind: 'swing' | 'slide';
  /** Swing: the point in X, Z. Slide: the direction. */
  readonly at: Point;
  readonly from: number;
  readonly to: number;
}

export interface PlaneSolid {
  readonly kind: 'circle' | 'rectangle' | 'meshRectangle';
  readonly centre: Point;
  /** Degrees about Y. */
  readonly turn: number;
  /** Circle: radius. Rectangle: half sizes in X and Z. */
  readonly half: Point;
}

export interface PlanePart {
  readonly solid: PlaneSolid;
  readonly steps: readonly PlaneStep[];
}

/** About +Y by the right-hand rule: x' = x cos + z sin, z' = -x sin + z cos. */
function turned([x, z]: Point, about: Point, degrees: number): Point {
  const a = (degrees * Math.PI) / 180;
  const [dx, dz] = [x - about[0], z - about[1]];
  return [about[0] + dx * Math.cos(a) + dz * Math.sin(a), about[1] - dx * Math.sin(a) + dz * Math.cos(a)];
}

interface PlacedSolid {
  readonly centre: Point;
  readonly turn: number;
}

/** Where the solid is at a position of its motion. */
export function placeAt({ solid, steps }: PlanePart, position: number): PlacedSolid {
  let { centre, turn } = solid;
  for (const [i, step] of steps.entries()) {
    const share = Math.min(1, Math.max(0, position * steps.length - i));
    if (share === 0 && i > 0) break;
    const value = step.from + share * (step.to - step.from);
    if (step.kind === 'swing') {
      centre = turned(centre, step.at, value);
      turn += value;
    } else {
      const l = Math.hypot(...step.at);
      centre = [centre[0] + (step.at[0] / l) * value, centre[1] + (step.at[1] / l) * value];
    }
  }
  return { centre, turn };
}

function outline(solid: PlaneSolid, { centre, turn }: PlacedSolid): Point[] {
  const [hx, hz] = solid.half;
  return (
    [
      [-hx, -hz],
      [hx, -hz],
      [hx, hz],
      [-hx, hz],
    ] as const
  ).map(([x, z]) => turned([centre[0] + x, centre[1] + z], centre, turn));
}

function toSegment(p: Point, a: Point, b: Point): number {
  const [ux, uz] = [b[0] - a[0], b[1] - a[1]];
  const t = Math.min(1, Math.max(0, ((p[0] - a[0]) * ux + (p[1] - a[1]) * uz) / (ux * ux + uz * uz)));
  return Math.hypot(p[0] - a[0] - t * ux, p[1] - a[1] - t * uz);
}

/** Distance of a point from a rectangle, 0 inside. */
function toRectangle(p: Point, solid: PlaneSolid, at: PlacedSolid): number {
  const [x, z] = turned(p, at.centre, -at.turn);
  return Math.hypot(
    Math.max(0, Math.abs(x - at.centre[0]) - solid.half[0]),
    Math.max(0, Math.abs(z - at.centre[1]) - solid.half[1]),
  );
}

/** True if a line along a side of either parts the two rectangles. */
function areParted(p: readonly Point[], q: readonly Point[]): boolean {
  return [p, q].some((r) =>
    [0, 1].some((i) => {
      const [nx, nz] = [r[i + 1]![0] - r[i]![0], r[i + 1]![1] - r[i]![1]];
      const [a, b] = [p, q].map((s) => s.map((c) => c[0] * nx + c[1] * nz)) as [number[], number[]];
      return Math.max(...a) < Math.min(...b) || Math.max(...b) < Math.min(...a);
    }),
  );
}

/** The gap of two parts at positions of their motions, by closed form. */
export function planeGap(a: PlanePart, b: PlanePart, p: number, q: number): number {
  const [x, y] = [placeAt(a, p), placeAt(b, q)];
  const isRound = (s: PlaneSolid): boolean => s.kind === 'circle';
  if (isRound(a.solid) && isRound(b.solid)) {
    const apart = Math.hypot(x.centre[0] - y.centre[0], x.centre[1] - y.centre[1]);
    return Math.max(0, apart - a.solid.half[0] - b.solid.half[0]);
  }
  if (isRound(a.solid)) return Math.max(0, toRectangle(x.centre, b.solid, y) - a.solid.half[0]);
  if (isRound(b.solid)) return Math.max(0, toRectangle(y.centre, a.solid, x) - b.solid.half[0]);
  const [r, s] = [outline(a.solid, x), outline(b.solid, y)];
  if (!areParted(r, s)) return 0;
  let least = Infinity;
  for (const [points, other] of [
    [r, s],
    [s, r],
  ] as const) {
    for (const point of points) {
      for (let i = 0; i < 4; i += 1) least = Math.min(least, toSegment(point, other[i]!, other[(i + 1) % 4]!));
    }
  }
  return least;
}

/** The same part as the scene document has it; `length` along Y. */
export function asPart(id: string, { solid, steps }: PlanePart, length: number, use = 'operating'): Json {
  const [x, z] = solid.centre;
  const at = [x, 0, z];
  const made =
    solid.kind === 'circle'
      ? rod(2 * solid.half[0], length, { at, turn: [90, 0, 0] })
      : solid.kind === 'rectangle'
        ? block([2 * solid.half[0], length, 2 * solid.half[1]], { at, turn: [0, solid.turn, 0] })
        : mesh(`${id}.stl`, { at, turn: [0, solid.turn, 0] });
  const list = steps.map((s) =>
    s.kind === 'swing'
      ? swing(s.to, { point: [s.at[0], 0, s.at[1]], from: s.from })
      : slide([s.at[0], 0, s.at[1]], s.to, { from: s.from }),
  );
  return part(id, [made], { motions: steps.length === 0 ? [] : [motion(list, { use })] });
}
