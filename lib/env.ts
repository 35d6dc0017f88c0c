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

/** Where files are kept when not in a folder: an S3-compatible object store. */
export interface ObjectStore {
  readonly bucket: string
  readonly region: string
  /** Undefined: the endpoint of the region, as the client library knows it. */
  readonly endpoint: string | undefined
  /** Undefined: found as the client library does, for example from the machine's role. */
  readonly credentials: { readonly accessKeyId: string; readonly secretAccessKey: string } | undefined
}

/** The object store that is configured; undefined when files are kept in a folder. Fails with a sentence for the operator. */
export function objectStore(): ObjectStore | undefined {
  const bucket = text('ELBOWROOM_S3_BUCKET')
  const endpoint = text('ELBOWROOM_S3_ENDPOINT')
  const accessKeyId = text('ELBOWROOM_S3_ACCESS_KEY_ID')
  const secretAccessKey = text('ELBOWROOM_S3_SECRET_ACCESS_KEY')
  if (bucket === undefined) {
    if ((endpoint ?? accessKeyId ?? secretAccessKey) !== undefined) throw new Error('ELBOWROOM_S3_BUCKET is missing, and other ELBOWROOM_S3_ variables are set.')
    return undefined
  }
  if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(bucket)) throw new Error('ELBOWROOM_S3_BUCKET must be the name of a bucket: 3 to 63 of a-z, 0-9, "." and "-".')
  if (endpoint !== undefined && !/^https?:\/\/[^/?#@]+\/?$/.test(endpoint)) {
    throw new Error('ELBOWROOM_S3_ENDPOINT must be http:// or https:// and a host, without a path or a password.')
  }
  if ((accessKeyId === undefined) !== (secretAccessKey === undefined)) {
    throw new Error('Set both ELBOWROOM_S3_ACCESS_KEY_ID and ELBOWROOM_S3_SECRET_ACCESS_KEY, or neither.')
  }
  const credentials = accessKeyId === undefined || secretAccessKey === undefined ? undefined : { accessKeyId, secretAccessKey }
  return { bucket, region: text('ELBOWROOM_S3_REGION') ?? 'us-east-1', endpoint, credentials }
}

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
