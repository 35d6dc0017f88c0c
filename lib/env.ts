import path from 'node:path'

/** The environment, read here and nowhere else. README.md has the table of what each variable does. */

const text = (name: string): string | undefined => process.env[name]?.trim() || undefined

const port = text('PORT') ?? '3000'

/** Scheme and host under which people and gateways reach this installation, without a trailing slash. */
export const siteUrl = (): string => (text('ELBOWROOM_URL') ?? `http://127.0.0.1:${port}`).replace(/\/+$/, '')

// next-auth reads its own variable; it is derived so that nobody has to set the same address twice.
process.env.NEXTAUTH_URL = siteUrl()

/** Origins that a state-changing request with a session cookie may carry: the site itself and, when that is a loopback
 *  address, the other spelling of it. */
export function siteOrigins(): readonly string[] {
  const url = new URL(siteUrl())
  const twins: Record<string, string> = { '127.0.0.1': 'localhost', localhost: '127.0.0.1' }
  const twin = twins[url.hostname]
  return twin === undefined ? [url.origin] : [url.origin, url.origin.replace(url.hostname, twin)]
}

export const isServedByTls = (): boolean => siteUrl().startsWith('https:')

/** Folder of the embedded database and of what belongs to this installation. */
export const dataDir = (): string => path.resolve(/* turbopackIgnore: true */ text('ELBOWROOM_DATA_DIR') ?? '.data')

/** Address of a PostgreSQL server, or undefined for the embedded database. */
export const databaseUrl = (): string | undefined => text('DATABASE_URL')

/** True for tests that want the embedded database in memory. */
export const isDatabaseInMemory = (): boolean => text('ELBOWROOM_DATA_DIR') === 'memory'

/** Key of the session cookies. At least 32 characters, from the environment only. */
export function sessionSecret(): string {
  const secret = text('ELBOWROOM_SECRET')
  if (secret === undefined || secret.length < 32) {
    throw new Error(
      'ELBOWROOM_SECRET is missing or shorter than 32 characters. Make one with `openssl rand -base64 32` and set it before starting.',
    )
  }
  return secret
}

export const isProduction = (): boolean => process.env.NODE_ENV === 'production'
/** True in the service that Next serves; false in the commands beside it. */
export const isService = (): boolean => process.env.NEXT_RUNTIME === 'nodejs'
export const isBuilding = (): boolean => process.env.NEXT_PHASE === 'phase-production-build'
export const logLevel = (): string => text('LOG_LEVEL') ?? 'info'
export const demoPassword = (): string | undefined => text('DEMO_PASSWORD')
