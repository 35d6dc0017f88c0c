/** The components of a twist in their order: linear velocity of the reference point, then angular velocity. */
export const TWIST_COMPONENTS = ['vx', 'vy', 'vz', 'wx', 'wy', 'wz'] as const
export type TwistComponent = (typeof TWIST_COMPONENTS)[number]

/** How many leading components are linear. */
export const LINEAR_COMPONENTS = 3
export const TWIST_SIZE = TWIST_COMPONENTS.length

/** Axes that a twist is given in: the chain's base link, or the tip link's frame with the tool applied. */
export type TaskFrame = 'base' | 'tip'

/** The part of a twist that is asked for, and the axes it is in. */
export interface Task {
  /** In twist order, each once. */
  readonly components: readonly TwistComponent[]
  readonly frame: TaskFrame
  /** Where each component stands in a twist. */
  readonly rows: readonly number[]
}

/** A task of the given components (all six when left out) in `frame`, brought into twist order. Throws a RangeError
 *  on no component or an unknown one; a repeated one counts once. */
export function createTask(components: readonly TwistComponent[] = TWIST_COMPONENTS, frame: TaskFrame = 'base'): Task {
  const unknown = components.find((component) => !TWIST_COMPONENTS.includes(component))
  if (unknown !== undefined) throw new RangeError(`no component of a twist is named '${unknown}'`)
  if (components.length === 0) throw new RangeError('a task needs at least one component')
  const rows = TWIST_COMPONENTS.flatMap((component, row) => (components.includes(component) ? [row] : []))
  return Object.freeze({ components: Object.freeze(rows.map((row) => TWIST_COMPONENTS[row]!)), frame, rows: Object.freeze(rows) })
}
