import path from 'node:path'
import { PGlite } from '@electric-sql/pglite'
import { pg_trgm } from '@electric-sql/pglite/contrib/pg_trgm'
import { drizzle as drizzleServer } from 'drizzle-orm/node-postgres'
import { migrate as migrateServer } from 'drizzle-orm/node-postgres/migrator'
import { drizzle as drizzleEmbedded } from 'drizzle-orm/pglite'
import { migrate as migrateEmbedded } from 'drizzle-orm/pglite/migrator'
import pg from 'pg'
import { type Db, schema } from '@/db/client'
import { ROOT } from '@/tests/api/support/server'
import { startPostgres } from './postgres.mjs'

/** A migrated database of its own for a test, and its raw query beside the builder. */
export interface TestDatabase {
  readonly db: Db
  readonly query: (text: string, values?: unknown[]) => Promise<Record<string, unknown>[]>
  readonly close: () => Promise<void>
}

const migrations = { migrationsFolder: path.join(ROOT, 'drizzle') }

async function embedded(): Promise<TestDatabase> {
  const client = await PGlite.create({ extensions: { pg_trgm } })
  const db = drizzleEmbedded({ client, schema })
  await migrateEmbedded(db, migrations)
  return { db, query: async (text, values) => (await client.query<Record<string, unknown>>(text, values)).rows, close: () => client.close() }
}

async function server(): Promise<TestDatabase> {
  const postgres = await startPostgres()
  const pool = new pg.Pool({ connectionString: postgres.createDatabase('tests') })
  pool.on('error', () => undefined)
  const db = drizzleServer({ client: pool, schema })
  await migrateServer(db, migrations)
  return {
    db,
    query: async (text, values) => (await pool.query<Record<string, unknown>>(text, values)).rows,
    close: async () => {
      await pool.end()
      await postgres.stop()
    },
  }
}

/** Both kinds of database that the program runs on, by name. */
export const BOTH = [
  { kind: 'embedded', open: embedded },
  { kind: 'server', open: server },
] as const
