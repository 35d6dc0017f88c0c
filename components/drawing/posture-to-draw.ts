import type { Chain } from '@/lib/kinematics/chain'
import { radFromDeg } from '@/lib/units'
import { spanOf } from './pieces'
import { skeletonOf } from './skeleton'
import { along, lengthOf, minus, ORIGIN, type Vector } from './vector'
import { defaultView, projection } from './view'

/** Angles that are tried for each turning joint, rad, and parts of the way for each sliding one. */
const TURNS = [0, -20, 20, -40, 40, -60, 60, -80, 80].map(radFromDeg)
const PARTS = [0.5, 0.35, 0.65]
const PASSES = 3

/** Beyond this many joints one pass with few angles is enough, and quick. */
const MANY_JOINTS = 16

/** How well a pose reads on paper: links seen at length, bends neither straight nor folded, nothing under the floor; and
 *  the fewer joints are moved for it, the better. */
function readability(chain: Chain, q: readonly number[]): number {
  const skeleton = skeletonOf(chain, q)
  const span = spanOf(skeleton)
  const project = projection(defaultView(chain))
  const points: Vector[] = [ORIGIN, ...skeleton.nodes.map((node) => node.at), skeleton.tip]
  const links: Vector[] = []
  // The way of a slide is no link: only what is fixed to it counts.
  const ends = [...skeleton.nodes.map((node) => ({ from: node.at, to: node.zero })), { from: skeleton.tip, to: skeleton.tip }]
  let from: Vector = ORIGIN
  for (const end of ends) {
    if (lengthOf(minus(end.to, from)) > 1e-3 * span) links.push(minus(end.to, from))
    from = end.from
  }
  let score = 0
  for (const link of links) {
    const seen = project(link)
    score += (1.6 * Math.sqrt(seen.x * seen.x + seen.y * seen.y)) / span
  }
  for (let i = 1; i < links.length; i++) {
    const cosine = along(links[i]!, links[i - 1]!) / (lengthOf(links[i]!) * lengthOf(links[i - 1]!))
    const bend = Math.acos(Math.min(1, Math.max(-1, cosine)))
    score += 0.7 * Math.exp(-(((bend - 1) / 0.7) ** 2))
  }
  const upright = links.reduce((sum, link) => sum + Math.max(0, -link[2]) / span, 0)
  const sunk = points.reduce((sum, point) => sum + Math.max(0, 0.02 * span - point[2]) / span, 0)
  // Links that cross each other on the way back to the base read badly.
  const close = points.reduce((sum, a, i) => sum + points.slice(i + 2).filter((b) => lengthOf(minus(a, b)) < 0.15 * span && lengthOf(minus(a, b)) > 1e-3 * span).length, 0)
  const first = chain.joints.findIndex((joint) => joint.type !== 'prismatic')
  const moved = q.reduce((sum, value, i) => sum + (chain.joints[i]?.type === 'prismatic' || value === 0 ? 0 : (i === first ? 0.04 : 0.12) + 0.04 * Math.abs(value)), 0)
  return score - 0.6 * upright - 3 * sunk - 0.2 * close - moved
}

/** A configuration inside the limits that shows what an arm is: bent where it bends, everything in sight. n, rad or m.
 *  The same for the same chain. */
export function postureToDraw(chain: Chain): number[] {
  const choices = chain.joints.map((joint): number[] => {
    const { lower, upper } = joint
    if (joint.type === 'prismatic') {
      const from = lower ?? (upper ?? 1) - 1
      const to = upper ?? from + 1
      return PARTS.map((part) => from + part * (to - from))
    }
    const inside = (angle: number) => angle >= (lower ?? angle) && angle <= (upper ?? angle)
    const turns = chain.joints.length > MANY_JOINTS ? TURNS.slice(0, 3) : TURNS
    const possible = turns.filter(inside)
    return possible.length > 0 ? possible : [((lower ?? 0) + (upper ?? lower ?? 0)) / 2]
  })
  const isLong = chain.joints.length > MANY_JOINTS
  // What the first turning joint does decides which side of the arm is seen, and a climb from one side does not reach the other.
  const turning = chain.joints.findIndex((joint) => joint.type !== 'prismatic')
  const starts = isLong || turning < 0 ? [undefined] : choices[turning]!.filter((angle) => angle === 0 || Math.abs(angle) > 1.3)
  const climbs = starts.map((start) => {
    const q = choices.map((values) => values[0] ?? 0)
    if (start !== undefined) q[turning] = start
    return climb(chain, q, choices, start === undefined ? -1 : turning, isLong ? 1 : PASSES)
  })
  return climbs.reduce((best, next) => (next.score > best.score + 1e-9 ? next : best)).q
}

/** Tries every choice of one joint after the other, `held` excepted, and keeps what reads best. */
function climb(chain: Chain, q: number[], choices: readonly (readonly number[])[], held: number, passes: number) {
  let score = readability(chain, q)
  for (let pass = 0; pass < passes; pass++) {
    choices.forEach((values, i) => {
      if (i === held) return
      let best = q[i]!
      for (const value of values) {
        q[i] = value
        const next = readability(chain, q)
        if (next > score + 1e-9) {
          best = value
          score = next
        }
      }
      q[i] = best
    })
  }
  return { q, score }
}
