import type { Located } from '@/lib/access/locate'
import { currentTag } from '@/lib/access/version-tag'
import type { Operation } from '@/lib/contract/operation'
import { fail } from '@/lib/errors'

/** Whether an If-Match field (RFC 9110 section 13.1.1, strong comparison) names the tag. */
const matches = (field: string, tag: string): boolean =>
  field.trim() === '*' || field.split(',').some((candidate) => candidate.trim() === `"${tag}"`)

/** Keeps an edit to the state it was made for, and a computation to the model it was meant for.
 *  Fails with if-match-required, stale or fingerprint-mismatch. */
export function checkIfMatch(operation: Operation, at: Partial<Located>, headers: Headers): void {
  const field = headers.get('if-match')
  if (operation.edits) {
    if (field === null) fail('if-match-required')
    const tag = currentTag(at)
    if (tag === null || !matches(field, tag)) fail('stale')
  }
  if (operation.pinned && field !== null && at.revision !== undefined && !matches(field, at.revision.fingerprint)) {
    fail('fingerprint-mismatch', undefined, { headers: { 'model-fingerprint': at.revision.fingerprint } })
  }
}
