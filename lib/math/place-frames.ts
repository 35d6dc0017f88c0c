/** How many numbers describe the way from one motion's frame to the next: cosine and sine of the turn about x, and a position (m). */
export const STEP_SIZE = 5

/** Fills `frames` (12 numbers each, row-major 3 x 4) with the frame of each motion: frame = before · Trans(p) · Rx(α) · Rz(θ) · Tz(d),
 *  the first one after the transform `start`. steps: cos α, sin α, p; turns: sin θ, cos θ; slides: d (m). That a step needs no turn about z but the motion's own makes it half
 *  the work of a product of transforms, without what Denavit & Hartenberg's form loses where axes are nearly parallel. */
export function placeFrames(
  start: Float64Array, steps: Float64Array, turns: Float64Array, slides: Float64Array, count: number, frames: Float64Array,
): void {
  let r11 = start[0]!, r12 = start[1]!, r13 = start[2]!, x = start[3]!
  let r21 = start[4]!, r22 = start[5]!, r23 = start[6]!, y = start[7]!
  let r31 = start[8]!, r32 = start[9]!, r33 = start[10]!, z = start[11]!
  for (let i = 0; i < count; i++) {
    const step = STEP_SIZE * i
    const ca = steps[step]!, sa = steps[step + 1]!, px = steps[step + 2]!, py = steps[step + 3]!, pz = steps[step + 4]!
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
    const at = 12 * i
    frames[at] = r11
    frames[at + 1] = r12
    frames[at + 2] = r13
    frames[at + 3] = x
    frames[at + 4] = r21
    frames[at + 5] = r22
    frames[at + 6] = r23
    frames[at + 7] = y
    frames[at + 8] = r31
    frames[at + 9] = r32
    frames[at + 10] = r33
    frames[at + 11] = z
  }
}
