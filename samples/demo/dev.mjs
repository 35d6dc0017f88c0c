import { resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { installIfStale } from './install.mjs'
import { keptSecret } from './kept-secret.mjs'
import { requireNode } from './require-node.mjs'
import { requireFreePort, serve } from './serve.mjs'

// `npm run dev`: the development server, with a secret of its own kept in the data folder where none is set.

const root = fileURLToPath(new URL('../..', import.meta.url))
process.chdir(root)

try {
  requireNode(root)
  const host = process.env.HOST?.trim() || '127.0.0.1'
  const port = Number(process.env.PORT?.trim() || 3000)
  await requireFreePort(host, port)
  await installIfStale(root)
  const folder = resolve(process.env.ELBOWROOM_DATA_DIR?.trim() || '.data')
  const ELBOWROOM_SECRET = process.env.ELBOWROOM_SECRET?.trim() || keptSecret(folder, 'session-secret')
  const { exited } = serve(root, 'dev', { host, port, env: { ...process.env, ELBOWROOM_SECRET } })
  process.exitCode = (await exited).code ?? 0
} catch (error) {
  process.stderr.write(`${error.message}\n`)
  process.exitCode = 1
}
