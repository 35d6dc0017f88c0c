import { getDb } from '@/db/client'
import { listMemberships } from '@/db/queries/people'

/** The teams of a person with the role in each, by name. */
export const listTeams = async (userId: string) => listMemberships(await getDb(), userId)
