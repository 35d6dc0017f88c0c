import { and, desc, eq, lt, or, sql } from 'drizzle-orm'
import { type Db, schema } from '../client'

const { keys, keyUses, revisions } = schema

/** Notes that a key called a revision. */
export const touchKeyUse = (db: Db, keyId: string, revisionId: string, lastUsedAt: Date) =>
  db
    .insert(keyUses)
    .values({ keyId, revisionId, lastUsedAt })
    .onConflictDoUpdate({ target: [keyUses.keyId, keyUses.revisionId], set: { lastUsedAt: sql`greatest(${keyUses.lastUsedAt}, excluded.last_used_at)` } })

/** Which keys called which revision of a model, the latest first. after: position of the last row of the page before. */
export const listKeyUses = (db: Db, modelId: string, limit: number, after?: { readonly lastUsedAt: Date; readonly keyId: string; readonly number: number }) =>
  db
    .select({ key: keys, number: revisions.number, lastUsedAt: keyUses.lastUsedAt })
    .from(keyUses)
    .innerJoin(revisions, eq(revisions.id, keyUses.revisionId))
    .innerJoin(keys, eq(keys.id, keyUses.keyId))
    .where(
      and(
        eq(revisions.modelId, modelId),
        after &&
          or(
            lt(keyUses.lastUsedAt, after.lastUsedAt),
            and(eq(keyUses.lastUsedAt, after.lastUsedAt), or(lt(keys.id, after.keyId), and(eq(keys.id, after.keyId), lt(revisions.number, after.number)))),
          ),
      ),
    )
    .orderBy(desc(keyUses.lastUsedAt), desc(keys.id), desc(revisions.number))
    .limit(limit)
