import { describe, expect, it } from 'vitest'
import { expectProblem, pointersOf } from '../expect-problem'
import { importModel } from '../import-model'
import { twoArms } from '../urdf'
import { answerTo, ask, resultOf, resultsOf } from './ask'
import { expectClose } from './close'

const DEG = { angle: 'deg' }
const SHOP = { length: 'mm', angle: 'deg' }
const ELBOW_UP = [10, -35, 20, 70, -15, 45, 30]
const RAD = (degrees: readonly number[]) => degrees.map((value) => (value * Math.PI) / 180)

describe('the pose of the tip', () => {
  it('is that of the planar closed form (METHODS.md FK4)', async () => {
    const { pose } = await resultOf('forward-kinematics', 'trainer-3r', { units: DEG, configurations: [[30, 30, 30]] })
    expectClose(pose!.position, [1.3660254038, 2.3660254038, 0], 1e-10)
    expectClose(pose!.quaternion, [0, 0, Math.SQRT1_2, Math.SQRT1_2])
  })

  it('is the same in shop units and in SI', async () => {
    const shop = await answerTo('forward-kinematics', 'skerry-7', { units: SHOP, configurations: [ELBOW_UP] })
    const si = await answerTo('forward-kinematics', 'skerry-7', { configurations: [RAD(ELBOW_UP)] })
    expect([shop.units, si.units]).toEqual([SHOP, { length: 'm', angle: 'rad' }])
    expectClose(shop.results[0]!.pose!.position, si.results[0]!.pose!.position.map((m) => m * 1000), 1e-9)
    expectClose(shop.results[0]!.pose!.quaternion, si.results[0]!.pose!.quaternion, 1e-12)
  })

  it('takes a prismatic joint in the length unit', async () => {
    const low = await resultOf('forward-kinematics', 'gannet-4', { units: SHOP, configurations: [[0, 0, 100, 0]] })
    const high = await resultOf('forward-kinematics', 'gannet-4', { configurations: [[0, 0, 0, 0]] })
    expectClose(low.pose!.position[2]!, high.pose!.position[2]! * 1000 - 100, 1e-9)
  })

  it('has the tool applied, its quaternion normalised, its signs canonical', async () => {
    const tool = { position: [500, 0, 0], quaternion: [0, 0, -1.0005, 0] }
    const { pose } = await resultOf('forward-kinematics', 'trainer-3r', { units: SHOP, configurations: [[0, 90, 0]], tool })
    expectClose(pose!.position, [1000, 2500, 0], 1e-9)
    // Turned by 90° of the arm and 180° of the tool: 270°, which is -90°.
    expectClose(pose!.quaternion, [0, 0, -Math.SQRT1_2, Math.SQRT1_2])
  })

  it('refuses a quaternion that is none', async () => {
    for (const quaternion of [[0, 0, 0, 0], [0, 0, 0, 1.0011], [0, 0, 1, 1]]) {
      const response = await ask('forward-kinematics', 'trainer-3r', { configurations: [[0, 0, 0]], tool: { position: [0, 0, 0], quaternion } })
      expectProblem(response, 'invalid-request')
      expect(pointersOf(response)).toEqual(['/tool/quaternion'])
    }
  })

  it('comes with its matrix when asked for', async () => {
    const { pose } = await resultOf('forward-kinematics', 'trainer-3r', { units: SHOP, configurations: [[90, 0, 0]], matrices: true })
    expectClose(pose!.matrix, [[0, -1, 0, 0], [1, 0, 0, 3000], [0, 0, 1, 0], [0, 0, 0, 1]], 1e-9)
    expect(await resultOf('forward-kinematics', 'trainer-3r', { configurations: [[0, 0, 0]] })).not.toHaveProperty('pose.matrix')
  })
})

