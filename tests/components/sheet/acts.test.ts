import { describe, expect, it } from 'vitest'
import { actsOf } from '@/components/sheet/acts'
import type { Status } from '@/lib/contract/scalars'

const entry = (status: Status, by: string) => ({ status, by, at: '2026-12-01T10:00:00.000Z' })

describe('actsOf', () => {
  it('names who submitted and who released', () => {
    const { submitted, released } = actsOf([entry('draft', 'Ines'), entry('in-review', 'Ines'), entry('released', 'Tomas'), entry('superseded', 'Tomas')])
    expect([submitted?.by, released?.by]).toEqual(['Ines', 'Tomas'])
  })

  it('forgets a submission that was sent back, and knows the next one', () => {
    const history = [entry('draft', 'Ines'), entry('in-review', 'Ines'), entry('draft', 'Tomas')]
    expect(actsOf(history).submitted).toBeUndefined()
    expect(actsOf([...history, entry('in-review', 'Mira')]).submitted?.by).toBe('Mira')
  })
})
