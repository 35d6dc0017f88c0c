/** Euclidean norm of `count` numbers from `at` on. Scaled by the largest, so that no square over- or underflows;
 *  Math.sqrt, which is correctly rounded everywhere, and not Math.hypot, which is not. */
export function norm(v: ArrayLike<number>, at = 0, count = v.length - at): number {
  let largest = 0
  for (let i = at; i < at + count; i++) largest = Math.max(largest, Math.abs(v[i]!))
  if (largest === 0) return 0
  if (!Number.isFinite(largest)) return largest
  if (largest > 1e-140 && largest < 1e140) {
    let sum = 0
    for (let i = at; i < at + count; i++) sum += v[i]! * v[i]!
    return Math.sqrt(sum)
  }
  let sum = 0
  for (let i = at; i < at + count; i++) sum += (v[i]! / largest) * (v[i]! / largest)
  return largest * Math.sqrt(sum)
}