describe('the chain', () => {
  it('is the default one, or between any two links, named in the reply', async () => {
    const { chain } = await answerTo('forward-kinematics', 'skerry-7', { configurations: [RAD(ELBOW_UP)] })
    expect(chain).toEqual({
      base: 'base_link',
      tip: 'tool_flange',
      joints: ['shoulder_pan', 'shoulder_lift', 'upper_roll', 'elbow', 'fore_roll', 'wrist', 'flange_roll'],
      types: ['revolute', 'revolute', 'revolute', 'revolute', 'revolute', 'revolute', 'continuous'],
    })
    const part = await answerTo('forward-kinematics', 'trainer-3r', { chain: { tip: 'middle_link' }, configurations: [[0, 0]] })
    expect(part.chain).toMatchObject({ base: 'table', joints: ['shoulder', 'elbow'] })
    expectClose(part.results[0]!.pose!.position, [1, 0, 0])
  })

  it('read backwards gives the inverse pose', async () => {
    const q = [0.3, -0.5, 0.7]
    const there = await resultOf('forward-kinematics', 'trainer-3r', { configurations: [q], matrices: true })
    const back = await answerTo('forward-kinematics', 'trainer-3r', { chain: { base: 'tool_point', tip: 'table' }, configurations: [[...q].reverse()], matrices: true })
    expect(back.chain.joints).toEqual(['wrist', 'elbow', 'shoulder'])
    const a = there.pose!.matrix!
    const b = back.results[0]!.pose!.matrix!
    const product = a.map((row) => [0, 1, 2, 3].map((j) => row.reduce((sum, value, k) => sum + value * b[k]![j]!, 0)))
    expectClose(product, [[1, 0, 0, 0], [0, 1, 0, 0], [0, 0, 1, 0], [0, 0, 0, 1]], 1e-12)
  })

  it('may lead from one branch to another', async () => {
    const { model } = await importModel('Branch to branch', twoArms())
    const { chain, results } = await answerTo('forward-kinematics', model.slug, { chain: { base: 'left', tip: 'right_hand' }, configurations: [[0, 0, 0]] })
    expect(chain.joints).toEqual(['left_lift', 'right_lift', 'right_turn'])
    expectClose(results[0]!.pose!.position, [0, 0, 0.1])
  })

  it('may have no joint at all', async () => {
    const { chain, results } = await answerTo('forward-kinematics', 'skerry-7', { chain: { base: 'link_7', tip: 'tool_flange' }, configurations: [[], []] })
    expect(chain.joints).toEqual([])
    expect(results).toHaveLength(2)
    for (const question of ['jacobian', 'null-space'] as const) expect(await resultsOf(question, 'skerry-7', { chain: { tip: 'base_link' }, configurations: [[]] })).toHaveLength(1)
    expect(await resultOf('joint-rates', 'skerry-7', { chain: { tip: 'base_link' }, configurations: [[]], twists: [[1, 0, 0, 0, 0, 0]] })).toMatchObject({ rates: [], rank: 0 })
  })

  it('must be made of links of the revision', async () => {
    for (const chain of [{ tip: 'Tool_flange' }, { base: 'nowhere' }, { base: '', tip: 'tool_flange' }, { tip: 'elbow' }]) {
      expectProblem(await ask('forward-kinematics', 'skerry-7', { chain, configurations: [[0, 0, 0, 0, 0, 0, 0]] }), 'chain-not-found')
    }
  })
})

describe('further links', () => {
  it('are answered in the order asked, with what each depends on', async () => {
    const { links } = await resultOf('forward-kinematics', 'trainer-3r', { units: DEG, configurations: [[90, -90, 0]], links: ['middle_link', 'table', 'upper_link'] })
    expect(links!.map(({ link }) => link)).toEqual(['middle_link', 'table', 'upper_link'])
    expectClose(links!.map(({ pose }) => pose.position), [[0, 1, 0], [0, 0, 0], [0, 0, 0]])
  })

  it('are given without the tool', async () => {
    const tool = { position: [9, 9, 9], quaternion: [0, 0, 0, 1] }
    const { links } = await resultOf('forward-kinematics', 'trainer-3r', { configurations: [[0, 0, 0]], tool, links: ['tool_point'] })
    expectClose(links![0]!.pose.position, [3, 0, 0])
  })

  it('must follow from the configuration', async () => {
    const { model } = await importModel('Link on the other arm', twoArms())
    const response = await ask('forward-kinematics', model.slug, { chain: { tip: 'left' }, configurations: [[0]], links: ['stand', 'right'] })
    expectProblem(response, 'link-not-determined')
    expect(response.body).toMatchObject({ errors: [{ pointer: '/links/1', detail: "depends on 'right_lift'" }] })
  })

  it('must exist', async () => {
    const response = await ask('forward-kinematics', 'trainer-3r', { configurations: [[0, 0, 0]], links: ['table', 'nowhere'] })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/links/1'])
  })
})

describe('limits', () => {
  it('name each joint beyond its range, in the units of the question', async () => {
    const { withinLimits, violations } = await resultOf('forward-kinematics', 'gannet-4', { units: SHOP, configurations: [[0, -150, 171, 0]] })
    expect(withinLimits).toBe(false)
    expect(violations!.map(({ joint }) => joint)).toEqual(['elbow', 'quill_stroke'])
    expectClose(violations!.map(({ value, lower, upper }) => [value, lower!, upper!]), [[-150, (-2.53 * 180) / Math.PI, (2.53 * 180) / Math.PI], [171, 0, 170]], 1e-9)
  })

  it('are kept up to 1e-9, and a joint without bounds has none to break', async () => {
    const at = async (shoulder: number) => (await resultOf('forward-kinematics', 'trainer-3r', { configurations: [[shoulder, 0, 0]] })).withinLimits
    expect([await at(3.1), await at(3.1 + 0.5e-9), await at(3.1 + 2e-9), await at(-3.1 - 2e-9)]).toEqual([true, true, false, false])
    expect(await resultOf('forward-kinematics', 'skerry-7', { configurations: [[0, 0, 0, 0, 0, 0, 1000]] })).toMatchObject({ withinLimits: true, violations: [] })
  })
})
