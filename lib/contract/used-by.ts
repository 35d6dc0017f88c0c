import { z } from 'zod'
import { Instant } from './scalars'

/** A key that has called a revision, and when it last did. */
export const KeyUse = z
  .strictObject({
    key: z.strictObject({ label: z.string(), prefix: z.string().meta({ description: 'How the key begins, to recognise it by.' }), state: z.enum(['active', 'expired', 'revoked']) }),
    revision: z.int().min(1),
    lastUsedAt: Instant.meta({ description: 'Noted at most once a minute for each key and revision.' }),
  })
  .meta({ id: 'KeyUse' })
export type KeyUse = z.infer<typeof KeyUse>
