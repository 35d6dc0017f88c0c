import { describe, expect, it } from 'vitest'
import { piecesOf } from '@/components/drawing/pieces'
import { skeletonOf } from '@/components/drawing/skeleton'
import { seededConfigurations } from '@/lib/kinematics/seeded-configurations'
import { SAMPLE_FILES, sampleChain } from './sample-chains'

describe('skeletonOf', () => {
  it('puts the tip of the planar arm where the closed form puts it', () => {
    // Three links of 1 m, each turned by 30 degrees: sums of cos and sin of 30, 60, 90 degrees.
    const { tip } = skeletonOf(sampleChain('trainer-3r.urdf'), [Math.PI / 6, Math.PI / 6, Math.PI / 6])
    expect(tip[0]).toBeCloseTo(Math.sqrt(3) / 2 + 0.5, 12)
    expect(tip[1]).toBeCloseTo(0.5 + Math.sqrt(3) / 2 + 1, 12)
    expect(tip[2]).toBeCloseTo(0, 12)
  })

  it('draws the way of a rail from its lower to its upper limit, whatever its value', () => {
    const chain = sampleChain('skerry-7-rail.urdf')
    for (const value of [0, 1.2, 3]) {
      const [rail] = skeletonOf(chain, [value, 0, 0.4, 0, 0.8, 0, 0.4, 0]).nodes
      expect(rail!.rotary).toBe(false)
      expect(rail!.at[0]).toBeCloseTo(value, 12)
      expect(rail!.zero[0]).toBeCloseTo(0, 12)
      expect(rail!.ends.map((end) => end[0])).toEqual([expect.closeTo(0, 12), expect.closeTo(3, 12)])
    }
  })
})

describe('piecesOf', () => {
  it.each(SAMPLE_FILES)('gives every joint of %s the same mark in every pose', (file) => {
    const chain = sampleChain(file)
    const marks = (q: ArrayLike<number>) =>
      piecesOf(skeletonOf(chain, q)).flatMap((piece) => (piece.kind === 'drum' || piece.kind === 'band' ? [piece.kind] : []))
    const poses = seededConfigurations(chain, 20, 3)
    for (const pose of poses) expect(marks(pose)).toEqual(marks(poses[0]!))
  })

  it('draws a turn about the length of a link as a band and a bend as a drum', () => {
    const pieces = piecesOf(skeletonOf(sampleChain('skerry-7.urdf'), [0, -0.6, 0, 1.2, 0, 0.8, 0]))
    const marks = pieces.flatMap((piece) => (piece.kind === 'drum' || piece.kind === 'band' ? [piece.kind] : []))
    // pan, lift, upper roll, elbow, fore roll, wrist, flange roll
    expect(marks).toEqual(['band', 'drum', 'band', 'drum', 'band', 'drum', 'band'])
  })
})
