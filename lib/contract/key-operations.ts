import { z } from 'zod'
import { operation } from './operation'
import { Instant, listOf, Name, Paging } from './scalars'

export const SCOPES = ['catalog:read', 'catalog:write', 'compute', 'gateway'] as const
export const Scope = z.enum(SCOPES).meta({ id: 'Scope' })
export type Scope = z.infer<typeof Scope>

const keyFields = {
  id: z.string(),
  prefix: z.string().meta({ description: 'How the key begins, to recognise it by.', example: 'elb_4fXk02MzQ8aT' }),
  label: z.string(),
  scopes: z.array(Scope),
  state: z.enum(['active', 'expired', 'revoked']),
  createdAt: Instant,
  createdBy: z.string(),
  expiresAt: Instant.optional(),
  revokedAt: Instant.optional(),
  lastUsedAt: Instant.optional(),
}

export const Key = z.strictObject(keyFields).meta({ id: 'Key' })
export type Key = z.infer<typeof Key>

/** The one answer that carries the key itself. */
export const NewKey = z.strictObject({ ...keyFields, key: z.string().meta({ description: 'Shown this once.' }) }).meta({ id: 'NewKey' })

const Scopes = z
  .array(Scope)
  .min(1, 'choose at least one scope')
  .refine((scopes) => new Set(scopes).size === scopes.length, 'name each scope once')

/** When a key ends: ahead of now. What is no time at all is told by Instant. */
const Expiry = Instant.refine((text) => !(Date.parse(text) <= Date.now()), 'lies in the past: choose a time ahead')

export const KeyQuestion = z.strictObject({
  label: Name,
  scopes: Scopes,
  expiresAt: Expiry.optional().meta({ description: 'Left out: the key does not expire.', example: '2031-06-30T22:00:00Z' }),
})

const KEYS = '/teams/{team}/keys'
const KEY = `${KEYS}/{key}` as const

export const KEY_OPERATIONS = {
  listKeys: operation({
    method: 'GET',
    path: KEYS,
    tag: 'Keys',
    summary: 'The keys of the team, newest first',
    query: z.strictObject(Paging),
    answer: { status: 200, schema: listOf(Key) },
    errors: [],
  }),
  createKey: operation({
    method: 'POST',
    path: KEYS,
    tag: 'Keys',
    summary: 'Make a key',
    description: 'The key is in this answer and nowhere else: only its SHA-256 is kept.',
    body: KeyQuestion,
    answer: { status: 201, schema: NewKey },
    errors: [],
    example: { label: 'Cell 4 gateway', scopes: ['compute'] },
  }),
  getKey: operation({
    method: 'GET',
    path: KEY,
    tag: 'Keys',
    summary: 'A key, without its secret',
    description: 'Its ETag stays the same when the key is used.',
    answer: { status: 200, schema: Key },
    errors: [],
    conditional: true,
  }),
  editKey: operation({
    method: 'PATCH',
    path: KEY,
    tag: 'Keys',
    summary: 'Change label or expiry',
    body: z.strictObject({
      label: Name.optional(),
      expiresAt: Expiry.nullable().optional().meta({ description: 'null: the key does not expire.', example: '2031-06-30T22:00:00Z' }),
    }),
    answer: { status: 200, schema: Key },
    errors: [],
    edits: true,
    example: { label: 'Cell 4 gateway, spare' },
  }),
  revokeKey: operation({
    method: 'DELETE',
    path: KEY,
    tag: 'Keys',
    summary: 'Revoke a key',
    description: 'Takes hold at once on this process and within two seconds on others. Needs no If-Match.',
    answer: { status: 204 },
    errors: [],
  }),
} as const
