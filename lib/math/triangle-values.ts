/** Rounds of the bidiagonal iteration at most, for each value. */
const MOST_ROUNDS = 30

/** A sum of squares below this is taken as 0: it has lost digits to underflow. */
const NEGLIGIBLE = 1e-280

/** Room to find the singular values of a triangle of up to m x m in. */
export interface TriangleRoom {
  readonly square: Float64Array
  readonly diagonal: Float64Array
  readonly beside: Float64Array
}

/** Room for m x m. */
export function createTriangleRoom(m: number): TriangleRoom {
  return { square: new Float64Array(m * m), diagonal: new Float64Array(m), beside: new Float64Array(m) }
}

/** Fills `values` with the m singular values, descending, of an m x m lower triangle, without vectors: Householder reflections to two
 *  diagonals (Golub & Kahan 1965), then implicit QR steps (Golub & Reinsch 1970; both from memory). Accurate to rounding of the largest.
 *  False where it does not settle, as it may where a diagonal entry is 0: meant for triangles of full rank, values above 1e-100. */
export function triangleValues(lower: Float64Array, m: number, room: TriangleRoom, values: Float64Array): boolean {
  const { square, diagonal, beside } = room
  for (let i = 0; i < m; i++) for (let k = 0; k < m; k++) square[i * m + k] = k <= i ? lower[i * m + k]! : 0
  for (let k = 0; k < m; k++) {
    reflectColumn(square, m, k, diagonal)
    reflectRow(square, m, k, beside)
  }
  if (!settle(diagonal, beside, m)) return false
  // Insertion sort, descending, of the absolute values.
  for (let k = 0; k < m; k++) {
    const value = Math.abs(diagonal[k]!)
    let at = k
    while (at > 0 && values[at - 1]! < value) {
      values[at] = values[at - 1]!
      at--
    }
    values[at] = value
  }
  return true
}

/** Reflects what is below the diagonal of column k into the diagonal, and writes that entry to `out`: a number that is returned would be
 *  put on the heap. */
function reflectColumn(a: Float64Array, m: number, k: number, out: Float64Array): void {
  out[k] = 0
  let squares = 0
  for (let i = k; i < m; i++) squares += a[i * m + k]! * a[i * m + k]!
  if (squares < NEGLIGIBLE) return
  const first = a[k * m + k]!
  const length = first > 0 ? -Math.sqrt(squares) : Math.sqrt(squares)
  const scale = 1 / (squares - first * length)
  out[k] = length
  a[k * m + k] = first - length
  for (let c = k + 1; c < m; c++) {
    let sum = 0
    for (let i = k; i < m; i++) sum += a[i * m + k]! * a[i * m + c]!
    sum *= scale
    for (let i = k; i < m; i++) a[i * m + c]! -= sum * a[i * m + k]!
  }
}

/** The same for what is right of the entry beside the diagonal of row k. */
function reflectRow(a: Float64Array, m: number, k: number, out: Float64Array): void {
  out[k] = 0
  let squares = 0
  for (let c = k + 1; c < m; c++) squares += a[k * m + c]! * a[k * m + c]!
  if (squares < NEGLIGIBLE) return
  const first = a[k * m + k + 1]!
  const length = first > 0 ? -Math.sqrt(squares) : Math.sqrt(squares)
  const scale = 1 / (squares - first * length)
  out[k] = length
  a[k * m + k + 1] = first - length
  for (let i = k + 1; i < m; i++) {
    let sum = 0
    for (let c = k + 1; c < m; c++) sum += a[k * m + c]! * a[i * m + c]!
    sum *= scale
    for (let c = k + 1; c < m; c++) a[i * m + c]! -= sum * a[k * m + c]!
  }
}

/** Drives the entries beside the diagonal to 0. diagonal: d₀ … ; beside: eₖ between dₖ and dₖ₊₁. */
function settle(d: Float64Array, e: Float64Array, m: number): boolean {
  let size = 0
  for (let k = 0; k < m; k++) size = Math.max(size, Math.abs(d[k]!) + Math.abs(e[k]!))
  const negligible = Number.EPSILON * size
  // Nothing stands beside the last entry: its place hands this on without putting it on the heap.
  e[m - 1] = negligible
  let last = m - 1
  for (let round = 0; last > 0; round++) {
    if (round > MOST_ROUNDS * m) return false
    if (Math.abs(e[last - 1]!) <= negligible) {
      last--
      continue
    }
    let first = last - 1
    while (first > 0 && Math.abs(e[first - 1]!) > negligible) first--
    step(d, e, first, last, m)
  }
  return true
}

/** One implicit QR step on the block from `first` to `last`, shifted by the eigenvalue of its last corner of BᵀB (Wilkinson). */
function step(d: Float64Array, e: Float64Array, first: number, last: number, m: number): void {
  const negligible = e[m - 1]!
  // A diagonal entry of 0 takes the shift away, which chases the entry beside it out.
  let zero = false
  for (let k = first; k <= last; k++) zero ||= Math.abs(d[k]!) <= negligible
  const before = last - 1 > first ? e[last - 2]! : 0
  const a = d[last - 1]! * d[last - 1]! + before * before
  const b = d[last - 1]! * e[last - 1]!
  const c = d[last]! * d[last]! + e[last - 1]! * e[last - 1]!
  const half = (a - c) / 2
  const root = Math.sqrt(half * half + b * b)
  const shift = zero || root === 0 ? 0 : c - (b * b) / (half + (half < 0 ? -root : root))
  let y = d[first]! * d[first]! - shift
  let z = d[first]! * e[first]!
  for (let k = first; k < last; k++) {
    // From the right: columns k and k + 1.
    let length = Math.sqrt(y * y + z * z)
    let inverse = length === 0 ? 0 : 1 / length
    let cosine = length === 0 ? 1 : y * inverse
    let sine = z * inverse
    if (k > first) e[k - 1] = length
    const dk = d[k]!, ek = e[k]!
    y = cosine * dk + sine * ek
    e[k] = cosine * ek - sine * dk
    z = sine * d[k + 1]!
    d[k + 1] = cosine * d[k + 1]!
    // From the left: rows k and k + 1.
    length = Math.sqrt(y * y + z * z)
    inverse = length === 0 ? 0 : 1 / length
    cosine = length === 0 ? 1 : y * inverse
    sine = z * inverse
    d[k] = length
    const beside = e[k]!
    y = cosine * beside + sine * d[k + 1]!
    d[k + 1] = cosine * d[k + 1]! - sine * beside
    if (k + 1 < last) {
      z = sine * e[k + 1]!
      e[k + 1] = cosine * e[k + 1]!
    }
    if (k + 1 === last) e[k] = y
  }
}
