import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { positionOf } from '@/lib/math/rigid-transform'
import { quaternionOf } from '@/lib/math/quaternion'
import { compileChain } from '@/lib/urdf/compile-chain'
import { defaultChain } from '@/lib/urdf/default-chain'
import type { Description } from '@/lib/urdf/description'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

const read = (name: string) => parseUrdf(readFileSync(`samples/${name}.urdf`))
const accepted = (name: string): Description => read(name).description!

const SKERRY = ['shoulder_pan', 'shoulder_lift', 'upper_roll', 'elbow', 'fore_roll', 'wrist', 'flange_roll']

/** What each sample that imports is. Fingerprints: cross-checked with a Python script that builds the canonical content from the
 *  XML on its own (xml.etree, json, hashlib). */
const SAMPLES: readonly { name: string; base: string; tip: string; joints: readonly string[]; types: string; fingerprint: string }[] = [
  { name: 'trainer-3r', base: 'table', tip: 'tool_point', joints: ['shoulder', 'elbow', 'wrist'], types: 'rrr',
    fingerprint: '2cf550d0f65486cdff4f96791b4b802d165ae7b0dade8317db975e8fd8ac5591' },
  { name: 'gannet-4', base: 'base_link', tip: 'tool_flange', joints: ['swing', 'elbow', 'quill_stroke', 'spindle'], types: 'rrpr',
    fingerprint: 'a49295c189b180c3cf7977918d950ae904918813feb43e5ca68c64c9b44ae207' },
  { name: 'fulmar-6', base: 'base_link', tip: 'tool_flange', joints: ['turret_pan', 'shoulder', 'elbow', 'fore_roll', 'wrist_bend', 'flange_roll'], types: 'rrrrrc',
    fingerprint: '3473f0a44932e3837da561667dca0f615b5efb668827c9982b1f106b46171991' },
  { name: 'skerry-7', base: 'base_link', tip: 'tool_flange', joints: SKERRY, types: 'rrrrrrc',
    fingerprint: 'b52f802512bd0c386f87f07d2bd4850eef46aac59533a8037c076ca5e2668a7e' },
  { name: 'skerry-7-revision-2', base: 'base_link', tip: 'tool_flange', joints: SKERRY, types: 'rrrrrrc',
    fingerprint: 'f0780621fc75405b7e52daaced1dad0db1385be48e68db8b70ef1e8dec2b02c3' },
  { name: 'skerry-7-rail', base: 'rail_bed', tip: 'tool_flange', joints: ['rail', ...SKERRY], types: 'prrrrrrc',
    fingerprint: 'efc694e43945a2447a9ce5034928f10c32786ca7613bb36ac936af33a943b5db' },
  { name: 'flawed-warning', base: 'base_link', tip: 'face_plate', joints: ['turn', 'tilt'], types: 'cr',
    fingerprint: '05ad98598628071a10aed8ec64270f258f2a4d013ee8a2ea95d559e9572d9cff' },
]

const degrees = (...values: number[]): number[] => values.map((value) => (value * Math.PI) / 180)
function tipPose(name: string, q: readonly number[]) {
  const chain = compileChain(accepted(name))
  const work = createWorkspace(chain)
  forwardKinematics(chain, q, work)
  return { position: positionOf(work.baseFromTip), quaternion: quaternionOf(work.baseFromTip) }
}
const near = (values: readonly number[], digits: number) => values.map((value) => expect.closeTo(value, digits))

