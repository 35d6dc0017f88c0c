import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { resolveRates } from '@/lib/kinematics/resolve-rates'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { numbers, randomPose } from '../lib/kinematics/arms'
import { askPython } from './ask-python'
import { randomTree } from './random-tree'

const TREES = 300
const CONFIGURATIONS = 4
/** Of the larger of 1 and the largest entry. */
const TOLERANCE = 1e-12

interface Case {
  readonly seed: number
  readonly chain: Chain
  readonly configurations: number[][]
  /** Asked only where KDL can be asked: without mimics, and from six joints on, below which it asserts. */
  readonly damped?: { readonly lambda: number; readonly weights: number[]; readonly twists: number[][] }
}

interface Witness {
  readonly transforms: number[][]
  readonly jacobians: number[][]
  readonly rates: number[][]
}

function drawCase(seed: number, folder: string): { readonly question: object; readonly known: Case } {
  const { urdf, base, tip, mimics } = randomTree(seed)
  const file = path.join(folder, `${seed}.urdf`)
  writeFileSync(file, urdf)
  const { description, findings } = parseUrdf(Buffer.from(urdf))
  if (description === null) throw new Error(`tree ${seed}: ${JSON.stringify(findings)}`)
  const chain = compileChain(description, base, tip)
  const configurations = Array.from({ length: CONFIGURATIONS }, (_unused, i) => randomPose(chain, 31 * seed + i))
  const random = numbers(100_003 * seed)
  const damped =
    mimics || chain.joints.length < 6
      ? {}
      : {
          damped: {
            lambda: 0.02 + random() / 5,
            weights: chain.joints.map(() => 0.1 + 5 * random()),
            twists: configurations.map(() => Array.from({ length: 6 }, () => random() - 0.5)),
          },
        }
  const joints = chain.joints.map(({ name }) => name)
  return { question: { file, base, tip, joints, configurations, ...damped }, known: { seed, chain, configurations, ...damped } }
}

/** Largest distance, as a part of the larger of 1 and the largest entry. */
function distance(ours: ArrayLike<number>, theirs: readonly number[]): number {
  expect(ours.length).toBe(theirs.length)
  const size = Math.max(1, ...theirs.map(Math.abs))
  return theirs.reduce((worst, value, i) => Math.max(worst, Math.abs(value - ours[i]!)), 0) / size
}

describe('300 random trees against Orocos KDL', () => {
  let folder: string
  let cases: Case[]
  let witnesses: Witness[]

  beforeAll(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'trees-'))
    const drawn = Array.from({ length: TREES }, (_unused, i) => drawCase(i + 1, folder))
    cases = drawn.map(({ known }) => known)
    witnesses = askPython<Witness[]>('kdl.py', { questions: drawn.map(({ question }) => question) })
  })
  afterAll(() => rmSync(folder, { recursive: true }))

  it('mix rotary and prismatic joints, crooked axes, placements, mimics of mimics and leaders off the path', () => {
    const motions = cases.flatMap(({ chain }) => chain.motions)
    expect(motions.filter(({ rotary }) => !rotary).length).toBeGreaterThan(300)
    expect(motions.filter(({ multiplier }) => multiplier < 0).length).toBeGreaterThan(50)
    expect(cases.filter(({ chain }) => chain.motions.length > chain.joints.length).length).toBeGreaterThan(50)
    expect(cases.filter(({ damped }) => damped !== undefined).length).toBeGreaterThan(50)
  })

  it('have the same poses', () => {
    cases.forEach(({ seed, chain, configurations }, i) => {
      const work = createWorkspace(chain)
      configurations.forEach((q, k) => {
        forwardKinematics(chain, q, work)
        expect(distance(work.baseFromTip, witnesses[i]!.transforms[k]!), `tree ${seed}`).toBeLessThanOrEqual(TOLERANCE)
      })
    })
  })

  it('have the same Jacobians', () => {
    cases.forEach(({ seed, chain, configurations }, i) => {
      const work = createWorkspace(chain)
      configurations.forEach((q, k) => {
        forwardKinematics(chain, q, work)
        expect(distance(jacobian(chain, work), witnesses[i]!.jacobians[k]!), `tree ${seed}`).toBeLessThanOrEqual(TOLERANCE)
      })
    })
  })

  it('have the same weighted damped rates, to 1e-14 times the condition of the damped system', () => {
    cases.forEach(({ seed, chain, configurations, damped }, i) => {
      if (damped === undefined) return
      const work = createWorkspace(chain)
      const task = createTask()
      const structural = structuralLoss(chain, task)
      configurations.forEach((q, k) => {
        forwardKinematics(chain, q, work)
        const { rates, singularValues } = resolveRates(chain, work, damped.twists[k]!, {
          task, structural, secondary: [], inverse: { method: 'damped', damping: damped.lambda },
          jointWeights: damped.weights, limits: { rates: 'report', derating: 1 },
        })
        const spread = Math.sqrt(Math.max(...damped.weights) / Math.min(...damped.weights))
        const condition = (spread * singularValues[0]! ** 2) / damped.lambda ** 2
        expect(distance(rates, witnesses[i]!.rates[k]!), `tree ${seed}`).toBeLessThanOrEqual(1e-14 * condition)
      })
    })
  })
})
