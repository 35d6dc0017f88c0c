import { dot } from './dot'

/** A column counts as a pivot from this part of the largest on. Not 0.5: exactly half is met at everyday poses, and rounding
 *  would decide. */
const PIVOT_PART = 0.499

/** Each step divides by a length and so enlarges what rounding has done; once their product is below this, the rows are made
 *  orthonormal anew. */
const WORN = 0.5

/** The canonical orthonormal basis, as n − r vectors of n, of everything orthogonal to the `r` orthonormal rows of n numbers in `taken`:
 *  Gram-Schmidt on the columns of the projector I − takenᵀ·taken in order; each step takes the first column whose remaining norm is
 *  at least 0.499 of the largest, its component at the pivot positive.
 *
 *  After a step at pivot p what remains is orthogonal to `taken` and has no component at p. So the projector is never formed:
 *  dropping column p from the rows and making them orthonormal again, Q ← Q·(I − qqᵀ)^(−½) with q = Q·eₚ, leaves those that
 *  describe the next one. */
export function canonicalBasis(taken: Float64Array, n: number, r: number): number[][] {
  // A column of `rows` is kept together in memory: r numbers for each of the n coordinates.
  const rows = new Float64Array(n * r)
  for (let k = 0; k < r; k++) for (let i = 0; i < n; i++) rows[i * r + k] = taken[k * n + i]!
  const left = new Uint8Array(n).fill(1)
  const q = new Float64Array(r)
  let wear = 1
  return Array.from({ length: n - r }, () => {
    const pivot = firstLargeColumn(rows, left, n, r)
    left[pivot] = 0
    for (let k = 0; k < r; k++) q[k] = rows[pivot * r + k]!
    const squared = dot(q, 0, q, 0, r)
    const length = Math.sqrt(1 - squared)
    // (1/length − 1)/|q|², without the cancellation for a small q.
    const widen = 1 / (length * (1 + length))
    const vector = new Array<number>(n).fill(0)
    vector[pivot] = length
    for (let i = 0; i < n; i++) {
      if (left[i] === 0) continue
      const along = dot(rows, i * r, q, 0, r)
      vector[i] = 0 - along / length
      for (let k = 0; k < r; k++) rows[i * r + k]! += widen * along * q[k]!
    }
    wear *= length
    if (wear < WORN) {
      makeOrthonormal(rows, left, n, r)
      wear = 1
    }
    return vector
  })
}

/** Gram-Schmidt on the r rows, over the coordinates that are left. */
function makeOrthonormal(rows: Float64Array, left: Uint8Array, n: number, r: number): void {
  for (let k = 0; k < r; k++) {
    for (let earlier = 0; earlier <= k; earlier++) {
      let along = 0
      for (let i = 0; i < n; i++) if (left[i] === 1) along += rows[i * r + k]! * rows[i * r + earlier]!
      // The last one is the row with itself: its length.
      const length = Math.sqrt(along)
      for (let i = 0; i < n; i++) {
        if (earlier < k) rows[i * r + k]! -= along * rows[i * r + earlier]!
        else rows[i * r + k]! /= length
      }
    }
  }
}

function firstLargeColumn(rows: Float64Array, left: Uint8Array, n: number, r: number): number {
  let largest = 0
  for (let i = 0; i < n; i++) if (left[i] === 1) largest = Math.max(largest, 1 - dot(rows, i * r, rows, i * r, r))
  const threshold = PIVOT_PART * PIVOT_PART * largest
  let pivot = 0
  while (left[pivot] === 0 || 1 - dot(rows, pivot * r, rows, pivot * r, r) < threshold) pivot++
  return pivot
}
