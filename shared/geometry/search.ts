// The search for the least distance between two sides that may both move: one best-first walk over a node of A, a node of
// B, a stretch of A's path and a stretch of B's. Every entry carries a bound that holds for all it stands for; the least
// bound waiting and the least distance measured close in on the answer from below and above.
//
// Three bounds, of which the best counts:
//  - the distance of the two boxes with both sides in the middle of their stretches, less how far either can travel from
//    there (radius of the farthest corner times the chord of the half angle);
//  - along the direction between the two boxes, how far A reaches and B reaches back over the whole of both stretches: for
//    a swing the reach at the two ends, plus r(1 - cos h) for what may bulge between them. Parts that pass one another
//    side by side keep their gap in this one at any length of stretch;
//  - for two single shapes the same with the exact distance and direction in place of the boxes'.
import { composeRigid, invertRigid } from '#shared/units';
import type { Rigid } from '#shared/units';
import { reach } from './convex';
import type { Convex } from './convex';
import { ConvexMeter } from './gjk';
import { halve, isPoint, stretchesOf } from './path';
import type { Path, Stretch } from './path';
import { BoundQueue } from './queue';
import { shapeBox } from './shape';
import type { MeshShape, Placed } from './shape';
import { PAIR_ANSWER_LENGTH, triangleDistance } from './triangle-distance';

/** One side: solids that move together along one path. */
export interface Side {
  readonly solids: readonly Placed[];
  readonly path: Path;
}

export interface Range {
  readonly from: number;
  readonly to: number;
}

export interface Nearest {
  /** A distance that the two really have, mm, at `positions`; the asker's limit if nothing nearer was met. */
  readonly upper: number;
  /** No position within the ranges brings them closer than this, mm. */
  readonly lower: number;
  readonly positions: readonly [number, number];
  /** World points that have the distance `upper`, of A first. */
  readonly points: readonly [readonly [number, number, number], readonly [number, number, number]];
  /** Which solids they are on. */
  readonly solids: readonly [number, number];
}

/** Says whether bounds (mm) are close enough for the asker. */
export type Settled = (lower: number, upper: number) => boolean;

/** How close the meter of convex pairs brings its two ends together, mm. */
const CONVEX_ENOUGH = 1e-9;

/** A solid with what the walk needs of it. */
interface Body {
  readonly placed: Placed;
  readonly mesh: MeshShape | null;
  readonly nodeCount: number;
  /** Box of the root, for single shapes. */
  readonly box: Float64Array;
}

/** How one solid stands within the present entry. */
interface Stand {
  body: Body;
  stretch: Stretch;
  pose: Rigid;
  /** Centre in the world and half sizes of the present node, and its corners if it is a triangle. */
  node: number;
  readonly centre: Float64Array;
  readonly half: Float64Array;
  readonly corners: Float64Array;
  single: boolean;
  /** Radius of the ball about the centre, and the longest way a point of the node can go from the middle. */
  size: number;
  travel: number;
}

function newStand(body: Body, stretch: Stretch): Stand {
  return {
    body,
    stretch,
    pose: body.placed.pose,
    node: -1,
    centre: new Float64Array(3),
    half: new Float64Array(3),
    corners: new Float64Array(9),
    single: false,
    size: 0,
    travel: 0,
  };
}

function bodyOf(placed: Placed): Body {
  const mesh = placed.shape.kind === 'mesh' ? placed.shape : null;
  return { placed, mesh, nodeCount: mesh === null ? 0 : mesh.tree.nodes.length / 2, box: shapeBox(placed.shape) };
}

/** World pose of solid `index` in the middle of a stretch. */
function poseIn(stretch: Stretch, index: number, body: Body): Rigid {
  return (stretch.poses[index] ??=
    stretch.kind === 'still' ? body.placed.pose : composeRigid(stretch.at, body.placed.pose));
}

function inverseIn(stretch: Stretch, index: number, body: Body): Rigid {
  return (stretch.inverses[index] ??= invertRigid(poseIn(stretch, index, body)));
}

