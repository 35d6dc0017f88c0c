import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { AXIS, joint, links, parse, robot } from './urdf-text'

interface Drawn {
  readonly type?: string
  readonly xyz?: string
  readonly rpy?: string
  readonly lower?: number
  readonly upper?: number
  readonly velocity?: number
  /** Index of the link that carries it; the one before when left out. */
  readonly on?: number
}

/** A robot with these joints, each on the one before. */
const chain = (...joints: Drawn[]): string =>
  robot(
    links(...['l0', ...joints.map((_, i) => `l${i + 1}`)]) +
      joints
        .map(({ type = 'revolute', xyz = '0 0 0', rpy = '0 0 0', lower = -1, upper = 1, velocity = 2, on }, i) =>
          joint(`j${i}`, `l${on ?? i}`, `l${i + 1}`, `<origin xyz="${xyz}" rpy="${rpy}"/>${AXIS}<limit lower="${lower}" upper="${upper}" effort="1" velocity="${velocity}"/>`, type),
        )
        .join(''),
  )

const suspects = (text: string) => parse(text).findings.filter(({ rule }) => rule === 'unit-suspect')

const SUSPECT: readonly (readonly [string, RegExp, string])[] = [
  ['an arm whose limits are in degrees', /^2 joints have limits such as 170/, chain({ lower: -170, upper: 170 }, { lower: -90, upper: 120 }, {})],
  ['an rpy of 180', /^A joint has rpy beyond 10 rad, here 180/, chain({}, { rpy: '0 0 180' })],
  ['an arm whose placements are in millimetres', /^3 joints have origins further than 30 m/, chain({ xyz: '0 0 89.2' }, { xyz: '0 0 425' }, { xyz: '0 0 392' }, { xyz: '0 0 82' })],
  ['a slide of 500 at 250', /^A joint has a stroke such as 500 and a rate such as 250/, chain({ type: 'prismatic', lower: 0, upper: 500, velocity: 250 })],
]

const PLAIN: readonly (readonly [string, string])[] = [
  ['a gantry of 60 m', chain({ type: 'prismatic', lower: 0, upper: 60, velocity: 3 }, { type: 'prismatic', lower: 0, upper: 24, velocity: 2, xyz: '0 0 18' }, { xyz: '0 0 -12' })],
  ['a gripper of millimetres', chain({ type: 'prismatic', lower: 0, upper: 0.004, velocity: 0.05, xyz: '0 0.002 0.01' }, { xyz: '0 0 0.0005' })],
  ['a robot far from the origin of its site', chain({ type: 'fixed', xyz: '812 344 0' }, { xyz: '0 0 0.4' }, { xyz: '0 0 0.5' })],
  ['stations spread over a site', chain(...[80, 120, 200, 310].map((x) => ({ type: 'fixed', xyz: `${x} 0 0`, on: 0 })))],
  ['one drum of 120 rad among ordinary joints', chain({ lower: -120, upper: 120 }, {}, {})],
  ['two drums among five joints', chain({ lower: -50, upper: 50 }, { lower: -50, upper: 50 }, {}, {}, {})],
  ['no limit written as 1e4 or 1e16', chain({ lower: -1e4, upper: 1e4 }, { lower: -1e16, upper: 1e16 }, { type: 'prismatic', lower: -1e9, upper: 1e9, velocity: 100 })],
  ['rotations by whole turns in radians', chain({ rpy: '0 0 12.566370614359172' }, { rpy: '-9.42477796 0 0' })],
  ['a fast short slide', chain({ type: 'prismatic', lower: 0, upper: 0.3, velocity: 25 })],
]

describe('values that look like degrees or millimetres', () => {
  it.each(SUSPECT)('are met in %s, once', (_what, message, text) => {
    const found = suspects(text)
    expect(found.map(({ severity }) => severity)).toEqual(['warning'])
    expect(found[0]!.message).toMatch(message)
  })

  it.each(PLAIN)('are not met in %s', (_what, text) => {
    expect(suspects(text)).toEqual([])
  })

  it('are reported once for each kind in a file that has several', () => {
    const joints = [1, 2, 3, 4].map(() => ({ xyz: '0 0 120', rpy: '90 0 0', lower: -170, upper: 170 }))
    expect(suspects(chain(...joints)).map(({ message }) => /limits|rpy|origins/.exec(message)![0]).sort()).toEqual(['limits', 'origins', 'rpy'])
  })

  it('are not met in any sample', () => {
    const files = readdirSync('samples').filter((file) => file.endsWith('.urdf'))
    expect(files.length).toBeGreaterThan(5)
    for (const file of files) expect(parseUrdf(readFileSync(`samples/${file}`)).findings.filter(({ rule }) => rule === 'unit-suspect')).toEqual([])
  })
})
