import { describe, expect, it } from 'vitest'
import { fieldOf, Refusal, refusalFrom, sentenceOf } from '@/components/api/refusal'

const problem = (members: object): string => JSON.stringify({ type: '/docs/problems/same-content', title: 'T', status: 409, detail: 'A sentence.', instance: '/x', requestId: 'r1', ...members })

describe('refusalFrom', () => {
  it('takes code, sentence, faults and extension members out of a problem', () => {
    const refusal = refusalFrom(409, problem({ twin: 3, errors: [{ pointer: '/form/name', detail: 'give a name' }] }))
    expect(refusal).toMatchObject({ code: 'same-content', message: 'A sentence.', status: 409, faults: [{ pointer: '/form/name', detail: 'give a name' }] })
    expect(refusal.members.twin).toBe(3)
  })

  it('names the request where the service itself failed, so that it can be looked up', () => {
    expect(refusalFrom(500, problem({})).message).toContain('r1')
    expect(refusalFrom(409, problem({})).message).not.toContain('r1')
  })

  it('says the status where the answer is no problem document', () => {
    for (const text of ['<html>', '', '[]', '{}', 'null']) {
      const refusal = refusalFrom(502, text)
      expect(refusal.code).toBe('unreadable')
      expect(refusal.message).toContain('502')
    }
  })

  it('gives an empty list of findings where a problem has none', () => {
    expect(refusalFrom(409, problem({})).findings).toEqual([])
    expect(refusalFrom(422, problem({ findings: [{ rule: 'cycle' }] })).findings).toHaveLength(1)
  })
})

describe('fieldOf', () => {
  it.each([
    ['/form/name', 'name'],
    ['/label', 'label'],
    ['/scopes/2', 'scopes'],
    ['#/query/limit', 'limit'],
    ['', ''],
  ])('reads %j as the field %j', (pointer, field) => expect(fieldOf({ pointer, detail: '' })).toBe(field))
})

describe('sentenceOf', () => {
  it('says nothing of the inside of an unexpected fault', () => {
    expect(sentenceOf(new TypeError('x.y is not a function'))).not.toContain('x.y')
    expect(sentenceOf(new Refusal('stale', 'It changed.'))).toBe('It changed.')
  })
})
