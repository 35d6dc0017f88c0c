import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import type { Chain } from '@/lib/kinematics/chain'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

const FOLDER = path.join(import.meta.dirname, '../../../samples')

/** The default chain of a sample. */
export function sampleChain(file: string): Chain {
  const { description } = parseUrdf(new Uint8Array(readFileSync(path.join(FOLDER, file))))
  if (description === null) throw new Error(`${file} does not import`)
  return compileChain(description)
}

/** Every sample that imports. */
export const SAMPLE_FILES = readdirSync(FOLDER).filter((file) => file.endsWith('.urdf') && file !== 'flawed-error.urdf')

/** Many joints with short links, each turned against the one before. */
export function longChain(count: number): Chain {
  const constant = [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0.02]
  return {
    base: 'base',
    tip: 'tip',
    joints: Array.from({ length: count }, (_, i) => ({ name: `j${i}`, type: 'revolute' as const, lower: -1, upper: 1, rate: 1 })),
    motions: Array.from({ length: count }, (_, i) => ({
      name: `j${i}`,
      link: `l${i}`,
      rotary: true,
      axis: i % 2 === 0 ? ([1, 0, 0] as const) : ([0, 1, 0] as const),
      joint: i,
      multiplier: 1,
      offset: 0,
    })),
    constants: Array.from({ length: count + 1 }, () => constant),
  }
}

/** All joints in one point, and no link at all. */
export function pointChain(count: number): Chain {
  const chain = longChain(count)
  return { ...chain, constants: chain.constants.map(() => [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0]) }
}
