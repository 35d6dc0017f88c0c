import { describe, expect, it } from 'vitest'
import { jointRowsOf, rowsOfChain } from '@/components/sheet/joint-rows'
import { rangeSpan } from '@/components/sheet/range-span'
import type { Finding, Joint } from '@/lib/contract/description'

const chainJoint = { name: 'wrist', type: 'revolute', lower: -1, upper: 1, rate: 2 } as const
const finding = (severity: Finding['severity'], rule: string, element?: string): Finding => ({ rule, severity, message: 'm', remedy: 'r', line: 1, column: 1, ...(element === undefined ? {} : { element }) })

describe('rowsOfChain', () => {
  it('puts each warning at the joint that it names, once, and no note', () => {
    const findings = [
      finding('warning', 'axis-normalised', "joint 'wrist'"),
      finding('warning', 'axis-normalised', "joint 'wrist'"),
      finding('warning', 'axis-normalised', "joint 'elbow'"),
      finding('warning', 'mesh-missing'),
      finding('note', 'name-unusual', "joint 'wrist'"),
    ]
    expect(rowsOfChain([chainJoint], findings)[0]!.warnings).toEqual(['axis-normalised'])
  })
})

describe('jointRowsOf', () => {
  it('keeps the order asked for, and takes a limit that is left out as none', () => {
    const origin = { position: [0, 0, 0], quaternion: [0, 0, 0, 1] }
    const declared: Joint[] = [
      { name: 'a', type: 'continuous', parent: 'x', child: 'y', origin, rate: null },
      { name: 'b', type: 'prismatic', parent: 'y', child: 'z', origin, lower: 0, upper: 1, rate: 0.5 },
    ]
    expect(jointRowsOf(declared, ['b', 'a', 'gone'])).toEqual([
      { name: 'b', type: 'prismatic', lower: 0, upper: 1, rate: 0.5, warnings: [] },
      { name: 'a', type: 'continuous', lower: null, upper: null, rate: null, warnings: [] },
    ])
  })
})

describe('rangeSpan', () => {
  it('places an angle within one turn', () => {
    const span = rangeSpan({ type: 'revolute', lower: -Math.PI / 2, upper: Math.PI / 2 })!
    expect([span.from, span.to, span.place(0)]).toEqual([0.25, 0.75, 0.5])
  })

  it('holds a range beyond a turn, and a value beyond the range, at the ends of the bar', () => {
    const span = rangeSpan({ type: 'revolute', lower: -10, upper: 10 })!
    expect([span.from, span.to, span.place(99)]).toEqual([0, 1, 1])
  })

  it('has zero within the bar of a slide, and copes with a slide that cannot move', () => {
    const span = rangeSpan({ type: 'prismatic', lower: 1, upper: 3 })!
    expect([span.from, span.to]).toEqual([1 / 3, 1])
    expect(rangeSpan({ type: 'prismatic', lower: 0, upper: 0 })!.place(0)).toBe(0.5)
  })

  it('is none where a bound is missing', () => {
    expect(rangeSpan({ type: 'continuous', lower: null, upper: null })).toBeNull()
    expect(rangeSpan({ type: 'prismatic', lower: 0, upper: null })).toBeNull()
  })
})
