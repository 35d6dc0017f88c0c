import { dot } from '@/lib/math/dot'
import { factorPositive, solveLowerTransposed } from '@/lib/math/factor-positive'
import { factorRows, solveLower } from '@/lib/math/lower-orthogonal'
import type { Workspace } from './create-workspace'

/** Weights further apart than this (as a ratio), or that much larger or smaller than 1, leave too few digits for the rest. */
const WIDEST = 1e12

/** Fills work.rootWeights with the square roots of n positive weights. Throws a RangeError when there are not n, one is outside
 *  1e-12 to 1e12, or they are further apart than a factor 1e12. */
export function prepareWeights(work: Workspace, weights: ArrayLike<number>): void {
  const { rootWeights } = work
  const n = rootWeights.length
  if (weights.length !== n) throw new RangeError(`${n} joint weights are needed, ${weights.length} were given`)
  let least = Number.POSITIVE_INFINITY
  let most = 0
  for (let j = 0; j < n; j++) {
    const weight = weights[j]!
    if (!(weight >= 1 / WIDEST && weight <= WIDEST)) throw new RangeError('joint weights must be positive, from 1e-12 to 1e12')
    least = Math.min(least, weight)
    most = Math.max(most, weight)
    rootWeights[j] = Math.sqrt(weight)
  }
  if (n > 0 && most > WIDEST * least) throw new RangeError('joint weights may differ by a factor of 1e12 at most')
}

/** The weighted inverse goes through B = rows · W^(−½), whose factors B = R·Q are left in work.weightedLower (r x r) and
 *  work.weightedRows (r x n). */
export function factorWeighted(work: Workspace, rows: Float64Array, r: number): void {
  const { rootWeights, scaledRows, weightedRows, weightedLower } = work
  const n = rootWeights.length
  for (let k = 0; k < r; k++) for (let j = 0; j < n; j++) scaledRows[k * n + j] = rows[k * n + j]! / rootWeights[j]!
  factorRows(scaledRows, r, n, weightedRows, weightedLower)
}

/** rates = the ones with rows · rates = y that are least in Σ weight·rate². Whitney 1969; weighted least norm. */
export function leastWeighted(work: Workspace, r: number, y: Float64Array, rates: Float64Array): void {
  solveLower(work.weightedLower, r, y, work.coordinates)
  spread(work, r, work.coordinates, rates)
}

/** rates = W⁻¹·Jᵀ·(J·W⁻¹·Jᵀ + U·Λ²·Uᵀ)⁻¹·asked for J = Σ σₖ·uₖ·rowₖᵀ: each singular direction damped by its own λ. `asked` by singular
 *  direction. Fills work.delivered with the part of each direction that is delivered: 1 − λ²·(…)⁻¹ on the diagonal. */
export function dampedWeighted(work: Workspace, r: number, asked: Float64Array, rates: Float64Array): void {
  const { weightedLower, coordinates, delivered, square, lambdas } = work
  const { values } = work.taskValues
  // Σ·R·Rᵀ·Σ + Λ², each row and column divided by the larger of σ and λ, whose squares may be below binary64.
  const sizeOf = (k: number) => Math.max(values[k]!, lambdas[k]!)
  for (let i = 0; i < r; i++) {
    for (let k = 0; k <= i; k++) {
      const entry = (values[i]! / sizeOf(i)) * (values[k]! / sizeOf(k)) * dot(weightedLower, i * r, weightedLower, k * r, k + 1)
      square[i * r + k] = entry + (i === k ? (lambdas[i]! / sizeOf(i)) ** 2 : 0)
    }
  }
  factorPositive(square, r)
  for (let k = 0; k < r; k++) {
    coordinates.fill(0)
    coordinates[k] = 1
    solveLower(square, r, coordinates, coordinates)
    delivered[k] = 1 - (lambdas[k]! / sizeOf(k)) ** 2 * dot(coordinates, 0, coordinates, 0, r)
  }
  for (let k = 0; k < r; k++) coordinates[k] = asked[k]! / sizeOf(k)
  solveLower(square, r, coordinates, coordinates)
  solveLowerTransposed(square, r, coordinates)
  // x = Rᵀ·Σ·y
  for (let i = 0; i < r; i++) {
    let sum = 0
    for (let k = i; k < r; k++) sum += weightedLower[k * r + i]! * (values[k]! / sizeOf(k)) * coordinates[k]!
    coordinates[i] = sum
  }
  spread(work, r, coordinates, rates)
}

/** vector = (I − J_W⁺·J)·vector: what the task does not feel of it, and nearest to it in the weights. Oblique where weights differ. */
export function projectWeighted(work: Workspace, r: number, vector: Float64Array): void {
  const { rootWeights, weightedRows } = work
  const n = vector.length
  for (let j = 0; j < n; j++) vector[j]! *= rootWeights[j]!
  for (let k = 0; k < r; k++) {
    const along = dot(weightedRows, k * n, vector, 0, n)
    for (let j = 0; j < n; j++) vector[j]! -= along * weightedRows[k * n + j]!
  }
  for (let j = 0; j < n; j++) vector[j]! /= rootWeights[j]!
}

/** rates = W^(−½)·Qᵀ·x. */
function spread(work: Workspace, r: number, x: Float64Array, rates: Float64Array): void {
  const { rootWeights, weightedRows } = work
  const n = rates.length
  rates.fill(0)
  for (let k = 0; k < r; k++) for (let j = 0; j < n; j++) rates[j]! += x[k]! * weightedRows[k * n + j]!
  for (let j = 0; j < n; j++) rates[j]! /= rootWeights[j]!
}
