import { getDb } from '@/db/client'
import { countUsers } from '@/db/queries/people'

let known = false

/** Whether anybody can sign in here yet. Nobody is ever removed, so a yes is final. */
export async function isSetUp(): Promise<boolean> {
  if (!known) known = (await countUsers(await getDb())) > 0
  return known
}
