/** A pivot below this part of its diagonal entry is rounding; it is kept there, so that what follows stays finite. */
const SMALLEST_PIVOT = Number.EPSILON

/** Replaces the lower triangle of a symmetric positive (m x m) matrix by its Cholesky factor L, A = L·Lᵀ. */
export function factorPositive(a: Float64Array, m: number): void {
  for (let j = 0; j < m; j++) {
    for (let i = j; i < m; i++) {
      let sum = a[i * m + j]!
      for (let k = 0; k < j; k++) sum -= a[i * m + k]! * a[j * m + k]!
      if (i === j) a[j * m + j] = Math.sqrt(Math.max(sum, SMALLEST_PIVOT * a[j * m + j]!, Number.MIN_VALUE))
      else a[i * m + j] = sum / a[j * m + j]!
    }
  }
}

/** x of Lᵀ·x = b in place, for a lower triangle (m x m). */
export function solveLowerTransposed(lower: Float64Array, m: number, x: Float64Array): void {
  for (let i = m - 1; i >= 0; i--) {
    let sum = x[i]!
    for (let k = i + 1; k < m; k++) sum -= lower[k * m + i]! * x[k]!
    x[i] = sum / lower[i * m + i]!
  }
}
