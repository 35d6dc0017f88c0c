import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { checkVectorsOf } from '@/lib/compute/evidence/check-vectors-of'
import { transformOfPose } from '@/lib/math/quaternion'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { askPython } from './ask-python'

/** Of the larger of 1 and the largest entry. */
const TOLERANCE = 1e-12

const fileOf = (name: string) => path.resolve(import.meta.dirname, '../../samples', name)
const chainOf = (name: string) => compileChain(parseUrdf(readFileSync(fileOf(name))).description!)

const expectAgreement = (ours: ArrayLike<number>, theirs: readonly number[], what: string) => {
  const size = Math.max(1, ...theirs.map(Math.abs))
  theirs.forEach((value, i) => expect(Math.abs(value - ours[i]!), `${what}, entry ${i}`).toBeLessThanOrEqual(TOLERANCE * size))
}

describe.each(['skerry-7.urdf', 'skerry-7-rail.urdf', 'gannet-4.urdf', 'fulmar-6.urdf', 'trainer-3r.urdf'])('the check vectors of %s', (name) => {
  it("are met by Orocos KDL and by NumPy's singular values", async () => {
    const chain = chainOf(name)
    const vectors = await checkVectorsOf(chain)
    const configurations = vectors.map(({ configuration }) => configuration)
    const joints = chain.joints.map((joint) => joint.name)
    const kdl = askPython<{ transforms: number[][]; jacobians: number[][] }>('kdl.py', { file: fileOf(name), base: chain.base, tip: chain.tip, joints, configurations })
    const numpy = askPython<{ values: number[] }[]>('linear-algebra.py', { matrices: vectors.map(({ jacobian }) => jacobian), asked: vectors.map(() => new Array(6).fill(0)), damping: 0 })
    expect(vectors).toHaveLength(24)
    vectors.forEach(({ pose, jacobian, singularValues }, i) => {
      expectAgreement(transformOfPose(pose.position, pose.quaternion), kdl.transforms[i]!, `pose ${i}`)
      expectAgreement(jacobian.flat(), kdl.jacobians[i]!, `Jacobian ${i}`)
      expectAgreement(singularValues, numpy[i]!.values, `singular values ${i}`)
    })
  })

  it('stay within the limits and are the same bits every time', async () => {
    const chain = chainOf(name)
    const vectors = await checkVectorsOf(chain)
    for (const { configuration } of vectors) {
      chain.joints.forEach(({ lower, upper }, i) => {
        expect(configuration[i]).toBeGreaterThanOrEqual(lower ?? -Math.PI)
        expect(configuration[i]).toBeLessThanOrEqual(upper ?? Math.PI)
      })
    }
    expect(JSON.stringify(await checkVectorsOf(chainOf(name)))).toBe(JSON.stringify(vectors))
  })
})
