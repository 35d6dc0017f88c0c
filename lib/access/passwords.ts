import { hash, verify } from '@node-rs/argon2'

/** argon2id (RFC 9106) with the library defaults: 19 MiB, 2 passes, one lane. */
export const hashPassword = (password: string): Promise<string> => hash(password)

// Verified against when the address is unknown, so that the answer takes as long as for a known one.
let decoy: Promise<string> | undefined

/** Whether the password is the one behind `passwordHash`; null stands for a person who does not exist. */
export async function isPassword(password: string, passwordHash: string | null): Promise<boolean> {
  if (passwordHash !== null) return verify(passwordHash, password)
  decoy ??= hashPassword('no one has this password')
  await verify(await decoy, password)
  return false
}
