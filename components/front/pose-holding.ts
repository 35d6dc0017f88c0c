import type { Workspace } from '@/lib/kinematics/create-workspace'

/** Singular values up to this part of the largest are not divided by. */
const TOLERANCE = 1e-6

const rankOf = ({ values }: Workspace['taskValues']): number => {
  const least = TOLERANCE * (values[0] ?? 0)
  return values.filter((value) => value > least).length
}

/** J⁺e for the task decomposition in `work`: the joint displacement (n) that takes the tool along the small twist `error` (6). */
export function corrected(work: Workspace, error: readonly number[]): number[] {
  const { left, values, right } = work.taskValues
  const n = work.q.length
  const m = error.length
  const displacement = new Array<number>(n).fill(0)
  for (let k = 0; k < rankOf(work.taskValues); k++) {
    let part = 0
    for (let i = 0; i < m; i++) part += left[k * m + i]! * error[i]!
    for (let j = 0; j < n; j++) displacement[j] = displacement[j]! + (part / values[k]!) * right[k * n + j]!
  }
  return displacement
}

/** (I − J⁺J) d for the task decomposition in `work`: what of the joint displacement `d` (n) the task does not feel. */
export function unfelt(work: Workspace, d: readonly number[]): number[] {
  const { right } = work.taskValues
  const n = d.length
  const rest = [...d]
  for (let k = 0; k < rankOf(work.taskValues); k++) {
    let part = 0
    for (let j = 0; j < n; j++) part += right[k * n + j]! * d[j]!
    for (let j = 0; j < n; j++) rest[j] = rest[j]! - part * right[k * n + j]!
  }
  return rest
}
