import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { seededConfigurations } from '@/lib/kinematics/seeded-configurations'
import { compileChain } from '@/lib/urdf/compile-chain'
import { defaultChain } from '@/lib/urdf/default-chain'
import type { Description } from '@/lib/urdf/description'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { askPython } from './ask-python'

const CONFIGURATIONS = 200
/** Of the larger of 1 and the largest entry. */
const TOLERANCE = 1e-12

const here = import.meta.dirname
const samples = path.resolve(here, '../../samples')

interface Witness {
  readonly transforms: number[][]
  readonly jacobians: number[][]
}

function ask(file: string, chain: Chain, configurations: readonly ArrayLike<number>[]): Witness {
  const question = {
    file,
    base: chain.base,
    tip: chain.tip,
    joints: chain.joints.map(({ name }) => name),
    configurations: configurations.map((q) => Array.from(q)),
  }
  return askPython<Witness>('kdl.py', question)
}

function expectAgreement(ours: ArrayLike<number>, theirs: readonly number[], what: string) {
  expect(ours.length, what).toBe(theirs.length)
  const size = Math.max(1, ...theirs.map(Math.abs))
  const away = Math.max(...theirs.map((value, i) => Math.abs(value - ours[i]!)))
  expect(away, `${what} is ${away} away from KDL's`).toBeLessThanOrEqual(TOLERANCE * size)
}

function expectSame(file: string, description: Description, base: string, tip: string, seed: number) {
  const chain = compileChain(description, base, tip)
  const configurations = seededConfigurations(chain, CONFIGURATIONS, seed)
  const { transforms, jacobians } = ask(file, chain, configurations)
  expect(transforms).toHaveLength(CONFIGURATIONS)
  const work = createWorkspace(chain)
  configurations.forEach((q, i) => {
    forwardKinematics(chain, q, work)
    expectAgreement(work.baseFromTip, transforms[i]!, `pose ${i}`)
    expectAgreement(jacobian(chain, work), jacobians[i]!, `Jacobian ${i}`)
  })
}

const imported = [samples, path.join(here, 'arms')]
  .flatMap((folder) =>
    readdirSync(folder)
      .filter((name) => name.endsWith('.urdf'))
      .sort()
      .map((name) => ({ name, file: path.join(folder, name) })),
  )
  .flatMap(({ name, file }) => {
    const { description } = parseUrdf(readFileSync(file))
    return description === null ? [] : [{ name, file, description }]
  })

describe('forward kinematics and Jacobian against Orocos KDL', () => {
  it('covers every sample that imports', () => {
    expect(imported.map(({ name }) => name)).toEqual(
      expect.arrayContaining(['skerry-7.urdf', 'trainer-3r.urdf', 'gannet-4.urdf', 'fulmar-6.urdf', 'skerry-7-rail.urdf']),
    )
  })

  it.each(imported)('agree on $name over 200 seeded configurations of its default chain', ({ file, description }) => {
    const found = defaultChain(description)
    expect(found).not.toBeNull()
    expectSame(file, description, found!.base, found!.tip, 7)
  })

  it.each(imported)('agree on $name from its root to every other link', ({ file, description }) => {
    const ends = description.joints.map(({ child }) => child)
    expect(ends.length).toBeGreaterThan(0)
    ends.forEach((tip, i) => {
      if (compileChain(description, description.root, tip).joints.length > 0) expectSame(file, description, description.root, tip, 100 + i)
    })
  })
})
