import { EFFECT_SAMPLES, EFFECT_SEED, type Comparison } from '@/lib/contract/comparison'
import { inSlices } from '@/lib/in-slices'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { configurationSource } from '@/lib/kinematics/seeded-configurations'
import { poseDifference } from '@/lib/math/pose-difference'
import { type CommonGround, takeUp } from './common-ground'

export type Effect = Comparison['effect']

const STILL = { max: 0, mean: 0, p95: 0 }

/** The effect between two descriptions that compute the same. */
export const NO_EFFECT: Effect = { samples: 0, seed: EFFECT_SEED, translation: STILL, rotation: STILL }

/** So many joints are placed on each side at the most, about two seconds of computing: a chain of thousands has fewer samples. */
const MOST_PLACED = 6_000_000

const samplesFor = (joints: number, common: number): number =>
  common === 0 ? 1 : Math.min(EFFECT_SAMPLES, Math.max(1, Math.floor(MOST_PLACED / Math.max(1, joints))))

/** How far the tip of `to` stands from that of `from`, in the base link, for the same joint values: over seeded configurations of the
 *  joints they have in common. Without any there is one configuration. Sliced. */
export async function tipEffect(from: Chain, to: Chain, ground: CommonGround): Promise<Effect> {
  const samples = samplesFor(Math.max(from.motions.length, to.motions.length), ground.joints.length)
  const next = configurationSource(ground.joints, EFFECT_SEED)
  const works = [createWorkspace(from), createWorkspace(to)] as const
  const own = [new Float64Array(from.joints.length), new Float64Array(to.joints.length)] as const
  const translation = createTally(samples)
  const rotation = createTally(samples)
  await inSlices(samples, (index) => {
    const q = next()
    takeUp(ground.from, q, own[0])
    takeUp(ground.to, q, own[1])
    forwardKinematics(from, own[0], works[0])
    forwardKinematics(to, own[1], works[1])
    const { distance, angle } = poseDifference(works[0].baseFromTip, works[1].baseFromTip)
    translation.add(index, distance, q)
    rotation.add(index, angle, q)
  })
  return { samples, seed: EFFECT_SEED, translation: translation.sum(), rotation: rotation.sum() }
}

/** Collects one measure over all configurations. The 95th percentile is the nearest-rank one. */
function createTally(samples: number) {
  const values = new Float64Array(samples)
  let worst: Float64Array | undefined
  let max = 0
  return {
    add(index: number, value: number, q: Float64Array): void {
      values[index] = value
      if (value <= max) return
      max = value
      worst = q
    },
    sum() {
      const mean = values.reduce((total, value) => total + value, 0) / samples
      const p95 = values.toSorted()[Math.ceil(0.95 * samples) - 1]!
      return { max, mean, p95, ...(worst === undefined ? {} : { worst: Array.from(worst) }) }
    },
  }
}
