import { dot } from './dot'

/** A singular value decomposition A = Σ σₖ · leftₖ · rightₖᵀ of an m x n matrix, written into arrays that are kept.
 *  left: m rows of m numbers, all m left singular vectors, also those that A never reaches.
 *  values: m numbers, descending; those beyond n are 0.  right: m rows of n numbers; a row whose value is 0 is 0. */
export interface SingularValues {
  readonly left: Float64Array
  readonly values: Float64Array
  readonly right: Float64Array
}

/** Room for the decomposition of matrices up to `rows` x `columns`. */
export function createSingularValues(rows: number, columns: number): SingularValues {
  return { left: new Float64Array(rows * rows), values: new Float64Array(rows), right: new Float64Array(rows * columns) }
}

/** Rounding chatter may keep a pair from settling; the result is accurate long before. */
const MOST_SWEEPS = 40
/** Squares below this have lost digits to underflow. Such a row is zero beside any other that matters. */
const NEGLIGIBLE_SQUARE = 1e-290

/** Decomposes the row-major m x n matrix `a` by one-sided Jacobi rotations of its rows (Hestenes 1958; sorted pairs after
 *  de Rijk 1989; both from memory): few rows, any number of columns, high relative accuracy also of small values.
 *  Every finite input ends, the same input gives the same bits. */
export function decompose(a: ArrayLike<number>, m: number, n: number, out: SingularValues): void {
  const { left, values, right } = out
  const scale = copyScaled(a, m * n, right)
  left.fill(0, 0, m * m)
  for (let i = 0; i < m; i++) left[i * m + i] = 1

  const tolerance = Number.EPSILON * (4 + Math.sqrt(n))
  let settled = false
  for (let sweep = 0; sweep < MOST_SWEEPS && !settled; sweep++) {
    settled = true
    for (let p = 0; p < m - 1; p++) {
      for (let q = p + 1; q < m; q++) if (makeOrthogonal(p, q, m, n, left, right, tolerance)) settled = false
    }
  }

  for (let k = 0; k < m; k++) {
    const length = k < n ? Math.sqrt(dot(right, k * n, right, k * n, n)) : 0
    values[k] = length * scale
    for (let i = k * n; i < (k + 1) * n; i++) right[i] = length > 0 ? right[i]! / length : 0
  }
}

/** Rotates rows p and q until they are orthogonal, the longer one first. True when anything changed. */
function makeOrthogonal(p: number, q: number, m: number, n: number, left: Float64Array, right: Float64Array, tolerance: number): boolean {
  let pp = dot(right, p * n, right, p * n, n)
  let qq = dot(right, q * n, right, q * n, n)
  const swapped = pp < qq
  if (swapped) {
    swapRows(right, p * n, q * n, n)
    swapRows(left, p * m, q * m, m)
    const kept = pp
    pp = qq
    qq = kept
  }
  if (qq < NEGLIGIBLE_SQUARE) return swapped
  const pq = dot(right, p * n, right, q * n, n)
  if (Math.abs(pq) <= tolerance * Math.sqrt(pp) * Math.sqrt(qq)) return swapped
  // tan of the rotation, the smaller root of t² + 2ζt − 1 = 0; for large ζ its square would overflow.
  const zeta = (qq - pp) / (2 * pq)
  const size = Math.abs(zeta)
  const root = size > 1e8 ? 1 / (2 * size) : 1 / (size + Math.sqrt(1 + size * size))
  const tangent = zeta < 0 ? -root : root
  const cosine = 1 / Math.sqrt(1 + tangent * tangent)
  rotateRows(right, p * n, q * n, n, cosine, cosine * tangent)
  rotateRows(left, p * m, q * m, m, cosine, cosine * tangent)
  return true
}

function rotateRows(rows: Float64Array, p: number, q: number, count: number, cosine: number, sine: number): void {
  for (let i = 0; i < count; i++) {
    const x = rows[p + i]!, y = rows[q + i]!
    rows[p + i] = cosine * x - sine * y
    rows[q + i] = sine * x + cosine * y
  }
}

function swapRows(rows: Float64Array, p: number, q: number, count: number): void {
  for (let i = 0; i < count; i++) {
    const kept = rows[p + i]!
    rows[p + i] = rows[q + i]!
    rows[q + i] = kept
  }
}

/** Copies `a`, divided by a power of two (which is exact) where its squares would leave the range of numbers; returns that power. */
function copyScaled(a: ArrayLike<number>, count: number, out: Float64Array): number {
  let largest = 0
  for (let i = 0; i < count; i++) largest = Math.max(largest, Math.abs(a[i]!))
  let scale = 1
  if (largest > 0 && Number.isFinite(largest)) {
    while (largest / scale > 1e90) scale *= 2
    while (largest / scale < 1e-90) scale /= 2
  }
  for (let i = 0; i < count; i++) out[i] = a[i]! / scale
  return scale
}
