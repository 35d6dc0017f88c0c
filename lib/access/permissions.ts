import { fail } from '@/lib/errors'
import type { Scope } from '@/lib/contract/key-operations'
import type { OperationName } from '@/lib/contract/operations'
import type { Caller } from './caller'
import { includesRole, type Role } from './roles'

/** role: the least role of a signed-in person. scope: what a key needs; null where a key can never call. */
export interface Permission {
  readonly role: Role
  readonly scope: Scope | null
}

/** The one permission table. An operation without a row does not compile. */
export const PERMISSIONS = {
  listModels: { role: 'reader', scope: 'catalog:read' },
  createModel: { role: 'engineer', scope: 'catalog:write' },
  checkImport: { role: 'engineer', scope: 'catalog:write' },
  getModel: { role: 'reader', scope: 'catalog:read' },
  editModel: { role: 'engineer', scope: 'catalog:write' },
  archiveModel: { role: 'administrator', scope: null },
  listRevisions: { role: 'reader', scope: 'catalog:read' },
  createRevision: { role: 'engineer', scope: 'catalog:write' },
  getRevision: { role: 'reader', scope: 'catalog:read' },
  getSource: { role: 'reader', scope: 'catalog:read' },
  getMesh: { role: 'reader', scope: 'catalog:read' },
  exportModel: { role: 'reader', scope: 'catalog:read' },
  listUses: { role: 'reader', scope: 'catalog:read' },
  getFindings: { role: 'reader', scope: 'catalog:read' },
  // What each change of status needs beyond this stands in lib/catalog/transition-table.ts.
  transitionRevision: { role: 'engineer', scope: null },
  forwardKinematics: { role: 'reader', scope: 'compute' },
  jacobian: { role: 'reader', scope: 'compute' },
  nullSpace: { role: 'reader', scope: 'compute' },
  jointRates: { role: 'reader', scope: 'compute' },
  inverseKinematics: { role: 'reader', scope: 'compute' },
  compareRevisions: { role: 'reader', scope: 'catalog:read' },
  getCheckVectors: { role: 'reader', scope: 'catalog:read' },
  listReferencePoses: { role: 'reader', scope: 'catalog:read' },
  addReferencePoses: { role: 'engineer', scope: 'catalog:write' },
  checkReferencePoses: { role: 'engineer', scope: 'catalog:write' },
  getReferencePoses: { role: 'reader', scope: 'catalog:read' },
  listKeys: { role: 'administrator', scope: null },
  createKey: { role: 'administrator', scope: null },
  getKey: { role: 'administrator', scope: null },
  editKey: { role: 'administrator', scope: null },
  revokeKey: { role: 'administrator', scope: null },
} as const satisfies Record<OperationName, Permission>

/** Whether the caller may call the operation at all. */
export function may(caller: Caller, name: OperationName): boolean {
  const { role, scope }: Permission = PERMISSIONS[name]
  return caller.kind === 'person' ? includesRole(caller.role, role) : scope !== null && caller.scopes.includes(scope)
}

/** Fails with scope-missing, session-only or role-missing unless the caller may call the operation. */
export function permit(caller: Caller, name: OperationName): void {
  if (may(caller, name)) return
  const { role, scope }: Permission = PERMISSIONS[name]
  if (caller.kind === 'person') fail('role-missing', `This needs the role ${role} or a higher one; yours is ${caller.role}.`)
  if (scope === null) fail('session-only')
  fail('scope-missing', `This needs a key with the scope ${scope}; this key has ${caller.scopes.join(', ')}.`)
}
