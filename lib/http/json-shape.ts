import { fail } from '@/lib/errors'

/** Nothing in the contract is nested deeper than 6. */
const MOST_DEPTH = 64
/** The largest question there is, 10 000 references with all their fields, has 150 000 lists, objects, names and texts. */
const MOST_PARTS = 400_000

const QUOTE = 0x22
const BACKSLASH = 0x5c
const isOpening = (byte: number) => byte === 0x5b || byte === 0x7b
const isClosing = (byte: number) => byte === 0x5d || byte === 0x7d

const refuse = (detail: string) => fail('invalid-request', `The body ${detail}.`, { errors: [{ pointer: '', detail }] })

/** Looks through the bytes of a JSON text before it is parsed: a body of 8 MiB has room for millions of lists within lists,
 *  which take seconds to build. Numbers are not counted, they are cheap. Fails with invalid-request. */
export function checkJsonShape(bytes: Uint8Array): void {
  let depth = 0
  let parts = 0
  let isText = false
  for (let place = 0; place < bytes.length; place++) {
    const byte = bytes[place]!
    if (isText) {
      if (byte === BACKSLASH) place++
      else if (byte === QUOTE) isText = false
      continue
    }
    if (isClosing(byte)) depth--
    if (byte === QUOTE) isText = true
    else if (isOpening(byte)) depth++
    else continue
    parts++
    if (depth > MOST_DEPTH) refuse(`is nested deeper than ${MOST_DEPTH} levels`)
    if (parts > MOST_PARTS) refuse(`holds more than ${MOST_PARTS} lists, objects and texts`)
  }
}
