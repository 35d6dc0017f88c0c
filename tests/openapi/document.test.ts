import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import type { Operation } from '@/lib/contract/operation'
import { OPERATIONS } from '@/lib/contract/operations'
import { RESERVED_SLUGS } from '@/lib/contract/scalars'
import { buildDocument } from '@/openapi/document'

interface Described {
  readonly operationId: string
  readonly summary: string
  readonly description: string
  readonly tags: readonly string[]
  readonly security: readonly object[]
  readonly parameters: readonly { readonly name: string; readonly in: string; readonly required?: boolean; readonly schema: object }[]
  readonly requestBody?: { readonly required: boolean; readonly content: Record<string, { readonly schema: object; readonly example?: unknown }> }
  readonly responses: Record<string, { readonly description: string; readonly content?: Record<string, { readonly schema: object }> }>
}

const document = JSON.parse(JSON.stringify(buildDocument())) as {
  openapi: string
  paths: Record<string, Record<string, Described>>
  components: { schemas: Record<string, object>; securitySchemes: Record<string, object> }
  tags: { name: string }[]
}

const described = Object.entries(document.paths).flatMap(([at, methods]) => Object.entries(methods).map(([method, operation]) => ({ at, method, operation })))

/** Every value under a key of this name, wherever it stands. */
function everywhere(value: unknown, key: string): unknown[] {
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([name, inner]) => [...(name === key ? [inner] : []), ...everywhere(inner, key)])
}

describe('the committed OpenAPI document', () => {
  it('is what the contract builds; `npm run openapi` writes it', () => {
    const file = readFileSync(path.resolve(import.meta.dirname, '../../openapi/openapi.json'), 'utf8')
    expect(JSON.parse(file)).toEqual(document)
  })

  it('is version 3.1 and describes each operation of the contract once', () => {
    expect(document.openapi).toMatch(/^3\.1\./)
    expect(described.map(({ operation }) => operation.operationId).sort()).toEqual(Object.keys(OPERATIONS).sort())
    for (const { at, method, operation } of described) {
      const { path: declared, method: verb } = OPERATIONS[operation.operationId as keyof typeof OPERATIONS]
      expect([at, method]).toEqual([declared, verb.toLowerCase()])
    }
  })

  it('points nowhere that is not there', () => {
    const references = everywhere(document, '$ref') as string[]
    expect(references.length).toBeGreaterThan(20)
    for (const reference of references) {
      const target = reference.replace(/^#\//, '').split('/').reduce<unknown>((inner, part) => (inner as Record<string, unknown> | undefined)?.[part], document)
      expect(target, reference).toBeTypeOf('object')
    }
    const schemes = Object.keys(document.components.securitySchemes)
    for (const { operation } of described) for (const name of operation.security.flatMap(Object.keys)) expect(schemes).toContain(name)
    const tags = document.tags.map(({ name }) => name)
    for (const { operation } of described) expect(tags).toEqual(expect.arrayContaining([...operation.tags]))
  })

  it('declares every parameter of every path, as required', () => {
    for (const { at, operation } of described) {
      const inPath = operation.parameters.filter((parameter) => parameter.in === 'path')
      expect(inPath.map(({ name }) => `{${name}}`), at).toEqual(at.match(/\{\w+\}/g))
      expect(inPath.every(({ required }) => required === true)).toBe(true)
      expect(operation.parameters.filter(({ name, in: place }) => place === 'header' && ['accept', 'content-type', 'authorization'].includes(name.toLowerCase()))).toEqual([])
    }
  })

  it('says in words what each operation is and who may call it, and describes every response', () => {
    for (const { operation } of described) {
      expect(operation.summary).toMatch(/^[A-Z].*[^.]$/)
      expect(operation.description).toMatch(/Session: (reader|engineer|approver|administrator) or above\. Key: /)
      const statuses = Object.keys(operation.responses)
      expect(statuses).toEqual(expect.arrayContaining(['401', '403', '404', '406', '422', '500']))
      for (const [status, { description, content }] of Object.entries(operation.responses)) {
        expect(description).not.toBe('')
        if (Number(status) >= 400) expect(Object.keys(content!)).toEqual(['application/problem+json'])
      }
    }
  })

  it('forbids unknown fields in every body and query that it describes', () => {
    for (const { operation } of described) {
      for (const [mediaType, { schema }] of Object.entries(operation.requestBody?.content ?? {})) {
        if (mediaType === 'application/octet-stream') continue
        const { $ref, ...inline } = schema as { $ref?: string; additionalProperties?: boolean }
        const whole = $ref === undefined ? inline : (document.components.schemas[$ref.split('/').at(-1)!] as typeof inline)
        expect(whole.additionalProperties, operation.operationId).toBe(false)
      }
    }
  })

  it('offers records in and out, with their fields, exactly where the contract does', () => {
    for (const { operation } of described) {
      const { records } = (OPERATIONS as Record<string, Operation>)[operation.operationId]!
      const isOffered = records !== undefined
      expect(Object.keys(operation.requestBody?.content ?? {}).includes('application/octet-stream'), operation.operationId).toBe(isOffered)
      const { content = {}, headers = {} } = (operation.responses['200'] ?? {}) as { content?: object; headers?: object }
      expect('text/csv' in content && 'application/octet-stream' in content && 'Record-Layout' in headers).toBe(isOffered)
      const question = operation.parameters.find(({ name }) => name === 'question') as { description?: string } | undefined
      for (const field of Object.keys(records?.question.shape ?? {})) expect(question?.description).toContain(field)
      expect(question !== undefined).toBe(isOffered)
    }
  })
})

describe('the examples', () => {
  const withExample = Object.entries(OPERATIONS as Record<string, Operation>).filter(([, { body }]) => body !== undefined)

  it.each(withExample)('of %s fits its own schema and stands in the document', (name, { body, example }) => {
    expect(body!.safeParse(example).error).toBeUndefined()
    const { operation } = described.find((other) => other.operation.operationId === name)!
    expect(operation.requestBody!.content['application/json']!.example).toEqual(example)
  })

  it('use no reserved word as a slug', () => {
    for (const { operation } of described) {
      for (const { name, schema } of operation.parameters) {
        const { example } = schema as { example?: string }
        if (name === 'model' || name === 'team') expect(RESERVED_SLUGS).not.toContain(example)
      }
    }
  })
})
