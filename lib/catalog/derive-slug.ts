import { RESERVED_SLUGS } from '@/lib/contract/scalars'

const LONGEST = 64
/** Room for `-` and the number of a further model of the same name. */
const LONGEST_SUFFIX = 8

/** Letters that are no other letter with a mark. */
const SPELLED: Readonly<Record<string, string>> = { ß: 'ss', æ: 'ae', œ: 'oe', ø: 'o', đ: 'd', ð: 'd', þ: 'th', ł: 'l', ı: 'i' }

/** A slug made of a name: Latin letters without their marks, digits and hyphens. */
export function deriveSlug(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[ßæœøđðþłı]/g, (letter) => SPELLED[letter]!)
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, LONGEST)
    .replace(/^-+|-+$/g, '')
  return plain === '' || RESERVED_SLUGS.includes(plain) ? `model${plain && `-${plain}`}` : plain
}

/** What every slug begins with that freeSlug can make of `stem`. */
export const commonStart = (stem: string): string => stem.slice(0, LONGEST - LONGEST_SUFFIX).replace(/-+$/, '')

/** The slug itself, or with the lowest number from 2 that makes it free. */
export function freeSlug(stem: string, taken: readonly string[]): string {
  const known = new Set(taken)
  if (!known.has(stem)) return stem
  for (let number = 2; ; number++) {
    const suffix = `-${number}`
    const slug = stem.slice(0, LONGEST - suffix.length).replace(/-+$/, '') + suffix
    if (!known.has(slug)) return slug
  }
}