/** Square of the distance of a point from the axis of a swing. */
function radiusSquared(s: Stretch, x: number, y: number, z: number): number {
  const px = x - s.point[0];
  const py = y - s.point[1];
  const pz = z - s.point[2];
  const along = px * s.axis[0] + py * s.axis[1] + pz * s.axis[2];
  const r2 = px * px + py * py + pz * pz - along * along;
  return r2 > 0 ? r2 : 0;
}

/** One search; keep it and use it again, it holds the scratch. */
export class Searcher {
  private readonly queue = new BoundQueue();
  private readonly meter = new ConvexMeter();
  private readonly answer = new Float64Array(PAIR_ANSWER_LENGTH);
  private readonly scratch = new Float64Array(3);
  private readonly direction = new Float64Array(3);
  private readonly across: Rigid = new Float64Array(12);
  private bodiesA: Body[] = [];
  private bodiesB: Body[] = [];
  private stretchesA: Stretch[] = [];
  private stretchesB: Stretch[] = [];
  private a!: Stand;
  private b!: Stand;
  private acrossKey = -1;
  private keyA: Stretch | null = null;
  private keyB: Stretch | null = null;
  private upper = Infinity;
  private best: Omit<Nearest, 'lower' | 'upper'> = NOWHERE;
  /** Entries looked at in the last search; for measurements. */
  looks = 0;

  /**
   * The least distance of two sides over ranges of their paths' positions.
   * @param settled asked with a proven lower bound and the least distance met so far; true ends the search
   * @param limit distances from here up are of no interest: where nothing is nearer, `upper` and `lower` are `limit`
   */
  nearest(A: Side, B: Side, settled: Settled, rangeA: Range = WHOLE, rangeB: Range = WHOLE, limit = Infinity): Nearest {
    this.start(A, B, limit);
    const startsA = stretchesOf(A.path, rangeA.from, rangeA.to);
    const startsB = stretchesOf(B.path, rangeB.from, rangeB.to);
    for (const sa of startsA) {
      for (const sb of startsB) {
        const na = numberIn(this.stretchesA, sa);
        const nb = numberIn(this.stretchesB, sb);
        for (let i = 0; i < this.bodiesA.length; i += 1) {
          for (let j = 0; j < this.bodiesB.length; j += 1) this.consider(0, i, 0, j, 0, na, nb);
        }
      }
    }
    return { ...this.best, lower: this.walk(settled), upper: this.upper };
  }

  private start(A: Side, B: Side, limit: number): void {
    this.queue.clear();
    this.bodiesA = A.solids.map(bodyOf);
    this.bodiesB = B.solids.map(bodyOf);
    this.stretchesA = [];
    this.stretchesB = [];
    this.keyA = null;
    this.keyB = null;
    this.upper = limit;
    this.best = NOWHERE;
    this.looks = 0;
  }

  private walk(settled: Settled): number {
    const { queue } = this;
    for (;;) {
      const lower = Math.min(queue.least, this.upper);
      if (settled(lower, this.upper) || lower >= this.upper) return lower;
      queue.pop();
      if (!this.split()) return lower;
    }
  }

  /** Replaces the entry just taken out by smaller ones; false if it cannot be made smaller. */
  private split(): boolean {
    const { bound, entry } = this.queue;
    const i = entry[0]!;
    const na = entry[1]!;
    const j = entry[2]!;
    const nb = entry[3]!;
    const sa = entry[4]!;
    const sb = entry[5]!;
    this.a = this.stand(this.a, this.bodiesA, i, na, this.stretchesA[sa]!);
    this.b = this.stand(this.b, this.bodiesB, j, nb, this.stretchesB[sb]!);
    const { a, b } = this;
    const sizeA = a.single ? 0 : a.size;
    const sizeB = b.single ? 0 : b.size;
    const travelA = isPoint(a.stretch) ? 0 : a.travel;
    const travelB = isPoint(b.stretch) ? 0 : b.travel;
    const largest = Math.max(sizeA, sizeB, travelA, travelB);
    if (a.single && b.single && largest === 0) return false;
    // a node without extent (all corners in one point) still has to be opened
    if (!a.single && (sizeA === largest || (b.single && largest === 0))) {
      const children = childrenOf(a.body, na);
      for (let k = 0; k < children; k += 1) this.consider(bound, i, childOf(a.body, na, k), j, nb, sa, sb);
    } else if (!b.single && sizeB === largest) {
      const children = childrenOf(b.body, nb);
      for (let k = 0; k < children; k += 1) this.consider(bound, i, na, j, childOf(b.body, nb, k), sa, sb);
    } else if (travelA >= travelB) {
      for (const half of halve(a.stretch)) {
        this.consider(bound, i, na, j, nb, numberIn(this.stretchesA, half), sb);
      }
    } else {
      for (const half of halve(b.stretch)) {
        this.consider(bound, i, na, j, nb, sa, numberIn(this.stretchesB, half));
      }
    }
    return true;
  }

