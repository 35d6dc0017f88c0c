import type { z } from 'zod'
import type { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import { countOf, type RecordColumn } from '@/lib/contract/record-columns'
import { fieldText } from './structured-field'

/** What a kinematics answer says besides its results. */
export type Envelope = Omit<z.infer<(typeof KINEMATIC_OPERATIONS)['jacobian']['answer']['schema']>, 'results'>

/** What CSV and binary records have no room for, as fields of the reply (RFC 9651): the model, the chain and the units. */
export function envelopeFields({ model, chain, units, warnings = [] }: Envelope): Record<string, string> {
  const warned = warnings.length === 0 ? '' : `;warnings=${warnings.length}`
  return {
    'model-revision': `${model.revision};team=${fieldText(model.team)};model=${fieldText(model.model)};status=${model.status}${warned}`,
    'record-chain': `base=${fieldText(chain.base)}, tip=${fieldText(chain.tip)}, joints=${chain.joints.length}`,
    'record-units': `length=${units.length}, angle=${units.angle}`,
  }
}

const SIZES = [[], ['length'], ['rows', 'columns'], ['planes', 'rows', 'columns']] as const

/** The columns of binary records, as a list (RFC 9651) of their paths with what each holds. */
export const layoutField = (columns: readonly RecordColumn[]): string =>
  columns
    .map(({ path, size, kind, words }) => {
      const length = SIZES[size.length]!.map((name, i) => `;${name}=${size[i]!}`).join('')
      return path + length + (kind === 'numbers' ? '' : `;${kind}${words === undefined ? '' : `=${fieldText(words.join(' '))}`}`)
    })
    .join(', ')

/** How many numbers a record has. */
export const widthOfRecord = (columns: readonly RecordColumn[]): number => columns.reduce((sum, column) => sum + countOf(column), 0)
