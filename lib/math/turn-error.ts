/** Below this angle (rad) the series is exact to the last digits. */
const SMALL = 1e-3

/** How a rotation vector e (rad) that is left to turn changes with the turning: ė = −A·ω. Fills `out` with A (3 x 3, row-major), the
 *  inverse of the Jacobian of the exponential map: I ± ½[e]× + (1/ϑ² − (1 + cos ϑ)/(2ϑ sin ϑ))·[e]×², with + for e and ω in the axes of
 *  the goal's base ('base') and − in those of what turns ('tip'). */
export function turnErrorSlope(e: ArrayLike<number>, axes: 'base' | 'tip', out: Float64Array): void {
  const x = e[0]!, y = e[1]!, z = e[2]!
  const squared = x * x + y * y + z * z
  const angle = Math.sqrt(squared)
  const half = axes === 'base' ? 0.5 : -0.5
  const c = angle < SMALL ? 1 / 12 + squared / 720 : 1 / squared - 1 / (2 * angle * Math.tan(angle / 2))
  out[0] = 1 - c * (y * y + z * z)
  out[1] = -half * z + c * x * y
  out[2] = half * y + c * x * z
  out[3] = half * z + c * x * y
  out[4] = 1 - c * (x * x + z * z)
  out[5] = -half * x + c * y * z
  out[6] = -half * y + c * x * z
  out[7] = half * x + c * y * z
  out[8] = 1 - c * (x * x + y * y)
}
