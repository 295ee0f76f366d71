// The distance between two convex sets by the method of Gilbert, Johnson and Keerthi (IEEE J. Robotics and Automation
// 4(2), 1988), with both ends proven: the length of the vector found is a distance that two real points have, and the
// support along that vector is a plane that keeps the two apart. Whatever rounding does to the simplex, these two stay true;
// it can only cost iterations.
import { farthest } from './convex';
import type { Convex } from './convex';
import type { PairAnswer } from './triangle-distance';

/** Steps at most; the worst case met in tests needs 60. */
const MAX_STEPS = 200;

/** The nearest combination of up to four points to the origin; `weights` says how it is made. */
class Simplex {
  size = 0;
  /** Points of the difference A - B, and of A and B, four times three numbers each. */
  readonly w = new Float64Array(12);
  readonly a = new Float64Array(12);
  readonly b = new Float64Array(12);
  readonly weights = new Float64Array(4);
  private readonly trial = new Float64Array(4);
  private bestLength = Infinity;
  private bestSet = 0;

  clear(): void {
    this.size = 0;
  }

  private offer(set: number, l0: number, l1: number, l2: number, l3: number): void {
    const { w } = this;
    const x = l0 * w[0]! + l1 * w[3]! + l2 * w[6]! + l3 * w[9]!;
    const y = l0 * w[1]! + l1 * w[4]! + l2 * w[7]! + l3 * w[10]!;
    const z = l0 * w[2]! + l1 * w[5]! + l2 * w[8]! + l3 * w[11]!;
    const length = x * x + y * y + z * z;
    if (length < this.bestLength) {
      this.bestLength = length;
      this.bestSet = set;
      this.weights[0] = l0;
      this.weights[1] = l1;
      this.weights[2] = l2;
      this.weights[3] = l3;
    }
  }

  private point(i: number): void {
    const l = this.trial.fill(0);
    l[i] = 1;
    this.offer(1 << i, l[0]!, l[1]!, l[2]!, l[3]!);
  }

  /** Nearest point inside the segment i-j, if it is inside. */
  private segment(i: number, j: number): void {
    const { w } = this;
    const p = 3 * i;
    const q = 3 * j;
    const dx = w[q]! - w[p]!;
    const dy = w[q + 1]! - w[p + 1]!;
    const dz = w[q + 2]! - w[p + 2]!;
    const dd = dx * dx + dy * dy + dz * dz;
    const t = -(w[p]! * dx + w[p + 1]! * dy + w[p + 2]! * dz);
    if (!(t > 0 && t < dd)) return;
    const l = this.trial.fill(0);
    l[j] = t / dd;
    l[i] = 1 - l[j];
    this.offer((1 << i) | (1 << j), l[0]!, l[1]!, l[2]!, l[3]!);
  }

  /** Nearest point inside the triangle i-j-k, if it is inside. */
  private triangle(i: number, j: number, k: number): void {
    const { w } = this;
    const p = 3 * i;
    const q = 3 * j;
    const r = 3 * k;
    const ux = w[q]! - w[p]!;
    const uy = w[q + 1]! - w[p + 1]!;
    const uz = w[q + 2]! - w[p + 2]!;
    const vx = w[r]! - w[p]!;
    const vy = w[r + 1]! - w[p + 1]!;
    const vz = w[r + 2]! - w[p + 2]!;
    const nx = uy * vz - uz * vy;
    const ny = uz * vx - ux * vz;
    const nz = ux * vy - uy * vx;
    const nn = nx * nx + ny * ny + nz * nz;
    if (!(nn > 0)) return;
    // barycentric coordinates of the origin's projection, from cross products with -p
    const ox = -w[p]!;
    const oy = -w[p + 1]!;
    const oz = -w[p + 2]!;
    const lj = ((oy * vz - oz * vy) * nx + (oz * vx - ox * vz) * ny + (ox * vy - oy * vx) * nz) / nn;
    const lk = ((uy * oz - uz * oy) * nx + (uz * ox - ux * oz) * ny + (ux * oy - uy * ox) * nz) / nn;
    if (!(lj > 0 && lk > 0 && lj + lk < 1)) return;
    const l = this.trial.fill(0);
    l[j] = lj;
    l[k] = lk;
    l[i] = 1 - lj - lk;
    this.offer((1 << i) | (1 << j) | (1 << k), l[0]!, l[1]!, l[2]!, l[3]!);
  }

