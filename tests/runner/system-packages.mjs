import { spawnSync } from 'node:child_process'
import { appendFileSync, existsSync } from 'node:fs'
import { join } from 'node:path'
import { runStep } from '../../samples/demo/run-step.mjs'
import { findPostgres } from '../db/support/postgres.mjs'

/** What the tests need besides npm packages: how to see that it is there, and the Debian packages that bring it. */
const NEEDS = [
  { what: 'Chromium, for the browser tests', packages: ['chromium'], isThere: () => existsSync(chromiumPath()) },
  {
    what: 'Orocos KDL and NumPy for Debian\'s Python, witnesses of the reference tests',
    packages: ['python3', 'python3-pykdl', 'python3-numpy'],
    isThere: () => spawnSync('/usr/bin/python3', ['-c', 'import PyKDL, numpy']).status === 0,
  },
  { what: 'check_urdf, a second reader of URDF, for the reference tests', packages: ['liburdfdom-tools'], isThere: () => isOnPath('check_urdf') },
  { what: 'curl and OpenSSL, for the commands of the README', packages: ['curl', 'openssl'], isThere: () => ['curl', 'openssl'].every(isOnPath) },
  { what: 'a PostgreSQL server, version 15 or later', packages: ['postgresql'], isThere: () => findPostgres() !== undefined },
]

function isOnPath(program) {
  return (process.env.PATH ?? '').split(':').some((folder) => existsSync(join(folder, program)))
}

/** The browser of the browser tests; CHROMIUM_PATH names another. */
export function chromiumPath() {
  return process.env.CHROMIUM_PATH ?? '/usr/bin/chromium'
}

/** Debian's package makes and starts a database cluster of its own at installation unless told not to; the tests want only
 *  its programs. A machine that had the package before keeps its setting. */
async function keepDebianFromStartingACluster(env) {
  const setting = '/etc/postgresql-common/createcluster.conf'
  if (existsSync(setting)) return
  await runStep('apt-get', ['install', '-y', '--no-install-recommends', 'postgresql-common'], { env, sentence: 'apt-get could not install postgresql-common' })
  appendFileSync(setting, '\ncreate_main_cluster = false\n')
}

/** Installs through apt-get what is missing, when this is root on a Debian system; otherwise fails and says exactly what to install. */
export async function installSystemPackages() {
  const missing = NEEDS.filter(({ isThere }) => !isThere())
  if (missing.length === 0) return
  const packages = missing.flatMap(({ packages: names }) => names)
  const list = missing.map(({ what }) => `  - ${what}`).join('\n')
  const command = `apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (process.getuid?.() !== 0 || spawnSync('apt-get', ['--version']).status !== 0) {
    throw new Error(`The tests need programs that are not installed:\n${list}\nOn Debian, as root: ${command}`)
  }
  process.stdout.write(`Installing what the tests need:\n${list}\n`)
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  await runStep('apt-get', ['update'], { env, sentence: 'apt-get could not read the package lists' })
  if (packages.includes('postgresql')) await keepDebianFromStartingACluster(env)
  await runStep('apt-get', command.split(' ').slice(1), { env, sentence: 'apt-get could not install the packages' })
  const still = NEEDS.filter(({ isThere }) => !isThere())
  if (still.length > 0) throw new Error(`Installed, and still not found:\n${still.map(({ what }) => `  - ${what}`).join('\n')}`)
}