  /** Brings a stand to a node of a solid in the middle of a stretch. */
  private stand(old: Stand | undefined, bodies: Body[], index: number, node: number, stretch: Stretch): Stand {
    const body = bodies[index]!;
    const s = old ?? newStand(body, stretch);
    if (old !== undefined && s.body === body && s.node === node && s.stretch === stretch) return s;
    s.body = body;
    s.stretch = stretch;
    s.node = node;
    const m = (s.pose = poseIn(stretch, index, body));
    const { mesh } = body;
    const { centre, half } = s;
    if (mesh !== null && node >= body.nodeCount) {
      s.single = true;
      const o = 3 * (node - body.nodeCount);
      const c = s.corners;
      for (let k = 0; k < 3; k += 1) {
        const p = 3 * mesh.tree.triangles[o + k]!;
        const x = mesh.corners[p]!;
        const y = mesh.corners[p + 1]!;
        const z = mesh.corners[p + 2]!;
        c[3 * k] = m[0]! * x + m[1]! * y + m[2]! * z + m[3]!;
        c[3 * k + 1] = m[4]! * x + m[5]! * y + m[6]! * z + m[7]!;
        c[3 * k + 2] = m[8]! * x + m[9]! * y + m[10]! * z + m[11]!;
      }
      let r2 = 0;
      let size2 = 0;
      for (let k = 0; k < 3; k += 1) centre[k] = (c[k]! + c[k + 3]! + c[k + 6]!) / 3;
      for (let k = 0; k < 9; k += 3) {
        if (stretch.kind === 'swing') r2 = Math.max(r2, radiusSquared(stretch, c[k]!, c[k + 1]!, c[k + 2]!));
        const dx = c[k]! - centre[0]!;
        const dy = c[k + 1]! - centre[1]!;
        const dz = c[k + 2]! - centre[2]!;
        size2 = Math.max(size2, dx * dx + dy * dy + dz * dz);
      }
      s.size = Math.sqrt(size2);
      s.travel = stretch.kind === 'swing' ? stretch.chord * Math.sqrt(r2) : stretch.half;
      return s;
    }
    s.single = mesh === null;
    const box = mesh === null ? body.box : mesh.tree.boxes;
    const o = mesh === null ? 0 : 6 * node;
    const x = box[o]!;
    const y = box[o + 1]!;
    const z = box[o + 2]!;
    centre[0] = m[0]! * x + m[1]! * y + m[2]! * z + m[3]!;
    centre[1] = m[4]! * x + m[5]! * y + m[6]! * z + m[7]!;
    centre[2] = m[8]! * x + m[9]! * y + m[10]! * z + m[11]!;
    const hx = (half[0] = box[o + 3]!);
    const hy = (half[1] = box[o + 4]!);
    const hz = (half[2] = box[o + 5]!);
    s.size = Math.sqrt(hx * hx + hy * hy + hz * hz);
    s.travel =
      stretch.kind === 'swing'
        ? stretch.chord * (Math.sqrt(radiusSquared(stretch, centre[0], centre[1], centre[2])) + s.size)
        : stretch.half;
    return s;
  }

