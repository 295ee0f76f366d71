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
import { BoxGauge } from './box-gauge';
import { ConvexMeter } from './gjk';
import { halve, isPoint, stretchesOf } from './path';
import type { Path, Stretch } from './path';
import { BoundQueue } from './queue';
import type { Placed } from './shape';
import { bodyOf, childOf, childrenOf, convexOf, standAt } from './stand';
import type { Body, Stand } from './stand';
import { apartThroughout } from './throughout';
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
  /** The single shapes, one of each side, that have the distance `upper`; null if nothing nearer than the limit was met. */
  readonly witness: Witness | null;
}

/** A pair of single shapes: boxes, cylinders or triangles. */
export interface Witness {
  readonly solids: readonly [number, number];
  /** Nodes of the solids' trees; 0 for a box or cylinder. */
  readonly nodes: readonly [number, number];
}

/** Says whether bounds (mm) are close enough for the asker. */
export type Settled = (lower: number, upper: number) => boolean;

/** How close the meter of convex pairs brings its two ends together, mm. */
const CONVEX_ENOUGH = 1e-9;

/** One search; keep it and use it again, it holds the scratch. */
export class Searcher {
  private readonly queue = new BoundQueue();
  private readonly meter = new ConvexMeter();
  private gauge = new BoxGauge();
  private readonly answer = new Float64Array(PAIR_ANSWER_LENGTH);
  private readonly scratch = new Float64Array(3);
  private bodiesA: Body[] = [];
  private bodiesB: Body[] = [];
  private stretchesA: Stretch[] = [];
  private stretchesB: Stretch[] = [];
  private a: Stand | null = null;
  private b: Stand | null = null;
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
    // The walk looks at the middles of stretches and only ever comes near their ends. A stroke often comes closest at the very
    // end of it, so that is looked at for itself.
    const endsA = endsOf(A.path, rangeA);
    const endsB = endsOf(B.path, rangeB);
    if (endsA.length + endsB.length > 0) {
      const stillA = endsA.length > 0 ? endsA : stretchesOf(A.path, rangeA.from, rangeA.from);
      const stillB = endsB.length > 0 ? endsB : stretchesOf(B.path, rangeB.from, rangeB.from);
      this.begin(stillA, stillB);
    }
    this.begin(stretchesOf(A.path, rangeA.from, rangeA.to), stretchesOf(B.path, rangeB.from, rangeB.to));
    const lower = this.walk(settled);
    return { ...this.best, lower, upper: this.upper };
  }

  /** Queues every pair of solids over every pair of stretches. */
  private begin(startsA: readonly Stretch[], startsB: readonly Stretch[]): void {
    for (const sa of startsA) {
      for (const sb of startsB) {
        const na = numberIn(this.stretchesA, sa);
        const nb = numberIn(this.stretchesB, sb);
        for (let i = 0; i < this.bodiesA.length; i += 1) {
          for (let j = 0; j < this.bodiesB.length; j += 1) this.consider(0, i, 0, j, 0, na, nb);
        }
      }
    }
  }

  private start(A: Side, B: Side, limit: number): void {
    this.queue.clear();
    this.bodiesA = A.solids.map(bodyOf);
    this.bodiesB = B.solids.map(bodyOf);
    this.stretchesA = [];
    this.stretchesB = [];
    this.gauge = new BoxGauge();
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
    const a = (this.a = standAt(this.a, this.bodiesA[i]!, i, na, this.stretchesA[sa]!));
    const b = (this.b = standAt(this.b, this.bodiesB[j]!, j, nb, this.stretchesB[sb]!));
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

  /** Bounds a pair of nodes over a pair of stretches; measures it if both are single; queues what may still matter. */
  private consider(parent: number, i: number, na: number, j: number, nb: number, sa: number, sb: number): void {
    this.looks += 1;
    const a = (this.a = standAt(this.a, this.bodiesA[i]!, i, na, this.stretchesA[sa]!));
    const b = (this.b = standAt(this.b, this.bodiesB[j]!, j, nb, this.stretchesB[sb]!));
    const travel = a.travel + b.travel;
    const apart = this.gauge.apart(a, b, j);
    let bound = Math.max(parent, apart - travel);
    if (bound >= this.upper) return;
    if (a.single && b.single) {
      const measured = this.measure(a, b, i, j);
      bound = Math.max(bound, measured - travel);
    }
    if (bound >= this.upper) return;
    if (travel > 0) {
      bound = Math.max(bound, apartThroughout(a, b, this.gauge.direction, this.scratch));
      if (bound >= this.upper) return;
    }
    this.queue.push(bound, i, na, j, nb, sa, sb);
  }

  /** Exact distance of two single shapes in the middle; keeps it if it is the least so far. Returns a lower bound. */
  private measure(a: Stand, b: Stand, i: number, j: number): number {
    const out = this.answer;
    const lower = this.shapesApart(a, b);
    const d = this.gauge.direction;
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
        witness: { solids: [i, j], nodes: [a.node, b.node] },
      };
    }
    return lower;
  }

  /** Distance of one pair of single shapes of two sides at positions of their paths, mm. */
  distanceOf(A: Side, B: Side, { solids, nodes }: Witness, positions: readonly [number, number]): number {
    const [i, j] = solids;
    const [p, q] = positions;
    const a = standAt(null, bodyOf(A.solids[i]!), i, nodes[0], stretchesOf(A.path, p, p)[0]!);
    const b = standAt(null, bodyOf(B.solids[j]!), j, nodes[1], stretchesOf(B.path, q, q)[0]!);
    this.shapesApart(a, b);
    return this.answer[0]!;
  }

  /** Distance of two single shapes in the middle of their stretches, into `answer`; returns a lower bound. */
  private shapesApart(a: Stand, b: Stand): number {
    const out = this.answer;
    if (a.body.mesh !== null && b.body.mesh !== null) return triangleDistance(a.corners, b.corners, out);
    return this.meter.measure(convexOf(a), convexOf(b), out, CONVEX_ENOUGH);
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
  witness: null,
};

/** The ends of a whole stroke that lie within a range, each as a stretch without length. */
function endsOf(path: Path, range: Range): Stretch[] {
  if (path.steps.length === 0 || range.from === range.to) return [];
  return [0, 1].flatMap((p) => (p === range.from || p === range.to ? stretchesOf(path, p, p) : []));
}

/** The number of a stretch in a search's list; stretches belong to one search. */
function numberIn(list: Stretch[], s: Stretch): number {
  if (s.number < 0) {
    s.number = list.length;
    list.push(s);
  }
  return s.number;
}
