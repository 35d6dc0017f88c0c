import type { TestProject } from 'vitest/node'
import { makeZip, robotText } from '../../lib/archive/make-zip'
import { PEOPLE } from './people'
import { PASSWORD, readKey, startServer } from './server'
import { signIn } from './sign-in'

export interface ServedScenario {
  readonly url: string
  /** Folder of the server's data; keys and secrets lie in it. */
  readonly dataDir: string
  readonly password: string
  /** Key of tarnholm with scope `compute`. */
  readonly tarnholmKey: string
  /** Key of kestrel with scope `compute`. */
  readonly kestrelKey: string
  /** Which database answers: 'embedded' or 'server'. */
  readonly database: 'embedded' | 'server'
}

declare module 'vitest' {
  export interface ProvidedContext {
    served: ServedScenario
  }
}

/** A model out of an archive, which the walks need and the demo scenario has not. */
async function importArchive(url: string): Promise<void> {
  const form = new FormData()
  form.set('name', 'Walked archive')
  form.set('file', new Blob([new Uint8Array(makeZip([{ name: 'arm.urdf', data: robotText('meshes/base.stl') }, { name: 'meshes/base.stl', data: 'solid walked' }]))]), 'arm.zip')
  const answer = await fetch(`${url}/api/v1/teams/tarnholm/models`, { method: 'POST', headers: await signIn(url, PEOPLE.ines, PASSWORD), body: form })
  if (answer.status !== 201) throw new Error(`the archive was not imported: ${answer.status} ${await answer.text()}`)
}

/** One built server with the demo scenario for all API tests, on PostgreSQL when DATABASE_URL names one, else embedded. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const databaseUrl = process.env.DATABASE_URL
  const server = await startServer(databaseUrl === undefined ? {} : { databaseUrl })
  await importArchive(server.url)
  project.provide('served', {
    url: server.url,
    dataDir: server.dataDir,
    password: PASSWORD,
    tarnholmKey: readKey(server.dataDir, 'demo-key'),
    kestrelKey: readKey(server.dataDir, 'kestrel-key'),
    database: databaseUrl === undefined ? 'embedded' : 'server',
  })
  return async () => void (await server.stop())
}
