import { randomInt, timingSafeEqual } from 'node:crypto'
import { isSetUp } from './is-set-up'

/** Without letters and digits that look alike. */
const ALPHABET = '23456789ABCDEFGHJKLMNPQRSTUVWXYZ'
const LENGTH = 16
/** After this many wrong codes setting up is closed until the service is started again with a new code. */
const MOST_TRIES = 20

// In memory only: a restart prints a new code, and an old log is of no use.
const shared = globalThis as unknown as { elbowroomSetup?: { code: string; tries: number } }

/** The one-time code that proves access to the log; null when there is nothing to set up. */
export async function announceSetup(): Promise<string | null> {
  if (await isSetUp()) return null
  const code = Array.from({ length: LENGTH }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')
  shared.elbowroomSetup ??= { code: code.replace(/(.{4})(?=.)/g, '$1-'), tries: 0 }
  return shared.elbowroomSetup.code
}

const plain = (code: string) => Buffer.from(code.toUpperCase().replace(/[^A-Z0-9]/g, '').padEnd(LENGTH).slice(0, LENGTH))

/** Whether this is the code in the log; 'closed' after too many wrong ones. */
export function checkSetupCode(code: string): 'right' | 'wrong' | 'closed' {
  const setup = shared.elbowroomSetup
  if (setup === undefined || setup.tries >= MOST_TRIES) return 'closed'
  if (timingSafeEqual(plain(code), plain(setup.code))) return 'right'
  setup.tries++
  return 'wrong'
}
