/** Unit factors: the only place where a number changes its unit. */

export const radFromDeg = (deg: number): number => (deg * Math.PI) / 180
export const degFromRad = (rad: number): number => (rad * 180) / Math.PI
/** Divides by 1000 rather than multiplying by 0.001, so that 350 mm is 0.35 m to the last bit. */
export const mFromMm = (mm: number): number => mm / 1000
export const mmFromM = (m: number): number => m * 1000

export const LENGTH_UNITS = ['m', 'mm'] as const
export const ANGLE_UNITS = ['rad', 'deg'] as const
export type LengthUnit = (typeof LENGTH_UNITS)[number]
export type AngleUnit = (typeof ANGLE_UNITS)[number]
export interface Units {
  readonly length: LengthUnit
  readonly angle: AngleUnit
}
export const SI: Units = { length: 'm', angle: 'rad' }
