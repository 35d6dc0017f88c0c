import { describe, expect, it } from 'vitest'
import { canonicalContent } from '@/lib/urdf/canonical'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { described } from './urdf-text'

const FILE = `<robot name="arm" version="1.0">
  <link name="base"/>
  <link name="upper"><inertial><mass value="2"/></inertial></link>
  <link name="hand"/>
  <link name="jaw"/>
  <joint name="turn" type="revolute">
    <parent link="base"/><child link="upper"/>
    <origin xyz="0 0 0.35" rpy="0 0.1 0"/><axis xyz="0 0 1"/>
    <limit lower="-1" upper="1" effort="5" velocity="2"/>
  </joint>
  <joint name="spin" type="continuous">
    <parent link="upper"/><child link="hand"/>
    <axis xyz="0 0.6 0.8"/><limit effort="5" velocity="2"/>
  </joint>
  <joint name="grip" type="prismatic">
    <parent link="hand"/><child link="jaw"/>
    <axis xyz="1 0 0"/><limit lower="0" upper="0.04" effort="5" velocity="0.1"/>
    <mimic joint="turn" multiplier="0.5" offset="0.01"/>
  </joint>
</robot>`

const edit = (from: string, to: string) => (text: string) => {
  if (!text.includes(from)) throw new Error(`the file has no ${from}`)
  return text.replace(from, to)
}

/** Edits that change nothing that enters the computation. */
const SAME: readonly (readonly [string, (text: string) => string])[] = [
  ['a comment', edit('<link name="base"/>', '<!-- checked --><link name="base"/>')],
  ['formatting', (text) => text.replaceAll(/\n\s*/g, ' ').replaceAll('"', "'")],
  ['line ends', (text) => text.replaceAll('\n', '\r\n')],
  ['the order of links', (text) => text.replace('<link name="base"/>', '').replace('<link name="jaw"/>', '<link name="jaw"/><link name="base"/>')],
  ['the order of joints', (text) => {
    const joints = text.match(/<joint name[\s\S]*?<\/joint>/g)!
    return text.replace(joints[0]!, '').replace('</robot>', `${joints[0]}</robot>`)
  }],
  ['the order of attributes', edit('lower="-1" upper="1"', 'upper="1" lower="-1"')],
  ['the name of the robot', edit('name="arm"', 'name="arm 2"')],
  ['inertia', edit('<mass value="2"/>', '<mass value="3"/>')],
  ['a visual', edit('<link name="hand"/>', '<link name="hand"><visual><geometry><sphere radius="1"/></geometry></visual></link>')],
  ['a mesh', edit('<link name="hand"/>', '<link name="hand"><visual><geometry><mesh filename="x.stl"/></geometry></visual></link>')],
  ['another way to write a number', edit('0 0 0.35', '0.0 -0 3.5e-1')],
  ['a number beyond the digits of binary64', edit('0 0 0.35', '0 0 0.35000000000000000001')],
  ['the length of an axis', edit('0 0.6 0.8', '0 3 4')],
  ['an axis within 1e-13', edit('0 0.6 0.8', '0 0.6000000000001 0.8')],
  ['an origin written out', edit('<axis xyz="0 0.6 0.8"/>', '<origin xyz="0 0 0" rpy="0 0 0"/><axis xyz="0 0.6 0.8"/>')],
  ['the default axis left out', edit('<axis xyz="1 0 0"/>', '')],
  ['a default bound left out', edit('lower="0" upper="0.04"', 'upper="0.04"')],
  ['bounds on a continuous joint', edit('<limit effort="5" velocity="2"/>', '<limit lower="-1" upper="1" effort="5" velocity="2"/>')],
  ['dynamics', edit('<axis xyz="0 0 1"/>', '<axis xyz="0 0 1"/><dynamics damping="1"/>')],
  ['the version, where it changes no default', edit('version="1.0"', 'version="1.2"')],
  ['a vendor element', edit('</robot>', '<gazebo><link name="base"/></gazebo></robot>')],
]

