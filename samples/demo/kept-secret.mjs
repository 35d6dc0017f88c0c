import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/** 32 random bytes as text. */
export const randomSecret = () => randomBytes(32).toString('base64url')

/** The text kept in `folder`/`name`, or undefined. */
export function findSecret(folder, name) {
  try {
    return readFileSync(join(folder, name), 'utf8').trim() || undefined
  } catch (error) {
    if (error.code === 'ENOENT') return undefined
    throw error
  }
}

/** Keeps `secret` in `folder`/`name`, readable by its owner only. Written beside and renamed, so that it is never half there. */
export function keepSecret(folder, name, secret) {
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const beside = join(folder, `${name}.${process.pid}`)
  writeFileSync(beside, `${secret}\n`, { mode: 0o600 })
  renameSync(beside, join(folder, name))
  return secret
}

/** The text kept in `folder`/`name`, made at the first call. */
export const keptSecret = (folder, name, make = randomSecret) => findSecret(folder, name) ?? keepSecret(folder, name, make())
