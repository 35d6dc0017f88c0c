import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import { createSixFactors, factorSix, fillInverseTrace, projectSix, solveAndProjectSix, solveSix } from '@/lib/math/six'
import { numbers } from '../kinematics/arms'
import { expectClose } from '../kinematics/expect-close'

/** A matrix of 6 rows, a right hand side and a vector, drawn from a seed, of condition up to a thousand; a tenth of the rows nearly
 *  repeats another. */
function question(seed: number) {
  const random = numbers(100_003 * seed)
  const n = 6 + (seed % 6)
  const draw = (count: number) => Array.from({ length: count }, () => 4 * random() - 2)
  const j = draw(6 * n)
  if (seed % 10 === 0) for (let c = 0; c < n; c++) j[c] = j[n + c]! + 0.01 * j[c]!
  return { n, j, b: draw(6), z: draw(n) }
}

function decomposed(j: readonly number[], n: number) {
  return new SingularValueDecomposition(Matrix.from1DArray(6, n, j), { autoTranspose: true })
}

const SEEDS = Array.from({ length: 400 }, (_unused, i) => i + 1)

describe('the written-out way of six components', () => {
  it.each([0, 0.05, 1])('gives the rates that ml-matrix gives by singular values, damped by %s, and bounds the smallest of them', (lambda) => {
    for (const seed of SEEDS) {
      const { n, j, b } = question(seed)
      const { leftSingularVectors, rightSingularVectors, diagonal } = decomposed(j, n)
      if (diagonal[5]! < 1e-3 * diagonal[0]!) continue
      const factors = createSixFactors()
      const rates = new Float64Array(n)
      factorSix(Float64Array.from(j), n, lambda * lambda, factors)
      solveSix(Float64Array.from(j), n, factors, Float64Array.from(b), rates, 1)
      const gains = diagonal.map((value) => value / (value * value + lambda * lambda))
      const witness = rightSingularVectors.mmul(Matrix.diag(gains)).mmul(leftSingularVectors.transpose()).mmul(Matrix.columnVector(b)).to1DArray()
      const size = Math.max(1, ...witness.map(Math.abs))
      expectClose(rates, witness, (1e-14 * diagonal[0]! * size) / Math.min(1, Math.max(diagonal[5]!, lambda)))
      fillInverseTrace(factors)
      const least = 1 / Math.sqrt(factors.sizes[2]!) - lambda
      expect(least).toBeLessThanOrEqual(diagonal[5]! * (1 + 1e-6))
      expect(factors.sizes[1]).toBeCloseTo(diagonal.reduce((sum, value) => sum + value * value, 0), 9)
    }
  })

  it('projects so that nothing is felt of what is left, and what is left stays as it is', () => {
    for (const seed of SEEDS) {
      const { n, j, z } = question(seed)
      const { diagonal } = decomposed(j, n)
      if (diagonal[5]! < 1e-3 * diagonal[0]!) continue
      const factors = createSixFactors()
      const whole = Float64Array.from(j)
      factorSix(whole, n, 0, factors)
      const once = Float64Array.from(z)
      projectSix(whole, n, factors, once, 1)
      const felt = Array.from({ length: 6 }, (_row, i) => once.reduce((sum, part, c) => sum + part * j[i * n + c]!, 0))
      expectClose(felt, [0, 0, 0, 0, 0, 0], 1e-13)
      const twice = once.slice()
      projectSix(whole, n, factors, twice, 1)
      expectClose(twice, once, 1e-12)
    }
  })

  it('does both at once as it does them one by one', () => {
    for (const seed of SEEDS) {
      const { n, j, b, z } = question(seed)
      const factors = createSixFactors()
      const whole = Float64Array.from(j)
      factorSix(whole, n, 0, factors)
      const [rates, rest] = [new Float64Array(n), Float64Array.from(z)]
      solveSix(whole, n, factors, Float64Array.from(b), rates, 0)
      projectSix(whole, n, factors, rest, 0)
      const [bothRates, bothRest] = [new Float64Array(n), Float64Array.from(z)]
      solveAndProjectSix(whole, n, factors, Float64Array.from(b), bothRates, bothRest)
      expect(bothRates).toEqual(rates)
      expect(bothRest).toEqual(rest)
    }
  })

  it('is not finite, or says so by its sizes, where a row says what another does', () => {
    const row = [1, 2, 3, 4, 5, 6, 7]
    const j = Float64Array.from([...row, ...row, ...Array.from({ length: 28 }, (_unused, i) => Math.sin(i))])
    const factors = createSixFactors()
    factorSix(j, 7, 0, factors)
    fillInverseTrace(factors)
    expect(factors.sizes[2]! > 0 && factors.sizes[1]! * factors.sizes[2]! < 1e8).toBe(false)
  })
})
