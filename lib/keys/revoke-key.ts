import { getDb } from '@/db/client'
import { revokeKeyRow } from '@/db/queries/keys'
import { forgetKey } from '@/lib/access/key-caller'
import type { UseCase } from '@/lib/access/use-case'

/** Revokes a key for good. Doing it twice changes nothing. */
export const revokeKey: UseCase<'revokeKey'> = async (_caller, { at }) => {
  const { id } = at.key.key
  await revokeKeyRow(await getDb(), id, new Date())
  forgetKey(id)
  return { body: undefined }
}