/** Edits of which every one changes what enters the computation. */
const DIFFERENT: readonly (readonly [string, (text: string) => string])[] = [
  ['a position by one unit in the last place', edit('0 0 0.35', '0 0 0.35000000000000003')],
  ['a roll, pitch or yaw', edit('0 0.1 0', '0 0.1000001 0')],
  ['an axis by 1e-11', edit('0 0.6 0.8', '0 0.60000000002 0.8')],
  ['the sign of an axis', edit('0 0 1', '0 0 -1')],
  ['a lower limit', edit('lower="-1"', 'lower="-0.99"')],
  ['an upper limit', edit('upper="1"', 'upper="1.01"')],
  ['a rate', edit('velocity="2"', 'velocity="2.1"')],
  ['a rate that becomes unknown', edit('velocity="2"', 'velocity="0"')],
  ['an effort', edit('effort="5"', 'effort="6"')],
  ['an acceleration', edit('velocity="2"', 'velocity="2" acceleration="3"')],
  ['a deceleration', edit('velocity="2"', 'velocity="2" deceleration="3"')],
  ['a jerk', edit('velocity="2"', 'velocity="2" jerk="3"')],
  ['a type', edit('type="revolute"', 'type="prismatic"')],
  ['a multiplier', edit('multiplier="0.5"', 'multiplier="-0.5"')],
  ['an offset', edit('offset="0.01"', 'offset="0.02"')],
  ['a leader', edit('mimic joint="turn"', 'mimic joint="spin"')],
  ['no mimic', edit('<mimic joint="turn" multiplier="0.5" offset="0.01"/>', '')],
  ['the name of a link', (text) => text.replaceAll('"jaw"', '"claw"')],
  ['the name of a joint', edit('joint name="spin"', 'joint name="roll"')],
  ['a further link', edit('</robot>', '<link name="cam"/><joint name="c" type="fixed"><parent link="hand"/><child link="cam"/></joint></robot>')],
  ['where a joint hangs', edit('<parent link="hand"/>', '<parent link="upper"/>')],
]

describe('fingerprint', () => {
  const plain = fingerprint(described(FILE))

  it.each(SAME)('is not changed by %s', (_what, change) => {
    const text = change(FILE)
    expect(text).not.toBe(FILE)
    expect(fingerprint(described(text))).toBe(plain)
  })

  it.each(DIFFERENT)('is changed by %s', (_what, change) => {
    expect(fingerprint(described(change(FILE)))).not.toBe(plain)
  })

  it('tells every one of these edits from every other', () => {
    const all = DIFFERENT.map(([, change]) => fingerprint(described(change(FILE))))
    expect(new Set([plain, ...all]).size).toBe(DIFFERENT.length + 1)
  })

  it('is the same for an unknown rate however it is written', () => {
    const [missing, ...others] = ['', 'velocity="0"', 'velocity="-1"'].map((rate) => fingerprint(described(FILE.replace('velocity="2"', rate))))
    expect(others).toEqual([missing, missing])
  })

  it('takes in nothing of what a fixed joint ignores', () => {
    const fixed = FILE.replace('type="revolute"', 'type="fixed"')
    const bare = fixed.replace('<axis xyz="0 0 1"/>', '').replace('<limit lower="-1" upper="1" effort="5" velocity="2"/>', '')
    expect(fingerprint(described(fixed))).toBe(fingerprint(described(bare)))
  })

  it('is SHA-256, in lower-case hexadecimal, over the canonical content', () => {
    const content = canonicalContent(described('<robot name="r"><link name="b"/><link name="ä"/><joint name="j" type="fixed"><parent link="b"/><child link="ä"/><origin xyz="1e8 1e-7 -0"/></joint></robot>'))
    expect(content).toBe(
      '{"joints":[{"acceleration":null,"axis":[0,0,0],"child":"ä","deceleration":null,"effort":null,"jerk":null,"lower":null,"mimic":null,"name":"j",' +
        '"origin":{"rpy":[0,0,0],"xyz":[100000000,1e-7,0]},"parent":"b","rate":null,"type":"fixed","upper":null}],"links":["b","ä"]}',
    )
    const description = described('<robot name="r"><link name="b"/></robot>')
    expect(canonicalContent(description)).toBe('{"joints":[],"links":["b"]}')
    // Witness: printf '{"joints":[],"links":["b"]}' | sha256sum
    expect(fingerprint(description)).toBe('e946541471c0494a8ec7ed993a76f51ed3d7f70d9a0ac46fd4c6367f4756dc85')
  })

  it('sorts names by UTF-16 code units (RFC 8785 section 3.2.3)', () => {
    const text = `<robot name="r"><link name="Ａ"/><link name="🤖"/><joint name="j" type="fixed"><parent link="Ａ"/><child link="🤖"/></joint></robot>`
    expect(canonicalContent(described(text))).toContain('"links":["🤖","Ａ"]')
  })
})
