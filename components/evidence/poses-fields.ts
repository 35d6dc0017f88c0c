import '@/components/api/quiet-zod'
import { z } from 'zod'
import { ReferencePosesQuestion } from '@/lib/contract/reference-poses'
import { ROTATION_CONVENTION_NAMES } from '@/lib/contract/rotation-conventions'
import type { Units } from '@/lib/units'

/** The pairs of units a table may be in, as a form offers them. */
export const TABLE_UNITS = {
  'mm-deg': { length: 'mm', angle: 'deg' },
  'm-rad': { length: 'm', angle: 'rad' },
  'm-deg': { length: 'm', angle: 'deg' },
  'mm-rad': { length: 'mm', angle: 'rad' },
} as const satisfies Record<string, Units>
export type TableUnits = keyof typeof TABLE_UNITS

const NUMBERS_OF_A_TOOL = 7

/** A typed number, with a decimal point or comma. */
const numberOf = (text: string): number => (/^[+\-−]?(?:\d+[.,]?\d*|[.,]\d+)(?:e[+-]?\d+)?$/i.test(text.trim()) ? Number(text.trim().replace(',', '.').replace('−', '-')) : Number.NaN)
const numbersOf = (text: string): number[] => text.trim().split(/[\s;]+/).map(numberOf)

const tolerance = z.string().refine((text) => numberOf(text) > 0, 'Type a number greater than 0.')

/** The form of a set of reference poses. Units and orientation start unchosen: nothing is guessed. */
export const PosesFields = z
  .strictObject({
    table: z.string().refine((text) => text.trim() !== '', 'Paste the rows here, or drop a file.'),
    units: z.string().refine((name) => name in TABLE_UNITS, 'Choose the units that the table is in.'),
    rotation: z.string().refine((name) => (ROTATION_CONVENTION_NAMES as readonly string[]).includes(name), 'Choose how the orientations are written.'),
    measuredAt: z.string().refine((place) => ['tip', 'tool'].includes(place), 'Choose what was measured.'),
    tool: z.string(),
    position: tolerance,
    orientation: tolerance,
    base: z.string(),
    tip: z.string(),
    note: ReferencePosesQuestion.shape.note.unwrap(),
  })
  .superRefine(({ measuredAt, tool }, context) => {
    if (measuredAt !== 'tool') return
    const numbers = numbersOf(tool)
    if (numbers.length !== NUMBERS_OF_A_TOOL || numbers.some(Number.isNaN)) {
      context.addIssue({ code: 'custom', path: ['tool'], message: 'Type seven numbers separated by blanks: x y z and the quaternion qx qy qz qw.' })
    }
  })
export type PosesFields = z.infer<typeof PosesFields>

/** The question that a filled form asks. */
export function questionOf({ table, units, rotation, measuredAt, tool, position, orientation, base, tip, note }: PosesFields): ReferencePosesQuestion {
  const [x, y, z1, ...quaternion] = numbersOf(tool)
  return {
    table,
    units: TABLE_UNITS[units as TableUnits],
    rotation: rotation as ReferencePosesQuestion['rotation'],
    tool: measuredAt === 'tool' ? { position: [x!, y!, z1!], quaternion } : null,
    tolerance: { position: numberOf(position), orientation: numberOf(orientation) },
    ...(base === '' && tip === '' ? {} : { chain: { ...(base === '' ? {} : { base }), ...(tip === '' ? {} : { tip }) } }),
    ...(note === '' ? {} : { note }),
  }
}