  /** Bounds a pair of nodes over a pair of stretches; measures it if both are single; queues what may still matter. */
  private consider(parent: number, i: number, na: number, j: number, nb: number, sa: number, sb: number): void {
    this.looks += 1;
    const a = (this.a = this.stand(this.a, this.bodiesA, i, na, this.stretchesA[sa]!));
    const b = (this.b = this.stand(this.b, this.bodiesB, j, nb, this.stretchesB[sb]!));
    const travel = a.travel + b.travel;
    const apart = this.boxesApart(a, b, i, j);
    let bound = Math.max(parent, apart - travel);
    if (bound >= this.upper) return;
    if (a.single && b.single) {
      const measured = this.measure(a, b, i, j);
      bound = Math.max(bound, measured - travel);
    }
    if (bound >= this.upper) return;
    if (travel > 0) {
      bound = Math.max(bound, this.apartThroughout(a, b));
      if (bound >= this.upper) return;
    }
    this.queue.push(bound, i, na, j, nb, sa, sb);
  }

  /** Exact distance of two single shapes in the middle; keeps it if it is the least so far. Returns a lower bound. */
  private measure(a: Stand, b: Stand, i: number, j: number): number {
    const out = this.answer;
    let lower: number;
    if (a.body.mesh !== null && b.body.mesh !== null) lower = triangleDistance(a.corners, b.corners, out);
    else lower = this.meter.measure(convexOf(a), convexOf(b), out, CONVEX_ENOUGH);
    const d = this.direction;
    d[0] = out[4]! - out[1]!;
    d[1] = out[5]! - out[2]!;
    d[2] = out[6]! - out[3]!;
    if (out[0]! < this.upper) {
      this.upper = out[0]!;
      this.best = {
        positions: [a.stretch.middle, b.stretch.middle],
        points: [
          [out[1]!, out[2]!, out[3]!],
          [out[4]!, out[5]!, out[6]!],
        ],
        solids: [i, j],
      };
    }
    return lower;
  }

  /** Lower bound of the boxes' distance in the middle; leaves the direction from A to B in `direction`. */
  private boxesApart(a: Stand, b: Stand, i: number, j: number): number {
    const d = this.direction;
    const dx = b.centre[0]! - a.centre[0]!;
    const dy = b.centre[1]! - a.centre[1]!;
    const dz = b.centre[2]! - a.centre[2]!;
    d[0] = dx;
    d[1] = dy;
    d[2] = dz;
    const balls = Math.sqrt(dx * dx + dy * dy + dz * dz) - a.size - b.size;
    if (isTriangle(a) || isTriangle(b)) return this.triangleApart(a, b, balls);
    const ma = a.pose;
    const mb = b.pose;
    const r = this.acrossOf(a, b, i, j);
    // the centre's offset in either frame
    const bx = mb[0]! * dx + mb[4]! * dy + mb[8]! * dz;
    const by = mb[1]! * dx + mb[5]! * dy + mb[9]! * dz;
    const bz = mb[2]! * dx + mb[6]! * dy + mb[10]! * dz;
    const ax = ma[0]! * dx + ma[4]! * dy + ma[8]! * dz;
    const ay = ma[1]! * dx + ma[5]! * dy + ma[9]! * dz;
    const az = ma[2]! * dx + ma[6]! * dy + ma[10]! * dz;
    const ha = a.half;
    const hb = b.half;
    // r holds |R| from A's frame to B's
    const ux = between(bx, ha[0]! * r[0]! + ha[1]! * r[1]! + ha[2]! * r[2]! + hb[0]!);
    const uy = between(by, ha[0]! * r[3]! + ha[1]! * r[4]! + ha[2]! * r[5]! + hb[1]!);
    const uz = between(bz, ha[0]! * r[6]! + ha[1]! * r[7]! + ha[2]! * r[8]! + hb[2]!);
    const vx = between(ax, hb[0]! * r[0]! + hb[1]! * r[3]! + hb[2]! * r[6]! + ha[0]!);
    const vy = between(ay, hb[0]! * r[1]! + hb[1]! * r[4]! + hb[2]! * r[7]! + ha[1]!);
    const vz = between(az, hb[0]! * r[2]! + hb[1]! * r[5]! + hb[2]! * r[8]! + ha[2]!);
    const inB = Math.sqrt(ux * ux + uy * uy + uz * uz);
    const inA = Math.sqrt(vx * vx + vy * vy + vz * vz);
    if (inB >= inA) {
      if (inB > 0) {
        d[0] = mb[0]! * ux + mb[1]! * uy + mb[2]! * uz;
        d[1] = mb[4]! * ux + mb[5]! * uy + mb[6]! * uz;
        d[2] = mb[8]! * ux + mb[9]! * uy + mb[10]! * uz;
      }
      return Math.max(balls, inB);
    }
    d[0] = ma[0]! * vx + ma[1]! * vy + ma[2]! * vz;
    d[1] = ma[4]! * vx + ma[5]! * vy + ma[6]! * vz;
    d[2] = ma[8]! * vx + ma[9]! * vy + ma[10]! * vz;
    return Math.max(balls, inA);
  }

