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
  const vectors = new Float64Array((n - r) * n)
  fillCanonicalBasis(taken, n, r, createBasisRoom(n, r), vectors)
  return Array.from({ length: n - r }, (_vector, k) => Array.from(vectors.subarray(k * n, (k + 1) * n)))
}

/** Room to find a canonical basis in. */
export interface BasisRoom {
  readonly rows: Float64Array
  readonly sizes: Float64Array
  readonly left: Uint8Array
  readonly q: Float64Array
}

/** Room for n coordinates of which up to r directions are taken. */
export function createBasisRoom(n: number, r: number): BasisRoom {
  return { rows: new Float64Array(n * r), sizes: new Float64Array(n), left: new Uint8Array(n), q: new Float64Array(r) }
}

/** The same into n − r rows of n numbers of `out`, allocating nothing. */
export function fillCanonicalBasis(taken: Float64Array, n: number, r: number, room: BasisRoom, out: Float64Array): void {
  const { rows, sizes, left, q } = room
  // A column of `rows` is kept together in memory: r numbers for each of the n coordinates.
  for (let i = 0; i < n; i++) {
    left[i] = 1
    for (let k = 0; k < r; k++) rows[i * r + k] = taken[k * n + i]!
  }
  let wear = 1
  for (let found = 0; found < n - r; found++) {
    const pivot = firstLargeColumn(rows, sizes, left, n, r)
    left[pivot] = 0
    for (let k = 0; k < r; k++) q[k] = rows[pivot * r + k]!
    const length = Math.sqrt(sizes[pivot]!)
    // (1/length − 1)/|q|², without the cancellation for a small q.
    const widen = 1 / (length * (1 + length))
    const at = found * n
    for (let i = 0; i < n; i++) {
      out[at + i] = 0
      if (left[i] === 0) continue
      let along = 0
      for (let k = 0; k < r; k++) along += rows[i * r + k]! * q[k]!
      out[at + i] = 0 - along / length
      // After the last vector nobody asks for the rest.
      if (found < n - r - 1) for (let k = 0; k < r; k++) rows[i * r + k]! += widen * along * q[k]!
    }
    out[at + pivot] = length
    wear *= length
    if (wear < WORN) {
      makeOrthonormal(rows, left, n, r)
      wear = 1
    }
  }
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

/** Fills `sizes` with the squared column norms that remain, 0 where a column was taken, and gives the pivot. */
function firstLargeColumn(rows: Float64Array, sizes: Float64Array, left: Uint8Array, n: number, r: number): number {
  for (let i = 0; i < n; i++) {
    let size = left[i]!
    if (size === 1) for (let k = 0; k < r; k++) size -= rows[i * r + k]! * rows[i * r + k]!
    sizes[i] = size
  }
  return firstLarge(sizes, n)
}

/** The first of n sizes, squared, that is large enough beside the largest. */
function firstLarge(sizes: Float64Array, n: number): number {
  let largest = 0
  for (let i = 0; i < n; i++) if (sizes[i]! > largest) largest = sizes[i]!
  const threshold = PIVOT_PART * PIVOT_PART * largest
  let pivot = 0
  while (sizes[pivot]! < threshold) pivot++
  return pivot
}

/** The same basis where k = n − r orthonormal rows of n numbers that span it are at hand: each step turns them so that the first row is
 *  along the pivot's column of the projector rowsᵀ·rows and the others have no component there. */
export function makeCanonical(nullRows: Float64Array, n: number, k: number, room: BasisRoom, out: Float64Array): void {
  const { sizes, q } = room
  for (let at = 0; at < k * n; at++) out[at] = nullRows[at]!
  for (let found = 0; found < k; found++) {
    for (let i = 0; i < n; i++) {
      let size = 0
      for (let at = found * n + i; at < k * n; at += n) size += out[at]! * out[at]!
      sizes[i] = size
    }
    const pivot = firstLarge(sizes, n)
    const first = found * n
    let squares = 0
    for (let row = found; row < k; row++) {
      q[row] = out[row * n + pivot]!
      squares += q[row]! * q[row]!
    }
    const length = q[found]! > 0 ? -Math.sqrt(squares) : Math.sqrt(squares)
    if (found < k - 1) {
      q[found]! -= length
      const scale = 1 / (squares - length * (q[found]! + length))
      for (let i = 0; i < n; i++) {
        let sum = 0
        for (let row = found; row < k; row++) sum += q[row]! * out[row * n + i]!
        sum *= scale
        for (let row = found; row < k; row++) out[row * n + i]! -= sum * q[row]!
      }
      for (let row = found + 1; row < k; row++) out[row * n + pivot] = 0
      out[first + pivot] = length
    }
    if (out[first + pivot]! < 0) for (let i = 0; i < n; i++) out[first + i] = 0 - out[first + i]!
  }
}
