// The form in which a mesh goes out for drawing: thinned out and rounded, never the supplier's file. Little-endian:
//   4 bytes "GWDM", uint32 version 1, uint32 corners, uint32 triangles, 6 float32 low and high in file units,
//   corners x 3 uint16 (position between low and high, 0 to 65535), padding to 4 bytes, triangles x 3 uint32.

export interface DisplayMesh {
  /** File units, three numbers a corner. */
  readonly positions: Float32Array;
  readonly index: Uint32Array;
}

const MAGIC = 0x4d445747;
const HEADER = 40;
const padded = (n: number): number => Math.ceil(n / 4) * 4;

export function encodeDisplayMesh(mesh: DisplayMesh): Uint8Array {
  const corners = mesh.positions.length / 3;
  const low = [Infinity, Infinity, Infinity];
  const high = [-Infinity, -Infinity, -Infinity];
  for (let i = 0; i < mesh.positions.length; i += 1) {
    low[i % 3] = Math.min(low[i % 3]!, mesh.positions[i]!);
    high[i % 3] = Math.max(high[i % 3]!, mesh.positions[i]!);
  }
  const indexAt = HEADER + padded(corners * 6);
  const bytes = new Uint8Array(indexAt + mesh.index.length * 4);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, MAGIC, true);
  view.setUint32(4, 1, true);
  view.setUint32(8, corners, true);
  view.setUint32(12, mesh.index.length / 3, true);
  for (let k = 0; k < 3; k += 1) {
    view.setFloat32(16 + 4 * k, low[k]!, true);
    view.setFloat32(28 + 4 * k, high[k]!, true);
  }
  for (let i = 0; i < mesh.positions.length; i += 1) {
    const a = low[i % 3]!;
    const span = high[i % 3]! - a;
    view.setUint16(HEADER + 2 * i, span > 0 ? Math.round(((mesh.positions[i]! - a) / span) * 65535) : 0, true);
  }
  for (let i = 0; i < mesh.index.length; i += 1) view.setUint32(indexAt + 4 * i, mesh.index[i]!, true);
  return bytes;
}

/** Null if the bytes are no display mesh. */
export function decodeDisplayMesh(bytes: ArrayBuffer): DisplayMesh | null {
  if (bytes.byteLength < HEADER) return null;
  const view = new DataView(bytes);
  const corners = view.getUint32(8, true);
  const triangles = view.getUint32(12, true);
  const indexAt = HEADER + padded(corners * 6);
  if (view.getUint32(0, true) !== MAGIC || view.getUint32(4, true) !== 1) return null;
  if (bytes.byteLength !== indexAt + triangles * 12) return null;
  const positions = new Float32Array(corners * 3);
  for (let i = 0; i < positions.length; i += 1) {
    const a = view.getFloat32(16 + 4 * (i % 3), true);
    const b = view.getFloat32(28 + 4 * (i % 3), true);
    positions[i] = a + ((b - a) * view.getUint16(HEADER + 2 * i, true)) / 65535;
  }
  const index = new Uint32Array(triangles * 3);
  for (let i = 0; i < index.length; i += 1) {
    index[i] = view.getUint32(indexAt + 4 * i, true);
    if (index[i]! >= corners) return null;
  }
  return { positions, index };
}
