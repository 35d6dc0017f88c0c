/** The rotation A (as a transform without translation) whose third column is the unit vector `axis`, so that turning
 *  about `axis` is A · Rz · Aᵀ. Along a coordinate axis A holds only 0 and ±1, so that it adds no rounding. */
export function axisFrame(axis: ArrayLike<number>, out: Float64Array): void {
  let largest = 0
  for (let i = 1; i < 3; i++) if (Math.abs(axis[i]!) > Math.abs(axis[largest]!)) largest = i
  // The coordinate axis after the largest one is at least 45° away from `axis`: what is left of it is well conditioned.
  const next = (largest + 1) % 3
  const along = axis[next]!
  const a1 = axis[0]!, a2 = axis[1]!, a3 = axis[2]!
  let x1 = (next === 0 ? 1 : 0) - along * a1
  let x2 = (next === 1 ? 1 : 0) - along * a2
  let x3 = (next === 2 ? 1 : 0) - along * a3
  const length = Math.sqrt(x1 * x1 + x2 * x2 + x3 * x3)
  x1 /= length
  x2 /= length
  x3 /= length
  out.fill(0)
  out[0] = x1
  out[1] = a2 * x3 - a3 * x2
  out[2] = a1
  out[4] = x2
  out[5] = a3 * x1 - a1 * x3
  out[6] = a2
  out[8] = x3
  out[9] = a1 * x2 - a2 * x1
  out[10] = a3
}
