import { formatSignificant } from '@/components/ui/format-number'
import { JointType } from '@/components/ui/joint-type'
import { Num } from '@/components/ui/num'
import { Quantity } from '@/components/ui/quantity'
import { RowHead, Td } from '@/components/ui/table'
import type { Joint } from '@/lib/contract/description'
import { rollPitchYawOf } from './roll-pitch-yaw-of'
import type { StructureRow } from './structure-rows'

/** Deeper links are not moved further to the right: a long chain would leave the page. */
const MOST_INDENT = 12

/** The cells of one link. */
export function StructureCells({ row: { link, depth, joint } }: { readonly row: StructureRow }) {
  return (
    <>
      <RowHead className="num max-w-80 min-w-40 break-all" style={{ paddingLeft: 8 + 12 * Math.min(depth, MOST_INDENT) }} title={link}>
        {depth === 0 ? null : (
          <span aria-hidden className="mr-1 text-soft">
            └
          </span>
        )}
        <bdi>{link}</bdi>
        <span className="sr-only">, level {depth}</span>
      </RowHead>
      {joint === null ? (
        <Td colSpan={10} className="text-soft">
          root
        </Td>
      ) : (
        <JointCells joint={joint} />
      )}
    </>
  )
}

function JointCells({ joint }: { readonly joint: Joint }) {
  const { name, type, origin, axis, mimic } = joint
  const kind = type === 'prismatic' ? 'length' : 'angle'
  const isTurning = type === 'revolute' || type === 'continuous'
  const isBounded = type === 'revolute' || type === 'prismatic'
  return (
    <>
      <Td className="num max-w-64 min-w-32 break-all">
        <bdi title={name}>{name}</bdi>
      </Td>
      <Td>
        <JointType type={type} />
      </Td>
      <Td align="right">
        <Triple values={origin.position} kind="length" />
      </Td>
      <Td align="right">
        <Triple values={rollPitchYawOf(origin.quaternion)} kind="angle" />
      </Td>
      <Td align="right">{axis === undefined ? '' : axis.map((part) => tidy(part)).join('  ')}</Td>
      <Td align="right">{isBounded ? <Quantity value={joint.lower} kind={kind} withUnit /> : ''}</Td>
      <Td align="right">{isBounded ? <Quantity value={joint.upper} kind={kind} withUnit /> : ''}</Td>
      <Td align="right">{isTurning || isBounded ? joint.rate == null ? 'unknown' : <Quantity value={joint.rate} kind={`${kind}-rate`} withUnit /> : ''}</Td>
      <Td align="right">{joint.effort == null ? '' : <Num value={joint.effort} digits={1} unit={kind === 'length' ? 'N' : 'Nm'} />}</Td>
      <Td className="num whitespace-nowrap">{mimic === undefined ? '' : <Follows mimic={mimic} />}</Td>
    </>
  )
}

function Follows({ mimic: { joint, multiplier, offset } }: { readonly mimic: NonNullable<Joint['mimic']> }) {
  return (
    <>
      {tidy(multiplier)} · <bdi>{joint}</bdi>
      {offset === 0 ? '' : ` ${offset < 0 ? '−' : '+'} ${tidy(Math.abs(offset))}`}
    </>
  )
}

const tidy = (value: number): string => (Number.isInteger(value) ? String(value).replace('-', '−') : formatSignificant(value, 4))

function Triple({ values, kind }: { readonly values: readonly number[]; readonly kind: 'length' | 'angle' }) {
  return (
    <span className="inline-flex gap-3">
      {values.map((value, i) => (
        <Quantity key={i} value={value} kind={kind} />
      ))}
    </span>
  )
}
