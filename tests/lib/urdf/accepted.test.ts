import { describe, expect, it } from 'vitest'
import { compileChain } from '@/lib/urdf/compile-chain'
import { defaultChain, listChains } from '@/lib/urdf/default-chain'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { AXIS, described, joint, LIMIT, links, parse, robot, rulesOf, turning } from './urdf-text'

const NAMES = ['a/b', 'tool flange', 'arm.1', 'Gelenk-ä', '关节', '🤖', '__proto__', 'constructor', 'hasOwnProperty', 'toString', 'prototype', '1', '-', 'a&amp;b', '#text', ':@']

describe('parseUrdf accepts without an error', () => {
  it.each(NAMES)('the name %s for a link, a joint and a leader', (name) => {
    const text = robot(
      `<link name="base"/><link name="${name}"/><link name="second"/>` +
        joint(name, 'base', name, AXIS + LIMIT, 'revolute') +
        joint('follower', name, 'second', `${AXIS}${LIMIT}<mimic joint="${name}"/>`, 'revolute'),
    )
    const { description, findings } = parse(text)
    expect(rulesOf(findings)).toEqual(/^[\w-]+$/.test(name) ? [] : ['name-unusual'])
    const plain = name.replace('&amp;', '&')
    expect(description!.links.map((link) => link.name)).toEqual(['base', plain, 'second'])
    const chain = compileChain(description!)
    expect(chain.joints.map((each) => each.name)).toEqual([plain])
    expect(chain.motions.map(({ name: each, link }) => [each, link])).toEqual([[plain, plain], ['follower', 'second']])
    expect(fingerprint(description!)).toMatch(/^[0-9a-f]{64}$/)
  })

  it.each(NAMES.filter((name) => /^[\w-]+$/.test(name) && !/^[\d-]/.test(name)))('an unknown element and attribute called %s', (name) => {
    expect(rulesOf(parse(robot(`${links('a')}<${name} ${name}="${name}"><${name}/></${name}>`)).findings)).toEqual(['unknown-element'])
  })

  it('a link and a joint with the same name', () => {
    expect(parse(robot(links('base', 'arm') + joint('arm', 'base', 'arm'))).findings).toEqual([])
  })

  it('links and joints nested inside transmission or gazebo, which do not count', () => {
    const { description, findings } = parse(
      robot(`${links('a', 'b')}${joint('j', 'a', 'b')}<transmission name="t"><joint name="j"><hardwareInterface>x</hardwareInterface></joint></transmission>
        <gazebo reference="a"><link name="a"/><joint name="other" type="fancy"/></gazebo>`),
    )
    expect(rulesOf(findings)).toEqual(['unknown-element', 'unknown-element'])
    expect([description!.links.length, description!.joints.length]).toEqual([2, 1])
  })

  it('repeated, leading and trailing blanks, tabs and newlines in vectors', () => {
    const { description, findings } = parse(turning(`<origin xyz="  1\t2\n 3 " rpy="\r\n0.1  0.2\r\n0.3"/><axis xyz=" 0 0   1 "/>${LIMIT}`))
    expect(findings).toEqual([])
    expect(description!.joints[0]!.origin).toEqual({ xyz: [1, 2, 3], rpy: [0.1, 0.2, 0.3] })
  })

  it('every way of writing a number that XML Schema has', () => {
    const { description, findings } = parse(turning(`<origin xyz="+1. .5 -2.5E-1" rpy="1e0 00.5 -0"/>${AXIS}${LIMIT}`))
    expect(findings).toEqual([])
    expect(description!.joints[0]!.origin).toEqual({ xyz: [1, 0.5, -0.25], rpy: [1, 0.5, 0] })
  })

  it('line ends of all systems, which change nothing', () => {
    const text = `<robot name="r">\n${links('a', 'b')}\n${joint('j', 'a', 'b', `\n<origin\n xyz="1\n2 3"/>${AXIS}${LIMIT}`, 'revolute')}\n</robot>\n`
    const plain = fingerprint(described(text))
    for (const end of ['\r\n', '\r']) expect(fingerprint(described(text.replaceAll('\n', end)))).toBe(plain)
  })

  it('comments, processing instructions and CDATA anywhere, whatever they hold', () => {
    const aside = `<!-- <link name="x"/> it's "so" & > --><?step it's <link> "so?>`
    const text = `<?xml version='1.0' encoding='utf-8' standalone='yes'?>${aside}<robot name="r">${aside}<link name="a">${aside}</link>
      <note>it's <![CDATA[<link name="y"/> ]] & ]]></note>${aside}</robot>${aside}\n`
    const { description, findings } = parse(text)
    expect(rulesOf(findings)).toEqual(['unknown-element'])
    expect(description!.links.map(({ name }) => name)).toEqual(['a'])
  })

  it('the namespace of xacro on an expanded file', () => {
    expect(parse(robot(links('a'), ' xmlns:xacro="http://www.ros.org/wiki/xacro"')).findings).toEqual([])
  })

  it('safety_controller, calibration and dynamics, which do not enter', () => {
    const extras = '<safety_controller k_velocity="10" soft_lower_limit="0" soft_upper_limit="0"/><calibration rising="0.3"/><dynamics damping="x"/>'
    expect(parse(turning(AXIS + LIMIT + extras)).findings).toEqual([])
    expect(fingerprint(described(turning(AXIS + LIMIT + extras)))).toBe(fingerprint(described(turning(AXIS + LIMIT))))
  })

  it('a movable joint without axis, with the warning that x is used', () => {
    const { description, findings } = parse(turning(LIMIT))
    expect(rulesOf(findings)).toEqual(['axis-defaulted'])
    expect(description!.joints[0]!.axis).toEqual([1, 0, 0])
  })

  it('a link with a material that is not defined, and one with nothing in it', () => {
    expect(parse(robot('<link name="a"><visual><geometry><box size="1 1 1"/></geometry><material name="ghost"/></visual></link>')).findings).toEqual([])
  })

  it('meshes that are not in the upload, whatever their path, with warnings', () => {
    const names = ['package://x/y.stl', 'file:///etc/passwd', '/abs/y.dae', '../../y.obj', 'http://host.example/y.glb', 'y ${a}.stl', '']
    const text = robot(`<link name="a">${names.map((name) => `<visual><geometry><mesh filename="${name}"/></geometry></visual>`).join('')}</link>`)
    const { description, findings } = parse(text)
    expect(rulesOf(findings)).toEqual(['mesh-missing', 'mesh-outside', 'mesh-outside', 'mesh-outside', 'mesh-outside', 'xacro-leftover', 'mesh-missing'])
    expect(description!.links[0]!.meshes).toEqual(names.slice(0, -1))
  })

  it('limits beyond a turn and limits of 1e16, with a note', () => {
    const { description, findings } = parse(turning(`${AXIS}<limit lower="-12.6" upper="1e16" velocity="3"/>`))
    expect(rulesOf(findings)).toEqual(['range-beyond-turn'])
    expect(description!.joints[0]).toMatchObject({ lower: -12.6, upper: 1e16 })
  })

  it.each(['0', '-1', '-0'])('%s as an unknown rate', (rate) => {
    const { description, findings } = parse(turning(`${AXIS}<limit lower="-1" upper="1" velocity="${rate}"/>`))
    expect(rulesOf(findings)).toEqual(['rate-limit-unknown'])
    expect(description!.joints[0]!.rate).toBeNull()
  })

  it('a fixed joint with axis, limit and mimic, all of which are ignored', () => {
    const text = turning('<axis xyz="0 0 0"/><limit lower="nan" upper="x"/><mimic joint="ghost"/>', '', 'fixed')
    const { description, findings } = parse(text)
    expect(findings).toEqual([])
    expect(description!.joints[0]).toMatchObject({ axis: [0, 0, 0], lower: null, upper: null, rate: null, effort: null, mimic: null })
  })

  it('bounds left out, as 0 in versions 1.0 and 1.1 and as unbounded in version 1.2', () => {
    const bounds = (version: string, limit: string) => {
      const { lower, upper } = described(turning(AXIS + limit, version)).joints[0]!
      return [lower, upper]
    }
    expect(bounds('', '<limit velocity="1"/>')).toEqual([0, 0])
    expect(bounds(' version="1.1"', '<limit velocity="1" upper="2"/>')).toEqual([0, 2])
    expect(bounds(' version="1.2"', '<limit velocity="1" upper="2"/>')).toEqual([null, 2])
    expect(bounds(' version="1.2"', '')).toEqual([null, null])
  })

  it('what versions 1.1 and 1.2 add', () => {
    const text = turning(
      `<origin xyz="0 0 1" quat_xyzw="0 0 0.6 0.8"/>${AXIS}<limit lower="-1" upper="1" effort="4" velocity="2" acceleration="3" deceleration="4" jerk="5"/>`,
      ' version="1.2"',
    )
    const { description, findings } = parse(text)
    expect(findings).toEqual([])
    expect(description!.version).toBe('1.2')
    expect(description!.joints[0]).toMatchObject({
      origin: { xyz: [0, 0, 1], quaternion: [0, 0, 0.6, 0.8] }, effort: 4, acceleration: 3, deceleration: 4, jerk: 5,
    })
  })

  it('a single link', () => {
    const description = described(robot(links('only')))
    expect(defaultChain(description)).toEqual({ base: 'only', tip: 'only' })
    expect(compileChain(description)).toMatchObject({ joints: [], motions: [] })
  })

  it('a chain of 5 000 links', () => {
    const names = Array.from({ length: 5000 }, (_, i) => `l${i}`)
    const joints = names.slice(1).map((name, i) => joint(`j${i}`, names[i]!, name, AXIS + LIMIT, 'revolute'))
    const { description, findings } = parse(robot(links(...names) + joints.reverse().join('')))
    expect(findings).toEqual([])
    expect(compileChain(description!).joints).toHaveLength(4999)
    expect(listChains(description!).map(({ joints: listed }) => listed.length)).toEqual([4999])
    expect(fingerprint(description!)).toMatch(/^[0-9a-f]{64}$/)
  })

  it('a tree of 2 000 leaves', () => {
    const names = Array.from({ length: 2000 }, (_, i) => `l${i}`)
    const { description, findings } = parse(robot(links('base', ...names) + names.map((name) => joint(name, 'base', name, AXIS + LIMIT, 'revolute')).join('')))
    expect(findings).toEqual([])
    expect(listChains(description!)).toHaveLength(2000)
    expect(defaultChain(description!)).toEqual({ base: 'base', tip: 'l0' })
  })
})
