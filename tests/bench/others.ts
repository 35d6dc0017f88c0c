import { all, create } from 'mathjs'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import type { Chain } from '@/lib/kinematics/chain'
import { DAMPING, POSTURE, TWIST } from './arms'
import type { Ask } from './ours'

/** What a library offers an answer to. */
type Answers = Partial<Record<'fk' | 'fk-jacobian' | 'null-space' | 'damped' | 'spare' | 'everything', Ask>>

/** The same questions asked of general-purpose libraries, written the way their manuals suggest. */

const math = create(all ?? {})

/** Frames (4 x 4, nested) of each motion and of the tip, by a library's own product. */
function frames<T>(chain: Chain, q: ArrayLike<number>, lift: (rows: number[][]) => T, times: (a: T, b: T) => T): T[] {
  let frame = lift([[1, 0, 0, 0], [0, 1, 0, 0], [0, 0, 1, 0], [0, 0, 0, 1]])
  const found = chain.motions.map(({ axis: [x, y, z] }, i) => {
    const [c, s] = [Math.cos(q[i]!), Math.sin(q[i]!)]
    const v = 1 - c
    const turn = lift([
      [c + x * x * v, x * y * v - z * s, x * z * v + y * s, 0],
      [x * y * v + z * s, c + y * y * v, y * z * v - x * s, 0],
      [x * z * v - y * s, y * z * v + x * s, c + z * z * v, 0],
      [0, 0, 0, 1],
    ])
    frame = times(times(frame, lift(square(chain.constants[i]!))), turn)
    return frame
  })
  return [...found, times(frame, lift(square(chain.constants.at(-1)!)))]
}

function square(t: readonly number[]): number[][] {
  return [t.slice(0, 4), t.slice(4, 8), t.slice(8, 12), [0, 0, 0, 1]]
}

/** 6 x n from nested frames. */
function jacobianOf(chain: Chain, placed: readonly number[][][]): number[][] {
  const tip = placed.at(-1)!
  const columns = chain.motions.map(({ axis }, i) => {
    const t = placed[i]!
    const z = [0, 1, 2].map((row) => t[row]![0]! * axis[0] + t[row]![1]! * axis[1] + t[row]![2]! * axis[2]) as [number, number, number]
    const d = [0, 1, 2].map((row) => tip[row]![3]! - t[row]![3]!) as [number, number, number]
    return [z[1] * d[2] - z[2] * d[1], z[2] * d[0] - z[0] * d[2], z[0] * d[1] - z[1] * d[0], ...z]
  })
  return [0, 1, 2, 3, 4, 5].map((row) => columns.map((column) => column[row]!))
}

const wishOf = (q: ArrayLike<number>) => Array.from(q, (value) => POSTURE - value)

/** Answers by mathjs. */
export function byMathjs(chain: Chain): Answers {
  const place = (q: Float64Array) => frames(chain, q, (rows) => rows, (a, b) => math.multiply(a, b))
  const squared = math.multiply(DAMPING * DAMPING, math.identity(6)) as never
  return {
    fk: (q) => place(q).at(-1)![0]![3]!,
    'fk-jacobian': (q) => jacobianOf(chain, place(q))[0]![0]!,
    damped: (q) => {
      const j = jacobianOf(chain, place(q))
      const inner = math.add(math.multiply(j, math.transpose(j)), squared)
      const y = math.lusolve(inner as never, Array.from(TWIST)) as never
      return (math.multiply(math.transpose(j), y) as unknown as { toArray(): number[][] }).toArray()[0]![0]!
    },
    spare: (q) => {
      const j = jacobianOf(chain, place(q))
      const inverse = math.pinv(j)
      const projector = math.subtract(math.identity(q.length), math.multiply(inverse, j)) as never
      const rates = math.add(math.multiply(inverse, Array.from(TWIST)), math.multiply(projector, wishOf(q))) as unknown as { toArray(): number[] }
      return scaled(chain, rates.toArray())
    },
  }
}

/** Answers by ml-matrix. */
export function byMlMatrix(chain: Chain): Answers {
  const place = (q: Float64Array) => frames(chain, q, (rows) => new Matrix(rows), (a, b) => a.mmul(b)).map((matrix) => matrix.to2DArray())
  const twist = Matrix.columnVector(TWIST)
  return {
    fk: (q) => place(q).at(-1)![0]![3]!,
    'fk-jacobian': (q) => jacobianOf(chain, place(q))[0]![0]!,
    'null-space': (q) => {
      const j = new Matrix(jacobianOf(chain, place(q)))
      const { rightSingularVectors: v, rank } = new SingularValueDecomposition(j, { autoTranspose: true })
      return Matrix.eye(q.length).sub(v.subMatrix(0, q.length - 1, 0, rank - 1).mmul(v.subMatrix(0, q.length - 1, 0, rank - 1).transpose()))
    },
    damped: (q) => {
      const { leftSingularVectors: u, rightSingularVectors: v, diagonal } = new SingularValueDecomposition(new Matrix(jacobianOf(chain, place(q))), { autoTranspose: true })
      const gains = diagonal.map((value) => value / (value * value + DAMPING * DAMPING))
      return v.mmul(Matrix.diag(gains)).mmul(u.transpose()).mmul(twist).get(0, 0)
    },
    spare: (q) => {
      const j = new Matrix(jacobianOf(chain, place(q)))
      const inverse = new SingularValueDecomposition(j, { autoTranspose: true }).inverse()
      const projector = Matrix.eye(q.length).sub(inverse.mmul(j))
      return scaled(chain, inverse.mmul(twist).add(projector.mmul(Matrix.columnVector(wishOf(q)))).to1DArray())
    },
  }
}

function scaled(chain: Chain, rates: readonly number[]): number {
  return rates[0]! * rates.reduce((least, rate, i) => Math.min(least, chain.joints[i]!.rate! / Math.abs(rate)), 1)
}
