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
 *  slides: d (m), or none where nothing slides. One array of constants and one of results, because each costs more than a few numbers. That a step needs no turn about z but the motion's own makes it half the work of a product of transforms, without what
 *  Denavit & Hartenberg's form loses where axes are nearly parallel; nobody needs x and y of the frames on the way. */
export function placeAxes(constants: Float64Array, turns: Float64Array, slides: Float64Array, count: number, out: Float64Array): void {
  let r11 = constants[0]!, r12 = constants[1]!, r13 = constants[2]!, x = constants[3]!
  let r21 = constants[4]!, r22 = constants[5]!, r23 = constants[6]!, y = constants[7]!
  let r31 = constants[8]!, r32 = constants[9]!, r33 = constants[10]!, z = constants[11]!

  const sliding = slides.length > 0
  for (let i = 0; i < count; i++) {
    // FIRST_STEP, STEP_SIZE, FIRST_AXIS and AXIS_SIZE as numbers: an exported constant is read, and checked, on every turn of a loop.
    const step = 24 + 5 * i
    const px = constants[step + 2]!
    // What is exactly 0, as most of it is in most arms, is left out; that is the same on each call, and so costs no surprise.
    if (px !== 0) {
      x += r11 * px
      y += r21 * px
      z += r31 * px
    }
    const py = constants[step + 3]!
    if (py !== 0) {
      x += r12 * py
      y += r22 * py
      z += r32 * py
    }
    const pz = constants[step + 4]!
    if (pz !== 0) {
      x += r13 * pz
      y += r23 * pz
      z += r33 * pz
    }

    const ca = constants[step]!, sa = constants[step + 1]!
    let t1: number, t2: number, t3: number
    if (ca === 0) {
      t1 = sa * r13
      t2 = sa * r23
      t3 = sa * r33
      r13 = -sa * r12
      r23 = -sa * r22
      r33 = -sa * r32
    } else {
      t1 = ca * r12 + sa * r13
      t2 = ca * r22 + sa * r23
      t3 = ca * r32 + sa * r33
      r13 = ca * r13 - sa * r12
      r23 = ca * r23 - sa * r22
      r33 = ca * r33 - sa * r32
    }
    const st = turns[2 * i]!, ct = turns[2 * i + 1]!
    r12 = ct * t1 - st * r11
    r22 = ct * t2 - st * r21
    r32 = ct * t3 - st * r31
    r11 = ct * r11 + st * t1
    r21 = ct * r21 + st * t2
    r31 = ct * r31 + st * t3

    if (sliding) {
      const d = slides[i]!
      x += r13 * d
      y += r23 * d
      z += r33 * d
    }
    const at = 12 + 6 * i
    out[at] = r13
    out[at + 1] = r23
    out[at + 2] = r33
    out[at + 3] = x
    out[at + 4] = y
    out[at + 5] = z
  }
  const e11 = constants[12]!, e12 = constants[13]!, e13 = constants[14]!, ex = constants[15]!
  const e21 = constants[16]!, e22 = constants[17]!, e23 = constants[18]!, ey = constants[19]!
  const e31 = constants[20]!, e32 = constants[21]!, e33 = constants[22]!, ez = constants[23]!
  out[0] = r11 * e11 + r12 * e21 + r13 * e31
  out[1] = r11 * e12 + r12 * e22 + r13 * e32
  out[2] = r11 * e13 + r12 * e23 + r13 * e33
  out[3] = r11 * ex + r12 * ey + r13 * ez + x
  out[4] = r21 * e11 + r22 * e21 + r23 * e31
  out[5] = r21 * e12 + r22 * e22 + r23 * e32
  out[6] = r21 * e13 + r22 * e23 + r23 * e33
  out[7] = r21 * ex + r22 * ey + r23 * ez + y
  out[8] = r31 * e11 + r32 * e21 + r33 * e31
  out[9] = r31 * e12 + r32 * e22 + r33 * e32
  out[10] = r31 * e13 + r32 * e23 + r33 * e33
  out[11] = r31 * ex + r32 * ey + r33 * ez + z
}
