import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { Operation } from '@/lib/contract/operation'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'
import { fill, type Fields, type Headers, type Sent } from './send'

export const sample = (file: string): Buffer => readFileSync(path.resolve(import.meta.dirname, '../../samples', file))

/** Things of the demo scenario that a path may name; a key is made by whoever needs one. */
export const PLACES: Fields = { team: 'tarnholm', model: 'skerry-7', revision: '1', set: '1', key: 'neverWas0000' }

/** Text fields of multipart bodies. */
const FORM_FIELDS: Fields = { name: 'Walked' }

const isRequired = (schema: unknown) => !(schema as { safeParse(value: unknown): { success: boolean } }).safeParse(undefined).success

/** The required text fields of a multipart body. */
function requiredFields(form: NonNullable<Operation['form']>): Fields {
  const names = Object.keys(form.shape).filter((name) => isRequired(form.shape[name]))
  return Object.fromEntries(names.map((name) => [name, FORM_FIELDS[name] ?? 'example']))
}

/** All operations of the contract by name, as the tests walk them. */
export const ALL_OPERATIONS = Object.entries(OPERATIONS) as [OperationName, Operation][]

/** The request that a declaration shows: its path at `places`, its example, or a multipart body with a file. */
export function exampleRequest(operation: Operation, headers: Headers, places: Fields = PLACES, file = 'flawed-error.urdf'): Sent {
  return {
    method: operation.method,
    path: fill(operation.path, places),
    headers,
    ...(operation.body === undefined ? {} : { json: operation.example }),
    ...(operation.form === undefined ? {} : { form: { fields: requiredFields(operation.form), file: { name: file, bytes: sample(file) } } }),
  }
}
