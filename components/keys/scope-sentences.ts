import type { Scope } from '@/lib/contract/key-operations'

/** What a key with each scope can do, for the person who gives it. */
export const SCOPE_SENTENCES: Record<Scope, string> = {
  'catalog:read': 'Read models, revisions, findings and source files.',
  'catalog:write': 'Import files, and change the names and notes of models.',
  compute: 'Ask kinematics questions of any revision.',
  gateway: 'Read the descriptor of a cell and call its steps, from a controller.',
}
