/** A sine below this is rounding: the axes are parallel. */
const PARALLEL = 1e-15

/** Takes a transform apart into Rz(first) · Trans(p) · Rx(α) · Rz(last), writes cos α, sin α and p to `steps` from `at` on and returns
 *  the turns about z (rad). Stable at every angle: `last` is what is left once `first` is taken off, so that a `first` which is hardly
 *  determined does no harm. Quarter turns leave exact zeros and ones. */
export function stepBetweenAxes(transform: ArrayLike<number>, steps: Float64Array, at: number): { readonly first: number; readonly last: number } {
  const ax = transform[2]!, ay = transform[6]!
  const sine = Math.sqrt(ax * ax + ay * ay)
  const parallel = sine < PARALLEL
  const c = parallel ? 1 : -ay / sine
  const s = parallel ? 0 : ax / sine
  const px = transform[3]!, py = transform[7]!
  steps[at] = parallel ? Math.sign(transform[10]!) : transform[10]!
  steps[at + 1] = parallel ? 0 : sine
  steps[at + 2] = c * px + s * py
  steps[at + 3] = c * py - s * px
  steps[at + 4] = transform[11]!
  return { first: Math.atan2(s, c), last: Math.atan2(-(c * transform[1]! + s * transform[5]!), c * transform[0]! + s * transform[4]!) }
}
