/** A point or a direction in the base frame, m. */
export type Vector = readonly [number, number, number]

export const plus = (a: Vector, b: Vector, factor = 1): Vector => [a[0] + factor * b[0], a[1] + factor * b[1], a[2] + factor * b[2]]
export const minus = (a: Vector, b: Vector): Vector => plus(a, b, -1)
export const times = (factor: number, a: Vector): Vector => [factor * a[0], factor * a[1], factor * a[2]]
export const along = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
export const lengthOf = (a: Vector): number => Math.sqrt(along(a, a))
export const ORIGIN: Vector = [0, 0, 0]
