import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { Operation } from '@/lib/contract/operation'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'
import { fill, type Fields, type Headers, type Sent } from './send'

export const sample = (file: string): Buffer => readFileSync(path.resolve(import.meta.dirname, '../../samples', file))

/** Things of the demo scenario that a path may name; a key is made by whoever needs one. */
export const PLACES: Fields = { team: 'tarnholm', model: 'skerry-7', revision: '1', set: '1', path: 'meshes/base.stl', key: 'neverWas0000' }

/** Stored by the set-up of these tests, because the demo scenario has no archive: what a path to a mesh needs of `PLACES`. */
export const WALKED_ARCHIVE = 'walked-archive'

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
    path: fill(operation.path, operation.path.includes('{path}') && places.model === PLACES.model ? { ...places, model: WALKED_ARCHIVE } : places),
    headers,
    ...(operation.body === undefined ? {} : { json: operation.example }),
    ...(operation.form === undefined ? {} : { form: { fields: requiredFields(operation.form), file: { name: file, bytes: sample(file) } } }),
  }
}
