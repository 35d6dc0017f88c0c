import { PERMISSIONS } from '@/lib/access/permissions'
import type { Operation } from '@/lib/contract/operation'
import type { OperationName } from '@/lib/contract/operations'
import type { ProblemCode } from '@/lib/errors'

const AUTHENTICATION: readonly ProblemCode[] = ['sign-in-required', 'session-ended', 'key-mistyped', 'key-unknown', 'key-expired', 'key-revoked']

const BY_PARAMETER: Readonly<Record<string, readonly ProblemCode[]>> = {
  '{team}': ['team-not-found'],
  '{model}': ['model-not-found'],
  '{revision}': ['revision-not-found', 'nothing-released'],
  '{key}': ['key-not-found'],
  '{path}': ['mesh-not-found'],
  '{set}': ['reference-poses-not-found'],
}

/** Every problem that an operation can answer: those it declares and those that follow from its declaration. */
export function problemsOf(name: OperationName, operation: Operation): ProblemCode[] {
  const isKeyCallable = PERMISSIONS[name].scope !== null
  const hasBody = operation.body !== undefined || operation.form !== undefined
  return [
    ...AUTHENTICATION,
    ...Object.entries(BY_PARAMETER).flatMap(([parameter, codes]) => (operation.path.includes(parameter) ? codes : [])),
    ...((isKeyCallable ? ['scope-missing'] : ['session-only']) satisfies ProblemCode[]),
    ...((PERMISSIONS[name].role === 'reader' ? [] : ['role-missing']) satisfies ProblemCode[]),
    ...((operation.method === 'GET' ? [] : ['origin-refused']) satisfies ProblemCode[]),
    'not-acceptable',
    ...((hasBody ? ['unsupported-media-type', 'too-large', 'malformed-body'] : []) satisfies ProblemCode[]),
    // Fields that nobody declared are refused, in a query as well.
    'invalid-request',
    ...((operation.edits ? ['if-match-required', 'stale'] : []) satisfies ProblemCode[]),
    ...((operation.pinned ? ['fingerprint-mismatch'] : []) satisfies ProblemCode[]),
    ...operation.errors,
    'internal-error',
  ]
}
