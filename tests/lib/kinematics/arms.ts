import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import { identityTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import type { Chain, ChainJoint, Motion } from '@/lib/kinematics/chain'
import { createWorkspace, type Workspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'

/** Chains that the tests compute with, built as plain data, so that no importer stands between a check value and the kernel. */

type Triple = readonly [number, number, number]

interface Joint {
  readonly type?: ChainJoint['type']
  readonly xyz?: Triple
  readonly rpy?: Triple
  readonly axis?: Triple
  readonly lower?: number
  readonly upper?: number
  readonly rate?: number
  /** Follows an earlier joint (by index) instead of being a coordinate. */
  readonly mimic?: { readonly joint: number; readonly multiplier: number; readonly offset?: number }
}

export function rad(...degrees: number[]): number[] {
  return degrees.map((d) => (d * Math.PI) / 180)
}

export function transform(xyz: Triple = [0, 0, 0], rpy: Triple = [0, 0, 0]): number[] {
  return Array.from(transformOfRollPitchYaw(xyz, rpy))
}

/** A chain of joints, each placed in the frame of the one before, and a tip placed in the last. */
export function arm(joints: readonly Joint[], tip: readonly number[] = transform()): Chain {
  const own = joints.filter((joint) => joint.mimic === undefined)
  return {
    base: 'base',
    tip: 'tip',
    joints: own.map((joint, i) => ({
      name: `joint-${i + 1}`,
      type: joint.type ?? 'revolute',
      lower: joint.lower ?? null,
      upper: joint.upper ?? null,
      rate: joint.rate ?? null,
    })),
    motions: joints.map((joint, i): Motion => ({
      name: `motion-${i + 1}`,
      link: `link-${i + 1}`,
      rotary: joint.type !== 'prismatic',
      axis: joint.axis ?? [0, 0, 1],
      joint: joint.mimic?.joint ?? own.indexOf(joint),
      multiplier: joint.mimic?.multiplier ?? 1,
      offset: joint.mimic?.offset ?? 0,
    })),
    constants: [...joints.map((joint) => transform(joint.xyz, joint.rpy)), tip],
  }
}

/** Rotary joints about z, each link along x. */
export function planar(lengths: readonly number[], each: Joint = {}): Chain {
  return arm(
    lengths.map((_length, i) => ({ ...each, xyz: [i === 0 ? 0 : lengths[i - 1]!, 0, 0] })),
    transform([lengths.at(-1)!, 0, 0]),
  )
}

const GOLDEN: readonly Joint[] = [
  { xyz: [0, 0, 0.3], axis: [0, 0, 1] },
  { xyz: [0, 0, 0], axis: [0, 1, 0] },
  { xyz: [0, 0, 0], axis: [0, 0, 1] },
  { xyz: [0, 0, 0.35], axis: [0, -1, 0] },
  { xyz: [0, 0, 0], axis: [0, 0, 1] },
  { xyz: [0, 0, 0.35], axis: [0, 1, 0] },
  { xyz: [0, 0, 0], axis: [0, 0, 1] },
]

/** The 7R arm with spherical shoulder and wrist whose numbers were computed twice (chain, and product of exponentials). */
export function golden(each: Joint = {}): Chain {
  return arm(
    GOLDEN.map((joint) => ({ ...each, ...joint })),
    transform([0, 0, 0.1]),
  )
}

/** The pose that the golden numbers are for. */
export const GOLDEN_POSE = rad(10, 20, 30, 40, 50, 60, 70)

/** Two upright turning joints, a quill and a turning tool: three rotary components can never be had. */
export function scara(): Chain {
  return arm([
    { xyz: [0, 0, 0.4], lower: -2.3, upper: 2.3, rate: 4 },
    { xyz: [0.35, 0, 0], lower: -2.5, upper: 2.5, rate: 5 },
    { xyz: [0.25, 0, 0], type: 'prismatic', axis: [0, 0, -1], lower: 0, upper: 0.2, rate: 1 },
    { type: 'continuous', axis: [0, 0, -1], rate: 12 },
  ])
}

type Screw = readonly [number, number, number, number, number, number]

/** A chain from screws (w; v) and a home pose. A screw with pitch h = w·v becomes a rotary motion and one that slides along the same
 *  axis and follows it with multiplier h. Screws in base axes come before the home pose, screws in tip axes after it. */
export function screwArm(screws: readonly Screw[], home: readonly number[], given: 'in-base' | 'in-tip' = 'in-base'): Chain {
  const motions: Motion[] = []
  const constants: number[][] = []
  let from: Triple = [0, 0, 0]
  screws.forEach(([w1, w2, w3, v1, v2, v3], joint) => {
    const point: Triple = [w2 * v3 - w3 * v2, w3 * v1 - w1 * v3, w1 * v2 - w2 * v1]
    const pitch = w1 * v1 + w2 * v2 + w3 * v3
    const common = { axis: [w1, w2, w3], joint, offset: 0, link: `link-${joint + 1}` } as const
    motions.push({ ...common, name: `turn-${joint + 1}`, rotary: true, multiplier: 1 })
    constants.push(transform([point[0] - from[0], point[1] - from[1], point[2] - from[2]]))
    if (pitch !== 0) {
      motions.push({ ...common, name: `slide-${joint + 1}`, rotary: false, multiplier: pitch })
      constants.push(transform())
    }
    from = point
  })
  constants.push(transform([-from[0], -from[1], -from[2]]))
  const end = given === 'in-base' ? constants.length - 1 : 0
  const pair = given === 'in-base' ? [constants[end]!, home] : [home, constants[end]!]
  const folded = identityTransform()
  multiplyTransforms(pair[0]!, 0, pair[1]!, 0, folded, 0)
  constants[end] = Array.from(folded)
  const joints = screws.map((_screw, i) => ({ name: `screw-${i + 1}`, type: 'revolute', lower: null, upper: null, rate: null }) as const)
  return { base: 'base', tip: 'tip', joints, motions, constants }
}

/** The six-axis example of Lynch & Park 2017, chapter 4, as a chain of screws (dimensions from memory). */
export function sixAxis(): Chain {
  const [W1, W2, L1, L2, H1, H2] = [0.109, 0.082, 0.425, 0.392, 0.089, 0.095]
  return screwArm(
    [
      [0, 0, 1, 0, 0, 0],
      [0, 1, 0, -H1, 0, 0],
      [0, 1, 0, -H1, 0, L1],
      [0, 1, 0, -H1, 0, L1 + L2],
      [0, 0, -1, -W1, L1 + L2, 0],
      [0, 1, 0, H2 - H1, 0, L1 + L2],
    ],
    [-1, 0, 0, L1 + L2, 0, 0, 1, W1 + W2, 0, 1, 0, H1 - H2],
  )
}

/** The three joints of the inverse kinematics example in the code library of Lynch & Park 2017, given by screws in tip axes: a turn, a
 *  slide along y, and a turn that slides a tenth as far. */
export function turnSlideScrew(): Chain {
  const screws = screwArm([[0, 0, -1, 2, 0, 0], [1, 0, 0, 0, 0, 0], [0, 0, 1, 0, 0, 0.1]], [-1, 0, 0, 0, 0, 1, 0, 6, 0, 0, -1, 2], 'in-tip')
  // A screw without a turn stands in the second place, which screwArm does not write.
  return { ...screws, motions: screws.motions.map((motion) => (motion.joint === 1 ? { ...motion, rotary: false, axis: [0, 1, 0] } : motion)) }
}

/** A workspace that stands at `q`. */
export function at(chain: Chain, q: ArrayLike<number>, tool?: ArrayLike<number>): Workspace {
  const work = createWorkspace(chain)
  forwardKinematics(chain, q, work, tool)
  return work
}

/** Arms whose joints, placements and axes are drawn from a seed: rotary and prismatic, 1 … 12 motions, some of them mimics. */
export function randomArm(seed: number): Chain {
  const random = numbers(seed)
  const spread = (half: number) => half * (2 * random() - 1)
  const count = 1 + Math.floor(10 * random())
  const joints: Joint[] = []
  let coordinates = 0
  for (let i = 0; i < count; i++) {
    const mimics = coordinates > 0 && random() < 0.2
    joints.push({
      type: random() < 0.25 ? 'prismatic' : 'revolute',
      xyz: [spread(0.5), spread(0.5), spread(0.5)],
      rpy: [spread(3), spread(1.5), spread(3)],
      axis: [spread(1) + 2, spread(1), spread(1)],
      ...(mimics ? { mimic: { joint: Math.floor(coordinates * random()), multiplier: spread(2), offset: spread(0.3) } } : {}),
    })
    if (!mimics) coordinates++
  }
  return arm(joints, transform([spread(0.3), spread(0.3), spread(0.3)], [spread(3), spread(1.5), spread(3)]))
}

/** A configuration for any chain, drawn from a seed. */
export function randomPose(chain: Chain, seed: number, half = 2): number[] {
  const random = numbers(seed ^ 0x5bd1e995)
  return chain.joints.map(() => half * (2 * random() - 1))
}

/** Numbers in [0, 1): Park & Miller's generator, so that the tests share no code with the kernel's. */
export function numbers(seed: number): () => number {
  let state = (Math.abs(seed | 0) % 2147483646) + 1
  return () => {
    state = (state * 48271) % 2147483647
    return state / 2147483647
  }
}
