import { describe, expect, it } from 'vitest'
import { addressOf } from '@/components/api/address'

describe('addressOf', () => {
  it('fills path parameters in, escaped, and leaves out what is not set in the query', () => {
    const address = addressOf('listModels', { team: 'a/b c' }, { query: 'x & y', status: undefined, joints: 0, cursor: '' })
    expect(address).toBe('/api/v1/teams/a%2Fb%20c/models?query=x+%26+y&joints=0')
  })

  it('has no question mark without a query', () => {
    expect(addressOf('getKey', { team: 't', key: 'k1' })).toBe('/api/v1/teams/t/keys/k1')
  })
})
