/** Euclidean norm of `count` numbers from `at` on. Scaled by the largest, so that no square over- or underflows;
 *  Math.sqrt, which is correctly rounded everywhere, and not Math.hypot, which is not. */
export function norm(v: ArrayLike<number>, at = 0, count = v.length - at): number {
  // Nearly always this is all: two sums, so that one addition need not wait for the other.
  let even = 0, odd = 0, i = at
  for (; i + 1 < at + count; i += 2) {
    even += v[i]! * v[i]!
    odd += v[i + 1]! * v[i + 1]!
  }
  if (i < at + count) even += v[i]! * v[i]!
  const squares = even + odd
  if (squares > 1e-280 && squares < 1e280) return Math.sqrt(squares)
  let largest = 0
  for (let i = at; i < at + count; i++) largest = Math.max(largest, Math.abs(v[i]!))
  if (largest === 0) return 0
  if (!Number.isFinite(largest)) return largest
  let sum = 0
  for (let i = at; i < at + count; i++) sum += (v[i]! / largest) * (v[i]! / largest)
  return largest * Math.sqrt(sum)
}
