import { relative, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { buildIfStale } from './build.mjs'
import { installIfStale } from './install.mjs'
import { findSecret, keepSecret, keptSecret, randomSecret } from './kept-secret.mjs'
import { requireNode } from './require-node.mjs'
import { runStep } from './run-step.mjs'
import { requireFreePort, serve, untilReady } from './serve.mjs'
import { TYPESCRIPT } from './typescript.mjs'

// `npm run demo`: from a fresh clone to a running installation with something in it. Needs nothing but Node.js to start,
// does what is missing and no more, and keeps serving until it is told to stop.

const root = fileURLToPath(new URL('../..', import.meta.url))
process.chdir(root)

const say = (text) => process.stdout.write(`${text}\n`)

/** The password of the demo's people: as set, as kept, or made now. */
function demoPassword(folder) {
  const kept = findSecret(folder, 'demo-password')
  const password = process.env.DEMO_PASSWORD?.trim() || kept || randomSecret().slice(0, 16)
  return password === kept ? password : keepSecret(folder, 'demo-password', password)
}

function welcome(url, folder, password, key) {
  const place = relative(root, folder).startsWith('..') ? folder : relative(root, folder)
  return `
Elbowroom is ready at ${url}

Sign in at ${url}/sign-in with the password  ${password}
  ines@tarnholm.example    engineer: imports and submits
  tomas@tarnholm.example   approver: releases and withdraws
  mira@tarnholm.example    administrator: keys
  kofi@tarnholm.example    reader
  runa@kestrel.example     administrator of another team, which releases only what was measured
  edda@kestrel.example     approver of that team

Gateway key (scope compute, kept in ${place}/demo-key):
  ${key}

Ask for a pose:
  curl -s ${url}/api/v1/teams/tarnholm/models/trainer-3r/revisions/released/forward-kinematics \\
    -H "Authorization: Bearer $(cat ${place}/demo-key)" -H 'Content-Type: application/json' \\
    -d '{"configurations": [[0.5, 1.0, -0.5]]}'

Results are engineering aids computed from the model as imported; they are not a safety function.
Stop with Ctrl-C. The data stay in ${place}.`
}

async function demo() {
  requireNode(root)
  const host = process.env.HOST?.trim() || '127.0.0.1'
  const port = Number(process.env.PORT?.trim() || 3000)
  if (!Number.isInteger(port) || port < 1 || port > 65535) throw new Error(`PORT=${process.env.PORT} is not a port number.`)
  const folder = resolve(process.env.ELBOWROOM_DATA_DIR?.trim() || '.data')
  await requireFreePort(host, port)

  say((await installIfStale(root)) ? 'Packages installed.' : 'Packages are up to date.')
  say((await buildIfStale(root)) ? 'Pages built.' : 'The build is up to date.')

  const password = demoPassword(folder)
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    ELBOWROOM_DATA_DIR: folder,
    ELBOWROOM_SECRET: process.env.ELBOWROOM_SECRET?.trim() || keptSecret(folder, 'session-secret'),
    DEMO_PASSWORD: password,
    PORT: String(port),
    LOG_LEVEL: process.env.LOG_LEVEL ?? 'warn',
  }
  await runStep(process.execPath, [...TYPESCRIPT, 'samples/demo/seed.ts'], { cwd: root, env, sentence: 'The demo scenario could not be made.' })
  say(`The demo scenario is in ${folder}.`)

  const { exited } = serve(root, 'start', { host, port, env })
  const reach = ['0.0.0.0', '::'].includes(host) ? '127.0.0.1' : host
  if (await untilReady(`http://${reach}:${port}`, exited)) {
    const url = (process.env.ELBOWROOM_URL?.trim() || `http://${reach}:${port}`).replace(/\/+$/, '')
    say(welcome(url, folder, password, findSecret(folder, 'demo-key')))
  }
  const { code, signal, wasTold } = await exited
  if (code !== 0 && !wasTold) throw new Error(`The server ended by itself (${signal ?? `exit code ${code}`}).`)
  say('Stopped; the database is closed.')
}

try {
  await demo()
} catch (error) {
  process.stderr.write(`${error.message}\n`)
  process.exitCode = 1
}
