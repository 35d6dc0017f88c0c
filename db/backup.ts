import { existsSync, readdirSync, renameSync, rmSync, statSync } from 'node:fs'
import { readFile } from 'node:fs/promises'
import { promisify } from 'node:util'
import { gunzip } from 'node:zlib'
import { databaseUrl } from '@/lib/env'
import { writeWhole } from '@/lib/write-whole'
import { embeddedFolder, openEmbedded } from './client'

/** A reason that the operator can act on, told as it is. */
export class BackupRefused extends Error {}

const unzip = promisify(gunzip)

const isEmpty = (folder: string): boolean => !existsSync(folder) || readdirSync(folder).length === 0

function requireEmbedded(tool: string): string {
  if (databaseUrl() !== undefined) throw new BackupRefused(`DATABASE_URL names a PostgreSQL server. Use its own tool, ${tool}.`)
  return embeddedFolder()
}

/** Writes the embedded database to `file`, a gzip-compressed tar archive readable by its owner only, and returns its size in
 *  bytes. Refused while another process has the database open, when there is none, and when `file` exists. */
export async function dumpTo(file: string): Promise<number> {
  const folder = requireEmbedded('pg_dump')
  if (isEmpty(folder)) throw new BackupRefused(`There is no database in ${folder}. Set ELBOWROOM_DATA_DIR to the folder of the installation.`)
  if (existsSync(file)) throw new BackupRefused(`${file} exists already. Name another file, or remove that one first.`)
  const { client, close } = await openEmbedded(folder)
  try {
    const archive = await client.dumpDataDir('gzip')
    await writeWhole(file, new Uint8Array(await archive.arrayBuffer()))
    return archive.size
  } finally {
    await close()
  }
}

/** Fills the empty folder of the embedded database from a dump and returns how many migrations it had seen. Refused when the
 *  folder holds anything. The folder appears only when all of the dump is in it. */
export async function restoreFrom(file: string): Promise<number> {
  const folder = requireEmbedded('pg_restore')
  if (!isEmpty(folder)) {
    throw new BackupRefused(`${folder} is not empty. Restore into a new ELBOWROOM_DATA_DIR, or move that folder away first.`)
  }
  if (statSync(file, { throwIfNoEntry: false })?.isFile() !== true) throw new BackupRefused(`There is no file ${file}.`)
  const beside = `${folder}.${process.pid}.part`
  try {
    const migrations = await unpack(file, beside)
    rmSync(folder, { recursive: true, force: true })
    renameSync(beside, folder)
    return migrations
  } finally {
    rmSync(beside, { recursive: true, force: true })
  }
}

async function unpack(file: string, folder: string): Promise<number> {
  try {
    // Unpacked and looked at here, because a damaged archive would end the process from inside PGlite's own unpacking.
    const bytes = await unzip(await readFile(file))
    if (bytes.toString('latin1', 257, 262) !== 'ustar' || !bytes.includes('PG_VERSION')) throw new Error('no database is in it')
    const tar = new Blob([new Uint8Array(bytes)], { type: 'application/x-tar' })
    const { client, close } = await openEmbedded(folder, tar)
    try {
      const { rows } = await client.query<{ count: number }>('select count(*)::int as count from drizzle.__drizzle_migrations')
      return rows[0]?.count ?? 0
    } finally {
      await close()
    }
  } catch (error) {
    throw new BackupRefused(`${file} is not a dump of this program, or is damaged (${error instanceof Error ? error.message : String(error)}).`)
  }
}
