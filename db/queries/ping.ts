import { sql } from 'drizzle-orm'
import type { Db } from '../client'

/** Succeeds when the database answers. */
export const ping = (db: Db) => db.execute(sql`select 1`)
