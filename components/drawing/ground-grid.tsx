import type { Fit } from './fit'
import { onPaper } from './on-paper'
import { lengthOf, type Vector } from './vector'
import type { Seen } from './view'

const CELLS_WANTED = 5

/** A step of 1, 2 or 5 times a power of ten, m. */
function niceStep(reach: number): number {
  const rough = reach / CELLS_WANTED
  const power = 10 ** Math.floor(Math.log10(rough))
  return power * ([1, 2, 5].find((step) => step * power >= rough) ?? 10)
}

/** The floor: a grid at z = 0 of the base frame, around what stands on it. */
export function GroundGrid({ points, project, fit }: { readonly points: readonly Vector[]; readonly project: (point: Vector) => Seen; readonly fit: Fit }) {
  const reach = Math.max(...points.map((point) => lengthOf([point[0], point[1], 0])), ...points.map((point) => Math.abs(point[2]))) || 1
  const step = niceStep(reach)
  const bound = (axis: 0 | 1, side: -1 | 1): number => {
    const far = Math.max(...points.map((point) => side * point[axis]), 0.55 * reach)
    return side * Math.ceil(far / step) * step
  }
  const [x0, x1, y0, y1] = [bound(0, -1), bound(0, 1), bound(1, -1), bound(1, 1)]
  const place = (x: number, y: number) => fit.place(project([x, y, 0])).map((value) => onPaper(value)).join(' ')
  const lines: string[] = []
  for (let x = x0; x <= x1 + step / 2; x += step) lines.push(`M${place(x, y0)}L${place(x, y1)}`)
  for (let y = y0; y <= y1 + step / 2; y += step) lines.push(`M${place(x0, y)}L${place(x1, y)}`)
  return <path d={lines.join('')} stroke="var(--hair)" strokeWidth={1} fill="none" vectorEffect="non-scaling-stroke" />
}
