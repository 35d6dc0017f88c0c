import { describe, expect, it } from 'vitest'
import { alignBasis } from '@/lib/math/align-basis'
import { canonicalBasis } from '@/lib/math/canonical-basis'
import { expectClose } from '../kinematics/expect-close'

/** What is orthogonal to the first axis of four. */
const TAKEN = Float64Array.of(1, 0, 0, 0)
const SPACE = canonicalBasis(TAKEN, 4, 1)

function away(a: readonly (readonly number[])[], b: readonly (readonly number[])[]): number {
  return b.reduce((sum, vector, k) => sum + vector.reduce((s, part, i) => s + (part - a[k]![i]!) ** 2, 0), 0)
}

describe('alignBasis', () => {
  it('gives back a basis of the same space, however it was turned', () => {
    const [c, s] = [Math.cos(0.7), Math.sin(0.7)]
    const wanted = [[0, c, s, 0], [0, 0, 0, -1], [0, -s, c, 0]]
    expectClose(alignBasis(TAKEN, 4, 1, SPACE, wanted).flat(), wanted.flat(), 1e-15)
  })

  it('comes as near as any turn of the basis can', () => {
    const wanted = [[0.5, 0.6, 0.1, -0.2], [0.1, -0.3, 0.9, 0.4]]
    const aligned = alignBasis(TAKEN, 4, 1, SPACE, wanted)
    for (let i = 0; i < 400; i++) {
      const [a, b] = [Math.sin(i) / 20, Math.cos(3 * i) / 20]
      const turned = [
        aligned[0]!.map((part, k) => Math.cos(a) * part + Math.sin(a) * aligned[i % 2 === 0 ? 1 : 2]![k]!),
        aligned[1]!.map((part, k) => (i % 2 === 0 ? Math.cos(a) * part - Math.sin(a) * aligned[0]![k]! : Math.cos(b) * part + 0 * k)),
      ]
      if (i % 2 === 0) expect(away(aligned, wanted)).toBeLessThanOrEqual(away(turned, wanted) + 1e-14)
    }
    const kept = aligned.flatMap((a, i) => aligned.map((b, k) => a.reduce((sum, part, l) => sum + part * b[l]!, 0) - (i === k ? 1 : 0)))
    expectClose(kept, kept.map(() => 0), 1e-15)
  })

  it('matches as many as there are of both, and makes the rest canonical', () => {
    const one = alignBasis(TAKEN, 4, 1, SPACE, [[0, 0, 1, 0]])
    expectClose(one.flat(), [0, 0, 1, 0, 0, 1, 0, 0, 0, 0, 0, 1], 1e-15)
    const many = alignBasis(Float64Array.of(1, 0, 0, 0, 1, 0), 3, 2, [[0, 0, 1]], [[0, 0, -2], [5, 5, 5]])
    expectClose(many.flat(), [0, 0, -1], 1e-15)
    expect(alignBasis(TAKEN, 4, 1, SPACE, [])).toEqual(SPACE)
  })

  it('stays a basis where the wanted directions say nothing', () => {
    for (const wanted of [[[1, 0, 0, 0], [1, 0, 0, 0]], [[0, 0, 0, 0], [0, 1, 0, 0]]]) {
      const aligned = alignBasis(TAKEN, 4, 1, SPACE, wanted)
      aligned.forEach((a, i) => aligned.forEach((b, k) => expect(a.reduce((sum, part, l) => sum + part * b[l]!, 0)).toBeCloseTo(i === k ? 1 : 0, 14)))
    }
  })
})
