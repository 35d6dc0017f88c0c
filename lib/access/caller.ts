import type { Scope } from '@/lib/contract/key-operations'
import type { Role } from './roles'

/** The team that a call is about, and that the caller belongs to. */
export interface Team {
  readonly id: string
  readonly slug: string
  readonly name: string
  readonly fourEyes: boolean
  readonly reviewRequired: boolean
  readonly evidenceRequired: boolean
}

/** A signed-in person, before it is known which team the call is about. */
export interface Person {
  readonly kind: 'person'
  readonly sessionId: string
  readonly userId: string
  readonly name: string
  readonly email: string
}

/** A key and the one team it belongs to. */
export interface KeyHolder {
  readonly kind: 'key'
  readonly keyId: string
  readonly label: string
  /** The person who made the key and answers for what is done with it. */
  readonly userId: string
  readonly scopes: readonly Scope[]
  readonly team: Team
}

/** Who calls: what a cookie or a key proves by itself. */
export type Identity = Person | KeyHolder

/** Who calls, within one team. Every use-case takes this first. */
export type Caller = (Person & { readonly team: Team; readonly role: Role }) | KeyHolder

/** The name under which an act is recorded. */
export const callerName = (caller: Caller): string => (caller.kind === 'person' ? caller.name : `key ${caller.label}`)