  /** As boxesApart where one side is a single triangle: its corners against the other's box, in that one's frame. */
  private triangleApart(a: Stand, b: Stand, balls: number): number {
    const d = this.direction;
    const t = isTriangle(a) ? a : b;
    const o = t === a ? b : a;
    const both = isTriangle(o);
    const m = o.pose;
    let sum = 0;
    let dx = 0;
    let dy = 0;
    let dz = 0;
    for (let k = 0; k < 3; k += 1) {
      const nx = both ? (k === 0 ? 1 : 0) : m[k]!;
      const ny = both ? (k === 1 ? 1 : 0) : m[4 + k]!;
      const nz = both ? (k === 2 ? 1 : 0) : m[8 + k]!;
      const c = t.corners;
      const p0 = c[0]! * nx + c[1]! * ny + c[2]! * nz;
      const p1 = c[3]! * nx + c[4]! * ny + c[5]! * nz;
      const p2 = c[6]! * nx + c[7]! * ny + c[8]! * nz;
      const low = Math.min(p0, p1, p2);
      const high = Math.max(p0, p1, p2);
      let otherLow: number;
      let otherHigh: number;
      if (both) {
        const e = o.corners;
        otherLow = Math.min(e[k]!, e[k + 3]!, e[k + 6]!);
        otherHigh = Math.max(e[k]!, e[k + 3]!, e[k + 6]!);
      } else {
        const at = o.centre[0]! * nx + o.centre[1]! * ny + o.centre[2]! * nz;
        otherLow = at - o.half[k]!;
        otherHigh = at + o.half[k]!;
      }
      const gap = otherLow > high ? otherLow - high : low > otherHigh ? otherHigh - low : 0;
      sum += gap * gap;
      dx += gap * nx;
      dy += gap * ny;
      dz += gap * nz;
    }
    if (sum > 0) {
      const sign = t === a ? 1 : -1;
      d[0] = sign * dx;
      d[1] = sign * dy;
      d[2] = sign * dz;
    }
    return Math.max(balls, Math.sqrt(sum));
  }

  /** |R| of the rotation from A's frame to B's, nine numbers row by row; kept while the frames stay. */
  private acrossOf(a: Stand, b: Stand, i: number, j: number): Float64Array {
    const key = i * this.bodiesB.length + j;
    const r = this.across;
    if (this.keyA === a.stretch && this.keyB === b.stretch && this.acrossKey === key) return r;
    this.keyA = a.stretch;
    this.keyB = b.stretch;
    this.acrossKey = key;
    const n = inverseIn(b.stretch, j, b.body);
    const m = a.pose;
    for (let row = 0; row < 3; row += 1) {
      for (let col = 0; col < 3; col += 1) {
        r[3 * row + col] = Math.abs(
          n[4 * row]! * m[col]! + n[4 * row + 1]! * m[4 + col]! + n[4 * row + 2]! * m[8 + col]!,
        );
      }
    }
    return r;
  }

  /** How far apart the two stay along `direction` over the whole of both stretches; negative if they do not. */
  private apartThroughout(a: Stand, b: Stand): number {
    const d = this.direction;
    const length = Math.sqrt(d[0]! * d[0]! + d[1]! * d[1]! + d[2]! * d[2]!);
    if (!(length > 0)) return 0;
    const nx = d[0]! / length;
    const ny = d[1]! / length;
    const nz = d[2]! / length;
    return -this.reachThroughout(a, nx, ny, nz) - this.reachThroughout(b, -nx, -ny, -nz);
  }

