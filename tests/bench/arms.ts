import type { Chain } from '@/lib/kinematics/chain'

/** Heights (m) and axes of the joints of a seven-axis arm with spherical shoulder and wrist; longer arms repeat them. */
const HEIGHTS = [0.3, 0, 0, 0.35, 0, 0.35, 0]
const AXES = [[0, 0, 1], [0, 1, 0], [0, 0, 1], [0, -1, 0], [0, 0, 1], [0, 1, 0], [0, 0, 1]] as const

const raised = (z: number) => [1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, z]

/** An arm of n turning joints with rate limits. */
export function benchArm(n: number): Chain {
  const place = (i: number) => i % HEIGHTS.length
  return {
    base: 'base',
    tip: 'tip',
    joints: Array.from({ length: n }, (_joint, i) => ({ name: `q${i + 1}`, type: 'revolute', lower: -2.9, upper: 2.9, rate: 2 })),
    motions: Array.from({ length: n }, (_motion, i) => ({ name: `q${i + 1}`, link: `l${i + 1}`, rotary: true, axis: AXES[place(i)]!, joint: i, multiplier: 1, offset: 0 })),
    constants: [...Array.from({ length: n }, (_constant, i) => raised(HEIGHTS[place(i)]!)), raised(0.1)],
  }
}

/** Configurations within ±2 rad, the same on every run. */
export function benchConfigurations(n: number, count: number): Float64Array[] {
  let state = 12345
  const next = () => (state = (state * 48271) % 2147483647) / 2147483647
  return Array.from({ length: count }, () => Float64Array.from({ length: n }, () => 4 * next() - 2))
}

/** The question that every contestant is asked: twist (m/s, rad/s), posture, damping. */
export const TWIST = Float64Array.of(0.1, -0.05, 0.08, 0.1, 0.2, -0.1)
export const POSTURE = 0.3
export const DAMPING = 0.05
