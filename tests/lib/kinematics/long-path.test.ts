import { describe, expect, it } from 'vitest'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { nullSpace } from '@/lib/kinematics/null-space'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { golden } from './arms'

/** Largest distance of the columns' products from those of an orthonormal basis. */
function drift(basis: readonly (readonly number[])[]): number {
  const width = basis[0]!.length
  let worst = 0
  for (let a = 0; a < width; a++) {
    for (let b = 0; b <= a; b++) {
      let product = 0
      for (const row of basis) product += row[a]! * row[b]!
      worst = Math.max(worst, Math.abs(product - (a === b ? 1 : 0)))
    }
  }
  return worst
}

describe('a path of a million steps', () => {
  it('ends with a basis as orthonormal as it began, each aligned to the one before, and never jumps', () => {
    const chain = golden()
    const work = createWorkspace(chain)
    const task = createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip')
    const known = structuralLoss(chain, task)
    const q = new Float64Array(7)
    let basis: number[][] = []
    let worst = 0
    let jump = 0
    for (let i = 0; i < 1_000_000; i++) {
      const t = i * 2e-5
      for (let k = 0; k < 7; k++) q[k] = 0.3 + 0.2 * k + 0.25 * Math.sin((1 + 0.37 * k) * t + k)
      forwardKinematics(chain, q, work)
      const next = nullSpace(chain, work, task, known, i === 0 ? {} : { alignTo: basis }).basis
      if (i % 1000 === 0) worst = Math.max(worst, drift(next))
      if (i > 0) for (let k = 0; k < 7; k++) for (let c = 0; c < 2; c++) jump = Math.max(jump, Math.abs(next[k]![c]! - basis[k]![c]!))
      basis = next
    }
    expect(worst).toBeLessThanOrEqual(1e-12)
    expect(drift(basis)).toBeLessThanOrEqual(1e-12)
    expect(jump).toBeLessThan(1e-3)
  }, 120_000)
})
