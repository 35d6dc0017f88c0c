import { eq } from 'drizzle-orm'
import { type Db, schema } from '../client'

export const setPasswordHash = (db: Db, userId: string, passwordHash: string) =>
  db.update(schema.users).set({ passwordHash }).where(eq(schema.users.id, userId))
