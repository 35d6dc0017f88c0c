import { CATALOG_OPERATIONS } from './catalog-operations'
import { EVIDENCE_OPERATIONS } from './evidence-operations'
import { KEY_OPERATIONS } from './key-operations'
import { KINEMATIC_OPERATIONS } from './kinematic-operations'
import type { Operation } from './operation'

/** Every operation of the contract. */
export const OPERATIONS = { ...CATALOG_OPERATIONS, ...KINEMATIC_OPERATIONS, ...EVIDENCE_OPERATIONS, ...KEY_OPERATIONS } as const satisfies Record<string, Operation>

export type Operations = typeof OPERATIONS
export type OperationName = keyof Operations

/** The {parameters} of a path template, as a union of their names. */
export type PathParameters<Path extends string> = Path extends `${string}{${infer Name}}${infer Rest}` ? Name | PathParameters<Rest> : never
