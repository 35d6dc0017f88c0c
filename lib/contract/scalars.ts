import { z } from 'zod'

/** Path names that could be read as something else. */
export const RESERVED_SLUGS: readonly string[] = ['new', 'import', 'comparison', 'released']

export const SLUG_PATTERN = /^[a-z0-9](?:[a-z0-9-]{0,62}[a-z0-9])?$/

export const Slug = z
  .string()
  .regex(SLUG_PATTERN, 'use 1 to 64 lower-case letters, digits and hyphens, with a letter or digit at both ends')
  .refine((slug) => !RESERVED_SLUGS.includes(slug), 'this word is reserved: choose another')
  .meta({ description: 'A name in a URL.', example: 'skerry-7' })

/** Text that people read: no control characters but line breaks and tabs, trimmed, not empty. */
const readable = (most: number) =>
  z
    .string()
    .trim()
    .max(most, `at most ${most} characters`)
    .refine((text) => /^[^\p{Cc}\p{Cs}\p{Cn}]*$/u.test(text), 'control characters are not allowed')

export const Name = readable(120).min(1, 'give a name')

/** As it stands on the type plate. */
export const SerialNumber = readable(100)

export const Note = z
  .string()
  .trim()
  .max(2000, 'at most 2000 characters')
  .refine((text) => /^(?:[^\p{Cc}\p{Cs}\p{Cn}]|[\n\r\t])*$/u.test(text), 'control characters are not allowed')

export const Instant = z.iso.datetime().meta({ description: 'RFC 3339, UTC.', example: '2026-11-18T09:12:00.000Z' })

export const Digest = z
  .string()
  .regex(/^[0-9a-f]{64}$/)
  .meta({ description: 'SHA-256, 64 lower-case hexadecimal digits.' })

export const Status = z.enum(['draft', 'in-review', 'released', 'superseded', 'withdrawn']).meta({ id: 'Status' })
export type Status = z.infer<typeof Status>

export const Triple = z.array(z.number()).length(3)

/** A number in a query: its digits and nothing else, so that an empty field is no 0. */
export const wholeNumber = (least: number, most: number) => {
  const wanted = `a whole number from ${least} to ${most}`
  const digits = (text: unknown) => (typeof text === 'string' && /^\d{1,9}$/.test(text) ? Number(text) : text)
  return z.preprocess(digits, z.int(wanted).min(least, wanted).max(most, wanted))
}

/** The query fields of every list. */
export const Paging = {
  limit: wholeNumber(1, 200).optional().meta({ description: 'How many at most; 50 when left out.' }),
  cursor: z.string().max(500).optional().meta({ description: 'nextCursor of the previous page.' }),
}

/** The shape of every list. */
export const listOf = <T extends z.ZodType>(item: T) =>
  z.strictObject({ items: z.array(item), nextCursor: z.string().optional().meta({ description: 'Left out on the last page.' }) })
