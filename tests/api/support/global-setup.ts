import type { TestProject } from 'vitest/node'
import { PASSWORD, readKey, startServer } from './server'

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

/** One built server with the demo scenario for all API tests, on PostgreSQL when DATABASE_URL names one, else embedded. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const databaseUrl = process.env.DATABASE_URL
  const server = await startServer(databaseUrl === undefined ? {} : { databaseUrl })
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
