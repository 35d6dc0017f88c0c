/** Passes at most, for each value. */
const MOST_PASSES = 30

/** The square of what may be lost of the square of a value, relative, where it is split off. */
const NEGLIGIBLE = (Number.EPSILON / 4) ** 2

/** The last value's own estimate is a better shift than a bound of all from where it is within this part of it. */
const CLOSE = 0.1

/** Room to find the singular values of a bidiagonal matrix of up to m x m in. */
export interface ValuesRoom {
  /** Squares of the diagonal and of what stands beside it, before and after a pass. */
  readonly q: Float64Array
  readonly e: Float64Array
  readonly nextQ: Float64Array
  readonly nextE: Float64Array
}

/** Room for m x m. */
export function createValuesRoom(m: number): ValuesRoom {
  return { q: new Float64Array(m), e: new Float64Array(m), nextQ: new Float64Array(m), nextE: new Float64Array(m) }
}

/** Fills `values` with the m singular values, descending, of a bidiagonal matrix, by the differential quotient-difference algorithm with
 *  shifts: no rotation, no square root, and as accurate for the small values as for the large ones (Fernando & Parlett 1994). False where
 *  it does not settle, as it may where an entry is 0: meant for full rank, squares of entries between 1e-200 and 1e200. */
export function bidiagonalValues(diagonal: Float64Array, beside: Float64Array, m: number, room: ValuesRoom, values: Float64Array): boolean {
  const { q, e } = room
  // The small end goes last, where the shifts look for it.
  const reversed = Math.abs(diagonal[0]!) < Math.abs(diagonal[m - 1]!)
  for (let k = 0; k < m; k++) {
    const d = diagonal[reversed ? m - 1 - k : k]!
    q[k] = d * d
    const b = k === m - 1 ? 0 : beside[reversed ? m - 2 - k : k]!
    e[k] = b * b
  }
  if (!takeApart(room, m, values)) return false
  for (let k = 0; k < m; k++) {
    const value = Math.sqrt(values[k]!)
    let at = k
    while (at > 0 && values[at - 1]! < value) {
      values[at] = values[at - 1]!
      at--
    }
    values[at] = value
  }
  return true
}

/** Fills `squares` with the eigenvalues of BᵀB, from the last to the first, as they split off. */
function takeApart(room: ValuesRoom, m: number, squares: Float64Array): boolean {
  let q = room.q, e = room.e, nextQ = room.nextQ, nextE = room.nextE
  let taken = 0
  let last = m - 1
  let left = MOST_PASSES * m
  while (last > 1) {
    // The smaller eigenvalue of the last two rows, from what is positive alone, and the square of a bound of what the others change
    // about it: the residual of its vector.
    const b2 = q[last - 1]! * e[last - 1]!
    const a = q[last - 1]! + e[last - 2]!
    const c = q[last]! + e[last - 1]!
    const half = (a - c) / 2
    const root = Math.sqrt(half * half + b2)
    const reach = half + root
    const value = (q[last - 1]! * q[last]! + e[last - 2]! * c) / ((a + c) / 2 + root)
    const change2 = reach > 0 ? (q[last - 2]! * e[last - 2]! * b2) / (b2 + reach * reach) : q[last - 2]! * e[last - 2]!
    if (change2 <= NEGLIGIBLE * (taken + value) * (taken + value)) {
      squares[last] = taken + value
      // The larger one stays.
      q[last - 1]! += c - value
      last--
      continue
    }
    // Where nothing else is near, the square of the residual over the distance of both bounds it too (Kato & Temple).
    let shift = change2 < CLOSE * value * root ? value - change2 / root : safeShift(q, e, last)
    while (!passTwice(q, e, last, shift, nextQ, nextE)) {
      if (shift === 0 || --left < 0) return false
      const short = nextQ[last]!
      shift = short < 0 ? Math.max(0, (shift + short) * (1 - 4 * Number.EPSILON)) : Math.min(safeShift(q, e, last), shift / 4)
    }
    if (--left < 0) return false
    taken += shift
    const oldQ = q, oldE = e
    q = nextQ
    e = nextE
    nextQ = oldQ
    nextE = oldE
  }
  if (last === 1) splitTwo(q, e, taken, squares)
  else squares[0] = q[0]!
  return true
}

/** One over the trace of the inverse: a shift that is never too large, and at least a part of one over the number of values of what it
 *  could be. */
function safeShift(q: Float64Array, e: Float64Array, last: number): number {
  let grown = 1
  let trace = 1 / q[last]!
  for (let k = last - 1; k >= 0; k--) {
    grown = 1 + (e[k]! / q[k + 1]!) * grown
    trace += grown / q[k]!
  }
  return (1 - 8 * Number.EPSILON) / trace
}

/** Two passes, which are one step of QR: the factors of what is left when `shift` is taken off, and those of the same once more. The second
 *  goes one place behind the first, so that neither waits for the other's divisions. False where what is left is not positive definite;
 *  then the last entry of nextQ is by how much it is not, or 0 where the first pass ended early. */
function passTwice(q: Float64Array, e: Float64Array, last: number, shift: number, nextQ: Float64Array, nextE: Float64Array): boolean {
  nextQ[last] = 0
  let d = q[0]! - shift
  if (!(d >= 0)) return false
  // What the first pass has found at the place before.
  let found = d + e[0]!
  let part = q[1]! / found
  let beside = e[0]! * part
  d = d * part - shift
  let again = found
  for (let k = 1; k <= last; k++) {
    if (k < last) {
      // Written so that what is not a number ends it too.
      if (!(d >= 0)) return false
      const next = e[k]!
      found = d + next
      part = q[k + 1]! / found
      d = d * part - shift
      const sum = again + beside
      const behind = found / sum
      nextQ[k - 1] = sum
      nextE[k - 1] = beside * behind
      again *= behind
      beside = next * part
    } else {
      const sum = again + beside
      const behind = d / sum
      nextQ[k - 1] = sum
      nextE[k - 1] = beside * behind
      nextQ[k] = d < 0 ? d : again * behind
    }
  }
  return nextQ[last]! >= 0
}

/** The two eigenvalues of what two rows hold, without cancellation. */
function splitTwo(q: Float64Array, e: Float64Array, taken: number, squares: Float64Array): void {
  const q1 = q[0]!, q2 = q[1]!, beside = e[0]!
  const difference = q1 + beside - q2
  const large = (q1 + q2 + beside + Math.sqrt(difference * difference + 4 * beside * q2)) / 2
  squares[0] = taken + large
  squares[1] = taken + (large > 0 ? q1 * (q2 / large) : 0)
}
