// What all materials of one stage share: lasers thrown on the parts, the cutaway, the scale of the screen.
import { Vector2, Vector4 } from 'three';
import type { Laser } from '#shared/scene';
import { tokenColour } from './colours';
import { dot, scale, unit, type Triple } from './vectors';

export const MOST_LASERS = 8;

export interface SharedLight {
  readonly lasers: { value: Vector4[] };
  readonly laserCount: { value: number };
  readonly laserColour: { value: ReturnType<typeof tokenColour> };
  /** Plane of the cutaway: what lies on its far side (n·p > w) is not drawn. */
  readonly cut: { value: Vector4 };
  readonly isCut: { value: boolean };
  /** Size of what is drawn on, px, and px of it per CSS px. */
  readonly screen: { value: Vector2 };
  readonly density: { value: number };
  /** Distances from the eye between which things recede into the dye. */
  readonly recede: { value: Vector2 };
}

export function createLight(): SharedLight {
  return {
    lasers: { value: Array.from({ length: MOST_LASERS }, () => new Vector4()) },
    laserCount: { value: 0 },
    laserColour: { value: tokenColour('laser') },
    cut: { value: new Vector4() },
    isCut: { value: false },
    screen: { value: new Vector2(1, 1) },
    density: { value: 1 },
    recede: { value: new Vector2(1e6, 2e6) },
  };
}

export function throwLasers(light: SharedLight, lasers: readonly Laser[]): void {
  const shown = lasers.slice(0, MOST_LASERS);
  shown.forEach((laser, i) => {
    const n = unit(laser.normal);
    light.lasers.value[i]!.set(...n, dot(n, laser.point));
  });
  light.laserCount.value = shown.length;
}

/** A plane to cut along: everything on the side that `towards` points to is taken away. */
export interface Cut {
  readonly point: Triple;
  readonly towards: Triple;
}

export function setCut(light: SharedLight, cut: Cut | null): void {
  light.isCut.value = cut !== null;
  if (cut === null) return;
  const n = unit(cut.towards);
  light.cut.value.set(...scale(n, 1), dot(n, cut.point));
}
