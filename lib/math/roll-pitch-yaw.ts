/** The transform of a position (m) and roll, pitch, yaw (rad) about fixed axes x, then y, then z: R = Rz(yaw)·Ry(pitch)·Rx(roll),
 *  which is URDF's `rpy`. */
export function transformOfRollPitchYaw(position: ArrayLike<number>, rpy: ArrayLike<number>, out = new Float64Array(12)): Float64Array {
  const cr = Math.cos(rpy[0]!), sr = Math.sin(rpy[0]!)
  const cp = Math.cos(rpy[1]!), sp = Math.sin(rpy[1]!)
  const cy = Math.cos(rpy[2]!), sy = Math.sin(rpy[2]!)
  out[0] = cy * cp
  out[1] = cy * sp * sr - sy * cr
  out[2] = cy * sp * cr + sy * sr
  out[3] = position[0]!
  out[4] = sy * cp
  out[5] = sy * sp * sr + cy * cr
  out[6] = sy * sp * cr - cy * sr
  out[7] = position[1]!
  out[8] = -sp
  out[9] = cp * sr
  out[10] = cp * cr
  out[11] = position[2]!
  return out
}
