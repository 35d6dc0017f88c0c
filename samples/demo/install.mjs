import { statSync } from 'node:fs'
import { join } from 'node:path'
import { runStep } from './run-step.mjs'

const changedAt = (file) => statSync(file, { throwIfNoEntry: false })?.mtimeMs ?? 0

/** npm writes its own copy of the lock file last, so that copy tells whether an installation is whole and how old it is. */
export const isInstalled = (root) =>
  changedAt(join(root, 'node_modules', '.package-lock.json')) >= changedAt(join(root, 'package-lock.json'))

/** Installs the packages of the lock file unless they are there. Returns whether anything was done. */
export async function installIfStale(root) {
  if (isInstalled(root)) return false
  // The tools that build the pages are development packages, whatever NODE_ENV says.
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund']
  await runStep('npm', args, { cwd: root, sentence: 'npm ci could not install the packages' })
  return true
}
