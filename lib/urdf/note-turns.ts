import type { Attributes } from '@/lib/urdf/read-value'
import type { Report } from '@/lib/urdf/report'
import { quoted } from '@/lib/urdf/wording'

const TURN = 2 * Math.PI
/** Bounds of exactly one turn, however they are rounded, do not count as more. rad. */
const SLACK = 0.01
/** Excess over a multiple of a quarter turn that has no effect on any controller. rad. */
const HARMLESS = 1e-7
/** A value of fewer decimals may be meant as it stands. */
const FEWEST_DECIMALS = 3
const LARGEST_MULTIPLE = 16

/** Notes bounds of a revolute joint that were rounded beyond a multiple of a quarter turn, and ranges of more than a turn. rad. */
export function noteTurns(report: Report, attributes: Attributes, lower: number, upper: number, label: string): void {
  const given = ['lower', 'upper'].flatMap((name) => attributes.get(name) ?? [])
  const rounded = given.filter(({ value }) => isRoundedUp(value))
  if (rounded.length > 0) {
    const which = rounded.map(({ name, value }) => `${name}=${quoted(value)}`).join(' and ')
    report.add('limit-rounded-up', rounded[0]!.valueAt, `${which} ${rounded.length > 1 ? 'were' : 'was'} rounded to a little more than a multiple of a quarter turn.`, { element: label })
  }
  if (upper - lower <= TURN + SLACK) return
  const turns = (upper - lower) / TURN
  const shown = turns < 1e4 ? `${Number(turns.toPrecision(3))} turns` : 'a range without a practical end'
  report.add('range-beyond-turn', given[0]!.valueAt, `From ${lower} to ${upper} rad the joint has ${shown}: several of its values give the same pose.`, { element: label })
}

/** Whether a number is a multiple of pi/2, cut to its decimals, and larger than it in magnitude. */
function isRoundedUp(written: string): boolean {
  if (written.length < FEWEST_DECIMALS + 2) return false
  const match = /^\s*[+-]?(\d+\.(\d+))\s*$/.exec(written)
  if (!match || match[2]!.length < FEWEST_DECIMALS) return false
  const value = Number(match[1])
  const multiple = Math.round(value / (Math.PI / 2))
  if (multiple < 1 || multiple > LARGEST_MULTIPLE) return false
  const excess = value - (multiple * Math.PI) / 2
  return excess > HARMLESS && excess <= 0.5 * 10 ** -match[2]!.length
}
