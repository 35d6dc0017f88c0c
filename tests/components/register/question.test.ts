import { describe, expect, it } from 'vitest'
import { questionOf } from '@/components/register/question'
import { CATALOG_OPERATIONS } from '@/lib/contract/catalog-operations'

describe('questionOf', () => {
  it('keeps what is set and trims the search', () => {
    expect(questionOf({ query: '  skerry ', status: 'in-review', joints: '7' })).toEqual({ query: 'skerry', status: 'in-review', joints: 7 })
  })

  it.each([
    {},
    { query: '', status: null, joints: null },
    { query: ['a', 'b'], status: 'gone', joints: 'many' },
    { joints: '-1' },
    { joints: '1.5' },
    { joints: '20000' },
    { joints: '' },
  ])('leaves out what makes no sense: %j', (given) => expect(questionOf(given)).toEqual({}))

  it('is always a question that the contract accepts', () => {
    for (const given of [{ query: 'x'.repeat(999) }, { joints: 0 }, { status: 'withdrawn', query: '%_\\' }]) {
      expect(CATALOG_OPERATIONS.listModels.query.safeParse(questionOf(given)).success).toBe(true)
    }
  })
})
