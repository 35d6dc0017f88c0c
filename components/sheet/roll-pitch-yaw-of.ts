/** Roll, pitch and yaw (rad; fixed axes x, y, z, so R = Rz·Ry·Rx, as URDF writes them) of a unit quaternion [x, y, z, w].
 *  At a pitch of ±90° only yaw ∓ roll is determined; roll is then 0. */
export function rollPitchYawOf(quaternion: readonly number[]): readonly [roll: number, pitch: number, yaw: number] {
  const [x = 0, y = 0, z = 0, w = 1] = quaternion
  const sine = 2 * (w * y - x * z)
  if (Math.abs(sine) > 1 - 1e-12) return [0, (Math.sign(sine) * Math.PI) / 2, 2 * Math.atan2(z, w)]
  return [Math.atan2(2 * (w * x + y * z), 1 - 2 * (x * x + y * y)), Math.asin(sine), Math.atan2(2 * (w * z + x * y), 1 - 2 * (y * y + z * z))]
}
