/** Unit quaternions in the order x, y, z, w. */
export type Quaternion = [x: number, y: number, z: number, w: number]

/** Below this magnitude a quaternion component is rounding and does not decide the sign. */
const SIGN_THRESHOLD = 1e-9

/** The unit quaternion of a transform's rotation: the first of w, x, y, z whose magnitude exceeds 1e-9 is positive.
 *  Divides by the largest component (Shepperd 1978, from memory), so that it is accurate at every angle. */
export function quaternionOf(transform: ArrayLike<number>): Quaternion {
  const r11 = transform[0]!, r12 = transform[1]!, r13 = transform[2]!
  const r21 = transform[4]!, r22 = transform[5]!, r23 = transform[6]!
  const r31 = transform[8]!, r32 = transform[9]!, r33 = transform[10]!
  const trace = r11 + r22 + r33
  let x: number, y: number, z: number, w: number
  if (trace >= r11 && trace >= r22 && trace >= r33) {
    w = 1 + trace
    x = r32 - r23
    y = r13 - r31
    z = r21 - r12
  } else if (r11 >= r22 && r11 >= r33) {
    w = r32 - r23
    x = 1 + r11 - r22 - r33
    y = r12 + r21
    z = r13 + r31
  } else if (r22 >= r33) {
    w = r13 - r31
    x = r12 + r21
    y = 1 + r22 - r11 - r33
    z = r23 + r32
  } else {
    w = r21 - r12
    x = r13 + r31
    y = r23 + r32
    z = 1 + r33 - r11 - r22
  }
  let length = Math.sqrt(x * x + y * y + z * z + w * w)
  if (isNegative(w, x, y, z, SIGN_THRESHOLD * length)) length = -length
  return [x / length, y / length, z / length, w / length]
}

function isNegative(w: number, x: number, y: number, z: number, threshold: number): boolean {
  if (Math.abs(w) > threshold) return w < 0
  if (Math.abs(x) > threshold) return x < 0
  if (Math.abs(y) > threshold) return y < 0
  return z < 0
}

/** The transform of a position (m) and a quaternion (x, y, z, w; its norm is divided out, it must not be 0). */
export function transformOfPose(position: ArrayLike<number>, quaternion: ArrayLike<number>, out = new Float64Array(12)): Float64Array {
  const a = quaternion[0]!, b = quaternion[1]!, c = quaternion[2]!, d = quaternion[3]!
  const length = Math.sqrt(a * a + b * b + c * c + d * d)
  const x = a / length, y = b / length, z = c / length, w = d / length
  out[0] = 1 - 2 * (y * y + z * z)
  out[1] = 2 * (x * y - z * w)
  out[2] = 2 * (x * z + y * w)
  out[3] = position[0]!
  out[4] = 2 * (x * y + z * w)
  out[5] = 1 - 2 * (x * x + z * z)
  out[6] = 2 * (y * z - x * w)
  out[7] = position[1]!
  out[8] = 2 * (x * z - y * w)
  out[9] = 2 * (y * z + x * w)
  out[10] = 1 - 2 * (x * x + y * y)
  out[11] = position[2]!
  return out
}
