import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findLoops } from '@/lib/urdf/find-loops'

interface Edge {
  parent: string
  child: string
}
const into = (nodes: number, edges: readonly Edge[]): Map<string, Edge[]> =>
  new Map(Array.from({ length: nodes }, (_, node) => [String(node), edges.filter(({ child }) => child === String(node))]))

/** A witness by brute force: whether a walk of any length returns to its start. */
function hasLoop(nodes: number, edges: readonly Edge[]): boolean {
  const reached = Array.from({ length: nodes }, (_, node) => new Set(edges.filter(({ parent }) => parent === String(node)).map(({ child }) => child)))
  for (let round = 0; round < nodes; round++) {
    for (const set of reached) for (const node of [...set]) for (const next of reached[Number(node)]!) set.add(next)
  }
  return reached.some((set, node) => set.has(String(node)))
}

describe('findLoops', () => {
  it('finds loops where there are any, none where there are none, and every one that it gives is a loop', () => {
    const graph = fc.integer({ min: 1, max: 8 }).chain((nodes) => {
      const node = fc.integer({ min: 0, max: nodes - 1 }).map(String)
      return fc.record({ nodes: fc.constant(nodes), edges: fc.array(fc.record({ parent: node, child: node }), { maxLength: 10 }) })
    })
    fc.assert(
      fc.property(graph, ({ nodes, edges }) => {
        const loops = findLoops(into(nodes, edges))
        expect(loops.length > 0).toBe(hasLoop(nodes, edges))
        for (const loop of loops) {
          for (const [i, edge] of loop.entries()) {
            expect(edges).toContainEqual(edge)
            expect(loop[(i + 1) % loop.length]!.child).toBe(edge.parent)
          }
        }
      }),
      { seed: 3, numRuns: 1000 },
    )
  })

  it('finds every loop of separate ones', () => {
    const edges = [['0', '1'], ['1', '0'], ['2', '2'], ['3', '4'], ['4', '5'], ['5', '3']].map(([parent, child]) => ({ parent: parent!, child: child! }))
    expect(findLoops(into(7, edges)).map((loop) => loop.length).sort()).toEqual([1, 2, 3])
  })
})
