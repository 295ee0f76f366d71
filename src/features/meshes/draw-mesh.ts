// A small picture of a mesh without a 3D library: seen from front left above, each triangle filled by how it lies to the light,
// the far ones first.
import type { DisplayMesh } from '#shared/api';

export interface MeshColours {
  readonly ground: string;
  /** Red, green, blue of a face that lies full in the light, 0 to 255. */
  readonly face: readonly [number, number, number];
}

/** Directions of the eye: x over the picture, y up it, z towards the eye. Vehicle axes, Z up. */
const RIGHT = [0.4472, -0.8944, 0] as const;
const UP = [0.3651, 0.1826, 0.9129] as const;
const TOWARDS = [-0.8165, -0.4082, 0.4082] as const;
const LIGHT = [-0.36, -0.48, 0.8] as const;

type Axis = readonly [number, number, number];
const along = (p: Float32Array, i: number, d: Axis): number => p[i]! * d[0] + p[i + 1]! * d[1] + p[i + 2]! * d[2];

/** Corners in the picture's own axes, x right, y down, and depth towards the eye; fitted into width x height. */
function project(mesh: DisplayMesh, width: number, height: number): Float32Array {
  const { positions } = mesh;
  const out = new Float32Array(positions.length);
  const low = [Infinity, Infinity];
  const high = [-Infinity, -Infinity];
  for (let i = 0; i < positions.length; i += 3) {
    out[i] = along(positions, i, RIGHT);
    out[i + 1] = -along(positions, i, UP);
    out[i + 2] = along(positions, i, TOWARDS);
    for (let k = 0; k < 2; k += 1) {
      low[k] = Math.min(low[k]!, out[i + k]!);
      high[k] = Math.max(high[k]!, out[i + k]!);
    }
  }
  const scale = Math.min((width * 0.84) / (high[0]! - low[0]! || 1), (height * 0.84) / (high[1]! - low[1]! || 1));
  for (let i = 0; i < out.length; i += 3) {
    out[i] = (out[i]! - (low[0]! + high[0]!) / 2) * scale + width / 2;
    out[i + 1] = (out[i + 1]! - (low[1]! + high[1]!) / 2) * scale + height / 2;
  }
  return out;
}

/** How bright a triangle is, 0.35 to 1; both sides are lit, as scans are often turned inside out. */
function brightness(p: Float32Array, a: number, b: number, c: number): number {
  const u = [p[b]! - p[a]!, p[b + 1]! - p[a + 1]!, p[b + 2]! - p[a + 2]!] as const;
  const v = [p[c]! - p[a]!, p[c + 1]! - p[a + 1]!, p[c + 2]! - p[a + 2]!] as const;
  const n = [u[1] * v[2] - u[2] * v[1], u[2] * v[0] - u[0] * v[2], u[0] * v[1] - u[1] * v[0]] as const;
  const size = Math.hypot(n[0], n[1], n[2]);
  if (size === 0) return 0.35;
  return 0.35 + 0.65 * Math.abs((n[0] * LIGHT[0] + n[1] * LIGHT[1] + n[2] * LIGHT[2]) / size);
}

export function drawMesh(
  context: CanvasRenderingContext2D,
  mesh: DisplayMesh,
  width: number,
  height: number,
  { ground, face }: MeshColours,
): void {
  context.fillStyle = ground;
  context.fillRect(0, 0, width, height);
  const flat = project(mesh, width, height);
  const count = mesh.index.length / 3;
  const depth = new Float32Array(count);
  const order = new Uint32Array(count);
  for (let t = 0; t < count; t += 1) {
    order[t] = t;
    for (let k = 0; k < 3; k += 1) depth[t]! += flat[3 * mesh.index[3 * t + k]! + 2]!;
  }
  order.sort((s, t) => depth[s]! - depth[t]!);
  context.lineJoin = 'round';
  for (const t of order) {
    const a = 3 * mesh.index[3 * t]!;
    const b = 3 * mesh.index[3 * t + 1]!;
    const c = 3 * mesh.index[3 * t + 2]!;
    const light = brightness(mesh.positions, a, b, c);
    const colour = `rgb(${face.map((x) => Math.round(x * light)).join(' ')})`;
    context.fillStyle = colour;
    context.strokeStyle = colour;
    context.beginPath();
    context.moveTo(flat[a]!, flat[a + 1]!);
    context.lineTo(flat[b]!, flat[b + 1]!);
    context.lineTo(flat[c]!, flat[c + 1]!);
    context.closePath();
    context.fill();
    // hides the hairlines that neighbouring fills leave
    context.stroke();
  }
}
