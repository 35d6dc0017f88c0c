import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { UsedByPanel } from '@/components/sheet/used-by-panel'

const USE = { key: { label: 'Cell 4 gateway', prefix: 'elb_4fXk02MzQ8aT', state: 'active' }, revision: 3, lastUsedAt: '2026-06-01T08:00:00.000Z' } as const

describe('UsedByPanel', () => {
  it('names each key with its revision, and says when the key no longer opens anything', () => {
    const text = renderToStaticMarkup(<UsedByPanel uses={[USE, { ...USE, key: { ...USE.key, label: 'Old script', state: 'revoked' }, revision: 1 }]} hasMore={false} />)
    expect(text).toMatch(/3<.*Cell 4 gateway.*1<.*Old script.*revoked/)
    expect(text).not.toContain('more are in the API')
  })

  it('says that nobody has called the model', () => {
    expect(renderToStaticMarkup(<UsedByPanel uses={[]} hasMore={false} />)).toContain('No key has called this model yet.')
  })
})
