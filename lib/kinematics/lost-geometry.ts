import { cross, distanceToLine, inLine, inner, lengthOf, meetingPoint, plus, type Line, type Triple } from '@/lib/math/lines'
import { positionOf } from '@/lib/math/rigid-transform'
import { turnOutOfFrame } from '@/lib/math/twist-columns'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import type { LostPart } from './lost-parts'
import { motionAxis } from './motion-axis'
import { LINEAR_COMPONENTS, type Task } from './task'

/** Within this (m) lines meet and points lie on them; also the pitch (m) up to which a direction counts as a line. */
const MEETS = 1e-6
/** A part of a unit direction below this is not spoken of. */
const NOTHING = 1e-3
const SQUARE = 1e-6

interface Axis extends Line {
  readonly name: string
  readonly before: string
  readonly link: string
}

/** What a lost direction means on the arm, where that can be said and is true: which point cannot move along the line from the shoulder,
 *  inward or outward, in the plane of which links, and where the arm is stretched; or which axes have come into line. '' where neither.
 *  A lost direction (f; t) is felt as a force along a line: it is the motion along f of the points on that line. */
export function lostGeometry(chain: Chain, work: Workspace, task: Task, part: LostPart): string {
  const twist = [...part.direction]
  if (task.frame === 'tip') turnOutOfFrame(work.baseFromTool, twist, 1)
  const force = twist.slice(0, LINEAR_COMPONENTS) as unknown as Triple
  const moment = twist.slice(LINEAR_COMPONENTS) as unknown as Triple
  const axes = rotaryAxes(chain, work)
  const size = lengthOf(force)
  if (size < NOTHING) return alignedAxes(axes)
  const squared = size * size
  if (Math.abs(inner(force, moment)) > MEETS * squared) return ''
  const along: Triple = [force[0] / size, force[1] / size, force[2] / size]
  const tool = positionOf(work.baseFromTool)
  const line: Line = { point: plus(tool, cross(force, moment), 1 / squared), along }
  return radialWords(axes, line, lengthOf(moment) < NOTHING ? tool : null, part.asked)
}

function rotaryAxes(chain: Chain, work: Workspace): Axis[] {
  return chain.motions.flatMap(({ name, rotary, link }, i): Axis[] => {
    if (!rotary) return []
    const before = i === 0 ? chain.base : chain.motions[i - 1]!.link
    return [{ name, before, link, ...motionAxis(work, i) }]
  })
}

interface Place {
  readonly point: Triple
  readonly words: string
  /** The axes up to and with this index make it. */
  readonly last: number
}

function radialWords(axes: readonly Axis[], line: Line, tool: Triple | null, asked: 1 | -1): string {
  const shoulder = shoulderOn(axes, line)
  if (shoulder === null) return ''
  const moved = tool === null ? wristOn(axes, line, shoulder) : { point: tool, words: '', last: axes.length }
  if (moved === null) return ''
  const out = inner(plus(moved.point, shoulder.point, -1), line.along)
  if (Math.abs(out) < MEETS) return ''
  const outward = out * asked > 0
  const elbow = elbowOn(axes, line, shoulder, moved)
  const way = `${outward ? 'radially outward, away from' : 'radially inward, towards'} ${shoulder.words}`
  const plane = elbow === null ? '' : `, in the plane of links '${elbow.axis.before}' and '${elbow.axis.link}'`
  const why = elbow === null ? '' : `: the arm is ${elbow.stretched ? 'stretched' : 'folded'} at '${elbow.axis.name}'`
  return `${moved.words}${way}${plane}${why}`
}

/** Where the line starts: the point where the first two turning axes meet, or else where the line crosses the first axis squarely. */
function shoulderOn(axes: readonly Axis[], line: Line): Place | null {
  const [first, second] = axes
  if (first === undefined) return null
  const point = second === undefined ? null : meetingPoint(first, second, MEETS)
  if (point !== null && distanceToLine(point, line) < MEETS) {
    return { point, words: `the point where the axes of '${first.name}' and '${second!.name}' meet`, last: 1 }
  }
  const crossing = meetingPoint(line, first, MEETS)
  if (crossing === null || Math.abs(inner(first.along, line.along)) > SQUARE) return null
  return { point: crossing, words: `the axis of '${first.name}'`, last: 0 }
}

/** The last point on the line, other than the shoulder, where two neighbouring axes meet. */
function wristOn(axes: readonly Axis[], line: Line, shoulder: Place): Place | null {
  for (let i = axes.length - 1; i > shoulder.last + 1; i--) {
    const point = meetingPoint(axes[i - 1]!, axes[i]!, MEETS)
    if (point === null || distanceToLine(point, line) > MEETS || lengthOf(plus(point, shoulder.point, -1)) < MEETS) continue
    return { point, words: `the point where the axes of '${axes[i - 1]!.name}' and '${axes[i]!.name}' meet cannot move `, last: i - 2 }
  }
  return null
}

/** The first axis between both places that crosses the line squarely, away from either. */
function elbowOn(axes: readonly Axis[], line: Line, from: Place, to: Place): { readonly axis: Axis; readonly stretched: boolean } | null {
  const whole = inner(plus(to.point, from.point, -1), line.along)
  for (let i = from.last + 1; i < axes.length && i <= to.last; i++) {
    const axis = axes[i]!
    const point = meetingPoint(line, axis, MEETS)
    if (point === null || Math.abs(inner(axis.along, line.along)) > SQUARE) continue
    const part = inner(plus(point, from.point, -1), line.along) / whole
    if (Math.abs(part) < SQUARE || Math.abs(part - 1) < SQUARE) continue
    return { axis, stretched: part > 0 && part < 1 }
  }
  return null
}

/** Two axes that are in line although one between them could turn them apart. */
function alignedAxes(axes: readonly Axis[]): string {
  for (let i = 0; i < axes.length; i++) {
    for (let k = i + 2; k < axes.length; k++) {
      const [a, b] = [axes[i]!, axes[k]!]
      const apart = axes.slice(i + 1, k).some((between) => !inLine(a, between, MEETS))
      if (apart && inLine(a, b, MEETS)) return `the axes of '${a.name}' and '${b.name}' are in line`
    }
  }
  return ''
}
