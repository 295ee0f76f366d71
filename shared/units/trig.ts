// Sine, cosine and arc tangent that give the same bits in every engine. JavaScript leaves Math.sin and its kin to the
// engine, and two engines differ in the last bit; a check must give one report in Node and in the browser. Only + - * /
// and Math.sqrt are used here, which IEEE 754 fixes to the bit.
// The polynomials are the minimax ones of the public fdlibm (k_sin.c, k_cos.c, s_atan.c), good to about one unit in the
// last place on their intervals.

const RADIANS_PER_DEGREE = 0.017453292519943295;
const DEGREES_PER_RADIAN = 57.29577951308232;

/** sin(x) for |x| <= pi/4, x in radians. */
function kernelSin(x: number): number {
  const z = x * x;
  const r =
    8.33333333332248946124e-3 +
    z *
      (-1.98412698298579493134e-4 +
        z * (2.75573137070700676789e-6 + z * (-2.50507602534068634195e-8 + z * 1.58969099521155010221e-10)));
  return x + z * x * (-1.66666666666666324348e-1 + z * r);
}

/** cos(x) for |x| <= pi/4, x in radians. */
function kernelCos(x: number): number {
  const z = x * x;
  const r =
    z *
    (4.16666666666666019037e-2 +
      z *
        (-1.38888888888741095749e-3 +
          z *
            (2.48015872894767294178e-5 +
              z * (-2.75573143513906633035e-7 + z * (2.0875723212981748279e-9 + z * -1.13596475577881948265e-11)))));
  const half = 0.5 * z;
  const w = 1 - half;
  return w + (1 - w - half + z * r);
}

/**
 * Sine and cosine of an angle in degrees: `[sin, cos]`. The reduction to one octant is done in degrees, where it is
 * exact, so whole quarter turns give exactly 0 and ±1.
 */
export function sinCosDegrees(degrees: number): readonly [number, number] {
  let d = degrees % 360;
  if (d > 180) d -= 360;
  else if (d < -180) d += 360;
  // d in [-180, 180]; take the nearest quarter turn away
  let quarter = 0;
  if (d > 135) {
    quarter = 2;
    d -= 180;
  } else if (d > 45) {
    quarter = 1;
    d -= 90;
  } else if (d < -135) {
    quarter = 2;
    d += 180;
  } else if (d < -45) {
    quarter = 3;
    d += 90;
  }
  const x = d * RADIANS_PER_DEGREE;
  const s = kernelSin(x);
  const c = kernelCos(x);
  if (quarter === 0) return [s, c];
  if (quarter === 1) return [c, -s];
  if (quarter === 2) return [-s, -c];
  return [-c, s];
}

/** Arc tangent in radians, for any finite x. */
function arcTangent(x: number): number {
  const negative = x < 0;
  let a = negative ? -x : x;
  let high = 0;
  let low = 0;
  let reduced = false;
  if (a >= 0.4375) {
    reduced = true;
    if (a < 1.1875) {
      if (a < 0.6875) {
        high = 4.63647609000806093515e-1;
        low = 2.26987774529616870924e-17;
        a = (2 * a - 1) / (2 + a);
      } else {
        high = 7.85398163397448278999e-1;
        low = 3.06161699786838301793e-17;
        a = (a - 1) / (a + 1);
      }
    } else if (a < 2.4375) {
      high = 9.82793723247329054082e-1;
      low = 1.39033110312309984516e-17;
      a = (a - 1.5) / (1 + 1.5 * a);
    } else {
      high = 1.570796326794896558;
      low = 6.12323399573676603587e-17;
      a = -1 / a;
    }
  }
  const z = a * a;
  const w = z * z;
  const s1 =
    z *
    (3.33333333333329318027e-1 +
      w *
        (1.42857142725034663711e-1 +
          w *
            (9.09088713343650656196e-2 +
              w * (6.66107313738753120669e-2 + w * (4.97687799461593236017e-2 + w * 1.62858201153657823623e-2)))));
  const s2 =
    w *
    (-1.99999999998764832476e-1 +
      w *
        (-1.1111110405462355788e-1 +
          w * (-7.69187620504482999495e-2 + w * (-5.83357013379057348645e-2 + w * -3.6531572744216915527e-2))));
  const value = reduced ? high - (a * (s1 + s2) - low - a) : a - a * (s1 + s2);
  return negative ? -value : value;
}

/** The angle of the vector (x, y) from the x axis in radians, in (-pi, pi]; (0, 0) gives 0. */
export function atan2Radians(y: number, x: number): number {
  if (x === 0) return y === 0 ? 0 : y > 0 ? 1.5707963267948966 : -1.5707963267948966;
  const ratio = y / x;
  // an overflowing ratio is a right angle, not a NaN
  const base = ratio === Infinity ? 1.5707963267948966 : ratio === -Infinity ? -1.5707963267948966 : arcTangent(ratio);
  if (x > 0) return base;
  return y < 0 ? base - 3.141592653589793 : base + 3.141592653589793;
}

/** The angle of the vector (x, y) from the x axis in degrees, in (-180, 180]. */
export function atan2Degrees(y: number, x: number): number {
  return atan2Radians(y, x) * DEGREES_PER_RADIAN;
}

/** Degrees as radians. */
export function radiansOf(degrees: number): number {
  return degrees * RADIANS_PER_DEGREE;
}
