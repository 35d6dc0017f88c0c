import { canonicalBasis } from './canonical-basis'
import { dot } from './dot'
import { createSingularValues, decompose } from './singular-values'

/** Where the old direction is this near to square on everything new (as a cosine), it says nothing of where to turn. */
const SAYS_NOTHING = 1e-8

/** An orthonormal basis of the same space as the `k` orthonormal `vectors` (of n numbers each), the first min(k, wanted.length) of which
 *  come as near as they can to those of `wanted` (n numbers each): orthogonal Procrustes, Schönemann 1966. The surplus ones are canonical
 *  in what is left of the space, which is everything orthogonal to the `r` orthonormal rows of `taken`. */
export function alignBasis(taken: Float64Array, n: number, r: number, vectors: readonly (readonly number[])[], wanted: readonly (readonly number[])[]): number[][] {
  const k = vectors.length
  const matched = Math.min(k, wanted.length)
  if (matched === 0) return vectors.map((vector) => [...vector])
  const turn = nearestTurn(vectors, wanted, matched, n)
  const aligned = Array.from({ length: matched }, (_vector, j) =>
    Array.from({ length: n }, (_entry, i) => {
      let sum = 0
      for (let l = 0; l < k; l++) sum += turn[j * k + l]! * vectors[l]![i]!
      return sum
    }),
  )
  if (matched === k) return aligned
  const occupied = new Float64Array((r + matched) * n)
  occupied.set(taken.subarray(0, r * n))
  aligned.forEach((vector, j) => occupied.set(vector, (r + j) * n))
  return [...aligned, ...canonicalBasis(occupied, n, r + matched)]
}

/** The `matched` orthonormal rows of k numbers that bring the vectors nearest to the wanted ones: the orthogonal part of
 *  M = wanted · vectorsᵀ. */
function nearestTurn(vectors: readonly (readonly number[])[], wanted: readonly (readonly number[])[], matched: number, n: number): Float64Array {
  const k = vectors.length
  const overlap = new Float64Array(matched * k)
  for (let j = 0; j < matched; j++) for (let l = 0; l < k; l++) overlap[j * k + l] = dot(wanted[j]!, 0, vectors[l]!, 0, n)
  const { left, values, right } = createSingularValues(matched, k)
  decompose(overlap, matched, k, { left, values, right })
  let said = 0
  while (said < matched && values[said]! > SAYS_NOTHING) said++
  // Directions of which the old basis says nothing are filled up canonically.
  if (said < matched) canonicalBasis(right, k, said).slice(0, matched - said).forEach((vector, i) => right.set(vector, (said + i) * k))
  const turn = new Float64Array(matched * k)
  for (let s = 0; s < matched; s++) {
    for (let j = 0; j < matched; j++) for (let l = 0; l < k; l++) turn[j * k + l]! += left[s * matched + j]! * right[s * k + l]!
  }
  return turn
}
