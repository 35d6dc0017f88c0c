import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import type { JointRow } from '@/components/sheet/joint-rows'
import { JointsTable } from '@/components/sheet/joints-table'

const turn: JointRow = { name: 'elbow', type: 'revolute', lower: -Math.PI / 36, upper: Math.PI / 2, rate: null, warnings: [] }
const slide: JointRow = { name: 'quill', type: 'prismatic', lower: 0, upper: 0.18, rate: 1.2, warnings: ['limit-defaulted'] }

describe('JointsTable', () => {
  it('has the unit in the head where all joints share it, and true minus signs', () => {
    const html = renderToStaticMarkup(<JointsTable rows={[turn]} />)
    expect(html).toMatch(/Lower, (<!-- -->)?°/)
    expect(html).toContain('−5.00')
  })

  it('has the unit beside each number where turns and slides stand in one table', () => {
    const html = renderToStaticMarkup(<JointsTable rows={[turn, slide]} />)
    expect(html).not.toMatch(/Lower, /)
    expect(html).toMatch(/180\.0<span[^>]*> mm/)
    expect(html).toMatch(/90\.00<span[^>]*> °/)
  })

  it('says that an unknown rate is unknown, and which joint has a warning', () => {
    const html = renderToStaticMarkup(<JointsTable rows={[turn, slide]} />)
    expect(html).toContain('unknown')
    expect(html).toContain('has a warning: limit-defaulted')
  })

  it('says so where nothing moves', () => expect(renderToStaticMarkup(<JointsTable rows={[]} />)).toContain('Nothing moves'))

  it('keeps a table of thousands small', () => {
    const rows = Array.from({ length: 5000 }, (_, i) => ({ ...turn, name: `j${i}` }))
    const html = renderToStaticMarkup(<JointsTable rows={rows} />)
    expect(html).toContain('aria-rowcount="5001"')
    expect(html.split('<tr').length).toBeLessThan(200)
  })
})
