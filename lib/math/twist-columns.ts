/** Twists as columns of a 6 x n row-major matrix: linear rows vx, vy, vz, then wx, wy, wz. */

/** Fills the 6 x n matrix `out` with a column for each of n frames: the twist that turning about its z axis gives the origin of `point`
 *  (a transform), v = z × (p − o), w = z, or the one that sliding along it gives, v = z, w = 0, all in the axes that both are given in. */
export function fillColumns(frames: Float64Array, rotary: Uint8Array, point: Float64Array, n: number, out: Float64Array): void {
  const px = point[3]!, py = point[7]!, pz = point[11]!
  for (let i = 0; i < n; i++) {
    const at = 12 * i
    const z1 = frames[at + 2]!, z2 = frames[at + 6]!, z3 = frames[at + 10]!
    const turning = rotary[i] === 1
    const x = px - frames[at + 3]!, y = py - frames[at + 7]!, z = pz - frames[at + 11]!
    out[i] = turning ? z2 * z - z3 * y : z1
    out[n + i] = turning ? z3 * x - z1 * z : z2
    out[2 * n + i] = turning ? z1 * y - z2 * x : z3
    out[3 * n + i] = turning ? z1 : 0
    out[4 * n + i] = turning ? z2 : 0
    out[5 * n + i] = turning ? z3 : 0
  }
}

/** Adds `weight` times the twist that turning about the z axis of the frame at `at` gives the origin of `point` (a transform):
 *  v = z × (p − o), w = z, all in the axes that both are given in. */
export function addTurning(
  frames: Float64Array, at: number, point: Float64Array, weight: number, out: Float64Array, columns: number, column: number,
): void {
  const z1 = weight * frames[at + 2]!, z2 = weight * frames[at + 6]!, z3 = weight * frames[at + 10]!
  const x = point[3]! - frames[at + 3]!, y = point[7]! - frames[at + 7]!, z = point[11]! - frames[at + 11]!
  out[column]! += z2 * z - z3 * y
  out[columns + column]! += z3 * x - z1 * z
  out[2 * columns + column]! += z1 * y - z2 * x
  out[3 * columns + column]! += z1
  out[4 * columns + column]! += z2
  out[5 * columns + column]! += z3
}

/** Adds `weight` times the twist of sliding along the z axis of the frame at `at`: v = z, w = 0. */
export function addSliding(frames: Float64Array, at: number, weight: number, out: Float64Array, columns: number, column: number): void {
  out[column]! += weight * frames[at + 2]!
  out[columns + column]! += weight * frames[at + 6]!
  out[2 * columns + column]! += weight * frames[at + 10]!
}

/** out = the same twists in the axes of `frame`: both blocks multiplied by Rᵀ of that transform. `out` may be `twists`. */
export function turnIntoFrame(frame: ArrayLike<number>, twists: ArrayLike<number>, columns: number, out: Float64Array | number[]): void {
  for (let block = 0; block < 6 * columns; block += 3 * columns) {
    for (let column = block; column < block + columns; column++) {
      const x = twists[column]!, y = twists[column + columns]!, z = twists[column + 2 * columns]!
      out[column] = frame[0]! * x + frame[4]! * y + frame[8]! * z
      out[column + columns] = frame[1]! * x + frame[5]! * y + frame[9]! * z
      out[column + 2 * columns] = frame[2]! * x + frame[6]! * y + frame[10]! * z
    }
  }
}

/** The way back: both blocks multiplied by R of the transform, in place. */
export function turnOutOfFrame(frame: ArrayLike<number>, twists: Float64Array | number[], columns: number): void {
  for (let block = 0; block < 6 * columns; block += 3 * columns) {
    for (let column = block; column < block + columns; column++) {
      const x = twists[column]!, y = twists[column + columns]!, z = twists[column + 2 * columns]!
      twists[column] = frame[0]! * x + frame[1]! * y + frame[2]! * z
      twists[column + columns] = frame[4]! * x + frame[5]! * y + frame[6]! * z
      twists[column + 2 * columns] = frame[8]! * x + frame[9]! * y + frame[10]! * z
    }
  }
}
