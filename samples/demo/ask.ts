import type { Db } from '@/db/client'
import { findUserByEmail } from '@/db/queries/people'
import { locate } from '@/lib/access/locate'
import { permit } from '@/lib/access/permissions'
import type { Ask, UseCase } from '@/lib/access/use-case'
import type { OperationName } from '@/lib/contract/operations'
import { fail } from '@/lib/errors'

/** Asks an operation of the contract as a person, with the permission and the use-case that a request would meet. */
export async function ask<N extends OperationName>(
  db: Db,
  email: string,
  operation: { readonly name: N; readonly useCase: UseCase<N> },
  path: Parameters<typeof locate>[2],
  parts: Partial<Pick<Ask<N>, 'query' | 'body' | 'form' | 'file'>>,
) {
  const user = (await findUserByEmail(db, email)) ?? fail('sign-in-required')
  const person = { kind: 'person', sessionId: 'demo', userId: user.id, name: user.name, email: user.email } as const
  const { caller, at } = await locate(db, person, path)
  permit(caller, operation.name)
  return (await operation.useCase(caller, { at, query: undefined, body: undefined, form: undefined, file: undefined, ...parts } as unknown as Ask<N>)).body
}
