import { cookies, headers } from 'next/headers'
import { notFound, redirect } from 'next/navigation'
import { cache } from 'react'
import { getDb } from '@/db/client'
import type { Caller, Person } from '@/lib/access/caller'
import { locate, type Parameter } from '@/lib/access/locate'
import { may, PERMISSIONS } from '@/lib/access/permissions'
import type { Role } from '@/lib/access/roles'
import { identifySession } from '@/lib/access/sessions'
import type { Ask } from '@/lib/access/use-case'
import type { OperationName } from '@/lib/contract/operations'
import { Problem } from '@/lib/errors'

/** Set by the proxy on every page request, so that sign-in can lead back. */
export const PATH_HEADER = 'x-elbowroom-path'

/** The person who looks at this page; null when nobody is signed in or the session has ended. */
export const findVisitor = cache(async (): Promise<Person | null> => {
  try {
    return await identifySession(await cookies())
  } catch (error) {
    if (error instanceof Problem && error.code === 'session-ended') return null
    throw error
  }
})

/** The person who looks at this page; leads to sign-in and back when nobody is signed in. */
export async function getVisitor(): Promise<Person> {
  const visitor = await findVisitor()
  if (visitor !== null) return visitor
  const path = (await headers()).get(PATH_HEADER) ?? '/'
  redirect(`/sign-in?callbackUrl=${encodeURIComponent(path)}`)
}

export interface Visit<N extends OperationName> {
  readonly caller: Extract<Caller, { kind: 'person' }>
  readonly at: Ask<N>['at']
  /** Whether the visitor's role suffices; requiredRole says which one would. */
  readonly allowed: boolean
  readonly requiredRole: Role
}

/** A page's way in: the same checks as the operation that it shows, with a page for each refusal. */
export async function visit<N extends OperationName>(name: N, parameters: Partial<Record<Parameter, string>>): Promise<Visit<N>> {
  const visitor = await getVisitor()
  try {
    const { caller, at } = await locate(await getDb(), visitor, parameters)
    return { caller: caller as Visit<N>['caller'], at: at as Visit<N>['at'], allowed: may(caller, name), requiredRole: PERMISSIONS[name].role }
  } catch (error) {
    if (error instanceof Problem && error.code.endsWith('-not-found')) notFound()
    if (error instanceof Problem && error.code === 'nothing-released') notFound()
    throw error
  }
}
