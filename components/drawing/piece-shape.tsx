import type { ReactElement } from 'react'
import type { Fit } from './fit'
import { onPaper } from './on-paper'
import type { Piece } from './pieces'
import { plus, times, type Vector } from './vector'
import type { Seen } from './view'

type Point = readonly [number, number]

/** How pieces are brought to paper. */
export interface Paper {
  readonly project: (point: Vector) => Seen
  readonly fit: Fit
}

const text = ([x, y]: Point): string => `${onPaper(x)} ${onPaper(y)}`
const closed = (points: readonly Point[]): string => `M${points.map(text).join('L')}Z`
const open = (points: readonly Point[]): string => `M${points.map(text).join('L')}`
const shift = (point: Point, by: Point, factor: number): Point => [point[0] + factor * by[0], point[1] + factor * by[1]]

/** Unit direction from a to b on paper, and its normal; upright when they fall together. */
function directions(a: Point, b: Point): { way: Point; across: Point; length: number } {
  const dx = b[0] - a[0]
  const dy = b[1] - a[1]
  const length = Math.sqrt(dx * dx + dy * dy)
  const way: Point = length > 1e-6 ? [dx / length, dy / length] : [0, -1]
  return { way, across: [-way[1], way[0]], length }
}

const line = { vectorEffect: 'non-scaling-stroke' } as const
const CENTRE_LINE = { strokeDasharray: '10 3 2 3', strokeWidth: 0.8, fill: 'none', ...line }

const seen = (paper: Paper, point: Vector): Point => paper.fit.place(paper.project(point))

/** One piece as strokes; filled with the sheet, so that it hides what lies behind it. */
export function PieceShape({ piece, paper }: { readonly piece: Piece; readonly paper: Paper }): ReactElement {
  switch (piece.kind) {
    case 'link':
      return <LinkShape piece={piece} paper={paper} />
    case 'drum':
      return <DrumShape piece={piece} paper={paper} />
    case 'band':
      return <BandShape piece={piece} paper={paper} />
    case 'rail':
      return <RailShape piece={piece} paper={paper} />
    case 'way':
      return <WayShape piece={piece} paper={paper} />
    case 'block':
      return <BlockShape piece={piece} paper={paper} />
    case 'base':
      return <BaseShape piece={piece} paper={paper} />
  }
}

type Shape<Kind extends Piece['kind']> = { readonly piece: Extract<Piece, { kind: Kind }>; readonly paper: Paper }

function LinkShape({ piece, paper }: Shape<'link'>) {
  const a = seen(paper, piece.from)
  const b = seen(paper, piece.to)
  const { across } = directions(a, b)
  const [wa, wb] = [(piece.thick[0] * paper.fit.thickness) / 2, (piece.thick[1] * paper.fit.thickness) / 2]
  return (
    <g>
      <path d={closed([shift(a, across, wa), shift(b, across, wb), shift(b, across, -wb), shift(a, across, -wa)])} strokeWidth={1.6} {...line} />
      <path d={open([a, b])} {...CENTRE_LINE} />
    </g>
  )
}

/** A short cylinder about the axis, its near face with the centre marked. */
function DrumShape({ piece, paper }: Shape<'drum'>) {
  const radius = 0.62 * piece.thick * paper.fit.thickness
  const half = (0.5 * radius) / paper.fit.scale
  const tip = paper.project(piece.axis)
  const side = tip.near >= 0 ? 1 : -1
  const near = seen(paper, plus(piece.at, piece.axis, side * half))
  const far = seen(paper, plus(piece.at, piece.axis, -side * half))
  const { across } = directions(far, near)
  const ellipse = { rx: onPaper(radius), ry: onPaper(Math.max(radius * Math.abs(tip.near), 0.5)), strokeWidth: 1.6, ...line }
  const [cos, sin] = [onPaper(across[0], 4), onPaper(across[1], 4)]
  const at = (point: Point) => `matrix(${cos} ${sin} ${-sin + 0} ${cos} ${text(point)})`
  const edges = [shift(far, across, radius), shift(near, across, radius), shift(near, across, -radius), shift(far, across, -radius)] as const
  return (
    <g>
      <ellipse {...ellipse} transform={at(far)} />
      <path d={closed(edges)} stroke="none" />
      <path d={`${open([edges[0], edges[1]])}${open([edges[2], edges[3]])}`} fill="none" strokeWidth={1.6} {...line} />
      <ellipse {...ellipse} transform={at(near)} />
      <circle cx={onPaper(near[0])} cy={onPaper(near[1])} r={onPaper(Math.max(1.4, 0.14 * radius))} fill="currentColor" stroke="none" />
    </g>
  )
}

