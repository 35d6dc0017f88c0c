import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { partOf, resolveDrives, type Drive } from '@/lib/urdf/drives'
import { createTree, type Tree } from '@/lib/urdf/tree'

/** A chain from the root to a leaf as a revision lists it. joints: the independent joints, base to tip. */
export interface ListedChain {
  readonly base: string
  readonly tip: string
  readonly joints: readonly string[]
  readonly default: boolean
}

/** As many joint names are listed in all: in a tree with many leaves on a long trunk, the lists grow with the square of its size. */
export const LISTED_JOINTS = 200_000

/** The chain that is meant when none is named: from the root to the leaf with most independent joints; on a tie, to the leaf
 *  whose name sorts first by UTF-16 code units. null when every way to a leaf passes a joint that is not computable. */
export function defaultChain(description: Description): { readonly base: string; readonly tip: string } | null {
  return longestOf(description, leafWalk(description))
}

function longestOf(description: Description, visitLeaves: LeafWalk): { readonly base: string; readonly tip: string } | null {
  let best: { tip: string; count: number } | null = null
  visitLeaves((tip, joints) => {
    if (!best || joints.length > best.count || (joints.length === best.count && tip < best.tip)) best = { tip, count: joints.length }
  })
  const found = best as { tip: string } | null
  return found && { base: description.root, tip: found.tip }
}

/** The computable chains from the root to the leaves: the default one first, the others by the name of the leaf, until
 *  LISTED_JOINTS names are listed. */
export function listChains(description: Description): ListedChain[] {
  const visitLeaves = leafWalk(description)
  const standard = longestOf(description, visitLeaves)
  if (!standard) return []
  const tips: { tip: string; count: number }[] = []
  visitLeaves((tip, joints) => tips.push({ tip, count: joints.length }))
  tips.sort((a, b) => (a.tip === standard.tip ? -1 : b.tip === standard.tip ? 1 : a.tip < b.tip ? -1 : 1))
  let room = LISTED_JOINTS
  const shown = new Map<string, ListedChain>()
  for (const { tip, count } of tips) {
    room -= count
    if (shown.size > 0 && room < 0) break
    shown.set(tip, { base: description.root, tip, joints: [], default: tip === standard.tip })
  }
  visitLeaves((tip, joints) => {
    const chain = shown.get(tip)
    if (chain) shown.set(tip, { ...chain, joints: [...joints] })
  })
  return [...shown.values()]
}

/** Calls `visit` for each leaf that a computable way leads to, with the names of the independent joints on that way. The list is
 *  reused from leaf to leaf. Depth-first without recursion; linear. */
type LeafWalk = (visit: (leaf: string, joints: readonly string[]) => void) => void

function leafWalk(description: Description): LeafWalk {
  const tree = createTree(description)
  const drives = resolveDrives(description)
  return (visit) => visitLeaves(description.root, tree, drives, visit)
}

function visitLeaves(root: string, tree: Tree, drives: ReadonlyMap<string, Drive>, visit: Parameters<LeafWalk>[0]): void {
  const joints: string[] = []
  const uses = new Map<string, number>()
  const leaderOf = (joint: DescribedJoint): string | null | undefined => {
    const part = partOf(joint, drives.get(joint.name)!)
    return part.kind === 'moving' ? part.drive.leader.name : part.kind === 'still' ? null : undefined
  }
  const todo: ({ enter: string; leader: string | null } | { leave: string | null })[] = [{ enter: root, leader: null }]
  for (let step = todo.pop(); step; step = todo.pop()) {
    if ('leave' in step) {
      if (step.leave === null) continue
      const left = uses.get(step.leave)! - 1
      uses.set(step.leave, left)
      if (left === 0) joints.pop()
      continue
    }
    const { enter, leader } = step
    if (leader !== null) {
      const used = uses.get(leader) ?? 0
      uses.set(leader, used + 1)
      if (used === 0) joints.push(leader)
    }
    const below = tree.jointsBelow(enter)
    if (below.length === 0) visit(enter, joints)
    todo.push({ leave: leader })
    for (const joint of below) {
      const next = leaderOf(joint)
      if (next !== undefined) todo.push({ enter: joint.child, leader: next })
    }
  }
}
