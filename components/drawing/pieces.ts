import type { Node, Skeleton } from './skeleton'
import { along, lengthOf, minus, ORIGIN, plus, times, type Vector } from './vector'

/** A part of the drawing, in m. thick: 1 at the base, less towards the tip; what it is in m is decided by the fit. */
export type Piece =
  | { readonly kind: 'link'; readonly from: Vector; readonly to: Vector; readonly thick: readonly [number, number] }
  | { readonly kind: 'drum'; readonly at: Vector; readonly axis: Vector; readonly thick: number }
  | { readonly kind: 'band'; readonly at: Vector; readonly axis: Vector; readonly thick: number }
  | { readonly kind: 'rail'; readonly from: Vector; readonly to: Vector; readonly thick: number }
  | { readonly kind: 'way'; readonly from: Vector; readonly to: Vector; readonly thick: number }
  | { readonly kind: 'block'; readonly at: Vector; readonly axis: Vector; readonly thick: number }
  | { readonly kind: 'base'; readonly at: Vector; readonly thick: number }

const TIP_THICKNESS = 0.45
/** Cosine from which an offset counts as lying along an axis. */
const PARALLEL = 0.96

/** How far the chain reaches when its links are laid end to end, m; never 0. */
export function spanOf(skeleton: Skeleton): number {
  let sum = 0
  let before = ORIGIN
  for (const node of skeleton.nodes) {
    sum += lengthOf(minus(node.zero, before))
    before = node.at
  }
  return sum + lengthOf(minus(skeleton.tip, before)) || 1
}

/** The offset of `axis`-parallel kind: none, along the axis, or across it. */
function lie(offset: Vector, axis: Vector, small: number): 'none' | 'along' | 'across' {
  const length = lengthOf(offset)
  if (length <= small) return 'none'
  return Math.abs(along(offset, axis)) / length > PARALLEL ? 'along' : 'across'
}

/** Cuts an arm into the parts that are drawn. Which mark a joint gets depends on the build of the arm and never on the pose, so
 *  that nothing jumps while it moves: an axis along its link is a band across it, any other a drum. */
export function piecesOf(skeleton: Skeleton): Piece[] {
  const { nodes, tip } = skeleton
  const small = 1e-3 * spanOf(skeleton)
  const thickness = (place: number) => 1 - (1 - TIP_THICKNESS) * Math.min(1, Math.max(0, place / (nodes.length + 1)))
  const pieces: Piece[] = []
  const onRail = nodes[0] !== undefined && !nodes[0].rotary && lengthOf(nodes[0].zero) <= small
  if (!onRail) pieces.push({ kind: 'base', at: ORIGIN, thick: 1 })

  let from: Vector = ORIGIN
  const link = (to: Vector, place: number) => {
    if (lengthOf(minus(to, from)) > small) pieces.push({ kind: 'link', from, to, thick: [thickness(place), thickness(place + 1)] })
    from = to
  }

  nodes.forEach((node, i) => {
    const into = minus(node.zero, from)
    const next = nodes[i + 1]?.zero ?? tip
    const out = minus(next, node.at)
    link(node.zero, i)
    const thick = thickness(i + 1)
    if (!node.rotary) pieces.push(...slide(node, i === 0 && onRail, thick, small))
    else pieces.push(turn(node, into, out, thick, small))
    from = node.at
    // A link that leaves a drum sideways first follows the axis, then crosses to the next joint.
    const rise = along(out, node.axis)
    const isCorner = node.rotary && lie(out, node.axis, small) === 'across' && Math.abs(rise) > 4 * small
    if (isCorner) link(plus(node.at, node.axis, rise), i + 1)
  })
  link(tip, nodes.length)
  return pieces
}

/** Part of the way from a joint to its band. */
const BAND_PLACE = 0.24

function turn(node: Node, into: Vector, out: Vector, thick: number, small: number): Piece {
  const before = lie(into, node.axis, small)
  const after = lie(out, node.axis, small)
  const isBand = (after === 'along' && before !== 'across') || (before === 'along' && after === 'none')
  if (!isBand) return { kind: 'drum', at: node.at, axis: node.axis, thick }
  const at = after === 'along' ? plus(node.at, out, BAND_PLACE) : plus(node.at, into, -BAND_PLACE)
  return { kind: 'band', at, axis: node.axis, thick }
}

function slide(node: Node, onRail: boolean, thick: number, small: number): Piece[] {
  const [lower, upper] = node.ends
  if (onRail) return [{ kind: 'rail', from: lower, to: upper, thick }, { kind: 'block', at: node.at, axis: node.axis, thick: 1.25 * thick }]
  const rod: Piece[] =
    lengthOf(minus(node.at, node.zero)) > small
      ? [{ kind: 'link', from: node.zero, to: node.at, thick: [0.55 * thick, 0.55 * thick] }]
      : []
  return [{ kind: 'way', from: lower, to: upper, thick }, ...rod, { kind: 'block', at: node.zero, axis: node.axis, thick }]
}

/** The length of a typical link, m: half of the arm consists of links at least as long. */
export function linkLength(pieces: readonly Piece[]): number {
  const lengths = pieces.flatMap((piece) => (piece.kind === 'link' ? [lengthOf(minus(piece.to, piece.from))] : [])).sort((a, b) => b - a)
  const half = lengths.reduce((sum, length) => sum + length, 0) / 2
  let sum = 0
  return lengths.find((length) => (sum += length) >= half) ?? 1
}

/** The points that the drawing must contain. */
export function outlineOf(skeleton: Skeleton): Vector[] {
  return [ORIGIN, skeleton.tip, ...skeleton.nodes.flatMap((node) => [node.at, node.zero, ...node.ends])]
}

/** The tip frame, its arms as long as the drawing wants them. */
export const tipFrame = (skeleton: Skeleton, armLength: number): Vector[] =>
  skeleton.tipAxes.map((axis) => plus(skeleton.tip, times(armLength, axis)))
