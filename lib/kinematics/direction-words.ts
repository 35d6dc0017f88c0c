import { TWIST_COMPONENTS, type TaskFrame } from './task'

/** How near to an axis a direction is still called by that axis's name (length of the difference of unit vectors). */
const NAMED_WITHIN = 1e-3

const MOTION_WORDS = {
  vx: 'move along x',
  vy: 'move along y',
  vz: 'move along z',
  wx: 'turn about x',
  wy: 'turn about y',
  wz: 'turn about z',
} as const

/** A unit twist (6 numbers in twist order) as what the tool would do: "move along x of the base", or its numbers written out. */
export function directionWords(direction: readonly number[], frame: TaskFrame): string {
  const of = frame === 'base' ? 'of the base' : 'of the tool'
  const axis = TWIST_COMPONENTS.find((_component, i) => distanceToAxis(direction, i) <= NAMED_WITHIN)
  if (axis !== undefined) return `${MOTION_WORDS[axis]} ${of}`
  const parts = TWIST_COMPONENTS.flatMap((component, i) => {
    const part = (direction[i] ?? 0).toFixed(3)
    return Number(part) === 0 ? [] : [`${component} ${part}`]
  })
  return `move in the direction (${parts.join(', ')}) in the axes ${of}`
}

function distanceToAxis(direction: readonly number[], axis: number): number {
  let sum = 0
  direction.forEach((part, i) => {
    const difference = i === axis ? Math.abs(part) - 1 : part
    sum += difference * difference
  })
  return Math.sqrt(sum)
}
