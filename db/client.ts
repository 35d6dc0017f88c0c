import { createHash } from 'node:crypto'
import { mkdirSync, realpathSync } from 'node:fs'
import { createServer, type Server } from 'node:net'
import path from 'node:path'
import type { PgDatabase, PgQueryResultHKT } from 'drizzle-orm/pg-core'
import { databaseUrl, dataDir, isBuilding, isDatabaseInMemory } from '@/lib/env'
import * as catalog from './schema/catalog'
import * as evidence from './schema/evidence'
import * as files from './schema/files'
import * as keyUses from './schema/key-uses'
import * as keys from './schema/keys'
import * as people from './schema/people'
import * as register from './schema/register'

export const schema = { ...people, ...catalog, ...evidence, ...files, ...keys, ...keyUses, ...register }

/** One type for both drivers: the embedded one and the server's extend PgDatabase, and so does a transaction. */
export type Db = PgDatabase<PgQueryResultHKT, typeof schema>

export interface Database {
  readonly db: Db
  readonly kind: 'embedded' | 'server'
  /** Writes what is pending, closes, and frees the folder. */
  close(): Promise<void>
  /** A tar archive of the embedded database; undefined on a server, which has its own tools. */
  dump?(): Promise<Uint8Array>
}

const MIGRATIONS = path.join(process.cwd(), 'drizzle')

/** PGlite takes no lock of its own, and two processes on one folder corrupt it. An abstract unix socket is a lock that
 *  the kernel frees when the process dies, however it dies; exclusive keeps a cluster from sharing it. */
function lockFolder(folder: string): Promise<Server> {
  const name = `\0elbowroom-${createHash('sha256').update(realpathSync(folder)).digest('hex').slice(0, 40)}`
  return new Promise((resolve, reject) => {
    const server = createServer((connection) => connection.destroy())
    server.once('error', (error: NodeJS.ErrnoException) =>
      reject(
        error.code === 'EADDRINUSE'
          ? new Error(
              `The database folder ${folder} is in use by another process. Stop that process, or set ELBOWROOM_DATA_DIR to another folder.`,
            )
          : error,
      ),
    )
    server.listen({ path: name, exclusive: true }, () => {
      server.unref()
      resolve(server)
    })
  })
}

/** Opens the embedded database in `folder` (undefined: in memory) under the folder's lock, without migrating.
 *  archive: a dump to start from, for an empty folder. */
export async function openEmbedded(folder: string | undefined, archive?: Blob) {
  const { PGlite } = await import('@electric-sql/pglite')
  const { pg_trgm } = await import('@electric-sql/pglite/contrib/pg_trgm')
  const extensions = { pg_trgm }
  if (folder === undefined) {
    const client = await PGlite.create({ extensions })
    return { client, close: () => client.close() }
  }
  mkdirSync(folder, { recursive: true })
  const lock = await lockFolder(folder)
  try {
    const client = await PGlite.create(folder, archive === undefined ? { extensions } : { extensions, loadDataDir: archive })
    return {
      client,
      close: async () => {
        await client.close()
        lock.close()
      },
    }
  } catch (error) {
    lock.close()
    throw error
  }
}

export const embeddedFolder = (): string => path.join(dataDir(), 'database')

async function openServer(url: string): Promise<Database> {
  const { Pool } = await import('pg')
  const { drizzle } = await import('drizzle-orm/node-postgres')
  const { migrate } = await import('drizzle-orm/node-postgres/migrator')
  const pool = new Pool({ connectionString: url })
  // A broken idle connection must not end the process; the next query opens another.
  pool.on('error', () => undefined)
  // Two processes that start together must not migrate together.
  const connection = await pool.connect()
  try {
    await connection.query('select pg_advisory_lock(7366252)')
    await migrate(drizzle({ client: connection, schema }), { migrationsFolder: MIGRATIONS })
  } finally {
    await connection.query('select pg_advisory_unlock(7366252)').catch(() => undefined)
    connection.release()
  }
  return { db: drizzle({ client: pool, schema }), kind: 'server', close: () => pool.end() }
}

async function open(): Promise<Database> {
  if (isBuilding()) throw new Error('the database must not be opened while the pages are being built')
  const url = databaseUrl()
  if (url !== undefined) {
    if (!/^postgres(ql)?:\/\//.test(url)) {
      throw new Error('DATABASE_URL must start with postgres://. For the embedded database leave it out and set ELBOWROOM_DATA_DIR.')
    }
    return openServer(url)
  }
  const { drizzle } = await import('drizzle-orm/pglite')
  const { migrate } = await import('drizzle-orm/pglite/migrator')
  const { client, close } = await openEmbedded(isDatabaseInMemory() ? undefined : embeddedFolder())
  const db = drizzle({ client, schema })
  await migrate(db, { migrationsFolder: MIGRATIONS })
  // A server counts by itself what is in its tables, to choose among indexes; here nobody else does.
  await client.exec('analyze')
  return { db, kind: 'embedded', close, dump: async () => new Uint8Array(await (await client.dumpDataDir('gzip')).arrayBuffer()) }
}

// globalThis survives hot reloading and is shared by the instrumentation, route and page bundles of one process.
const shared = globalThis as unknown as { elbowroomDatabase?: Promise<Database> }

/** The database of this process, opened and migrated at the first call. */
export function database(): Promise<Database> {
  if (shared.elbowroomDatabase === undefined) {
    shared.elbowroomDatabase = open()
    shared.elbowroomDatabase.catch(() => {
      shared.elbowroomDatabase = undefined
    })
  }
  return shared.elbowroomDatabase
}

export const getDb = async (): Promise<Db> => (await database()).db
