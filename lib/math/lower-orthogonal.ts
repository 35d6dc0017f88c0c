/** A row that keeps less than this part of its square (a tenth of its length) when the rows before are taken out is cleaned once more:
 *  what rounding left in it has grown against it. Daniel, Gragg, Kaufman & Stewart 1976. */
const CLEANED_AGAIN = 0.01

/** A = L·Q of the row-major m x n matrix `a`, m <= n, by Gram-Schmidt on its rows: `rows` (m x n) receives the orthonormal rows of Q,
 *  `lower` (m x m) the lower triangle of L, diagonal above 0. False, and unfinished, where a row lies wholly in those before. */
export function factorRows(a: Float64Array, m: number, n: number, rows: Float64Array, lower: Float64Array): boolean {
  for (let k = 0; k < m; k++) {
    const at = k * n
    let before = 0
    for (let j = 0; j < n; j++) {
      const entry = a[at + j]!
      rows[at + j] = entry
      before += entry * entry
    }
    for (let i = 0; i < k; i++) lower[k * m + i] = 0
    takeOut(rows, at, k, n, lower, k * m)
    let after = lower[k * m + k]!
    if (after < CLEANED_AGAIN * before) {
      before = after
      takeOut(rows, at, k, n, lower, k * m)
      after = lower[k * m + k]!
      if (!(after >= CLEANED_AGAIN * before)) return false
    }
    const length = Math.sqrt(after)
    if (!(length > 0)) return false
    lower[k * m + k] = length
    const inverse = 1 / length
    for (let j = 0; j < n; j++) rows[at + j]! *= inverse
  }
  return true
}

/** Takes the first k rows out of the one at `at`, adds their parts to `lower` and writes the square of what is left behind them: a number
 *  that is returned would be put on the heap. */
function takeOut(rows: Float64Array, at: number, k: number, n: number, lower: Float64Array, atLower: number): void {
  for (let i = 0; i < k; i++) {
    const row = i * n
    // Two sums, so that one addition need not wait for the other.
    let even = 0, odd = 0, j = 0
    for (; j + 1 < n; j += 2) {
      even += rows[at + j]! * rows[row + j]!
      odd += rows[at + j + 1]! * rows[row + j + 1]!
    }
    if (j < n) even += rows[at + j]! * rows[row + j]!
    const along = even + odd
    for (j = 0; j < n; j++) rows[at + j]! -= along * rows[row + j]!
    lower[atLower + i]! += along
  }
  let squares = 0
  for (let j = 0; j < n; j++) squares += rows[at + j]! * rows[at + j]!
  lower[atLower + k] = squares
}

/** x of L·x = b for a lower triangle (m x m); `x` may be `b`. */
export function solveLower(lower: Float64Array, m: number, b: Float64Array, x: Float64Array): void {
  for (let i = 0; i < m; i++) {
    let sum = b[i]!
    for (let k = 0; k < i; k++) sum -= lower[i * m + k]! * x[k]!
    x[i] = sum / lower[i * m + i]!
  }
}

/** The Frobenius norm of a lower triangle (m x m), which is at least its largest singular value. */
export function triangleNorm(lower: Float64Array, m: number): number {
  let squares = 0
  for (let i = 0; i < m; i++) for (let k = 0; k <= i; k++) squares += lower[i * m + k]! * lower[i * m + k]!
  return Math.sqrt(squares)
}

/** At most the smallest singular value of a lower triangle (m x m), and at least a part 1/√m of it: one over the Frobenius norm of its
 *  inverse. scratch: 2·m numbers. */
export function leastSingularValue(lower: Float64Array, m: number, scratch: Float64Array): number {
  let squares = 0
  for (let i = 0; i < m; i++) scratch[m + i] = 1 / lower[i * m + i]!
  // Columns of the inverse one after the other.
  for (let c = 0; c < m; c++) {
    for (let i = c; i < m; i++) {
      let sum = i === c ? 1 : 0
      for (let k = c; k < i; k++) sum -= lower[i * m + k]! * scratch[k]!
      const entry = sum * scratch[m + i]!
      scratch[i] = entry
      squares += entry * entry
    }
  }
  return 1 / Math.sqrt(squares)
}
