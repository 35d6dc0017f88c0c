import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { checkVectorsOf } from '@/lib/compute/evidence/check-vectors-of'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

const vectorsOf = async (file: string) => checkVectorsOf(compileChain(parseUrdf(readFileSync(`samples/${file}`)).description!))

describe('checkVectorsOf', () => {
  it('gives the bits it gave before: what was handed out yesterday is met again tomorrow', async () => {
    const digest = createHash('sha256').update(JSON.stringify(await vectorsOf('skerry-7.urdf'))).digest('hex')
    expect(digest).toBe('ca15e3f90e49af27c7c707a131726e9ef0e96ba97a6a317103e583d785afaed3')
  })

  it('agrees with the closed form of a planar arm', async () => {
    // Three links of 1 m: x = Σ cos φᵢ, y = Σ sin φᵢ; the last column of the Jacobian is (−sin φ₃, cos φ₃, 0, 0, 0, 1).
    for (const { configuration, pose, jacobian } of await vectorsOf('trainer-3r.urdf')) {
      const [a, b, c] = configuration as [number, number, number]
      const angles = [a, a + b, a + b + c]
      expect(pose.position[0]).toBeCloseTo(angles.reduce((sum, angle) => sum + Math.cos(angle), 0), 14)
      expect(pose.position[1]).toBeCloseTo(angles.reduce((sum, angle) => sum + Math.sin(angle), 0), 14)
      const last = [-Math.sin(angles[2]!), Math.cos(angles[2]!), 0, 0, 0, 1]
      jacobian.forEach((row, i) => expect(row[2]).toBeCloseTo(last[i]!, 14))
    }
  })
})
