// A part that seems to lie inside a broken scan: an open surface has no inside that could be proven, but the generalised
// winding number tells when it all but closes around a point.
import { inBox, shapeBox, windingNumber, type Placed } from '#shared/geometry';
import { applyRigid, invertRigid } from '#shared/units';

/** From this winding number on, in magnitude, a point counts as enclosed. */
const ENCLOSED = 0.75;

function enclosed(inner: readonly Placed[], outer: readonly Placed[]): boolean {
  for (const sheet of outer) {
    const { shape } = sheet;
    if (shape.kind !== 'mesh' || shape.body) continue;
    const back = invertRigid(sheet.pose);
    for (const solid of inner) {
      const box = shapeBox(solid.shape);
      const centre = applyRigid(back, applyRigid(solid.pose, [box[0]!, box[1]!, box[2]!]));
      // the winding number falls off quickly outside the sheet's box, where it can reach 0.75 only for freak shapes
      if (inBox(shapeBox(shape), centre) && Math.abs(windingNumber(shape, centre)) > ENCLOSED) return true;
    }
  }
  return false;
}

/** True if the middle of a solid of either side lies, as it seems, inside a sheet of the other. World poses. */
export function insideSheet(a: readonly Placed[], b: readonly Placed[]): boolean {
  return enclosed(a, b) || enclosed(b, a);
}
