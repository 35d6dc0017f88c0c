/** A point or a direction in space, m or unit. */
export type Triple = readonly [x: number, y: number, z: number]

/** A line through a point, along a unit vector. */
export interface Line {
  readonly point: Triple
  readonly along: Triple
}

/** Cross product. */
export function cross(a: Triple, b: Triple): Triple {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]]
}

/** Scalar product. */
export function inner(a: Triple, b: Triple): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
}

/** a + factor · b. */
export function plus(a: Triple, b: Triple, factor = 1): Triple {
  return [a[0] + factor * b[0], a[1] + factor * b[1], a[2] + factor * b[2]]
}

/** Length of a vector. */
export function lengthOf(a: Triple): number {
  return Math.sqrt(inner(a, a))
}

/** How far a point is from a line. */
export function distanceToLine(point: Triple, { point: on, along }: Line): number {
  return lengthOf(cross(plus(point, on, -1), along))
}

/** The sine of the angle between two lines below which they count as parallel. */
const PARALLEL = 1e-6

/** Whether two lines are in line with each other, within `tolerance` (m). */
export function inLine(a: Line, b: Line, tolerance: number): boolean {
  return lengthOf(cross(a.along, b.along)) < PARALLEL && distanceToLine(b.point, a) < tolerance
}

/** Where two lines meet, on the first one; null where they are parallel, or pass each other further than `tolerance` (m). */
export function meetingPoint(a: Line, b: Line, tolerance: number): Triple | null {
  const normal = cross(a.along, b.along)
  const sine = lengthOf(normal)
  if (sine < PARALLEL) return null
  const between = plus(b.point, a.point, -1)
  if (Math.abs(inner(between, normal)) / sine > tolerance) return null
  return plus(a.point, a.along, inner(cross(between, b.along), normal) / (sine * sine))
}
