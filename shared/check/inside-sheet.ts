// A part that seems to lie inside a broken scan: an open surface has no inside that could be proven, but the generalised
// winding number tells when it all but closes around a point.
import { inBox, piecePoints, shapeBox, windingNumber, type Placed } from '#shared/geometry';
import { applyRigid, invertRigid } from '#shared/units';

/** Above this winding number, in magnitude, a point counts as enclosed. */
const ENCLOSED = 0.75;
/** Pieces of one solid that are asked about at most; a scan may fall into thousands. */
const PIECES = 8;

function enclosed(inner: readonly Placed[], outer: readonly Placed[]): boolean {
  for (const sheet of outer) {
    const { shape } = sheet;
    if (shape.kind !== 'mesh' || shape.body) continue;
    const back = invertRigid(sheet.pose);
    for (const solid of inner) {
      for (const point of piecePoints(solid.shape).slice(0, PIECES)) {
        const p = applyRigid(back, applyRigid(solid.pose, point));
        // the winding number falls off quickly outside the sheet's box, where it can reach 0.75 only for freak shapes
        if (inBox(shapeBox(shape), p) && Math.abs(windingNumber(shape, p)) > ENCLOSED) return true;
      }
    }
  }
  return false;
}

/** True if a solid of either side lies, as it seems, inside a sheet of the other: asked at one point of each piece. World poses. */
export function insideSheet(a: readonly Placed[], b: readonly Placed[]): boolean {
  return enclosed(a, b) || enclosed(b, a);
}
