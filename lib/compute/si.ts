import { type Fault, fail } from '@/lib/errors'
import type { Chain } from '@/lib/kinematics/chain'
import { degFromRad, mFromMm, mmFromM, radFromDeg, SI, type Units } from '@/lib/units'

/** What a number measures, as far as units go. */
export type Kind = 'length' | 'angle'

/** Largest magnitude of an input once in SI. */
export const LARGEST_INPUT = 1e9

export const jointKinds = (chain: Chain): Kind[] => chain.joints.map(({ type }) => (type === 'prismatic' ? 'length' : 'angle'))
export const TWIST_KINDS: readonly Kind[] = ['length', 'length', 'length', 'angle', 'angle', 'angle']
export const POSITION_KINDS: readonly Kind[] = ['length', 'length', 'length']

/** A number of these units in SI; of no kind: as it is. */
export const toSi = (value: number, kind: Kind | null, units: Units): number => {
  if (kind === 'length' && units.length === 'mm') return mFromMm(value)
  if (kind === 'angle' && units.angle === 'deg') return radFromDeg(value)
  return value
}

const fromSi = (value: number, kind: Kind, units: Units): number => {
  if (kind === 'length' && units.length === 'mm') return mmFromM(value)
  if (kind === 'angle' && units.angle === 'deg') return degFromRad(value)
  return value
}

/** The units asked for, with the defaults filled in. */
export const fullUnits = (units: { length?: Units['length'] | undefined; angle?: Units['angle'] | undefined } | undefined): Units => ({
  length: units?.length ?? SI.length,
  angle: units?.angle ?? SI.angle,
})

/** Brings the numbers of one question into SI and collects what is wrong with them, so that all of it is told at once. */
export class SiReader {
  private readonly lengths: Fault[] = []
  private readonly magnitudes: Fault[] = []

  constructor(readonly units: Units) {}

  /** A list of exactly kinds.length numbers. */
  list(values: readonly number[], kinds: readonly (Kind | null)[], pointer: string, whatOf: string): number[] {
    if (values.length !== kinds.length) {
      this.lengths.push({ pointer, detail: `has ${values.length} entries; ${whatOf} has ${kinds.length}` })
      return []
    }
    return values.map((value, place) => this.number(value, kinds[place]!, pointer, place))
  }

  /** place: of the number in the list at `pointer`; a pointer is only put together where there is a fault to point at. */
  number(value: number, kind: Kind | null, pointer: string, place?: number): number {
    const si = toSi(value, kind, this.units)
    if (Math.abs(si) > LARGEST_INPUT) this.magnitudes.push({ pointer: place === undefined ? pointer : `${pointer}/${place}`, detail: `is beyond 1e9 ${kind === 'angle' ? 'rad' : kind === 'length' ? 'm' : ''}`.trimEnd() })
    return si
  }

  /** Something else has the wrong length. */
  mismatch(pointer: string, detail: string): void {
    this.lengths.push({ pointer, detail })
  }

  /** A list that has one entry for each configuration (or what else there is a result for), or one for all. */
  matched(count: number, results: number, pointer: string, what = 'configurations'): void {
    if (count !== 1 && count !== results) {
      this.lengths.push({ pointer, detail: `has ${count} entries; send one for each of the ${results} ${what}, or one for all` })
    }
  }

  /** Fails with length-mismatch or invalid-request when anything was wrong. */
  finish(): void {
    const [code, faults] = this.lengths.length > 0 ? (['length-mismatch', this.lengths] as const) : (['invalid-request', this.magnitudes] as const)
    const [first] = faults
    if (first === undefined) return
    const more = faults.length === 1 ? '' : ` ${faults.length - 1} more; see "errors".`
    fail(code, `${first.pointer} ${first.detail}.${more}`, { errors: faults.slice(0, 50) })
  }
}

/** Writes SI numbers in the units asked for. */
export class SiWriter {
  constructor(readonly units: Units) {}

  number = (value: number, kind: Kind): number => fromSi(value, kind, this.units)
  nullable = (value: number | null, kind: Kind): number | null => (value === null ? null : fromSi(value, kind, this.units))
  list = (values: ArrayLike<number>, kinds: readonly Kind[]): number[] => Array.from(values, (value, place) => fromSi(value, kinds[place]!, this.units))

  /** A Jacobian, 6 x n row-major: row unit over column unit. Where both are the same the number stays as it is. */
  jacobian(values: ArrayLike<number>, columns: readonly Kind[]): number[][] {
    return TWIST_KINDS.map((row, i) =>
      columns.map((column, j) => {
        const value = values[i * columns.length + j]!
        return row === column ? value : toSi(fromSi(value, row, this.units), column, this.units)
      }),
    )
  }
}
