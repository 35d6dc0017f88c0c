import { readFileSync, rmSync } from 'node:fs'
import path from 'node:path'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ROOT, startServer, temporaryFolder } from '@/tests/api/support/server'
import { startPostgres } from './support/postgres.mjs'

const dataDir = temporaryFolder()
const journal = JSON.parse(readFileSync(path.join(ROOT, 'drizzle/meta/_journal.json'), 'utf8')) as { entries: unknown[] }
let postgres: Awaited<ReturnType<typeof startPostgres>>

beforeAll(async () => {
  postgres = await startPostgres()
})
afterAll(async () => {
  await postgres?.stop()
  rmSync(dataDir, { recursive: true, force: true })
})

async function query<T extends pg.QueryResultRow>(url: string, text: string): Promise<T[]> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query<T>(text)).rows
  } finally {
    await client.end()
  }
}

describe('the migrations on a PostgreSQL server', () => {
  it('run on the version installed, 15 or later', async () => {
    const [row] = await query<{ version: number }>(postgres.createDatabase('version'), "select current_setting('server_version_num')::int as version")
    expect(row!.version).toBeGreaterThanOrEqual(150_000)
  })

  it('are applied once when two servers start together on an empty database', async () => {
    const url = postgres.createDatabase('together')
    const servers = await Promise.all([1, 2].map(() => startServer({ dataDir, databaseUrl: url, seeded: false })))
    const ready = await Promise.all(servers.map(async (server) => (await fetch(`${server.url}/api/health/ready`)).status))
    expect(ready).toEqual([200, 200])
    const applied = await query(url, 'select hash from drizzle.__drizzle_migrations')
    expect(applied).toHaveLength(journal.entries.length)
    for (const server of servers) expect(await server.stop()).toBe(0)
  })

  it('make the same tables as on the embedded database', async () => {
    const { PGlite } = await import('@electric-sql/pglite')
    const columns = `select table_name, column_name, data_type, is_nullable from information_schema.columns
                     where table_schema = 'public' order by table_name, ordinal_position`
    const { pg_trgm } = await import('@electric-sql/pglite/contrib/pg_trgm')
    const embedded = await PGlite.create({ extensions: { pg_trgm } })
    for (const statement of readMigrations()) await embedded.exec(statement)
    const { rows } = await embedded.query(columns)
    await embedded.close()
    const url = postgres.createDatabase('tables')
    for (const statement of readMigrations()) await query(url, statement)
    expect(await query(url, columns)).toEqual(rows)
    expect(rows.length).toBeGreaterThan(20)
  })
})

function readMigrations(): string[] {
  const { entries } = journal as { entries: { tag: string }[] }
  return entries.map(({ tag }) => readFileSync(path.join(ROOT, 'drizzle', `${tag}.sql`), 'utf8'))
}
