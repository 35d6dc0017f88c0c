import type { Chain, ChainJoint } from './chain'

/** Half of the span used where a joint has no bound: rad for rotary joints, m for prismatic ones. */
const HALF_SPAN = { revolute: Math.PI, continuous: Math.PI, prismatic: 1 } as const

/** `count` configurations spread over the joint ranges, the same for the same chain and seed on every machine.
 *  A joint without bounds takes ±pi (rotary) or ±1 m (prismatic); with one bound, as wide a span from that bound on. */
export function seededConfigurations(chain: Chain, count: number, seed = 1): Float64Array[] {
  const next = configurationSource(chain.joints, seed)
  return Array.from({ length: count }, next)
}

/** The configurations of seededConfigurations one by one, for work that is done in slices. */
export function configurationSource(joints: readonly ChainJoint[], seed = 1): () => Float64Array {
  const random = numbers(seed)
  const ranges = joints.map(rangeOf)
  return () => Float64Array.from(ranges, ([from, to]) => from + (to - from) * random())
}

/** The range of a joint; where a bound is missing, the one that seededConfigurations takes. */
export function rangeOf({ type, lower, upper }: ChainJoint): [from: number, to: number] {
  const half = HALF_SPAN[type]
  if (lower !== null && upper !== null) return [lower, upper]
  if (lower !== null) return [lower, lower + 2 * half]
  if (upper !== null) return [upper - 2 * half, upper]
  return [-half, half]
}

/** Numbers in [0, 1) from a counter whose bits are mixed by integer multiplications (the finaliser of MurmurHash3, from memory). */
function numbers(seed: number): () => number {
  let counter = seed | 0
  return () => {
    counter = (counter + 0x9e3779b9) | 0
    let bits = counter
    bits = Math.imul(bits ^ (bits >>> 16), 0x85ebca6b)
    bits = Math.imul(bits ^ (bits >>> 13), 0xc2b2ae35)
    return ((bits ^ (bits >>> 16)) >>> 0) / 0x1_0000_0000
  }
}