  /** How far a stand reaches along the unit vector n over its whole stretch, at most. */
  private reachThroughout(s: Stand, nx: number, ny: number, nz: number): number {
    const t = s.stretch;
    if (t.kind === 'still') return this.reachOf(s, nx, ny, nz);
    const [kx, ky, kz] = t.axis;
    const along = nx * kx + ny * ky + nz * kz;
    if (t.kind === 'slide') return this.reachOf(s, nx, ny, nz) + Math.abs(along) * t.half;
    // n turned back by ±h: reaching along n after a turn is reaching along the turned-back n before it
    const px = nx - along * kx;
    const py = ny - along * ky;
    const pz = nz - along * kz;
    const qx = ky * nz - kz * ny;
    const qy = kz * nx - kx * nz;
    const qz = kx * ny - ky * nx;
    const atPoint = (x: number, y: number, z: number): number => x * t.point[0] + y * t.point[1] + z * t.point[2];
    const pivot = atPoint(nx, ny, nz);
    let most = -Infinity;
    for (let side = -1; side <= 1; side += 2) {
      const w = side * t.sin;
      const mx = along * kx + t.cos * px + w * qx;
      const my = along * ky + t.cos * py + w * qy;
      const mz = along * kz + t.cos * pz + w * qz;
      const r = pivot - atPoint(mx, my, mz) + this.reachOf(s, mx, my, mz);
      if (r > most) most = r;
    }
    if (t.bump === 0) return most;
    const radius = s.travel / t.chord;
    return most + t.bump * radius * Math.sqrt(px * px + py * py + pz * pz);
  }

  /** How far a stand reaches along (x, y, z) in the middle of its stretch. */
  private reachOf(s: Stand, x: number, y: number, z: number): number {
    if (s.single) return reach(convexOf(s), x, y, z, this.scratch);
    const m = s.pose;
    const h = s.half;
    return (
      s.centre[0]! * x +
      s.centre[1]! * y +
      s.centre[2]! * z +
      h[0]! * Math.abs(m[0]! * x + m[4]! * y + m[8]! * z) +
      h[1]! * Math.abs(m[1]! * x + m[5]! * y + m[9]! * z) +
      h[2]! * Math.abs(m[2]! * x + m[6]! * y + m[10]! * z)
    );
  }
}

const WHOLE: Range = { from: 0, to: 1 };
const NOWHERE: Omit<Nearest, 'lower' | 'upper'> = {
  positions: [0, 0],
  points: [
    [0, 0, 0],
    [0, 0, 0],
  ],
  solids: [0, 0],
};

/** How many children a node of a mesh has: two nodes, or the triangles of a leaf. */
function childrenOf(body: Body, node: number): number {
  return body.mesh!.tree.nodes[2 * node + 1]! || 2;
}

/** Child k of a node; triangles are numbered on after the nodes. */
function childOf(body: Body, node: number, k: number): number {
  const { nodes } = body.mesh!.tree;
  const first = nodes[2 * node]!;
  if (nodes[2 * node + 1]! > 0) return body.nodeCount + first + k;
  return k === 0 ? node + 1 : first;
}

/** The number of a stretch in a search's list; stretches belong to one search. */
function numberIn(list: Stretch[], s: Stretch): number {
  if (s.number < 0) {
    s.number = list.length;
    list.push(s);
  }
  return s.number;
}

function isTriangle(s: Stand): boolean {
  return s.single && s.body.mesh !== null;
}

/** How far the offset x lies beyond `reaches`, with its sign. */
function between(x: number, reaches: number): number {
  if (x > reaches) return x - reaches;
  return x < -reaches ? x + reaches : 0;
}

function convexOf(s: Stand): Convex {
  const { shape } = s.body.placed;
  if (shape.kind === 'mesh') return { kind: 'triangle', corners: s.corners };
  return { kind: 'placed', shape, pose: s.pose };
}