/** Two lines across a link: it turns about its own length here. */
function BandShape({ piece, paper }: Shape<'band'>) {
  const at = seen(paper, piece.at)
  const further = seen(paper, plus(piece.at, piece.axis, 1 / paper.fit.scale))
  const { way, across, length } = directions(at, further)
  const half = 0.5 * piece.thick * paper.fit.thickness
  // Seen nearly end on, the two lines would cover each other.
  if (length < 0.25) return <g />
  const gap = 0.09 * paper.fit.thickness + 1.2
  const bar = (offset: number) => open([shift(shift(at, way, offset), across, half * 1.12), shift(shift(at, way, offset), across, -half * 1.12)])
  return <path d={`${bar(-gap)}${bar(gap)}`} fill="none" strokeWidth={1.2} {...line} />
}

/** The bed of a rail: two lines over the whole way, with an end stop at both ends. */
function RailShape({ piece, paper }: Shape<'rail'>) {
  const a = seen(paper, piece.from)
  const b = seen(paper, piece.to)
  const { way, across } = directions(a, b)
  const half = 0.42 * piece.thick * paper.fit.thickness
  const from = shift(a, way, -1.6 * half)
  const to = shift(b, way, 1.6 * half)
  const stop = (point: Point) => open([shift(point, across, half * 1.5), shift(point, across, -half * 1.5)])
  return (
    <g>
      <path d={closed([shift(from, across, half), shift(to, across, half), shift(to, across, -half), shift(from, across, -half)])} strokeWidth={1.6} {...line} />
      <path d={`${stop(from)}${stop(to)}`} strokeWidth={1.6} {...line} />
      <path d={open([a, b])} {...CENTRE_LINE} />
    </g>
  )
}

/** The way of a slide inside the arm: a centre line with a tick at both ends. */
function WayShape({ piece, paper }: Shape<'way'>) {
  const a = seen(paper, piece.from)
  const b = seen(paper, piece.to)
  const { across } = directions(a, b)
  const half = 0.5 * piece.thick * paper.fit.thickness
  const tick = (point: Point) => open([shift(point, across, half), shift(point, across, -half)])
  return (
    <g>
      <path d={open([a, b])} {...CENTRE_LINE} />
      <path d={`${tick(a)}${tick(b)}`} strokeWidth={0.8} {...line} />
    </g>
  )
}

/** A carriage or a housing that something slides in. */
function BlockShape({ piece, paper }: Shape<'block'>) {
  const at = seen(paper, piece.at)
  const { way, across } = directions(at, seen(paper, plus(piece.at, times(1 / paper.fit.scale, piece.axis))))
  const half = 0.62 * piece.thick * paper.fit.thickness
  const corner = (u: number, v: number) => shift(shift(at, way, u * half * 1.15), across, v * half)
  return (
    <g>
      <path d={closed([corner(-1, -1), corner(1, -1), corner(1, 1), corner(-1, 1)])} strokeWidth={1.6} {...line} />
      <path d={`${open([corner(-0.45, -1), corner(-0.45, 1)])}${open([corner(0.45, -1), corner(0.45, 1)])}`} fill="none" strokeWidth={0.8} {...line} />
    </g>
  )
}

/** Sine of the elevation from which the base is drawn as the plate that it stands on, not as a foot seen from the front. */
const FROM_ABOVE = 0.7

function BaseShape({ piece, paper }: Shape<'base'>) {
  if (paper.project([0, 0, 1]).near > FROM_ABOVE) {
    const half = (0.95 * piece.thick * paper.fit.thickness) / paper.fit.scale
    const corners = ([[-1, -1], [1, -1], [1, 1], [-1, 1]] as const).map(([x, y]) => seen(paper, plus(piece.at, [x * half, y * half, 0])))
    return <path d={closed(corners)} strokeWidth={1.6} {...line} />
  }
  const [x, y] = seen(paper, piece.at)
  const u = 1.36 * piece.thick * paper.fit.thickness
  const foot: readonly Point[] = [[-1, 0.26], [1, 0.26], [1, 0.04], [0.65, 0.04], [0.48, -0.14], [-0.48, -0.14], [-0.65, 0.04], [-1, 0.04]]
  return <path d={closed(foot.map(([dx, dy]) => [x + dx * u, y + dy * u] as const))} strokeWidth={1.6} {...line} />
}
