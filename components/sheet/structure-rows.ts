import type { Joint } from '@/lib/contract/description'
import { groupBy } from './group-by'

/** A link in the tree of a robot, with the joint that carries it. */
export interface StructureRow {
  readonly link: string
  readonly depth: number
  /** null for the root. */
  readonly joint: Joint | null
}

/** The tree of links, root first, each link under its parent, children by name. Not recursive: chains may be thousands long. */
export function structureRows(rootLink: string, joints: readonly Joint[]): StructureRow[] {
  const byParent = groupBy(joints, (joint) => joint.parent)
  const rows: StructureRow[] = []
  const open: StructureRow[] = [{ link: rootLink, depth: 0, joint: null }]
  for (let row = open.pop(); row !== undefined; row = open.pop()) {
    rows.push(row)
    const { depth } = row
    const children = (byParent.get(row.link) ?? []).toSorted((a, b) => (a.child < b.child ? 1 : -1))
    for (const joint of children) open.push({ link: joint.child, depth: depth + 1, joint })
  }
  return rows
}
