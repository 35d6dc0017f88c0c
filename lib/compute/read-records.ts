import { isNearlyUnit, NOT_UNIT } from '@/lib/contract/kinematic-quantities'
import { MOST_RECORDS, partsOf, type RecordForm, type RecordPart, widthOf } from '@/lib/contract/record-form'
import { fail, type Fault } from '@/lib/errors'
import { inSlices } from '@/lib/in-slices'

const BYTES = Float64Array.BYTES_PER_ELEMENT
const MOST_FAULTS = 50

interface RecordChoice {
  readonly record?: string
  readonly gains?: { readonly position?: number; readonly orientation?: number }
}

type Values = Partial<Record<RecordPart, number[]>>

/** The lists of the JSON question that records amount to; those that have no entry are left out. */
interface Lists {
  configurations?: number[][]
  twists?: number[][]
  references?: { pose: { position: number[]; quaternion: number[] }; twist?: number[]; gains?: RecordChoice['gains'] }[]
  targets?: { position: number[]; quaternion: number[] }[]
  seeds?: number[][]
}

/** How many records there are. Fails with malformed-body where the bytes are no whole number of them. */
function countRecords(parts: readonly RecordPart[], bytes: number, n: number, form: RecordForm): number {
  const width = parts.reduce((sum, part) => sum + widthOf(part, n), 0)
  if (bytes % (BYTES * width) !== 0) {
    const made = parts.map((part) => `${part} ${widthOf(part, n)}`).join(', ')
    fail('malformed-body', `The body is no whole number of records: a record has ${width * BYTES} bytes here (${width} numbers of ${BYTES}: ${made}), and ${bytes} came.`)
  }
  const count = bytes / (BYTES * width)
  const detail = count === 0 ? 'is empty: send at least one record' : count > MOST_RECORDS ? `has ${count} records; at most ${MOST_RECORDS} ${form.list} at once` : undefined
  if (detail !== undefined) fail('invalid-request', `The body ${detail}.`, { errors: [{ pointer: '', detail }] })
  return count
}

/** Where in the JSON question a part of a record stands. */
const POINTERS: Readonly<Record<RecordPart, (list: RecordForm['list'], index: number) => string>> = {
  configuration: (_list, index) => `/configurations/${index}`,
  seed: (_list, index) => `/seeds/${index}`,
  position: (list, index) => (list === 'targets' ? `/targets/${index}/position` : `/references/${index}/pose/position`),
  quaternion: (list, index) => (list === 'targets' ? `/targets/${index}/quaternion` : `/references/${index}/pose/quaternion`),
  twist: (_list, index) => `/twists/${index}`,
}

/** Puts the parts of one record into the lists. */
function place({ configuration, position, quaternion, twist, seed }: Values, gains: RecordChoice['gains'], lists: Lists): void {
  const pose = position && quaternion && { position, quaternion }
  if (configuration) (lists.configurations ??= []).push(configuration)
  if (seed) (lists.seeds ??= []).push(seed)
  if (pose && configuration) (lists.references ??= []).push({ pose, ...(twist && { twist }), ...(gains && { gains }) })
  else if (pose) (lists.targets ??= []).push(pose)
  else if (twist) (lists.twists ??= []).push(twist)
}

/** Reads little-endian binary64 records as the lists of the JSON question that they amount to, and refuses what that question would not
 *  admit. n: independent joints of the chain. Fails with malformed-body or invalid-request. */
export async function readRecords(form: RecordForm, choice: RecordChoice, bytes: Uint8Array, n: number): Promise<Lists> {
  const parts = partsOf(form, choice)
  const count = countRecords(parts, bytes.length, n, form)
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  const lists: Lists = {}
  const faults: Fault[] = []
  let at = 0
  await inSlices(count, (index) => {
    const values: Values = {}
    for (const part of parts) {
      const numbers: number[] = []
      for (let k = 0; k < widthOf(part, n); k++, at += BYTES) {
        const value = view.getFloat64(at, true)
        if (!Number.isFinite(value) && faults.length < MOST_FAULTS) {
          const isTwistOfReference = part === 'twist' && parts.includes('position')
          const pointer = isTwistOfReference ? `/references/${index}/twist` : POINTERS[part](form.list, index)
          faults.push({ pointer: `${pointer}/${k}`, detail: `must be a number, not ${Number.isNaN(value) ? 'NaN' : 'infinity'}` })
        }
        numbers.push(value)
      }
      if (part === 'quaternion' && !isNearlyUnit(numbers) && faults.length < MOST_FAULTS) faults.push({ pointer: POINTERS[part](form.list, index), detail: NOT_UNIT })
      values[part] = numbers
    }
    place(values, choice.gains, lists)
  })
  const [first] = faults
  if (first !== undefined) fail('invalid-request', faults.length === 1 ? `${first.pointer}: ${first.detail}.` : `${faults.length} places are wrong; see "errors".`, { errors: faults })
  return lists
}
