import { createHash, randomInt } from 'node:crypto'

/** A key reads elb_ + id (12) + _ + secret (43) + checksum (6), each of 0-9 A-Z a-z. The checksum tells a mistyped key
 *  from an unknown one without asking the database; it proves nothing. 43 characters of 62 are 256 bits. */
const ALPHABET = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz'
const ID_LENGTH = 12
const SECRET_LENGTH = 43
const CHECKSUM_LENGTH = 6
const FORM = new RegExp(`^elb_([0-9A-Za-z]{${ID_LENGTH}})_([0-9A-Za-z]{${SECRET_LENGTH}})([0-9A-Za-z]{${CHECKSUM_LENGTH}})$`)

const draw = (length: number) => Array.from({ length }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')

function checksum(text: string): string {
  let rest = createHash('sha256').update(text).digest().readUIntBE(0, 6)
  let digits = ''
  for (let place = 0; place < CHECKSUM_LENGTH; place++) {
    digits += ALPHABET[rest % ALPHABET.length]
    rest = Math.floor(rest / ALPHABET.length)
  }
  return digits
}

/** The SHA-256 under which a key is kept, as hexadecimal. */
export const digestKey = (key: string): string => createHash('sha256').update(key).digest('hex')

/** What people recognise a key by. */
export const keyPrefix = (id: string): string => `elb_${id}`

/** A new random key. */
export function drawKey(): { id: string; key: string } {
  const id = draw(ID_LENGTH)
  const body = `${keyPrefix(id)}_${draw(SECRET_LENGTH)}`
  return { id, key: body + checksum(body) }
}

/** The id inside a key; null when the key is not well formed or its checksum does not match. */
export function parseKey(key: string): string | null {
  const match = FORM.exec(key)
  if (match === null || checksum(key.slice(0, -CHECKSUM_LENGTH)) !== match[3]) return null
  return match[1]!
}
