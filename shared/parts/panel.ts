// Sheet-metal panels with openings, built of strips: a panel stands in the plane of Y and Z, its thickness along X.
import type { Solid } from '#shared/scene';
import { box } from './solids';

/** A rectangle of the panel, in mm: `y` across, `z` up. */
export interface Patch {
  readonly y: readonly [number, number];
  readonly z: readonly [number, number];
}

/** The patches that are left of a panel when its openings are cut. */
export function stripsAround(panel: Patch, openings: readonly Patch[]): Patch[] {
  const heights = [...panel.z, ...openings.flatMap((o) => [...o.z])]
    .filter((z) => z >= panel.z[0] && z <= panel.z[1])
    .sort((a, b) => a - b);
  const strips: Patch[] = [];
  for (let i = 1; i < heights.length; i += 1) {
    const low = heights[i - 1]!;
    const high = heights[i]!;
    if (high - low < 1e-6) continue;
    const cut = openings.filter((o) => o.z[0] < high && o.z[1] > low).sort((a, b) => a.y[0] - b.y[0]);
    let y = panel.y[0];
    const row: Patch[] = [];
    for (const o of cut) {
      if (o.y[0] - y > 1e-6) row.push({ y: [y, Math.min(o.y[0], panel.y[1])], z: [low, high] });
      y = Math.max(y, o.y[1]);
    }
    if (panel.y[1] - y > 1e-6) row.push({ y: [y, panel.y[1]], z: [low, high] });
    mergeRow(strips, row);
  }
  return strips;
}

/** Joins a row to the strips right below it that have the same sides. */
function mergeRow(strips: Patch[], row: readonly Patch[]): void {
  for (const patch of row) {
    const below = strips.findIndex((s) => s.z[1] === patch.z[0] && s.y[0] === patch.y[0] && s.y[1] === patch.y[1]);
    if (below < 0) strips.push(patch);
    else strips[below] = { y: patch.y, z: [strips[below]!.z[0], patch.z[1]] };
  }
}

/** The strips as boxes, their front face (-X side) at x = -thickness, their rear face at x = 0. */
export function panel(id: string, name: string, thickness: number, whole: Patch, openings: readonly Patch[]): Solid[] {
  return stripsAround(whole, openings).map(({ y, z }, i) =>
    box(
      `${id}-${i + 1}`,
      name,
      [thickness, y[1] - y[0], z[1] - z[0]],
      [-thickness / 2, (y[0] + y[1]) / 2, (z[0] + z[1]) / 2],
    ),
  );
}
