import { readFileSync } from 'node:fs'
import { join } from 'node:path'

/** Fails with a sentence when this Node.js is older than package.json asks for. */
export function requireNode(root) {
  const { engines } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'))
  const [needMajor = 0, needMinor = 0] = engines.node.replace('>=', '').split('.').map(Number)
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major < needMajor || (major === needMajor && minor < needMinor)) {
    throw new Error(`Elbowroom needs Node.js ${needMajor}.${needMinor} or later; this is ${process.version}. Install a newer one and run the command again.`)
  }
}
