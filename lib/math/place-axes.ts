/** How many numbers describe the way from one motion's frame to the next: cosine and sine of the turn about x, and a position (m). */
export const STEP_SIZE = 5

/** Where in its constants a chain's first step stands: after the transform to the first motion, and that from the last frame to the tip. */
export const FIRST_STEP = 24

/** How many numbers an axis has: its unit direction, and a point on it (m). */
export const AXIS_SIZE = 6

/** Where the first axis stands in what placeAxes fills: after the transform of the tip. */
export const FIRST_AXIS = 12

/** Fills `out` with the transform of the tip and the axis of each motion, which is z of its frame and the origin of that. The first frame
 *  stands after the first constant, each is before · Trans(p) · Rx(α) · Rz(θ) · Tz(d). steps: cos α, sin α, p; turns: sin θ, cos θ;
 *  slides: d (m). One array of constants and one of results, because each costs more than a few numbers. That a step needs no turn about z but the motion's own makes it half the work of a product of transforms, without what
 *  Denavit & Hartenberg's form loses where axes are nearly parallel; nobody needs x and y of the frames on the way. */
export function placeAxes(constants: Float64Array, turns: Float64Array, slides: Float64Array, count: number, out: Float64Array): void {
  let r11 = constants[0]!, r12 = constants[1]!, r13 = constants[2]!, x = constants[3]!
  let r21 = constants[4]!, r22 = constants[5]!, r23 = constants[6]!, y = constants[7]!
  let r31 = constants[8]!, r32 = constants[9]!, r33 = constants[10]!, z = constants[11]!
  for (let i = 0; i < count; i++) {
    const step = FIRST_STEP + STEP_SIZE * i
    const ca = constants[step]!, sa = constants[step + 1]!, px = constants[step + 2]!, py = constants[step + 3]!, pz = constants[step + 4]!
    const st = turns[2 * i]!, ct = turns[2 * i + 1]!
    const d = slides[i]!
    x += r11 * px + r12 * py + r13 * pz
    y += r21 * px + r22 * py + r23 * pz
    z += r31 * px + r32 * py + r33 * pz

    const t1 = ca * r12 + sa * r13
    r13 = ca * r13 - sa * r12
    r12 = ct * t1 - st * r11
    r11 = ct * r11 + st * t1
    const t2 = ca * r22 + sa * r23
    r23 = ca * r23 - sa * r22
    r22 = ct * t2 - st * r21
    r21 = ct * r21 + st * t2
    const t3 = ca * r32 + sa * r33
    r33 = ca * r33 - sa * r32
    r32 = ct * t3 - st * r31
    r31 = ct * r31 + st * t3

    if (d !== 0) {
      x += r13 * d
      y += r23 * d
      z += r33 * d
    }
    const at = FIRST_AXIS + AXIS_SIZE * i
    out[at] = r13
    out[at + 1] = r23
    out[at + 2] = r33
    out[at + 3] = x
    out[at + 4] = y
    out[at + 5] = z
  }
  for (let column = 0; column < 4; column++) {
    const e1 = constants[12 + column]!, e2 = constants[16 + column]!, e3 = constants[20 + column]!
    out[column] = r11 * e1 + r12 * e2 + r13 * e3
    out[column + 4] = r21 * e1 + r22 * e2 + r23 * e3
    out[column + 8] = r31 * e1 + r32 * e2 + r33 * e3
  }
  out[3]! += x
  out[7]! += y
  out[11]! += z
}
