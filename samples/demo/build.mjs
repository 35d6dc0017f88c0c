import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { runStep } from './run-step.mjs'

/** Everything that can change what the build makes. Tests are type-checked by it, too, but do not enter it. */
const SOURCES = [
  'app', 'components', 'lib', 'db', 'openapi', 'samples', 'public', 'instrumentation.ts', 'instrumentation-node.ts', 'proxy.ts',
  'next.config.ts', 'postcss.config.mjs', 'tailwind.config.ts', 'package-lock.json',
]

const distFolder = (root) => join(root, process.env.NEXT_DIST_DIR ?? '.next')
const stampFile = (root) => join(distFolder(root), 'built-from')

function* filesUnder(path) {
  const found = statSync(path, { throwIfNoEntry: false })
  if (found === undefined) return
  if (!found.isDirectory()) yield path
  else for (const name of readdirSync(path).sort()) yield* filesUnder(join(path, name))
}

/** SHA-256 over names and contents: a checkout changes every date and no content. */
function digestOfSources(root) {
  const hash = createHash('sha256').update(process.version)
  for (const source of SOURCES) {
    for (const file of filesUnder(join(root, source))) {
      const content = readFileSync(file)
      hash.update(`\n${file.slice(root.length)} ${content.length}\n`).update(content)
    }
  }
  return hash.digest('hex')
}

async function build(root, digest) {
  const env = { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' }
  await runStep(process.execPath, [join(root, 'node_modules/next/dist/bin/next'), 'build'], { cwd: root, env, sentence: 'the build failed' })
  writeFileSync(stampFile(root), digest)
}

/** Builds the pages unless the last build was made from the same sources. Returns whether anything was done. */
export async function buildIfStale(root) {
  const digest = digestOfSources(root)
  const isWhole = existsSync(join(distFolder(root), 'BUILD_ID')) && existsSync(stampFile(root))
  if (isWhole && readFileSync(stampFile(root), 'utf8') === digest) return false
  await build(root, digest)
  return true
}

// `npm run build` builds whatever the last build was made from.
if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const root = fileURLToPath(new URL('../..', import.meta.url))
  await build(root, digestOfSources(root)).catch((error) => {
    process.stderr.write(`${error.message}\n`)
    process.exitCode = 1
  })
}