  /** The origin inside the tetrahedron of all four points. */
  private tetrahedron(): boolean {
    const { w } = this;
    const det = (p: number, q: number, r: number): number =>
      w[p]! * (w[q + 1]! * w[r + 2]! - w[q + 2]! * w[r + 1]!) -
      w[p + 1]! * (w[q]! * w[r + 2]! - w[q + 2]! * w[r]!) +
      w[p + 2]! * (w[q]! * w[r + 1]! - w[q + 1]! * w[r]!);
    const d0 = det(3, 6, 9);
    const d1 = -det(0, 6, 9);
    const d2 = det(0, 3, 9);
    const d3 = -det(0, 3, 6);
    const sum = d0 + d1 + d2 + d3;
    const inside = sum > 0 ? d0 > 0 && d1 > 0 && d2 > 0 && d3 > 0 : sum < 0 && d0 < 0 && d1 < 0 && d2 < 0 && d3 < 0;
    if (!inside) return false;
    this.weights[0] = d0 / sum;
    this.weights[1] = d1 / sum;
    this.weights[2] = d2 / sum;
    this.weights[3] = d3 / sum;
    return true;
  }

  /**
   * Finds the nearest point of the simplex to the origin and throws away the points it does not need.
   * @returns its squared length, 0 if the origin is inside
   */
  reduce(): number {
    if (this.size === 4 && this.tetrahedron()) return 0;
    this.bestLength = Infinity;
    const n = this.size;
    for (let i = 0; i < n; i += 1) this.point(i);
    for (let i = 0; i < n; i += 1) for (let j = i + 1; j < n; j += 1) this.segment(i, j);
    if (n === 3) this.triangle(0, 1, 2);
    if (n === 4) {
      this.triangle(0, 1, 2);
      this.triangle(0, 1, 3);
      this.triangle(0, 2, 3);
      this.triangle(1, 2, 3);
    }
    let kept = 0;
    for (let i = 0; i < n; i += 1) {
      if ((this.bestSet & (1 << i)) === 0) continue;
      if (kept !== i) {
        this.weights[kept] = this.weights[i]!;
        for (let c = 0; c < 3; c += 1) {
          this.w[3 * kept + c] = this.w[3 * i + c]!;
          this.a[3 * kept + c] = this.a[3 * i + c]!;
          this.b[3 * kept + c] = this.b[3 * i + c]!;
        }
      }
      kept += 1;
    }
    this.size = kept;
    return this.bestLength;
  }

  /** Coordinate c of the point that the weights make of `points`. */
  combine(points: Float64Array, c: number): number {
    let x = 0;
    for (let i = 0; i < this.size; i += 1) x += this.weights[i]! * points[3 * i + c]!;
    return x;
  }
}

/** Measures convex pairs; holds its scratch so that nothing is allocated per pair. */
export class ConvexMeter {
  private readonly simplex = new Simplex();
  private readonly pa = new Float64Array(3);
  private readonly pb = new Float64Array(3);

  /**
   * Distance between two convex sets in one frame.
   * @param out gets the distance found (mm) and the points that have it, of A first
   * @param enough stop as soon as distance and bound are this close, mm
   * @returns a lower bound of the distance, at most out[0]
   */
  measure(A: Convex, B: Convex, out: PairAnswer, enough: number): number {
    const s = this.simplex;
    const { pa, pb } = this;
    s.clear();
    let vx = 1;
    let vy = 0;
    let vz = 0;
    let vv = Infinity;
    let bound = 0;
    for (let step = 0; step < MAX_STEPS; step += 1) {
      farthest(A, -vx, -vy, -vz, pa, 0);
      farthest(B, vx, vy, vz, pb, 0);
      const wx = pa[0]! - pb[0]!;
      const wy = pa[1]! - pb[1]!;
      const wz = pa[2]! - pb[2]!;
      if (vv < Infinity) {
        const length = Math.sqrt(vv);
        const plane = (vx * wx + vy * wy + vz * wz) / length;
        if (plane > bound) bound = plane;
        if (length - bound <= enough) break;
        let known = false;
        for (let i = 0; i < s.size && !known; i += 1) {
          known = s.w[3 * i] === wx && s.w[3 * i + 1] === wy && s.w[3 * i + 2] === wz;
        }
        if (known) break;
      }
      const o = 3 * s.size;
      s.w[o] = wx;
      s.w[o + 1] = wy;
      s.w[o + 2] = wz;
      for (let c = 0; c < 3; c += 1) {
        s.a[o + c] = pa[c]!;
        s.b[o + c] = pb[c]!;
      }
      s.size += 1;
      const next = s.reduce();
      if (next === 0) {
        vv = 0;
        break;
      }
      if (!(next < vv)) break;
      vv = next;
      vx = s.combine(s.w, 0);
      vy = s.combine(s.w, 1);
      vz = s.combine(s.w, 2);
    }
    for (let c = 0; c < 3; c += 1) {
      out[1 + c] = s.combine(s.a, c);
      out[4 + c] = s.combine(s.b, c);
    }
    const dx = out[1]! - out[4]!;
    const dy = out[2]! - out[5]!;
    const dz = out[3]! - out[6]!;
    out[0] = vv === 0 ? 0 : Math.sqrt(dx * dx + dy * dy + dz * dz);
    return Math.min(bound, out[0]);
  }
}
