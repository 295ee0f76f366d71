// How far the boxes of two stands are apart in the middle of their stretches: centre and half sizes in either one's frame,
// or the corners of a single triangle against the other's box.
import type { Rigid } from '#shared/units';
import type { Stretch } from './path';
import { inverseIn, isTriangle } from './stand';
import type { Stand } from './stand';

/** Keeps the last relative turn, which serves all nodes of a pair of solids. */
export class BoxGauge {
  /** From A to B, of any length, after `apart`: the way along which the boxes are apart. */
  readonly direction = new Float64Array(3);
  private readonly across: Rigid = new Float64Array(12);
  private keyA: Stretch | null = null;
  private keyB: Stretch | null = null;
  private bodyA: Stand['body'] | null = null;
  private bodyB: Stand['body'] | null = null;

  /** Lower bound of the boxes' distance in the middle; leaves the direction from A to B in `direction`. */
  apart(a: Stand, b: Stand, j: number): number {
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
    const r = this.acrossOf(a, b, j);
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
  private acrossOf(a: Stand, b: Stand, j: number): Float64Array {
    const r = this.across;
    const isKept = this.keyA === a.stretch && this.keyB === b.stretch && this.bodyA === a.body && this.bodyB === b.body;
    if (isKept) return r;
    this.keyA = a.stretch;
    this.keyB = b.stretch;
    this.bodyA = a.body;
    this.bodyB = b.body;
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
}

/** How far the offset x lies beyond `reaches`, with its sign. */
function between(x: number, reaches: number): number {
  if (x > reaches) return x - reaches;
  return x < -reaches ? x + reaches : 0;
}
