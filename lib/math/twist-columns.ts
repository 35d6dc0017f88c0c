/** Twists as columns of a 6 x n row-major matrix: linear rows vx, vy, vz, then wx, wy, wz. */

/** Fills the 6 x n matrix `out` with a column for each of n axes (see placeAxes): the twist that turning about it gives the origin of `point`
 *  (a transform), v = z × (p − o), w = z, or the one that sliding along it gives, v = z, w = 0, all in the frame that both are given in. */
export function fillColumns(axes: Float64Array, rotary: Uint8Array, point: Float64Array, n: number, out: Float64Array): void {
  const px = point[3]!, py = point[7]!, pz = point[11]!
  for (let i = 0; i < n; i++) {
    const at = 6 * i
    const z1 = axes[at]!, z2 = axes[at + 1]!, z3 = axes[at + 2]!
    if (rotary[i] === 1) {
      const x = px - axes[at + 3]!, y = py - axes[at + 4]!, z = pz - axes[at + 5]!
      out[i] = z2 * z - z3 * y
      out[n + i] = z3 * x - z1 * z
      out[2 * n + i] = z1 * y - z2 * x
      out[3 * n + i] = z1
      out[4 * n + i] = z2
      out[5 * n + i] = z3
    } else {
      out[i] = z1
      out[n + i] = z2
      out[2 * n + i] = z3
      out[3 * n + i] = 0
      out[4 * n + i] = 0
      out[5 * n + i] = 0
    }
  }
}

/** Adds `weight` times the twist that turning about the axis at `at` gives the origin of `point` (a transform): v = z × (p − o), w = z. */
export function addTurning(
  axes: Float64Array, at: number, point: Float64Array, weight: number, out: Float64Array, columns: number, column: number,
): void {
  const z1 = weight * axes[at]!, z2 = weight * axes[at + 1]!, z3 = weight * axes[at + 2]!
  const x = point[3]! - axes[at + 3]!, y = point[7]! - axes[at + 4]!, z = point[11]! - axes[at + 5]!
  out[column]! += z2 * z - z3 * y
  out[columns + column]! += z3 * x - z1 * z
  out[2 * columns + column]! += z1 * y - z2 * x
  out[3 * columns + column]! += z1
  out[4 * columns + column]! += z2
  out[5 * columns + column]! += z3
}

/** Adds `weight` times the twist of sliding along the axis at `at`: v = z, w = 0. */
export function addSliding(axes: Float64Array, at: number, weight: number, out: Float64Array, columns: number, column: number): void {
  out[column]! += weight * axes[at]!
  out[columns + column]! += weight * axes[at + 1]!
  out[2 * columns + column]! += weight * axes[at + 2]!
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

/** twist (6) = J·rates of a row-major 6 x n matrix, all six sums at once. */
export function fillTwist(j: Float64Array, rates: Float64Array, twist: Float64Array): void {
  const n = rates.length
  let vx = 0, vy = 0, vz = 0, wx = 0, wy = 0, wz = 0
  for (let c = 0; c < n; c++) {
    const rate = rates[c]!
    vx += j[c]! * rate
    vy += j[n + c]! * rate
    vz += j[2 * n + c]! * rate
    wx += j[3 * n + c]! * rate
    wy += j[4 * n + c]! * rate
    wz += j[5 * n + c]! * rate
  }
  twist[0] = vx
  twist[1] = vy
  twist[2] = vz
  twist[3] = wx
  twist[4] = wy
  twist[5] = wz
}
