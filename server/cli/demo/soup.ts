// Triangles as a flat list of coordinates, and the ways the demo's meshes are made of them.

/** Nine numbers a triangle. */
export type Soup = number[];
export type Triple = [number, number, number];

/** The surface between rows of points, each joined to the next. `closed`: rows are rings, and both ends are capped. */
export function sweep(rows: readonly (readonly Triple[])[], { closed }: { readonly closed: boolean }): Soup {
  const soup: Soup = [];
  const width = rows[0]?.length ?? 0;
  const across = closed ? width : width - 1;
  for (let i = 0; i + 1 < rows.length; i += 1) {
    for (let j = 0; j < across; j += 1) {
      const a = rows[i]![j]!;
      const b = rows[i]![(j + 1) % width]!;
      const c = rows[i + 1]![(j + 1) % width]!;
      const d = rows[i + 1]![j]!;
      soup.push(...a, ...b, ...c, ...a, ...c, ...d);
    }
  }
  if (closed) {
    soup.push(...fan(rows[0]!, true), ...fan(rows.at(-1)!, false));
  }
  return soup;
}

/** A cap over a ring that is seen whole from its middle. */
function fan(ring: readonly Triple[], isFirst: boolean): Soup {
  const sums = ring.reduce<Triple>((s, p) => [s[0] + p[0], s[1] + p[1], s[2] + p[2]], [0, 0, 0]);
  const middle: Triple = [sums[0] / ring.length, sums[1] / ring.length, sums[2] / ring.length];
  return ring.flatMap((p, i) => {
    const next = ring[(i + 1) % ring.length]!;
    return isFirst ? [...middle, ...next, ...p] : [...middle, ...p, ...next];
  });
}

/** A body turned about an axis from pairs of place along it and radius, capped at both ends. */
export function turned(
  profile: readonly (readonly [along: number, radius: number])[],
  { axis, pieces }: { readonly axis: 'x' | 'y' | 'z'; readonly pieces: number },
): Soup {
  const rows = profile.map(([along, radius]) =>
    Array.from({ length: pieces }, (_, i): Triple => {
      const angle = (-2 * Math.PI * i) / pieces;
      const u = radius * Math.cos(angle);
      const v = radius * Math.sin(angle);
      if (axis === 'x') return [along, u, v];
      return axis === 'y' ? [v, along, u] : [u, v, along];
    }),
  );
  return sweep(rows, { closed: true });
}

/** Binary STL; coordinates as 32-bit floats, so that equal corners stay equal. */
export function encodeStl(soup: Soup, title: string): Uint8Array {
  const count = soup.length / 9;
  const bytes = new Uint8Array(84 + 50 * count);
  const view = new DataView(bytes.buffer);
  new TextEncoder().encodeInto(title, bytes.subarray(0, 80));
  view.setUint32(80, count, true);
  for (let t = 0; t < count; t += 1) {
    const p = soup.slice(9 * t, 9 * t + 9);
    const u = [p[3]! - p[0]!, p[4]! - p[1]!, p[5]! - p[2]!] as const;
    const v = [p[6]! - p[0]!, p[7]! - p[1]!, p[8]! - p[2]!] as const;
    const n = [u[1] * v[2] - u[2] * v[1], u[2] * v[0] - u[0] * v[2], u[0] * v[1] - u[1] * v[0]];
    const size = Math.hypot(...n) || 1;
    const at = 84 + 50 * t;
    n.forEach((x, k) => view.setFloat32(at + 4 * k, x / size, true));
    p.forEach((x, k) => view.setFloat32(at + 12 + 4 * k, x, true));
  }
  return bytes;
}
