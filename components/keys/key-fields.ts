import '@/components/api/quiet-zod'
import { z } from 'zod'
import { KeyQuestion } from '@/lib/contract/key-operations'
import { EXPIRY_PRESETS } from './expiry-choice'

/** The fields of a key's expiry as they stand in a form. */
const expiryFields = {
  preset: z.enum(EXPIRY_PRESETS.map(({ value }) => value)),
  date: z.string(),
}

const checkExpiry = ({ preset, date }: { preset: string; date: string }, context: z.RefinementCtx) => {
  if (preset !== 'date') return
  const end = new Date(`${date}T23:59:59.999`).getTime()
  if (Number.isNaN(end)) context.addIssue({ code: 'custom', path: ['date'], message: 'Choose a date.' })
  else if (end <= Date.now()) context.addIssue({ code: 'custom', path: ['date'], message: 'This date is past: choose one ahead.' })
}

/** The form of a new key: the contract's question with the expiry as people choose it. */
export const NewKeyFields = z
  .strictObject({ label: KeyQuestion.shape.label, scopes: KeyQuestion.shape.scopes, ...expiryFields })
  .superRefine(checkExpiry)

/** The form of a key's label and expiry. */
export const KeyEditFields = z.strictObject({ label: KeyQuestion.shape.label, ...expiryFields }).superRefine(checkExpiry)