describe('samples', () => {
  it('are all listed here', () => {
    const files = readdirSync('samples').filter((file) => file.endsWith('.urdf'))
    expect(files.sort()).toEqual([...SAMPLES.map(({ name }) => `${name}.urdf`), 'flawed-error.urdf'].sort())
  })

  it.each(SAMPLES.filter(({ name }) => name !== 'flawed-warning'))('$name imports without a finding', ({ name }) => {
    expect(read(name).findings).toEqual([])
  })

  it.each(SAMPLES)('$name has its default chain, its joints and its fingerprint', ({ name, base, tip, joints, types, fingerprint: expected }) => {
    const description = accepted(name)
    expect(defaultChain(description)).toEqual({ base, tip })
    const chain = compileChain(description)
    expect(chain.joints.map((joint) => joint.name)).toEqual(joints)
    expect(chain.joints.map(({ type }) => type[0]).join('')).toBe(types)
    expect(chain.joints.every(({ rate, type, lower, upper }) => rate !== null && (type === 'continuous') === (lower === null && upper === null))).toBe(true)
    expect(fingerprint(description)).toBe(expected)
  })

  it('flawed-error has one error: a link that is called by another name', () => {
    const { description, findings } = read('flawed-error')
    expect(description).toBeNull()
    expect(findings).toMatchObject([{ rule: 'link-undeclared', severity: 'error', line: 17, column: 18, element: "joint 'tilt'" }])
  })

  it('flawed-warning has one warning: an axis that is not of length 1', () => {
    expect(read('flawed-warning').findings).toMatchObject([{ rule: 'axis-normalised', severity: 'warning', line: 19, column: 16, element: "joint 'tilt'" }])
  })

  it('the two revisions of skerry-7 differ by fractions of a millimetre and one narrowed limit', () => {
    const [first, second] = [accepted('skerry-7'), accepted('skerry-7-revision-2')]
    for (const [index, joint] of first.joints.entries()) {
      const { origin, lower, ...rest } = second.joints[index]!
      const { origin: before, lower: lowerBefore, ...same } = joint
      expect(rest).toEqual(same)
      expect(lower).toBe(joint.name === 'wrist' ? -1.92 : lowerBefore)
      const moved = Math.sqrt(origin.xyz.reduce((sum, part, k) => sum + (part - before.xyz[k]!) ** 2, 0))
      expect(moved).toBeGreaterThan(0)
      expect(moved).toBeLessThan(0.0003)
    }
  })

  it('FK8: skerry-7 is the golden arm (value computed for this project, chain against product of exponentials)', () => {
    const { position, quaternion } = tipPose('skerry-7', degrees(10, 20, 30, 40, 50, 60, 70))
    expect(position).toEqual(near([0.039212607, -0.04363621, 1.025326241], 9))
    expect(quaternion).toEqual(near([-0.124899784, 0.308462036, 0.912865635, 0.236490062], 9))
  })

  it('FK4: trainer-3r follows its closed form', () => {
    expect(tipPose('trainer-3r', degrees(30, 30, 30)).position).toEqual(near([1.3660254038, 2.3660254038, 0], 10))
    const [a, b, c] = [0.4, -1.1, 0.7]
    expect(tipPose('trainer-3r', [a, b, c]).position).toEqual(
      near([Math.cos(a) + Math.cos(a + b) + Math.cos(a + b + c), Math.sin(a) + Math.sin(a + b) + Math.sin(a + b + c), 0], 14),
    )
  })

  it('gannet-4 follows its closed form, its flange looking down', () => {
    const [a, b, down, c] = [0.4, 0.9, 0.12, -0.3]
    const { position, quaternion } = tipPose('gannet-4', [a, b, down, c])
    const reach = (f: (angle: number) => number) => 0.345 * f(a) + 0.28 * f(a + b)
    expect(position).toEqual(near([reach(Math.cos), reach(Math.sin), 0.315 + 0.06 - 0.055 - 0.02 - down], 14))
    // Half a turn about an axis in the plane, which stands at half the sum of the angles.
    expect(quaternion).toEqual(near([Math.cos((a + b + c) / 2), Math.sin((a + b + c) / 2), 0, 0], 14))
  })

  it('fulmar-6 stands at zero as its head says: upper arm upright, forearm and flange along x', () => {
    const { position, quaternion } = tipPose('fulmar-6', [0, 0, 0, 0, 0, 0])
    expect(position).toEqual(near([0.155 + 0.685 + 0.092, 0, 0.415 + 0.64 + 0.115], 14))
    expect(quaternion).toEqual(near([0, Math.SQRT1_2, 0, Math.SQRT1_2], 14))
  })

  it('skerry-7-rail carries the same arm, turned by a quarter and moved by the rail', () => {
    const q = degrees(10, 20, 30, 40, 50, 60, 70)
    const { position: [x, y, z] } = tipPose('skerry-7', q)
    expect(tipPose('skerry-7-rail', [1.3, ...q]).position).toEqual(near([1.3 - y, x, z + 0.22], 14))
  })
})
