import type { Vector } from './vector'
import type { Seen } from './view'

export interface Box {
  readonly width: number
  readonly height: number
}

/** From the plane of the drawing (m) to units of the picture. */
export interface Fit {
  /** Units of the picture a metre. */
  readonly scale: number
  /** Width of a link of thickness 1, in units of the picture. */
  readonly thickness: number
  readonly place: (seen: Seen) => readonly [number, number]
}

const MOST_THICKNESS_PART = 0.056

const LEAST_THICKNESS_PART = 0.007
/** Thickness against the length of a typical link, so that short links are drawn thin. */
const SLENDERNESS = 0.26

/** Fits points into a box. linkLength: of a typical link, m. margin: part of the picture that stays free at each side. */
export function fitInto(box: Box, points: readonly Vector[], project: (point: Vector) => Seen, linkLength: number, margin: number): Fit {
  const seen = points.map(project)
  const xs = seen.map((point) => point.x)
  const ys = seen.map((point) => point.y)
  const left = Math.min(...xs)
  const right = Math.max(...xs)
  const top = Math.min(...ys)
  const bottom = Math.max(...ys)
  const free = { width: box.width * (1 - 2 * margin), height: box.height * (1 - 2 * margin) }
  const width = right - left
  const height = bottom - top
  const most = Math.min(free.width / Math.max(width, 1e-9), free.height / Math.max(height, 1e-9))
  const scale = Number.isFinite(most) && Math.max(width, height) > 1e-9 ? most : Math.min(free.width, free.height)
  const size = Math.min(box.width, box.height)
  const thickness = Math.max(LEAST_THICKNESS_PART * size, Math.min(MOST_THICKNESS_PART * size, SLENDERNESS * linkLength * scale))
  const middleX = (left + right) / 2
  const middleY = (top + bottom) / 2
  return {
    scale,
    thickness,
    place: ({ x, y }) => [box.width / 2 + (x - middleX) * scale, box.height / 2 + (y - middleY) * scale],
  }
}
