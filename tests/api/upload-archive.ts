import { createHash } from 'node:crypto'
import { rmSync } from 'node:fs'
import path from 'node:path'
import { inject } from 'vitest'
import { armEntries, makeZip, robotText, type ZipEntry } from '../lib/archive/make-zip'
import type { Imported } from './import-model'
import { type Fields, send } from './send'
import { asPerson, type Person } from './support/callers'

export const sha256 = (bytes: string | Uint8Array): string => createHash('sha256').update(bytes).digest('hex')

/** Sends an archive as a new model and answers the response. */
export const postArchive = async (fields: Fields, bytes: Buffer, by: Person = 'ines', team = 'tarnholm') =>
  send({ method: 'POST', path: `/teams/${team}/models`, headers: await asPerson(by), form: { fields, file: { name: 'arm.zip', bytes } } })

/** Stores an archive as a new model. */
export async function importArchive(name: string, entries: readonly ZipEntry[] = armEntries()): Promise<Imported> {
  const { status, text, body } = await postArchive({ name }, makeZip(entries))
  if (status !== 201) throw new Error(`the archive was not imported: ${status} ${text}`)
  return body as Imported
}

/** Takes a file out of the file storage of the served installation behind its back. */
export function loseFile(digest: string): void {
  rmSync(path.join(inject('served').dataDir, 'files', digest.slice(0, 2), digest))
}

/** A model all of whose files were lost. */
export async function importLost(): Promise<string> {
  const { model, revision } = await importArchive('Lost in the storage', [
    { name: 'arm.urdf', data: robotText('meshes/base.stl', 'lost') },
    { name: 'meshes/base.stl', data: 'solid lost' },
  ])
  loseFile(revision.sourceDigest)
  loseFile(sha256('solid lost'))
  return model.slug
}
