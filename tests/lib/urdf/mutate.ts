/** A seeded generator of broken files: bytes, tokens, numbers, names and subtrees of real ones changed, dropped, doubled and moved. */

/** A small seeded generator of numbers in [0, 1): mulberry32, public domain, from memory. */
export function mulberry32(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

const TOKENS = [
  '<', '>', '"', "'", '&', '&amp;', '&#0;', '&#x1F916;', '<!--', '-->', '<![CDATA[', ']]>', '<?x ', '?>', '/>', '</link>', '</robot>', '<!DOCTYPE r>', '<!ENTITY a "b">',
  '<link name="base_link"/>', '<link/>', '<joint/>', '<gazebo>', '<loop_joint/>', '<xacro:macro/>', '<limit/>', '<axis/>', '<mimic joint="elbow"/>', '<mesh filename="../x.stl"/>',
  ' name=""', ' xyz=""', ' quat_xyzw="0 0 0 1"', ' version="1.2"', ' xmlns:a="b"', ' a:b=""', '${x}', '\0', '\u0007', '\uD83E', 'é', '\u202E', '\uFEFF', '\r', '\r\n', '\t',
]
const NUMBERS = [
  '0', '-0', '1e-320', '5e-324', '1e-9', '1e-10', '1e9', '1.0000001e9', '1e30', '1e31', '1e400', '-1e400', 'nan', 'inf', '0x10', '1,5', '.', '1.', '.5', '+1', '1e', '', ' ', '1 2', '90', '170', '3.1416', '６',
]
const NAMES = ['__proto__', 'constructor', '<script>', '&lt;script&gt;', '../..', '', ' ', 'base_link', 'x'.repeat(300), 'é', '关节', 'a b', 'a/b', '0']
const TYPES = ['revolute', 'continuous', 'prismatic', 'fixed', 'floating', 'planar', 'Revolute', 'ball']

const ELEMENT = /<(\w+)\b[^<>]*?(?:\/>|>[\s\S]*?<\/\1>)/g
const NUMBER = /-?\d+(?:\.\d+)?(?:e-?\d+)?/g
const VALUE = /"[^"]*"/g
const TYPE = /(?<=type=")\w+/g

/** One mutant of `source`, which may take pieces of `other`, drawn by `random`. */
export function mutated(source: Uint8Array, other: Uint8Array, random: () => number): Uint8Array {
  let bytes = source
  for (let edits = 1 + Math.floor(3 * random()); edits > 0; edits--) bytes = random() < 0.4 ? bytesChanged(bytes, other, random) : textChanged(bytes, random)
  return bytes
}

function bytesChanged(bytes: Uint8Array, other: Uint8Array, random: () => number): Uint8Array {
  const upTo = (limit: number): number => Math.floor(random() * limit)
  const at = upTo(bytes.length)
  const length = upTo(random() < 0.5 ? 4 : 200)
  const [before, piece, behind] = [bytes.subarray(0, at), bytes.subarray(at, at + length), bytes.subarray(at + length)]
  const from = upTo(other.length)
  switch (upTo(6)) {
    case 0:
      return joined(before, Uint8Array.of(upTo(256)), bytes.subarray(at + 1))
    case 1:
      return joined(before, Uint8Array.of((bytes[at] ?? 0) ^ (1 << upTo(8))), bytes.subarray(at + 1))
    case 2:
      return joined(before, behind)
    case 3:
      return joined(before, piece, piece, behind)
    case 4:
      return joined(before, behind, piece)
    default:
      return joined(before, other.subarray(from, from + length), behind)
  }
}

function textChanged(bytes: Uint8Array, random: () => number): Uint8Array {
  const text = Buffer.from(bytes).toString('utf8')
  const pick = <T>(list: readonly T[]): T => list[Math.floor(list.length * random())]!
  const any = (pattern: RegExp) => pick([...text.matchAll(pattern)])
  const replaced = (pattern: RegExp, by: (met: string) => string): string => {
    const met = any(pattern)
    return met === undefined ? text : text.slice(0, met.index) + by(met[0]) + text.slice(met.index + met[0].length)
  }
  const change = pick([
    () => {
      const at = Math.floor(random() * text.length)
      return text.slice(0, at) + pick(TOKENS) + text.slice(at)
    },
    () => replaced(NUMBER, () => pick(NUMBERS)),
    () => replaced(NUMBER, (met) => `${Number(met) * pick([-1, 0, 1e-12, 1000, 57.29577951308232, 1e12])}`),
    () => replaced(VALUE, () => `"${pick(NAMES)}"`),
    () => replaced(VALUE, () => any(VALUE)?.[0] ?? '""'),
    () => replaced(TYPE, () => pick(TYPES)),
    () => replaced(ELEMENT, () => ''),
    () => replaced(ELEMENT, (met) => met + met),
    () => replaced(ELEMENT, () => any(ELEMENT)?.[0] ?? ''),
  ])
  return new TextEncoder().encode(change())
}

function joined(...parts: readonly Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(parts.reduce((sum, { length }) => sum + length, 0))
  let at = 0
  for (const part of parts) {
    whole.set(part, at)
    at += part.length
  }
  return whole
}
