import type { Matrix4 } from 'three';
import type { Rigid } from '#shared/units';

/** Writes a placement into a matrix of three.js. */
export function toMatrix(m: Rigid, out: Matrix4): Matrix4 {
  return out.set(m[0]!, m[1]!, m[2]!, m[3]!, m[4]!, m[5]!, m[6]!, m[7]!, m[8]!, m[9]!, m[10]!, m[11]!, 0, 0, 0, 1);
}
