import { Refusal } from '@/components/api/refusal'

/** The revision that a refused file computes the same numbers as. */
export interface Twin {
  readonly file: File
  readonly model: string
  readonly revision: number
}

/** The twin that a refusal names; null when it is about something else. */
export function twinOf(error: unknown, file: File, model: string): Twin | null {
  if (!(error instanceof Refusal) || error.code !== 'same-content') return null
  const { twin } = error.members
  return typeof twin === 'number' ? { file, model, revision: twin } : null
}
