/** The most rows that a form has: what is below the diagonal is then five numbers, which are written out, because a loop over them costs
 *  twice the time. */
const ROWS = 6

/** A column is as long as this: five zeros below it stand for rows that are not there. */
const STRIDE = 2 * ROWS - 1

/** A = U·B·Vᵀ of an m x n matrix, m <= n and m <= 6, with B lower bidiagonal: Householder reflections from both sides (Golub & Kahan 1965). */
export interface Bidiagonal {
  /** m and n, as they were last. */
  rows: number
  columns: number
  /** Column by column: below the diagonal the vectors of the reflections from the left, from the diagonal to the right, along each row,
   *  those of the ones from the right. */
  readonly vectors: Float64Array
  /** 2/|v|² of each reflection, 0 where there is none: from the left and from the right. */
  readonly leftScales: Float64Array
  readonly rightScales: Float64Array
  /** m, and beside it below: B. */
  readonly diagonal: Float64Array
  readonly beside: Float64Array
  /** A right hand side, with zeros below it. */
  readonly side: Float64Array
}

/** Room for up to 6 x n. */
export function createBidiagonal(n: number): Bidiagonal {
  const perRow = () => new Float64Array(ROWS)
  return {
    rows: 0,
    columns: 0,
    vectors: new Float64Array(STRIDE * n),
    leftScales: perRow(),
    rightScales: perRow(),
    diagonal: perRow(),
    beside: perRow(),
    side: new Float64Array(STRIDE),
  }
}

/** Fills `out` from the row-major m x n matrix `a`, m <= n and m <= 6. Squares of entries must neither over- nor underflow. */
export function bidiagonalise(a: Float64Array, m: number, n: number, out: Bidiagonal): void {
  const { vectors } = out
  out.rows = m
  out.columns = n
  for (let c = 0; c < n; c++) {
    const at = STRIDE * c
    for (let i = 0; i < m; i++) vectors[at + i] = a[i * n + c]!
    for (let i = m; i < STRIDE; i++) vectors[at + i] = 0
  }
  for (let k = 0; k < m; k++) reflectBoth(out, n, k)
}

/** Reflects what is right of the diagonal of row k into it, in all rows below, and then what is more than one below the diagonal of
 *  column k, in all columns right of it. Each vector stays in the place of what it took away. */
function reflectBoth({ vectors: a, diagonal, beside, leftScales, rightScales }: Bidiagonal, n: number, k: number): void {
  const corner = STRIDE * k + k
  const end = STRIDE * n
  const first = a[corner]!
  let squares = 0
  // s: what the reflection takes off, times its vector, in each of the rows below; x: what is left of those in column k.
  let s1 = 0, s2 = 0, s3 = 0, s4 = 0, s5 = 0
  for (let at = corner + STRIDE; at < end; at += STRIDE) {
    const v = a[at]!
    squares += v * v
    s1 += v * a[at + 1]!
    s2 += v * a[at + 2]!
    s3 += v * a[at + 3]!
    s4 += v * a[at + 4]!
    s5 += v * a[at + 5]!
  }
  let x1 = a[corner + 1]!, x2 = a[corner + 2]!, x3 = a[corner + 3]!, x4 = a[corner + 4]!, x5 = a[corner + 5]!
  let scale = 0
  diagonal[k] = first
  if (squares > 0) {
    const length = Math.sqrt(squares + first * first)
    const head = first > 0 ? first + length : first - length
    scale = 2 / (squares + head * head)
    diagonal[k] = first > 0 ? -length : length
    a[corner] = head
    s1 = scale * (s1 + head * x1)
    s2 = scale * (s2 + head * x2)
    s3 = scale * (s3 + head * x3)
    s4 = scale * (s4 + head * x4)
    s5 = scale * (s5 + head * x5)
    x1 -= s1 * head
    x2 -= s2 * head
    x3 -= s3 * head
    x4 -= s4 * head
    x5 -= s5 * head
  }
  rightScales[k] = scale
  squares = x2 * x2 + x3 * x3 + x4 * x4 + x5 * x5
  scale = 0
  beside[k] = x1
  if (squares > 0) {
    const length = Math.sqrt(squares + x1 * x1)
    beside[k] = x1 > 0 ? -length : length
    x1 = x1 > 0 ? x1 + length : x1 - length
    scale = 2 / (squares + x1 * x1)
  }
  leftScales[k] = scale
  a[corner + 1] = x1
  a[corner + 2] = x2
  a[corner + 3] = x3
  a[corner + 4] = x4
  a[corner + 5] = x5
  for (let at = corner + STRIDE; at < end; at += STRIDE) {
    const v = a[at]!
    const y1 = a[at + 1]! - s1 * v
    const y2 = a[at + 2]! - s2 * v
    const y3 = a[at + 3]! - s3 * v
    const y4 = a[at + 4]! - s4 * v
    const y5 = a[at + 5]! - s5 * v
    const part = scale * (x1 * y1 + x2 * y2 + (x3 * y3 + x4 * y4 + x5 * y5))
    a[at + 1] = y1 - part * x1
    a[at + 2] = y2 - part * x2
    a[at + 3] = y3 - part * x3
    a[at + 4] = y4 - part * x4
    a[at + 5] = y5 - part * x5
  }
}

