import { rmSync } from 'node:fs'
import { environmentFor, PASSWORD, runTypeScript, seed, startServer, temporaryFolder, type Server } from '@/tests/api/support/server'
import { signIn } from '@/tests/api/support/sign-in'

/** A built server with the demo scenario and what else a test file needs, apart from the one that all share. */
export interface OwnServer {
  readonly url: string
  readonly password: string
  /** Stores a file as a new model, or as a further revision of the model with this slug, and answers the slug. */
  readonly store: (fields: { readonly name?: string; readonly slug: string; readonly note?: string; readonly further?: boolean }, file: string) => Promise<string>
  /** Changes the status of a revision. */
  readonly move: (who: string, slug: string, revision: number, to: string, comment?: string) => Promise<void>
  readonly stop: () => Promise<void>
}

/** Starts it. models: how many a generated register has besides the demo. */
export async function startOwnServer({ models = 0 } = {}): Promise<OwnServer> {
  const dataDir = temporaryFolder()
  let server: Server
  try {
    seed(dataDir)
    if (models > 0) {
      const filled = runTypeScript('tests/bench/fill-register.ts', [String(models)], environmentFor(dataDir))
      if (filled.status !== 0) throw new Error(`the register could not be filled:\n${filled.stdout}${filled.stderr}`)
    }
    server = await startServer({ dataDir, seeded: false })
  } catch (error) {
    rmSync(dataDir, { recursive: true, force: true })
    throw error
  }
  const base = `${server.url}/api/v1/teams/tarnholm/models`
  const send = async (who: string, path: string, init: RequestInit) => {
    const answer = await fetch(base + path, { method: 'POST', ...init, headers: { ...(await signIn(server.url, `${who}@tarnholm.example`, PASSWORD)), ...init.headers } })
    if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`)
  }
  return {
    url: server.url,
    password: PASSWORD,
    store: async ({ name, slug, note, further = false }, file) => {
      const form = new FormData()
      for (const [field, value] of Object.entries(further ? { note, allowSame: 'true' } : { name, slug, note })) if (value !== undefined) form.append(field, value)
      form.append('file', new Blob([file]), `${slug}.urdf`)
      await send('ines', further ? `/${slug}/revisions` : '', { body: form })
      return slug
    },
    move: (who, slug, revision, to, comment) =>
      send(who, `/${slug}/revisions/${revision}/transitions`, { body: JSON.stringify({ to, ...(comment === undefined ? {} : { comment }) }), headers: { 'content-type': 'application/json' } }),
    stop: async () => {
      await server.stop()
      rmSync(dataDir, { recursive: true, force: true })
    },
  }
}
