import { formatSignificant } from '@/components/ui/format-number'
import { Quantity } from '@/components/ui/quantity'
import { rollPitchYawOf } from '@/components/sheet/roll-pitch-yaw-of'
import type { Change } from '@/lib/contract/comparison'

const tidy = (value: number): string => (Number.isInteger(value) ? String(value).replace('-', '−') : formatSignificant(value, 4))

const EFFORT_UNITS = { angle: 'N m', length: 'N' } as const

/** One side of a change, in the units of the page; of an origin only the part that changed. */
export function ChangeValue({ change, side }: { readonly change: Change; readonly side: 'from' | 'to' }) {
  const value = change[side]
  if (value === undefined) return null
  if (value === null) return <span className="label">none</span>
  if (typeof value === 'string') return <bdi className="num break-all">{value === '' ? '–' : value}</bdi>
  if (typeof value === 'number') return <SingleNumber value={value} change={change} />
  if (Array.isArray(value)) return value.every((part) => typeof part === 'number') ? <span className="num whitespace-nowrap">{value.map(tidy).join('  ')}</span> : <Names names={value} />
  if ('joint' in value) {
    return (
      <span className="num">
        {tidy(value.multiplier)} · <bdi>{value.joint}</bdi> {value.offset < 0 ? '−' : '+'} {tidy(Math.abs(value.offset))}
      </span>
    )
  }
  return (
    <span className="block whitespace-nowrap">
      {change.distance === 0 ? null : <Triple values={value.position} kind="length" />}
      {change.angle === 0 ? null : <Triple values={rollPitchYawOf(value.quaternion)} kind="angle" />}
    </span>
  )
}

function SingleNumber({ value, change: { what, quantity } }: { readonly value: number; readonly change: Change }) {
  if (what === 'rate' && quantity !== undefined) return <Quantity value={value} kind={`${quantity}-rate`} withUnit />
  if (what === 'effort' && quantity !== undefined) {
    return (
      <span className="num whitespace-nowrap">
        {tidy(value)} <span className="text-soft">{EFFORT_UNITS[quantity]}</span>
      </span>
    )
  }
  return <span className="num">{tidy(value)}</span>
}

const Names = ({ names }: { readonly names: readonly (string | number)[] }) =>
  names.length === 0 ? (
    <span className="label">none</span>
  ) : (
    <ul>
      {names.map((name, i) => (
        <li key={i} className="num break-all">
          <bdi>{name}</bdi>
        </li>
      ))}
    </ul>
  )

const Triple = ({ values, kind }: { readonly values: readonly number[]; readonly kind: 'length' | 'angle' }) => (
  <span className="flex justify-end gap-x-3">
    {values.map((value, i) => (
      <Quantity key={i} value={value} kind={kind} withUnit={i === values.length - 1} />
    ))}
  </span>
)