/** The least x (n) with A·x = b (m), for A of full rank, and in `nulls` n − m rows of n numbers, orthonormal to each other and to the rows
 *  of A. */
export function solveBidiagonal(of: Bidiagonal, b: Float64Array, x: Float64Array, nulls: Float64Array): void {
  const { rows: m, columns: n, vectors, leftScales, diagonal, beside, side } = of
  for (let k = 0; k < m; k++) side[k] = b[k]!
  for (let k = m; k < STRIDE; k++) side[k] = 0
  for (let k = 0; k < m - 2; k++) {
    const below = STRIDE * k + k + 1
    const v1 = vectors[below]!, v2 = vectors[below + 1]!, v3 = vectors[below + 2]!, v4 = vectors[below + 3]!, v5 = vectors[below + 4]!
    const b1 = side[k + 1]!, b2 = side[k + 2]!, b3 = side[k + 3]!, b4 = side[k + 4]!, b5 = side[k + 5]!
    const part = leftScales[k]! * (v1 * b1 + v2 * b2 + (v3 * b3 + v4 * b4 + v5 * b5))
    side[k + 1] = b1 - part * v1
    side[k + 2] = b2 - part * v2
    side[k + 3] = b3 - part * v3
    side[k + 4] = b4 - part * v4
    side[k + 5] = b5 - part * v5
  }
  let before = 0
  for (let k = 0; k < m; k++) {
    before = (side[k]! - before) / diagonal[k]!
    x[k] = before
    before *= beside[k]!
  }
  for (let c = m; c < n; c++) x[c] = 0
  for (let k = m; k < n; k++) {
    const at = (k - m) * n
    for (let c = 0; c < n; c++) nulls[at + c] = c === k ? 1 : 0
    if (k > m) turnBack(of, nulls, at)
  }
  if (n > m) turnBothBack(of, x, nulls)
  else turnBack(of, x, 0)
}

/** V times the n numbers of `x` from `at` on, in place. */
function turnBack({ rows: m, columns: n, vectors, rightScales }: Bidiagonal, x: Float64Array, at: number): void {
  for (let k = m - 1; k >= 0; k--) {
    let sum = 0
    for (let c = k, entry = STRIDE * k + k; c < n; c++, entry += STRIDE) sum += vectors[entry]! * x[at + c]!
    sum *= rightScales[k]!
    for (let c = k, entry = STRIDE * k + k; c < n; c++, entry += STRIDE) x[at + c]! -= sum * vectors[entry]!
  }
}

/** V times the first n numbers of `x`, and of `y`, in place: what everyone needs, and in one go hardly dearer than one of them. */
function turnBothBack({ rows: m, columns: n, vectors, rightScales }: Bidiagonal, x: Float64Array, y: Float64Array): void {
  for (let k = m - 1; k >= 0; k--) {
    let sumX = 0, sumY = 0
    for (let c = k, entry = STRIDE * k + k; c < n; c++, entry += STRIDE) {
      const v = vectors[entry]!
      sumX += v * x[c]!
      sumY += v * y[c]!
    }
    sumX *= rightScales[k]!
    sumY *= rightScales[k]!
    for (let c = k, entry = STRIDE * k + k; c < n; c++, entry += STRIDE) {
      const v = vectors[entry]!
      x[c]! -= sumX * v
      y[c]! -= sumY * v
    }
  }
}
