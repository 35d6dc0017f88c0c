import { MOST_POSES, type ReferencePosesQuestion } from '@/lib/contract/reference-poses'
import { POSITION_COLUMNS, ROTATION_CONVENTIONS } from '@/lib/contract/rotation-conventions'
import { type Fault, fail } from '@/lib/errors'
import { inSlices } from '@/lib/in-slices'
import type { Chain } from '@/lib/kinematics/chain'
import { jointKinds, LARGEST_INPUT, toSi } from '../si'
import { type Column, isHead, mapColumns } from './map-columns'
import { orientationKind, transformOfMeasured } from './orientation-of'
import { type DecimalMark, decimalMarkOf, isNumberText, numberOf } from './read-number'
import { readTable, type TextRecord, type TextTable } from './read-table'

/** One row of a table, SI. */
export interface MeasuredPose {
  readonly row: number
  readonly configuration: readonly number[]
  /** 12 numbers, from the base link to what was measured. */
  readonly baseFromMeasured: Float64Array
}

export interface ReadPoses {
  readonly poses: readonly MeasuredPose[]
  readonly decimalMark: DecimalMark
}

const MOST_FAULTS = 50

function refuse(faults: readonly Fault[]): never {
  const more = faults.length === 1 ? '' : ` ${faults.length - 1} more; see "errors".`
  fail('invalid-request', `/table ${faults[0]!.detail}.${more}`, { errors: faults.slice(0, MOST_FAULTS) })
}

const columnsOf = (chain: Chain, rotation: ReferencePosesQuestion['rotation']): Column[] => [
  ...jointKinds(chain).map((kind, i) => ({ name: chain.joints[i]!.name, kind })),
  ...POSITION_COLUMNS.map((name) => ({ name, kind: 'length' as const })),
  ...ROTATION_CONVENTIONS[rotation].columns.map((name) => ({ name, kind: orientationKind(rotation) })),
]

/** The measured poses of a table, as its question says they are to be read. Fails with malformed-body where it is no CSV, and with
 *  invalid-request and every bad cell by row and column. Sliced. */
export async function readPoses(question: Pick<ReferencePosesQuestion, 'table' | 'units' | 'rotation'>, chain: Chain): Promise<ReadPoses> {
  // One record more for a head line.
  const table = await readTable(question.table, MOST_POSES + 1)
  const columns = columnsOf(chain, question.rotation)
  const [first] = table.records
  const head = first !== undefined && isHead(first) ? first : null
  const records = head === null ? table.records : table.records.slice(1)
  if (records.length === 0) refuse([{ pointer: '/table', detail: 'holds no pose: send at least one row' }])
  if (records.length > MOST_POSES) refuse([{ pointer: '/table', detail: `holds more than ${MOST_POSES} poses: send fewer at once` }])
  const decimalMark = decimalMarkOf(records)
  if (typeof decimalMark === 'object') refuse([decimalMark])
  const places = head === null ? columns.map((_column, i) => i) : mapColumns(head, columns, question.units)
  if (places.some((place) => typeof place === 'object')) refuse(places as Fault[])

  const faults: Fault[] = []
  const poses: MeasuredPose[] = []
  const width = head?.cells.length ?? columns.length
  await inSlices(records.length, (index) => {
    const record = records[index]!
    if (record.cells.length !== width) return void faults.push(wrongWidth(record, width, columns, table))
    const pose = readRow(record, columns, places as number[], question, faults)
    if (pose !== null) poses.push(pose)
  })
  if (faults.length > 0) refuse(faults)
  return { poses, decimalMark }
}

function wrongWidth({ row, cells }: TextRecord, width: number, columns: readonly Column[], { delimiter }: TextTable): Fault {
  const wanted = `${width} are needed: ${columns.map(({ name }) => name).join(', ')}`
  const hint = delimiter === ',' && cells.length > width ? '. Where the decimal mark is a comma, separate the columns by semicolons' : ''
  return { pointer: '/table', detail: `row ${row} has ${cells.length} ${cells.length === 1 ? 'column' : 'columns'}; ${wanted}${hint}` }
}

function readRow(
  { row, cells }: TextRecord,
  columns: readonly Column[],
  places: readonly number[],
  { units, rotation }: Pick<ReferencePosesQuestion, 'units' | 'rotation'>,
  faults: Fault[],
): MeasuredPose | null {
  const before = faults.length
  const say = (i: number, detail: string) => void faults.push({ pointer: '/table', detail: `row ${row}, column ${places[i]! + 1} (${columns[i]!.name}): ${detail}` })
  const values = columns.map(({ kind }, i) => {
    const cell = cells[places[i]!]!
    if (!isNumberText(cell)) {
      say(i, cell === '' ? 'is empty' : `"${cell.slice(0, 40)}" is not a number`)
      return 0
    }
    const value = toSi(numberOf(cell), kind, units)
    if (!(Math.abs(value) <= LARGEST_INPUT)) say(i, 'is beyond 1e9')
    return value
  })
  if (faults.length > before) return null
  const joints = columns.length - POSITION_COLUMNS.length - ROTATION_CONVENTIONS[rotation].columns.length
  const turned = joints + POSITION_COLUMNS.length
  const transform = transformOfMeasured(values.slice(joints, turned), rotation, values.slice(turned))
  if (typeof transform === 'string') {
    say(turned, transform)
    return null
  }
  return { row, configuration: values.slice(0, joints), baseFromMeasured: transform }
}
