import { findLoops } from '@/lib/urdf/find-loops'
import type { DraftJoint } from '@/lib/urdf/read-joint'
import type { DraftLink } from '@/lib/urdf/read-link'
import type { Attribute } from '@/lib/urdf/read-tag'
import type { Report } from '@/lib/urdf/report'
import { createSimilarName } from '@/lib/urdf/similar-name'
import { listed, quoted } from '@/lib/urdf/wording'

/** A joint both of whose links exist. */
interface Edge {
  readonly joint: DraftJoint
  readonly parent: string
  readonly child: string
}

/** Reports what keeps links and joints from being one tree. Linear in the size of the file, without recursion. */
export function checkTree(report: Report, links: ReadonlyMap<string, DraftLink>, joints: readonly DraftJoint[]): void {
  const edges = checkEnds(report, links, joints)
  const into = new Map<string, Edge[]>([...links.keys()].map((name) => [name, []]))
  for (const edge of edges) into.get(edge.child)!.push(edge)

  const looped = new Set<Edge>()
  for (const loop of findLoops(into)) {
    for (const edge of loop) looped.add(edge)
    reportLoop(report, loop)
  }
  for (const [name, edgesInto] of into) {
    const [first, ...others] = edgesInto.filter((edge) => !looped.has(edge))
    for (const { joint } of others) {
      const line = report.lineAt(first!.joint.at)
      report.add('two-parents', joint.child!.valueAt, `The link ${quoted(name)} is already the child of ${first!.joint.label} in line ${line}.`, { element: joint.label })
    }
  }
  const roots = [...links].filter(([name]) => into.get(name)!.length === 0)
  // A joint that leads nowhere leaves its links over: they are a consequence of what is reported there.
  if (roots.length > 1 && edges.length === joints.length) {
    const [, second] = roots[1]!
    const where = listed(roots.map(([name]) => name), (index) => ` (line ${report.lineAt(roots[index]![1].at)})`)
    report.add('several-roots', second.at, `${roots.length} links are the child of no joint: ${where}.`, { element: second.label })
  }
}

/** The joints whose two links exist; the others are reported. */
function checkEnds(report: Report, links: ReadonlyMap<string, DraftLink>, joints: readonly DraftJoint[]): Edge[] {
  const similar = createSimilarName([...links.keys()])
  const exists = (joint: DraftJoint, which: 'parent' | 'child', end: Attribute | null): boolean => {
    if (!end) return false
    if (links.has(end.value)) return true
    const meant = similar(end.value)
    const hint = meant === undefined ? '' : ` The file has ${quoted(meant)}.`
    const remedy = meant === undefined ? {} : { remedy: `Write ${quoted(meant)} in the ${which} of this joint, if that link is meant, or declare the link.` }
    report.add('link-undeclared', end.valueAt, `The ${which} ${quoted(end.value)} is not a link of this file.${hint}`, { element: joint.label, ...remedy })
    return false
  }
  return joints.flatMap((joint) => {
    const parent = exists(joint, 'parent', joint.parent)
    const child = exists(joint, 'child', joint.child)
    return parent && child ? [{ joint, parent: joint.parent!.value, child: joint.child!.value }] : []
  })
}

/** edges: of one loop, each leading to the parent of the one before. */
function reportLoop(report: Report, edges: readonly Edge[]): void {
  const closing = edges.reduce((last, edge) => (edge.joint.at > last.joint.at ? edge : last))
  const turned = [...edges, ...edges].slice(edges.indexOf(closing), edges.indexOf(closing) + edges.length).reverse()
  const { joint, parent, child } = closing
  const message =
    parent === child
      ? `The joint leads from the link ${quoted(parent)} to itself.`
      : `The links ${listed(turned.map((edge) => edge.parent))} form a loop, which this joint closes: it leads from ${quoted(parent)} back to ${quoted(child)}.`
  report.add('cycle', joint.child!.valueAt, message, { element: joint.label })
}
