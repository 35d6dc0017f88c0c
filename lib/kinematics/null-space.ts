import { alignBasis } from '@/lib/math/align-basis'
import { canonicalBasis } from '@/lib/math/canonical-basis'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { measuresOf, type MeasureOptions } from './measures'
import { structuralSplit, type StructuralLoss } from './structural-loss'
import { TWIST_SIZE, type Task } from './task'
import { taskJacobian } from './task-jacobian'

/** A direction of the tool that no joint motion gives at this pose. */
export interface LostDirection {
  /** Unit, 6 numbers in twist order, in the task's frame; 0 outside the task. */
  readonly direction: number[]
  /** Lost because of how the chain is built, not because of the pose. */
  readonly structural: boolean
}

/** The freedom that a task leaves to the joints at one pose. */
export interface NullSpace {
  readonly rank: number
  /** n − rank. */
  readonly nullity: number
  /** min(components, n), descending. */
  readonly singularValues: number[]
  /** n rows of `nullity`: orthonormal columns, canonical (see canonicalBasis). No rows where it was not wanted. */
  readonly basis: number[][]
  /** Canonical too, structural ones first. */
  readonly lostDirections: LostDirection[]
  /** I − J⁺J, n x n; only where asked for, because it is large. */
  readonly projector?: number[][]
}

export interface NullSpaceOptions extends MeasureOptions {
  /** Of a long chain the basis is large: false leaves it out. */
  readonly withBasis?: boolean
  readonly withProjector?: boolean
  /** n rows of p: a basis, usually that of the configuration before, which the first min(p, nullity) columns are turned to. */
  readonly alignTo?: readonly (readonly number[])[]
}

/** Joint motions that the task does not feel, and tool motions that the joints cannot give, at the pose in `work`
 *  (see forwardKinematics). `known` comes from structuralLoss for the same task, tool and options. Throws a RangeError when `alignTo` has
 *  another shape. Liégeois 1977. */
export function nullSpace(chain: Chain, work: Workspace, task: Task, known: StructuralLoss, options: NullSpaceOptions = {}): NullSpace {
  const n = chain.joints.length
  taskJacobian(chain, work, task, options.characteristicLength)
  const { rank, singularValues } = measuresOf(work, task, options.tolerance)
  const { left, right } = work.taskValues
  const basis = options.withBasis === false ? [] : basisOf(right, n, rank, options.alignTo)
  const lost = lostDirections(left, task, rank, known)
  return {
    rank,
    nullity: n - rank,
    singularValues,
    basis,
    lostDirections: lost,
    ...(options.withProjector === true ? { projector: projector(right, n, rank) } : {}),
  }
}

function basisOf(right: Float64Array, n: number, rank: number, alignTo: readonly (readonly number[])[] | undefined): number[][] {
  const canonical = canonicalBasis(right, n, rank)
  const vectors = alignTo === undefined ? canonical : alignBasis(right, n, rank, canonical, columnsOf(alignTo, n))
  return Array.from({ length: n }, (_row, i) => vectors.map((vector) => vector[i]!))
}

function columnsOf(rows: readonly (readonly number[])[], n: number): number[][] {
  const width = rows[0]?.length ?? 0
  if (rows.length !== n || rows.some((row) => row.length !== width)) throw new RangeError(`a basis to align to needs ${n} rows of equal length`)
  return Array.from({ length: width }, (_column, j) => rows.map((row) => row[j]!))
}

/** I − Σ v·vᵀ over the first `rank` rows of n. */
function projector(right: Float64Array, n: number, rank: number): number[][] {
  return Array.from({ length: n }, (_row, i) =>
    Array.from({ length: n }, (_entry, j) => {
      let sum = 0
      for (let at = 0; at < rank * n; at += n) sum += right[at + i]! * right[at + j]!
      return (i === j ? 1 : 0) - sum
    }),
  )
}

function lostDirections(left: Float64Array, task: Task, rank: number, known: StructuralLoss): LostDirection[] {
  const m = task.rows.length
  if (rank === m) return []
  const { reached, reachedCount } = structuralSplit(left, m, rank, known)
  const structural = canonicalBasis(reached, m, reachedCount)
  // What is neither reached here nor lost for good is lost at this pose only.
  const taken = new Float64Array(m * m)
  taken.set(left.subarray(0, rank * m))
  structural.forEach((vector, k) => taken.set(vector, (rank + k) * m))
  const here = canonicalBasis(taken, m, rank + structural.length)
  return [
    ...structural.map((part) => ({ direction: inTwist(part, task), structural: true })),
    ...here.map((part) => ({ direction: inTwist(part, task), structural: false })),
  ]
}

/** A vector of the task's components as a twist, 0 outside the task. */
export function inTwist(part: ArrayLike<number>, task: Task): number[] {
  const twist = new Array<number>(TWIST_SIZE).fill(0)
  task.rows.forEach((row, k) => {
    twist[row] = part[k]!
  })
  return twist
}
