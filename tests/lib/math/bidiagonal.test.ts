import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import { bidiagonalise, createBidiagonal, solveBidiagonal } from '@/lib/math/bidiagonal'
import { bidiagonalValues, createValuesRoom } from '@/lib/math/bidiagonal-values'
import { numbers } from '../kinematics/arms'
import { expectClose } from '../kinematics/expect-close'

/** A matrix of 1 to 6 rows and up to 12 columns, drawn from a seed; some have rows of zeros but for one entry. */
function question(seed: number) {
  const random = numbers(70_001 * seed)
  const m = 1 + (seed % 6)
  const n = m + (Math.floor(seed / 6) % 7)
  const a = Array.from({ length: m * n }, () => 4 * random() - 2)
  if (seed % 9 === 0) for (let c = 0; c < n; c++) a[c] = c === n - 1 ? 1 : 0
  const room = createBidiagonal(12)
  bidiagonalise(Float64Array.from(a), m, n, room)
  return { m, n, a, b: Array.from({ length: m }, () => 4 * random() - 2), room }
}

const SEEDS = Array.from({ length: 400 }, (_unused, i) => i + 1)

describe('a bidiagonal form', () => {
  it('has the singular values of the matrix, as ml-matrix gives them', () => {
    for (const seed of SEEDS) {
      const { m, n, a, room } = question(seed)
      const values = new Float64Array(m)
      expect(bidiagonalValues(room.diagonal, room.beside, m, createValuesRoom(m), values)).toBe(true)
      const witness = new SingularValueDecomposition(Matrix.from1DArray(m, n, a), { autoTranspose: true }).diagonal
      expectClose(values, witness.slice(0, m), 2e-14 * witness[0]!)
    }
  })

  it('gives the least solution, as ml-matrix does by its pseudo-inverse', () => {
    for (const seed of SEEDS) {
      const { m, n, a, b, room } = question(seed)
      const matrix = Matrix.from1DArray(m, n, a)
      const svd = new SingularValueDecomposition(matrix, { autoTranspose: true })
      const witness = svd.solve(Matrix.columnVector(b)).to1DArray()
      const x = new Float64Array(n)
      solveBidiagonal(room, Float64Array.from(b), x, new Float64Array((n - m) * n))
      expectClose(x, witness, 1e-14 * svd.condition * Math.max(1, ...witness.map(Math.abs)))
    }
  })

  it('completes the rows of the matrix by orthonormal ones', () => {
    for (const seed of SEEDS) {
      const { m, n, a, b, room } = question(seed)
      const rows = new Float64Array((n - m) * n)
      solveBidiagonal(room, Float64Array.from(b), new Float64Array(n), rows)
      const nulls = n === m ? Matrix.zeros(0, n) : Matrix.from1DArray(n - m, n, Array.from(rows))
      if (n === m) continue
      expectClose(Matrix.from1DArray(m, n, a).mmul(nulls.transpose()).to1DArray(), new Array<number>(m * (n - m)).fill(0), 2e-14)
      expectClose(nulls.mmul(nulls.transpose()).to1DArray(), Matrix.eye(n - m).to1DArray(), 2e-15)
    }
  })
})
