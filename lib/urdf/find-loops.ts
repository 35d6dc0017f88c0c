/** The loops of a graph given by the edges that lead into each node; each loop as its edges, walked backwards (every edge leads
 *  to the parent of the one before). Of loops that share a node, one is found. Linear, without recursion. */
export function findLoops<E extends { readonly parent: string; readonly child: string }>(into: ReadonlyMap<string, readonly E[]>): E[][] {
  const back = edgesOffTheTrees(into)
  const seen = new Map<string, number>()
  const loops: E[][] = []
  let walk = 0
  for (const start of back.keys()) {
    walk++
    const path: E[] = []
    let node = start
    while (!seen.has(node)) {
      seen.set(node, walk)
      const edge = back.get(node)!
      path.push(edge)
      node = edge.parent
    }
    if (seen.get(node) === walk) loops.push(path.slice(path.findIndex((edge) => edge.child === node)))
  }
  return loops
}

/** For each node that no root reaches by peeling: one edge into it from another such node (or itself). */
function edgesOffTheTrees<E extends { readonly parent: string; readonly child: string }>(into: ReadonlyMap<string, readonly E[]>): Map<string, E> {
  const outOf = new Map<string, string[]>()
  for (const edges of into.values()) {
    for (const { parent, child } of edges) {
      const children = outOf.get(parent)
      if (children) children.push(child)
      else outOf.set(parent, [child])
    }
  }
  const waiting = new Map([...into].map(([node, edges]) => [node, edges.length]))
  const peeled = [...into.keys()].filter((node) => waiting.get(node) === 0)
  for (const node of peeled) {
    for (const child of outOf.get(node) ?? []) {
      const left = waiting.get(child)! - 1
      waiting.set(child, left)
      if (left === 0) peeled.push(child)
    }
  }
  const inTrees = new Set(peeled)
  const back = new Map<string, E>()
  for (const [node, edges] of into) {
    if (!inTrees.has(node)) back.set(node, edges.find(({ parent }) => !inTrees.has(parent))!)
  }
  return back
}
